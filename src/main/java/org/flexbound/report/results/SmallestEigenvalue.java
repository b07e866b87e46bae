package org.flexbound.report.results;

import java.util.List;
import java.util.OptionalDouble;

/**
 * The smallest eigenvalue of the square part of a matrix, scaled to a unit diagonal; an elastic
 * structure's is above zero.
 *
 * @param points the loads of the square part
 * @param value the eigenvalue
 * @param standardUncertainty standard uncertainty of the eigenvalue
 * @param z value over its standard uncertainty
 * @param limit how many standard uncertainties below zero it may come out by chance
 * @param vector its vector, in the order of the points
 * @param passed whether it is within its limit
 */
public record SmallestEigenvalue(
    List<String> points,
    double value,
    double standardUncertainty,
    OptionalDouble z,
    double limit,
    List<Double> vector,
    boolean passed) {
  /** Copies the lists. */
  public SmallestEigenvalue {
    points = List.copyOf(points);
    vector = List.copyOf(vector);
  }
}
