package org.flexbound.report.results;

import java.util.List;

/**
 * A support, joint or rigid link of the frame model, for the drawing.
 *
 * @param kind support, joint, connection or link
 * @param name its name
 * @param point x, y, z, m
 * @param other the other end of a link, x, y, z, m; empty for the rest
 */
public record Place(
    String kind,
    String name,
    List<Double> point,
    List<Double> other) {
  /** Copies the lists. */
  public Place {
    point = List.copyOf(point);
    other = List.copyOf(other);
  }
}
