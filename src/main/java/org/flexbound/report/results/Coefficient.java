package org.flexbound.report.results;

import java.util.List;
import java.util.OptionalDouble;

/**
 * A flexibility coefficient as it is compared: base motion taken out where it can be.
 *
 * @param configuration the configuration
 * @param gauge the gauge
 * @param load the load
 * @param value motion per unit load
 * @param unit the SI unit of value and uncertainty
 * @param standardUncertainty combined standard uncertainty (k = 1) from all sources
 * @param degreesOfFreedom effective degrees of freedom (Welch-Satterthwaite); left out where
 *     infinite
 * @param scatter the part of the standard uncertainty that comes from run-to-run scatter
 * @param floor the part that comes from the fixed floors of the gauge instruments
 * @param gain the part that comes from the gains of the instruments
 * @param absolute the coefficient before base motion was taken out; left out where it is the
 *     same
 * @param runs how many runs it is the mean of
 * @param quality quality figures, such as linearity, hysteresis and zero return
 */
public record Coefficient(
    String configuration,
    String gauge,
    String load,
    double value,
    String unit,
    double standardUncertainty,
    OptionalDouble degreesOfFreedom,
    double scatter,
    double floor,
    double gain,
    OptionalDouble absolute,
    int runs,
    List<Quality> quality) {
  /** Copies the lists. */
  public Coefficient {
    quality = List.copyOf(quality);
  }
}
