package org.flexbound.update;

import java.util.List;
import java.util.OptionalDouble;

/**
 * The least misfit (plus the other parameters' priors) for each value of one parameter, less its
 * minimum.
 *
 * @param parameter the parameter's name
 * @param points the curve, in order of the value
 * @param threshold what the rise must reach for a two-sided 95 % limit, ½ t²(0.975, ν)
 * @param lower where it is reached below, same kind as the parameter's {@code updated}; empty where
 *     the side is open within the bounds
 * @param upper where it is reached above
 * @param parabolic whether the rise is that of a parabola, so that it says no more than the posterior
 *     standard deviation does
 */
public record Profile(
    String parameter,
    List<Point> points,
    double threshold,
    OptionalDouble lower,
    OptionalDouble upper,
    boolean parabolic) {
  /** Copies the list. */
  public Profile {
    points = List.copyOf(points);
  }

  /**
   * One point of a profile.
   *
   * @param value stiffness or factor, same kind as the parameter's {@code updated}
   * @param working the value in the working variable
   * @param rise half the rise of the sum of squares over its minimum
   */
  public record Point(double value, double working, double rise) {}
}
