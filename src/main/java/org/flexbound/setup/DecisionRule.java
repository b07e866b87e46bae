package org.flexbound.setup;

/** How a measured value is judged against a limit (JCGM 106:2012). */
public enum DecisionRule {
  /** Pass and fail only outside a guard band about the limit; undecided within. */
  GUARD_BAND,
  /** The value alone decides, whatever its uncertainty. */
  SIMPLE
}
