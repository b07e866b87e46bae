package org.flexbound.setup;

/** How a slope is fitted to the steps of one run. */
public enum SlopeFit {
  /** Ordinary least squares, or both variables where the load's random error matters. */
  AUTOMATIC,
  /** Ordinary least squares of motion on load. */
  ORDINARY,
  /** Errors in both variables (York et al. 2004). */
  BOTH_VARIABLES,
  /** A fit that outlying steps move little. */
  ROBUST,
  /** Least squares of motion on load, each step weighted by its own scatter and resolution. */
  WEIGHTED
}
