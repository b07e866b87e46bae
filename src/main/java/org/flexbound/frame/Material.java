package org.flexbound.frame;

import org.flexbound.finding.Where;

/**
 * An isotropic linear-elastic material.
 *
 * @param name its name
 * @param youngsModulus E as the user states it, Pa
 * @param shearModulus G as the user states it or as E/(2(1 + ν)), Pa
 * @param density kg/m³; 0 where not stated
 * @param factor what an update made of E (and of G with it)
 * @param where its place in the user's file
 */
public record Material(
    String name,
    double youngsModulus,
    double shearModulus,
    double density,
    StiffnessSetting factor,
    Where where) {
  /**
   * Poisson's ratio, E/(2G) − 1.
   *
   * @return ν
   */
  public double poissonRatio() {
    return youngsModulus / (2 * shearModulus) - 1;
  }

  /**
   * The ratio of the moduli as set to those stated.
   *
   * @return 1 without an update
   */
  public double scale() {
    return factor.of(new Stiffness(youngsModulus)).value() / youngsModulus;
  }

  Material withFactor(StiffnessSetting next) {
    return new Material(
        name, youngsModulus, shearModulus, density, factor.then(next), where);
  }
}
