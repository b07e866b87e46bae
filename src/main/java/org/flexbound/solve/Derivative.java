package org.flexbound.solve;

/** By what a coefficient is differentiated. */
public enum Derivative {
  /** The natural logarithm of the stiffness; 0 where it is rigid or free. */
  LOGARITHM,
  /** The compliance 1/θ; regular where it is rigid. */
  COMPLIANCE,
  /** The stiffness θ; regular where it is free. */
  STIFFNESS
}
