package org.flexbound.acceptance;

import java.util.ArrayList;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;

/**
 * Turns differences into independent ones of unit variance: W with Wᵀ W = V⁺. V is scaled to
 * correlations first; directions in which it says nothing are left out.
 */
final class Whitening {
  /** Eigenvalues of the correlation below this share of the largest count as nothing. */
  private static final double NOTHING = 1e-9;

  private final List<double[]> rows = new ArrayList<>();

  Whitening(double[][] covariance) {
    int n = covariance.length;
    if (n == 0) {
      return;
    }
    double[] u = new double[n];
    for (int i = 0; i < n; i++) {
      u[i] = Math.sqrt(Math.max(0, covariance[i][i]));
    }
    DMatrixRMaj correlation = new DMatrixRMaj(n, n);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        double scale = u[i] * u[j];
        correlation.set(i, j, scale > 0 ? covariance[i][j] / scale : 0);
      }
    }
    EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(n, true, true);
    eigen.decompose(correlation);
    double largest = 0;
    for (int k = 0; k < n; k++) {
      largest = Math.max(largest, eigen.getEigenvalue(k).getReal());
    }
    for (int k = 0; k < n; k++) {
      double value = eigen.getEigenvalue(k).getReal();
      if (!(value > NOTHING * n * largest)) {
        continue;
      }
      double[] row = new double[n];
      for (int i = 0; i < n; i++) {
        row[i] = u[i] > 0 ? eigen.getEigenVector(k).get(i) / (u[i] * Math.sqrt(value)) : 0;
      }
      rows.add(row);
    }
  }

  int rank() {
    return rows.size();
  }

  double[] apply(double[] differences) {
    double[] result = new double[rows.size()];
    for (int r = 0; r < result.length; r++) {
      double[] row = rows.get(r);
      for (int i = 0; i < row.length; i++) {
        result[r] += row[i] * differences[i];
      }
    }
    return result;
  }

  double squares(double[] differences) {
    double sum = 0;
    for (double along : apply(differences)) {
      sum += along * along;
    }
    return sum;
  }
}
