package org.flexbound.report.results;

/**
 * One starting point of the solver.
 *
 * @param converged whether it converged
 * @param objective half the misfit plus half the weighted change, where it ended
 * @param iterations how many iterations it took
 * @param distance of its end from the best end, in posterior standard deviations
 */
public record Start(
    boolean converged,
    double objective,
    int iterations,
    double distance) {}
