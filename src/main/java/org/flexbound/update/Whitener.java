package org.flexbound.update;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.CholeskyDecomposition_F64;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;

/**
 * A matrix W with W V Wᵀ = I, for a covariance V.
 *
 * <p>From the Cholesky factor of V scaled to correlations; where that does not exist to working
 * precision (coefficients that depend on each other, as base motion taken out can make them), from
 * its eigenvectors, leaving out directions below 1e-10 of the largest, in which the data say nothing.
 * A row with no variance at all would weigh infinitely: that is refused before.
 */
final class Whitener {
  private static final double NOTHING = 1e-10;

  private final DMatrixRMaj matrix;

  private Whitener(DMatrixRMaj matrix) {
    this.matrix = matrix;
  }

  static Whitener of(DMatrixRMaj covariance) {
    int n = covariance.numRows;
    double[] scale = new double[n];
    boolean diagonal = true;
    for (int i = 0; i < n; i++) {
      scale[i] = Math.sqrt(covariance.get(i, i));
      if (!(scale[i] > 0)) {
        throw new IllegalArgumentException("coefficient " + i + " has no variance");
      }
      for (int j = 0; j < i; j++) {
        diagonal &= covariance.get(i, j) == 0;
      }
    }
    DMatrixRMaj result = new DMatrixRMaj(n, n);
    if (diagonal) {
      for (int i = 0; i < n; i++) {
        result.set(i, i, 1 / scale[i]);
      }
      return new Whitener(result);
    }
    DMatrixRMaj correlation = new DMatrixRMaj(n, n);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        correlation.set(i, j, covariance.get(i, j) / (scale[i] * scale[j]));
      }
    }
    CholeskyDecomposition_F64<DMatrixRMaj> cholesky = DecompositionFactory_DDRM.chol(n, true);
    if (cholesky.decompose(correlation.copy())) {
      DMatrixRMaj factor = cholesky.getT(null);
      double least = 1;
      for (int i = 0; i < n; i++) {
        least = Math.min(least, factor.get(i, i));
      }
      if (least * least > NOTHING) {
        result = CommonOps_DDRM.identity(n);
        solveLower(factor, result);
        scaleColumns(result, scale);
        return new Whitener(result);
      }
    }
    return new Whitener(fromEigenvectors(correlation, scale));
  }

  private static void solveLower(DMatrixRMaj lower, DMatrixRMaj right) {
    int n = lower.numRows;
    for (int i = 0; i < n; i++) {
      for (int k = 0; k < i; k++) {
        double l = lower.unsafe_get(i, k);
        if (l != 0) {
          for (int j = 0; j <= k; j++) {
            right.unsafe_set(i, j, right.unsafe_get(i, j) - l * right.unsafe_get(k, j));
          }
        }
      }
      for (int j = 0; j <= i; j++) {
        right.unsafe_set(i, j, right.unsafe_get(i, j) / lower.unsafe_get(i, i));
      }
    }
  }

  private static void scaleColumns(DMatrixRMaj matrix, double[] scale) {
    for (int i = 0; i < matrix.numRows; i++) {
      for (int j = 0; j < matrix.numCols; j++) {
        matrix.set(i, j, matrix.get(i, j) / scale[j]);
      }
    }
  }

  private static DMatrixRMaj fromEigenvectors(DMatrixRMaj correlation, double[] scale) {
    int n = scale.length;
    EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(n, true, true);
    if (!eigen.decompose(correlation)) {
      throw new ArithmeticException("the eigenvectors of a covariance were not found");
    }
    double largest = 0;
    for (int i = 0; i < n; i++) {
      largest = Math.max(largest, eigen.getEigenvalue(i).getReal());
    }
    int kept = 0;
    for (int i = 0; i < n; i++) {
      kept += eigen.getEigenvalue(i).getReal() > NOTHING * largest ? 1 : 0;
    }
    DMatrixRMaj result = new DMatrixRMaj(kept, n);
    int next = 0;
    for (int i = 0; i < n; i++) {
      double value = eigen.getEigenvalue(i).getReal();
      if (value > NOTHING * largest) {
        DMatrixRMaj vector = eigen.getEigenVector(i);
        for (int j = 0; j < n; j++) {
          result.set(next, j, vector.get(j) / Math.sqrt(value));
        }
        next++;
      }
    }
    scaleColumns(result, scale);
    return result;
  }

  int rank() {
    return matrix.numRows;
  }

  double[] whiten(double[] vector) {
    double[] result = new double[matrix.numRows];
    for (int i = 0; i < matrix.numRows; i++) {
      double sum = 0;
      for (int j = 0; j < matrix.numCols; j++) {
        sum += matrix.unsafe_get(i, j) * vector[j];
      }
      result[i] = sum;
    }
    return result;
  }

  DMatrixRMaj whiten(DMatrixRMaj columns) {
    DMatrixRMaj result = new DMatrixRMaj(matrix.numRows, columns.numCols);
    CommonOps_DDRM.mult(matrix, columns, result);
    return result;
  }
}
