package org.flexbound.update;

import org.ejml.data.DMatrixRMaj;

/** Whitened residuals as a function of the scaled unknowns w. */
interface WhitenedModel {
  /**
   * Residuals and derivatives of the model side.
   *
   * @param w the scaled unknowns
   * @return residuals (data − model) and Jacobian of the model side
   */
  Linear linearise(double[] w);

  /** Residuals (data − model) and the Jacobian of the model side; handed over, not copied. */
  final class Linear {
    final double[] residuals;
    final DMatrixRMaj jacobian;

    Linear(double[] residuals, DMatrixRMaj jacobian) {
      this.residuals = residuals;
      this.jacobian = jacobian;
    }
  }
}
