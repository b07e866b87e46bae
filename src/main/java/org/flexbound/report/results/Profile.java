package org.flexbound.report.results;

import java.util.List;

/**
 * The least misfit for each value of one parameter, less its minimum.
 *
 * @param threshold what the rise must reach for a two-sided 95 % limit
 * @param parabolic whether the rise is that of a parabola
 * @param points the curve, in order of the value
 */
public record Profile(
    double threshold,
    boolean parabolic,
    List<ProfilePoint> points) {
  /** Copies the lists. */
  public Profile {
    points = List.copyOf(points);
  }
}
