package org.flexbound.setup;

/** A place on the structure at which something is loaded or measured. */
public sealed interface Station {
  /**
   * A node of the frame model, or a place held rigidly at an offset from it.
   *
   * @param node the node's name
   * @param offset from the node to the place, m, global axes; zero for the node itself
   */
  record AtNode(String node, Vector offset) implements Station {}

  /**
   * A place on a member's axis.
   *
   * @param member the member's name
   * @param at the share of the flexible length from its first end, 0 to 1
   */
  record OnMember(String member, double at) implements Station {
    /** Checks the share. */
    public OnMember {
      if (!(at >= 0 && at <= 1)) {
        throw new IllegalArgumentException("a place on a member lies from 0 to 1, not at " + at);
      }
    }
  }

  /**
   * A place in space, tied to no model.
   *
   * @param point the place, m, global axes
   */
  record AtPoint(Vector point) implements Station {}
}
