package org.flexbound.acceptance;

/**
 * A measured quantity that a limit is set on.
 *
 * @param subject what it is, for the reader, e.g. {@code head x under push x}
 * @param value its value, SI
 * @param budget its uncertainty by source, same unit
 * @param runs how many runs it rests on
 * @param law how its true value is distributed about the measured one
 */
public record Quantity(String subject, double value, Budget budget, int runs, Law law) {
  /** How a true value is distributed about a measured one. */
  public enum Law {
    /** Student's t about the value, scaled by the standard uncertainty. */
    ABOUT_VALUE,
    /** The inverse of something that is distributed about its value: a stiffness 1/a. */
    INVERSE,
    /**
     * A standard deviation σ estimated by s from k degrees of freedom (those of the scatter): k s²/σ²
     * is χ² with k degrees of freedom.
     */
    STANDARD_DEVIATION
  }

  /**
   * The quantity whose inverse this is: value 1/v, uncertainties over v² (to the first order).
   *
   * @return the coefficient behind a stiffness
   */
  Quantity inverse() {
    double factor = 1 / (value * value);
    return new Quantity(
        subject,
        1 / value,
        new Budget(
            budget.scatter() * factor,
            budget.scatterDegreesOfFreedom(),
            budget.fixed().stream()
                .map(s -> new Budget.Source(s.name(), s.uncertainty() * factor, s.relative()))
                .toList()),
        runs,
        Law.ABOUT_VALUE);
  }
}
