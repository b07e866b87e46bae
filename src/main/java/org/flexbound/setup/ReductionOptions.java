package org.flexbound.setup;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * How readings are to be reduced.
 *
 * @param statedRepeatability relative standard deviation of a slope from run to run, from earlier
 *     tests, for use where there is only one run
 * @param fitRange the part of the load range that is fitted
 * @param fitRangeByGauge other ranges for some gauges, by name
 * @param beddingIn what becomes of the first cycle
 * @param slopeFit how slopes are fitted
 * @param localGravity weight of a mass, m/s², for loads stated in kg
 * @param takeOutBaseMotion whether the base gauges' motion is taken out of the others
 * @param qualityLimits the limits for verdicts
 * @param decisionRule how acceptance limits are judged
 */
public record ReductionOptions(
    OptionalDouble statedRepeatability,
    FitRange fitRange,
    Map<String, FitRange> fitRangeByGauge,
    BeddingIn beddingIn,
    SlopeFit slopeFit,
    double localGravity,
    boolean takeOutBaseMotion,
    QualityLimits qualityLimits,
    DecisionRule decisionRule) {
  /** Standard gravity, m/s² (CGPM 1901), for want of a stated local value. */
  public static final double STANDARD_GRAVITY = 9.80665;

  /** What holds where nothing is said. */
  public static final ReductionOptions USUAL =
      new ReductionOptions(
          OptionalDouble.empty(),
          FitRange.USUAL,
          Map.of(),
          BeddingIn.LEAVE_OUT_WHERE_OTHERS,
          SlopeFit.AUTOMATIC,
          STANDARD_GRAVITY,
          true,
          QualityLimits.USUAL,
          DecisionRule.GUARD_BAND);

  /** Copies the map. */
  public ReductionOptions {
    fitRangeByGauge = Collections.unmodifiableMap(new LinkedHashMap<>(fitRangeByGauge));
  }

  /**
   * The range for one gauge.
   *
   * @param gauge the gauge's name
   * @return its own range, or the common one
   */
  public FitRange fitRange(String gauge) {
    return fitRangeByGauge.getOrDefault(gauge, fitRange);
  }
}
