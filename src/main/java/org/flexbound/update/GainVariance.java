package org.flexbound.update;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.LinearSolverFactory_DDRM;

/** Posterior variances of the scaled gains at μ = 1, the parameters integrated out. */
final class GainVariance {
  private GainVariance() {}

  /** The diagonal of I − Gᵀ(I + JJᵀ)⁻¹G, J all columns. */
  static double[] of(DMatrixRMaj jacobian, int parameters) {
    int m = jacobian.numRows;
    int gains = jacobian.numCols - parameters;
    double[] result = new double[gains];
    if (m == 0 || gains == 0) {
      java.util.Arrays.fill(result, 1);
      return result;
    }
    DMatrixRMaj whole = new DMatrixRMaj(m, m);
    CommonOps_DDRM.multTransB(jacobian, jacobian, whole);
    for (int row = 0; row < m; row++) {
      whole.add(row, row, 1);
    }
    var solver = LinearSolverFactory_DDRM.symmPosDef(m);
    if (!solver.setA(whole)) {
      throw new ArithmeticException("the covariance of the data is not positive definite");
    }
    DMatrixRMaj g = CommonOps_DDRM.extract(jacobian, 0, m, parameters, jacobian.numCols);
    DMatrixRMaj solved = new DMatrixRMaj(m, gains);
    solver.solve(g.copy(), solved);
    for (int k = 0; k < gains; k++) {
      double sum = 1;
      for (int row = 0; row < m; row++) {
        sum -= g.get(row, k) * solved.get(row, k);
      }
      result[k] = Math.max(sum, 0);
    }
    return result;
  }
}
