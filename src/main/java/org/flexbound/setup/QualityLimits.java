package org.flexbound.setup;

/**
 * The limits against which the quality of a run and of a coefficient is judged; all are shares (0.02
 * = 2 %) unless said otherwise. Defaults are common practice without a standard behind them.
 *
 * @param linearity largest departure from the line, share of the gauge's span
 * @param hysteresis largest gap between loading and unloading, share of span
 * @param repeatability spread of the slopes of several runs, relative standard deviation
 * @param zeroReturn reading that does not come back after unloading, share of the peak reading
 * @param resolution the instrument's resolution, share of span
 * @param curvature size of an added quadratic, share of span, from which a significant one matters
 * @param reciprocityZ largest |z| of a reciprocity pair
 * @param baseMotionShare largest share of a reading that is base motion
 */
public record QualityLimits(
    double linearity,
    double hysteresis,
    double repeatability,
    double zeroReturn,
    double resolution,
    double curvature,
    double reciprocityZ,
    double baseMotionShare) {
  /** The defaults, all of them common practice: no standard names numbers for these. */
  public static final QualityLimits USUAL =
      new QualityLimits(0.02, 0.05, 0.02, 0.05, 0.01, 0.01, 3.0, 0.8);
}
