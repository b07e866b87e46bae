package org.flexbound.setup;

/** What an acceptance limit is set on. */
public enum LimitKind {
  /** A flexibility coefficient. */
  COEFFICIENT,
  /** A direct stiffness 1/a_ii. */
  DIRECT_STIFFNESS,
  /** The compliance at a point in a stated direction. */
  COMPLIANCE,
  /** The compliance at a point in its softest direction. */
  SOFTEST_COMPLIANCE,
  /** The share of a deflection that is base or fixture motion. */
  FIXTURE_SHARE,
  /** The departure of the measured from the computed coefficient, relative. */
  MODEL_AGREEMENT,
  /** The departure from reciprocity, relative. */
  RECIPROCITY,
  /** The linearity figure. */
  LINEARITY,
  /** The hysteresis figure. */
  HYSTERESIS,
  /** The repeatability figure. */
  REPEATABILITY,
  /** The set left after unloading. */
  SET
}
