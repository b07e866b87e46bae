package org.flexbound.solve;

/**
 * How far a solution can be trusted numerically.
 *
 * @param unknowns how many there were
 * @param residual the largest residual of a column before refinement, relative to its load
 * @param correction what one step of refinement changed, relative to the solution (in the norm of
 *     the diagonal stiffnesses)
 * @param leastPivot the least ratio of a pivot to its original diagonal entry
 */
public record Evidence(int unknowns, double residual, double correction, double leastPivot) {
  private static final double EPSILON = Math.ulp(1.0);

  /**
   * How many of the sixteen digits were lost before refinement, by what refinement changed.
   *
   * @return digits, at least 0
   */
  public double lostDigits() {
    return correction > EPSILON ? Math.log10(correction / EPSILON) : 0;
  }
}
