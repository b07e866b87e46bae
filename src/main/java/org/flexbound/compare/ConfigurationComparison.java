package org.flexbound.compare;

import java.util.List;

/**
 * Measured against computed flexibility in one configuration.
 *
 * @param configuration its name
 * @param coefficients in the order of {@code MeasuredFlexibility.coefficients()}
 * @param misfit the sum of squares of the differences under their covariance, gains included
 * @param limit what the misfit may be at 95 % if the model were true: the quantile of χ², or of F
 *     where the scatter is estimated
 * @param parts how far each part of the structure could account for the differences by itself, the
 *     best first; parts that would have to change more than twentyfold are left out
 */
public record ConfigurationComparison(
    String configuration,
    List<CoefficientComparison> coefficients,
    double misfit,
    double limit,
    List<PartShare> parts) {
  /** Copies the lists. */
  public ConfigurationComparison {
    coefficients = List.copyOf(coefficients);
    parts = List.copyOf(parts);
  }

  /**
   * How far one part of the structure could account for the differences by itself: the fit of one
   * common factor on its contributions.
   *
   * @param part the part, e.g. {@code joints.knee.rz}
   * @param complianceFactor the factor on the part's compliance that fits the differences best
   * @param misfitTakenAway what it takes off the misfit
   */
  public record PartShare(String part, double complianceFactor, double misfitTakenAway) {}
}
