package org.flexbound.flexibility;

import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;

/**
 * What every elastic structure's flexibility matrix keeps, held against the absolute coefficients as
 * they were measured, before anything is averaged or made symmetric.
 *
 * @param reciprocity pairs that should be equal, and all of them together
 * @param bounds direct coefficients above zero, cross coefficients within the geometric mean
 * @param definiteness of the square part; empty where there is none
 * @param gainPattern what wrong gains would leave behind; empty where no pair can be used
 * @param triples products round three points, furthest off first
 * @param hints what it looks like where something is wrong
 */
public record MatrixChecks(
    ReciprocityTable reciprocity,
    List<Bound> bounds,
    Optional<Definiteness> definiteness,
    Optional<GainPattern> gainPattern,
    List<TripleProduct> triples,
    List<Hint> hints) {
  /** All pairs together disagree where chance explains so much in fewer cases than this. */
  public static final double JOINT_LEVEL = 0.001;

  /** Copies the lists. */
  public MatrixChecks {
    bounds = List.copyOf(bounds);
    triples = List.copyOf(triples);
    hints = List.copyOf(hints);
  }

  /**
   * Checks.
   *
   * @param measured the measured flexibility
   * @param places where stations are in space, where known
   * @param single what |z| of a single check may be (3 by default); many checks are allowed for
   * @return the checks
   */
  public static MatrixChecks of(
      MeasuredFlexibility measured,
      Function<Station, Optional<Vector>> places,
      double single) {
    AbsoluteMeans means = new AbsoluteMeans(measured);
    List<CollocatedPoint> points = CollocatedPoint.of(means, places);
    ReciprocityTable reciprocity = ReciprocityTable.of(points, means, single);
    List<Bound> bounds = Bound.of(points, means, single);
    boolean wrong =
        reciprocity.probability() < JOINT_LEVEL
            || reciprocity.pairs().stream().anyMatch(ReciprocityTable.Pair::broken)
            || bounds.stream().anyMatch(Bound::broken);
    return new MatrixChecks(
        reciprocity,
        bounds,
        Definiteness.of(points, means, single),
        GainPattern.of(points, means, single),
        TripleProduct.of(points, means, single),
        wrong ? ReciprocityHints.of(points, means, single) : List.of());
  }
}
