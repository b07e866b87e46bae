package org.flexbound.study;

/** A prior standard deviation as the study states it. */
public sealed interface Spread {
  /**
   * In the working variable: of the natural logarithm, of the fixity factor, or, for a compliance,
   * as a share of the nominal compliance.
   *
   * @param value above 0
   */
  record InWorkingVariable(double value) implements Spread {}

  /**
   * An absolute compliance.
   *
   * @param value m/N or rad/(N·m), above 0
   */
  record OfCompliance(double value) implements Spread {}
}
