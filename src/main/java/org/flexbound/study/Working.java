package org.flexbound.study;

/** The variable in which a parameter is worked. */
public enum Working {
  /** The logarithm of stiffness over nominal stiffness. */
  LN,
  /** The compliance, rad/(N·m) or m/N; 0 is rigid. */
  COMPLIANCE,
  /**
   * The fixity factor 1/(1 + 3EI/(kL)) of a reference member (Monforton &amp; Wu 1963); 0 is free,
   * 1 is rigid.
   */
  FIXITY
}
