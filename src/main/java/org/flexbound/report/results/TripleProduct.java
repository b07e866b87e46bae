package org.flexbound.report.results;

import java.util.List;
import java.util.OptionalDouble;

/**
 * The products of three coefficients round three points, one way and the other, which no gain can
 * make differ.
 *
 * @param points the loads of the three points
 * @param ratio of the two products; one in an elastic structure
 * @param z logarithm of the ratio over its standard uncertainty
 * @param limit what |z| may be by chance
 * @param passed whether it is within its limit
 */
public record TripleProduct(
    List<String> points, double ratio, OptionalDouble z, double limit, boolean passed) {
  /** Copies the list. */
  public TripleProduct {
    points = List.copyOf(points);
  }
}
