package org.flexbound.update;

import java.util.List;

/**
 * How the μ = 1 estimate was reached.
 *
 * @param converged whether the solver met its tolerance
 * @param reason why it stopped, in words
 * @param iterations outer iterations
 * @param evaluations of the computed flexibility
 * @param projectedGradient largest component of the projected gradient, in scaled variables, relative
 *     to its size at the nominal model
 * @param starts one for each starting point
 * @param startsAgree whether all starts that converged came to the same point
 */
public record Convergence(
    boolean converged,
    String reason,
    int iterations,
    int evaluations,
    double projectedGradient,
    List<Start> starts,
    boolean startsAgree) {
  /** Copies the list. */
  public Convergence {
    starts = List.copyOf(starts);
  }

  /**
   * One starting point.
   *
   * @param converged whether it converged
   * @param objective what it came to
   * @param iterations how many iterations it took
   * @param distance of its end from the best, in posterior standard deviations
   */
  public record Start(boolean converged, double objective, int iterations, double distance) {}
}
