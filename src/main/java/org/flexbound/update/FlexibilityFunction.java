package org.flexbound.update;

/**
 * The computed absolute flexibility coefficients of every configuration as a function of the
 * parameters in their working variables.
 *
 * <p>The coefficients stand one configuration after another, in the order of each configuration's
 * {@code MeasuredFlexibility.absolute()}.
 */
public interface FlexibilityFunction {
  /**
   * Coefficients with their derivatives.
   *
   * @param x the parameters in their working variables
   * @return coefficients and Jacobian
   */
  Computed at(double[] x);

  /**
   * Coefficients alone; an implementation may be quicker here.
   *
   * @param x the parameters in their working variables
   * @return the coefficients, SI
   */
  default double[] coefficients(double[] x) {
    return at(x).coefficients();
  }

  /**
   * Coefficients and Jacobian at one point. Handed over, not copied: a Jacobian may have half a
   * million entries, and whoever asked for it is its only reader.
   */
  final class Computed {
    private final double[] coefficients;
    private final double[][] jacobian;

    /**
     * What was computed.
     *
     * @param coefficients the absolute coefficients, SI
     * @param jacobian row by coefficient, column by parameter
     */
    public Computed(double[] coefficients, double[][] jacobian) {
      this.coefficients = coefficients;
      this.jacobian = jacobian;
    }

    /**
     * The absolute coefficients.
     *
     * @return SI, not copied
     */
    public double[] coefficients() {
      return coefficients;
    }

    /**
     * Their derivatives.
     *
     * @return row by coefficient, column by parameter, not copied
     */
    public double[][] jacobian() {
      return jacobian;
    }
  }
}
