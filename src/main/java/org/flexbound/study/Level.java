package org.flexbound.study;

/** A stiffness as a bound states it. */
public sealed interface Level {
  /**
   * A multiple of the nominal stiffness.
   *
   * @param factor the multiple, above 0
   */
  record OfNominal(double factor) implements Level {}

  /**
   * A stiffness of its own.
   *
   * @param value N/m, N·m/rad (or, for a material, Pa), above 0
   */
  record Stiffness(double value) implements Level {}

  /** Rigid: compliance 0. */
  record Rigid() implements Level {}

  /** Free: stiffness 0. */
  record Free() implements Level {}
}
