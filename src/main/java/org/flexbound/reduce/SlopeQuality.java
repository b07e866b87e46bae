package org.flexbound.reduce;

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
 */
public record SlopeQuality(
    double span,
    double linearity,
    double hysteresis,
    double curvature,
    double curvatureProbability,
    double zeroReturn,
    double resolution,
    int steps) {}
