package org.flexbound.finding;

/** How much a finding weighs, worst first. */
public enum Severity {
  /** The input is refused, or a result that was asked for cannot be given. */
  ERROR,
  /** The result stands, but somebody must look at this before relying on it. */
  WARNING,
  /** What the program noticed, repaired or left out, and no harm done. */
  NOTE
}
