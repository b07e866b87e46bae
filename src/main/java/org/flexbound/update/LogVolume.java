package org.flexbound.update;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;

/**
 * How much room the other unknowns have where one is held: −½ ln det of their Gauss–Newton Hessian,
 * the factor between a profile and a marginal density (Tierney &amp; Kadane 1986, Journal of the
 * American Statistical Association 81, 82).
 */
final class LogVolume {
  private LogVolume() {}

  static double of(Minimum there, int held, double[] ridge) {
    int n = there.w.length;
    DMatrixRMaj hessian = new DMatrixRMaj(n - 1, n - 1);
    for (int i = 0, a = 0; i < n; i++) {
      if (i == held) {
        continue;
      }
      for (int k = 0, b = 0; k < n; k++) {
        if (k == held) {
          continue;
        }
        double sum = i == k ? ridge[i] * ridge[i] : 0;
        for (int row = 0; row < there.jacobian.numRows; row++) {
          sum += there.jacobian.unsafe_get(row, i) * there.jacobian.unsafe_get(row, k);
        }
        hessian.set(a, b, sum);
        b++;
      }
      a++;
    }
    if (n == 1) {
      return 0;
    }
    var cholesky = DecompositionFactory_DDRM.chol(n - 1, true);
    if (!cholesky.decompose(hessian)) {
      return 0;
    }
    DMatrixRMaj factor = cholesky.getT(null);
    double sum = 0;
    for (int i = 0; i < n - 1; i++) {
      sum -= Math.log(factor.get(i, i));
    }
    return sum;
  }
}
