package org.flexbound.frame;

import java.util.List;
import org.flexbound.finding.Where;
import org.flexbound.setup.Vector;

/**
 * A rigid body fastened to a node.
 *
 * @param node the node's name
 * @param mass kg
 * @param inertia the three rows of the inertia tensor about its own centre of mass, global axes,
 *     kg·m²
 * @param offset from the node to the centre of mass, m, global axes
 * @param where its place in the user's file
 */
public record PointMass(
    String node, double mass, List<Vector> inertia, Vector offset, Where where) {
  /** Copies the list; three rows. */
  public PointMass {
    inertia = List.copyOf(inertia);
    if (inertia.size() != 3) {
      throw new IllegalArgumentException("an inertia has three rows, not " + inertia.size());
    }
  }
}
