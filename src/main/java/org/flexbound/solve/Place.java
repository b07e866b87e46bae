package org.flexbound.solve;

import java.util.Optional;
import org.flexbound.setup.Vector;

/**
 * A place on the structure that was found in the model.
 *
 * @param node the node, where it is held rigidly by one
 * @param offset from the node, m
 * @param member the member, where it lies on one
 * @param at the share of the member's flexible length
 */
record Place(Optional<String> node, Vector offset, Optional<String> member, double at) {
  static Place atNode(String node, Vector offset) {
    return new Place(Optional.of(node), offset, Optional.empty(), 0);
  }

  static Place onMember(String member, double at) {
    return new Place(Optional.empty(), Vector.ZERO, Optional.of(member), at);
  }
}
