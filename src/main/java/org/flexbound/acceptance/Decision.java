package org.flexbound.acceptance;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.setup.DecisionRule;
import org.flexbound.setup.LimitSpec;

/**
 * What came of one limit: the quantity nearest to breaking it decides.
 *
 * @param configuration the configuration in which it was measured
 * @param limit the limit as stated
 * @param lower the smallest allowed value, SI, as it was applied (a departure is limited to both
 *     sides)
 * @param upper the largest allowed value, SI
 * @param quantity what was measured; empty where it could not be made out
 * @param judged how many quantities the limit covers; the one shown is the worst
 * @param probability that the true value lies within the limit; NaN where there is no quantity
 * @param guard the width of the guard band, SI; NaN where there is none of a fixed width
 * @param verdict the decision
 * @param rule the rule by which it was made
 * @param advice what would settle it, where it is undecided
 */
public record Decision(
    String configuration,
    LimitSpec limit,
    OptionalDouble lower,
    OptionalDouble upper,
    Optional<Quantity> quantity,
    int judged,
    double probability,
    double guard,
    Verdict verdict,
    DecisionRule rule,
    Optional<Advice> advice) {

  /**
   * The probability that the decision is wrong.
   *
   * @return of a true value beyond the limit for a pass, within it for a fail; the smaller of the two
   *     where undecided
   */
  public double wrong() {
    return switch (verdict) {
      case PASS -> 1 - probability;
      case FAIL -> probability;
      case UNDECIDED -> Math.min(probability, 1 - probability);
    };
  }

  /**
   * The worst of several verdicts.
   *
   * @param decisions the decisions
   * @return fail before undecided before pass; pass for none
   */
  public static Verdict worst(List<Decision> decisions) {
    Verdict worst = Verdict.PASS;
    for (Decision decision : decisions) {
      if (decision.verdict() == Verdict.FAIL) {
        return Verdict.FAIL;
      }
      worst = decision.verdict() == Verdict.UNDECIDED ? Verdict.UNDECIDED : worst;
    }
    return worst;
  }
}
