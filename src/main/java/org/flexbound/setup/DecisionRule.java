package org.flexbound.setup;

/**
 * How a measured value is judged against a limit (JCGM 106:2012).
 *
 * @param kind guarded or simple
 * @param largestProbability the largest probability of being wrong with a pass or a fail, above 0 and
 *     below 0.5; without effect on a simple rule
 */
public record DecisionRule(Kind kind, double largestProbability) {
  /** Guarded, with at most 5 % (common practice; the standard leaves the number to the parties). */
  public static final DecisionRule GUARD_BAND = new DecisionRule(Kind.GUARD_BAND, 0.05);

  /** The value alone decides. */
  public static final DecisionRule SIMPLE = new DecisionRule(Kind.SIMPLE, 0.05);

  /** Checks the probability. */
  public DecisionRule {
    if (!(largestProbability > 0 && largestProbability < 0.5)) {
      throw new IllegalArgumentException(
          "a probability of being wrong lies above 0 and below 0.5, not at " + largestProbability);
    }
  }

  /** The kinds of rule. */
  public enum Kind {
    /** Pass and fail only outside a guard band about the limit; undecided within. */
    GUARD_BAND,
    /** The value alone decides, whatever its uncertainty. */
    SIMPLE
  }

  /**
   * Whether a guard band is kept.
   *
   * @return false where the value alone decides
   */
  public boolean guarded() {
    return kind == Kind.GUARD_BAND;
  }
}
