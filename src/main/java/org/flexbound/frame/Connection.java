package org.flexbound.frame;

import java.util.Collections;
import java.util.EnumMap;
import java.util.Map;
import java.util.Optional;
import org.flexbound.finding.Where;
import org.flexbound.setup.Vector;

/**
 * A joint between two nodes. Both nodes are carried rigidly to its point; its deformation is the
 * motion of the second there less that of the first, in its own axes.
 *
 * @param name its name
 * @param firstNode the first node
 * @param secondNode the second node
 * @param joint the joint's name
 * @param axes its axes
 * @param at the point where it acts; empty for the first node
 * @param factors what an update made of this connection alone
 * @param where its place in the user's file
 */
public record Connection(
    String name,
    String firstNode,
    String secondNode,
    String joint,
    Axes axes,
    Optional<Vector> at,
    Map<Spring, StiffnessSetting> factors,
    Where where) {
  /** Copies the map. */
  public Connection {
    Map<Spring, StiffnessSetting> copy = new EnumMap<>(Spring.class);
    copy.putAll(factors);
    factors = Collections.unmodifiableMap(copy);
  }

  Connection withFactors(Map<Spring, StiffnessSetting> next) {
    return new Connection(name, firstNode, secondNode, joint, axes, at, next, where);
  }
}
