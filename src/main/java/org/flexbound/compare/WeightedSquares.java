package org.flexbound.compare;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;

/**
 * Products aᵀ K⁻¹ b under a covariance K, scaled to correlations first; directions below 1e-10 of the
 * largest, in which the data say nothing, are left out.
 */
final class WeightedSquares {
  private static final double NOTHING = 1e-10;

  private final double[][] rows;

  WeightedSquares(double[][] covariance) {
    int n = covariance.length;
    DMatrixRMaj correlation = new DMatrixRMaj(n, n);
    double[] scale = new double[n];
    for (int i = 0; i < n; i++) {
      scale[i] = Math.sqrt(covariance[i][i]);
    }
    for (int i = 0; i < n; i++) {
      for (int k = 0; k < n; k++) {
        correlation.set(i, k, covariance[i][k] / (scale[i] * scale[k]));
      }
    }
    if (n == 0) {
      rows = new double[0][];
      return;
    }
    var eigen = DecompositionFactory_DDRM.eig(n, true, true);
    if (!eigen.decompose(correlation)) {
      throw new ArithmeticException("the eigenvectors of a covariance were not found");
    }
    double largest = 0;
    for (int i = 0; i < n; i++) {
      largest = Math.max(largest, eigen.getEigenvalue(i).getReal());
    }
    java.util.List<double[]> kept = new java.util.ArrayList<>();
    for (int i = 0; i < n; i++) {
      double value = eigen.getEigenvalue(i).getReal();
      if (value > NOTHING * largest) {
        double[] row = new double[n];
        for (int k = 0; k < n; k++) {
          row[k] = eigen.getEigenVector(i).get(k) / (Math.sqrt(value) * scale[k]);
        }
        kept.add(row);
      }
    }
    rows = kept.toArray(double[][]::new);
  }

  int rank() {
    return rows.length;
  }

  double product(double[] a, double[] b) {
    double sum = 0;
    for (double[] row : rows) {
      double left = 0;
      double right = 0;
      for (int k = 0; k < row.length; k++) {
        left += row[k] * a[k];
        right += row[k] * b[k];
      }
      sum += left * right;
    }
    return sum;
  }
}
