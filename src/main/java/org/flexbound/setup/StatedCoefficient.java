package org.flexbound.setup;

import org.flexbound.finding.Where;

/**
 * A flexibility coefficient that was reduced elsewhere, stated in place of readings: absolute, that
 * is before base motion is taken out.
 *
 * @param gauge the gauge's name
 * @param load the load's name
 * @param value motion per load, SI
 * @param standardUncertainty combined standard uncertainty (k = 1) of the value, same unit, above 0
 * @param degreesOfFreedom of the uncertainty, above 0; infinite where none are stated
 * @param where its place in the user's file
 */
public record StatedCoefficient(
    String gauge,
    String load,
    double value,
    double standardUncertainty,
    double degreesOfFreedom,
    Where where) {
  /** Checks what is divided by. */
  public StatedCoefficient {
    if (!(standardUncertainty > 0 && degreesOfFreedom > 0)) {
      throw new IllegalArgumentException(
          "a stated coefficient has an uncertainty and degrees of freedom above 0");
    }
  }
}
