package org.flexbound.reduce;

import java.util.List;
import java.util.Optional;
import org.flexbound.statistics.Kink;

/**
 * Quality figures of a slope; shares are of the gauge's span over the fitted steps unless said
 * otherwise.
 *
 * @param span largest less smallest fitted motion, SI
 * @param linearity largest departure from the fitted lines
 * @param hysteresis largest gap between the lines of rising and falling branches of one cycle
 * @param curvature size of an added quadratic: largest departure from the chord
 * @param curvatureProbability that a straight line shows as much by chance
 * @param zeroReturn closing less opening reading at no load, share of the peak motion; NaN where
 *     there are not both
 * @param resolution the instrument's resolution; NaN where not stated
 * @param steps how many steps were fitted
 * @param zero what the closing zero is taken for
 * @param branches the slope of loading steps against that of unloading ones; empty where either has too few
 * @param pullPush the slope under loads above nought against that under loads below; empty where either has too few
 * @param kink the best place for a kink, and how likely chance makes one
 * @param outliers studentised deleted residuals of the fitted steps, in their order; NaN where a step cannot be left out
 */
public record SlopeQuality(
    double span,
    double linearity,
    double hysteresis,
    double curvature,
    double curvatureProbability,
    double zeroReturn,
    double resolution,
    int steps,
    ZeroReturn.Kind zero,
    Optional<SlopePair> branches,
    Optional<SlopePair> pullPush,
    Kink kink,
    List<Double> outliers) {
  /** Copies the list. */
  public SlopeQuality {
    outliers = List.copyOf(outliers);
  }
}
