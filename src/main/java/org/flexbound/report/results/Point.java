package org.flexbound.report.results;

import java.util.List;
import java.util.OptionalDouble;

/**
 * A place and a direction.
 *
 * @param place the node, the member and share, or the point, as one would say it
 * @param coordinates x, y, z in m, global axes; empty where not known
 * @param direction the unit vector in global axes
 * @param rotation true for about the vector (a moment, a rotation), false for along it
 * @param share the part of the total that acts here; 1 for a gauge or a single load point
 * @param positionUncertainty standard uncertainty of the place in each direction, m
 * @param angleUncertainty standard uncertainty of the direction about each normal axis, rad
 */
public record Point(
    String place,
    List<Double> coordinates,
    List<Double> direction,
    boolean rotation,
    double share,
    OptionalDouble positionUncertainty,
    OptionalDouble angleUncertainty) {
  /** Copies the lists. */
  public Point {
    coordinates = List.copyOf(coordinates);
    direction = List.copyOf(direction);
  }
}
