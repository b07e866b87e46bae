package org.flexbound.solve;

/** Arithmetic of 6 × 6 matrices, row by row in arrays of 36. */
final class Matrix6 {
  static final int N = 6;

  private Matrix6() {}

  static double[] times(double[] matrix, double[] vector) {
    double[] result = new double[N];
    for (int i = 0; i < N; i++) {
      double sum = 0;
      for (int j = 0; j < N; j++) {
        sum += matrix[i * N + j] * vector[j];
      }
      result[i] = sum;
    }
    return result;
  }

  static double dot(double[] a, double[] b) {
    double sum = 0;
    for (int i = 0; i < N; i++) {
      sum += a[i] * b[i];
    }
    return sum;
  }

  /** aᵀ M b. */
  static double form(double[] a, double[] matrix, double[] b) {
    double sum = 0;
    for (int i = 0; i < N; i++) {
      if (a[i] != 0) {
        double row = 0;
        for (int j = 0; j < N; j++) {
          row += matrix[i * N + j] * b[j];
        }
        sum += a[i] * row;
      }
    }
    return sum;
  }

  /** sum += factor · a aᵀ. */
  static void addOuter(double[] sum, double factor, double[] a) {
    for (int i = 0; i < N; i++) {
      for (int j = 0; j < N; j++) {
        sum[i * N + j] += factor * a[i] * a[j];
      }
    }
  }

  /**
   * The inverse of a positive definite matrix, by Cholesky's factor of the matrix scaled to a unit
   * diagonal (so that the units of force and moment do not matter).
   *
   * @throws ArithmeticException where it is not positive definite
   */
  static double[] inverse(double[] matrix) {
    double[] scale = new double[N];
    for (int i = 0; i < N; i++) {
      scale[i] = 1 / Math.sqrt(matrix[i * N + i]);
    }
    double[] l = new double[N * N];
    for (int i = 0; i < N; i++) {
      for (int j = 0; j <= i; j++) {
        double sum = matrix[i * N + j] * scale[i] * scale[j];
        for (int k = 0; k < j; k++) {
          sum -= l[i * N + k] * l[j * N + k];
        }
        if (i == j) {
          if (!(sum > 0)) {
            throw new ArithmeticException("not positive definite in row " + i);
          }
          l[i * N + i] = Math.sqrt(sum);
        } else {
          l[i * N + j] = sum / l[j * N + j];
        }
      }
    }
    double[] inverse = new double[N * N];
    double[] column = new double[N];
    for (int c = 0; c < N; c++) {
      for (int i = 0; i < N; i++) {
        double sum = i == c ? 1 : 0;
        for (int k = 0; k < i; k++) {
          sum -= l[i * N + k] * column[k];
        }
        column[i] = sum / l[i * N + i];
      }
      for (int i = N - 1; i >= 0; i--) {
        double sum = column[i];
        for (int k = i + 1; k < N; k++) {
          sum -= l[k * N + i] * column[k];
        }
        column[i] = sum / l[i * N + i];
      }
      for (int i = 0; i < N; i++) {
        inverse[i * N + c] = column[i] * scale[i] * scale[c];
      }
    }
    for (int i = 0; i < N; i++) {
      for (int j = 0; j < i; j++) {
        double mean = (inverse[i * N + j] + inverse[j * N + i]) / 2;
        inverse[i * N + j] = mean;
        inverse[j * N + i] = mean;
      }
    }
    return inverse;
  }
}
