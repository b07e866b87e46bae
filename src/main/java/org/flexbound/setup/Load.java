package org.flexbound.setup;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.finding.Where;

/**
 * One load that was varied by itself: a load point, or a load pattern (several points in fixed
 * proportion). It gives one column of the flexibility matrix, per unit total.
 *
 * @param name its name
 * @param points one point, or the points of the pattern
 * @param instrument the name of the instrument that reads it (where runs do not say otherwise)
 * @param limit the total it may not pass, N or N·m, where stated
 * @param remark the user's remark, or empty
 * @param where its place in the user's file
 */
public record Load(
    String name,
    List<LoadPoint> points,
    Optional<String> instrument,
    OptionalDouble limit,
    String remark,
    Where where) {
  /** Copies the list; at least one point. */
  public Load {
    points = List.copyOf(points);
    if (points.isEmpty()) {
      throw new IllegalArgumentException("load " + name + " has no point");
    }
  }

  /**
   * Whether this is a pattern.
   *
   * @return true for several points
   */
  public boolean isPattern() {
    return points.size() > 1;
  }

  /**
   * Whether the load is a moment (all points agree; readers see to it).
   *
   * @return true for a moment, N·m; false for a force, N
   */
  public boolean isMoment() {
    return points.get(0).direction().rotation();
  }
}
