package org.flexbound.reduce;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.finding.Finding;
import org.flexbound.flexibility.MatrixChecks;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.flexibility.ReciprocityTable;
import org.flexbound.statistics.PooledScatter;

/**
 * The result of a reduction, with its evidence.
 *
 * @param flexibility the partial flexibility matrix with its uncertainty
 * @param runs the runs with their verdicts
 * @param slopes what each gauge showed in each run
 * @param scatter the pooled run-to-run scatter; zero degrees of freedom where there was only one run
 * @param scatterStated true where a stated repeatability took the place of measured scatter
 * @param withoutSpread true where there is neither: intervals lack run-to-run spread
 * @param calibrationIncluded false where some instrument's calibration is not stated
 * @param repeatability relative standard deviation of the slopes over runs, by gauge and load
 *     ({@code gauge|load})
 * @param baseMotionShare share of each corrected coefficient's absolute value that was base motion,
 *     by gauge and load
 * @param matrix what every elastic structure keeps, held against the matrix
 * @param excluded what was left out
 * @param findings everything noticed
 */
public record Reduction(
    MeasuredFlexibility flexibility,
    List<RunResult> runs,
    List<RunSlope> slopes,
    PooledScatter scatter,
    boolean scatterStated,
    boolean withoutSpread,
    boolean calibrationIncluded,
    Map<String, Double> repeatability,
    Map<String, Double> baseMotionShare,
    MatrixChecks matrix,
    List<Exclusion> excluded,
    List<Finding> findings) {
  /** Copies the collections. */
  public Reduction {
    runs = List.copyOf(runs);
    slopes = List.copyOf(slopes);
    repeatability = Collections.unmodifiableMap(new LinkedHashMap<>(repeatability));
    baseMotionShare = Collections.unmodifiableMap(new LinkedHashMap<>(baseMotionShare));
    excluded = List.copyOf(excluded);
    findings = List.copyOf(findings);
  }

  /**
   * The reciprocal pairs.
   *
   * @return pairs that should be equal, and all of them together
   */
  public ReciprocityTable reciprocity() {
    return matrix.reciprocity();
  }

  /**
   * The key of a coefficient in the maps.
   *
   * @param gauge the gauge's name
   * @param load the load's name
   * @return {@code gauge|load}
   */
  public static String key(String gauge, String load) {
    return gauge + "|" + load;
  }
}
