package org.flexbound.report.results;

import java.util.List;
import java.util.Optional;

/**
 * What every elastic structure's flexibility matrix keeps, held against the absolute coefficients of
 * a configuration before anything is averaged or made symmetric.
 *
 * @param configuration the configuration
 * @param eigenvalue the smallest eigenvalue of the square part, where there is one
 * @param bounds direct coefficients above zero, cross coefficients within the geometric mean
 * @param gains what each point's gauge and load show against the other points
 * @param triples products round three points, furthest off first
 * @param hints what it looks like where something is wrong; never applied
 */
public record MatrixCheck(
    String configuration,
    Optional<SmallestEigenvalue> eigenvalue,
    List<BoundCheck> bounds,
    List<PointGain> gains,
    List<TripleProduct> triples,
    List<Hint> hints) {
  /** Copies the lists. */
  public MatrixCheck {
    bounds = List.copyOf(bounds);
    gains = List.copyOf(gains);
    triples = List.copyOf(triples);
    hints = List.copyOf(hints);
  }
}
