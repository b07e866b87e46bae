package org.flexbound.update;

import org.ejml.data.DMatrixRMaj;

/** Where a minimisation ended, with its evidence; handed over, not copied. */
final class Minimum {
  final double[] w;
  final double objective;
  final double[] residuals;
  final DMatrixRMaj jacobian;
  final int iterations;
  final int evaluations;
  final double projectedGradient;
  final boolean converged;
  final String reason;

  Minimum(
      double[] w,
      double objective,
      WhitenedModel.Linear linear,
      int iterations,
      int evaluations,
      double projectedGradient,
      boolean converged,
      String reason) {
    this.w = w;
    this.objective = objective;
    this.residuals = linear.residuals;
    this.jacobian = linear.jacobian;
    this.iterations = iterations;
    this.evaluations = evaluations;
    this.projectedGradient = projectedGradient;
    this.converged = converged;
    this.reason = reason;
  }
}
