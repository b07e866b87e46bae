package org.flexbound.sparse;

/** Products of tall, narrow column-major arrays (n rows), in blocks of four by four columns held in registers. */
final class TallBlocks {
  private TallBlocks() {}

  /**
   * {@code C = AᵀB}.
   *
   * @param a n × p from offset ao
   * @param b n × q from offset bo
   * @param c p × q, column-major, overwritten
   */
  static void project(int n, double[] a, int ao, int p, double[] b, int bo, int q, double[] c) {
    for (int j = 0; j < q; j += 4) {
      for (int i = 0; i < p; i += 4) {
        if (i + 4 <= p && j + 4 <= q) {
          project4(n, a, ao + i * n, b, bo + j * n, c, j * p + i, p);
        } else {
          for (int jj = j; jj < Math.min(q, j + 4); jj++) {
            for (int ii = i; ii < Math.min(p, i + 4); ii++) {
              c[jj * p + ii] = dot(n, a, ao + ii * n, b, bo + jj * n);
            }
          }
        }
      }
    }
  }

  static double dot(int n, double[] a, int ao, double[] b, int bo) {
    double s0 = 0;
    double s1 = 0;
    double s2 = 0;
    double s3 = 0;
    int i = 0;
    for (; i + 4 <= n; i += 4) {
      s0 = Math.fma(a[ao + i], b[bo + i], s0);
      s1 = Math.fma(a[ao + i + 1], b[bo + i + 1], s1);
      s2 = Math.fma(a[ao + i + 2], b[bo + i + 2], s2);
      s3 = Math.fma(a[ao + i + 3], b[bo + i + 3], s3);
    }
    for (; i < n; i++) {
      s0 = Math.fma(a[ao + i], b[bo + i], s0);
    }
    return (s0 + s1) + (s2 + s3);
  }

  private static void project4(int n, double[] a, int a0, double[] b, int b0, double[] c, int at, int ld) {
    int a1 = a0 + n;
    int a2 = a1 + n;
    int a3 = a2 + n;
    int b1 = b0 + n;
    int b2 = b1 + n;
    int b3 = b2 + n;
    double c00 = 0;
    double c10 = 0;
    double c20 = 0;
    double c30 = 0;
    double c01 = 0;
    double c11 = 0;
    double c21 = 0;
    double c31 = 0;
    double c02 = 0;
    double c12 = 0;
    double c22 = 0;
    double c32 = 0;
    double c03 = 0;
    double c13 = 0;
    double c23 = 0;
    double c33 = 0;
    for (int i = 0; i < n; i++) {
      double x0 = a[a0 + i];
      double x1 = a[a1 + i];
      double x2 = a[a2 + i];
      double x3 = a[a3 + i];
      double y = b[b0 + i];
      c00 = Math.fma(x0, y, c00);
      c10 = Math.fma(x1, y, c10);
      c20 = Math.fma(x2, y, c20);
      c30 = Math.fma(x3, y, c30);
      y = b[b1 + i];
      c01 = Math.fma(x0, y, c01);
      c11 = Math.fma(x1, y, c11);
      c21 = Math.fma(x2, y, c21);
      c31 = Math.fma(x3, y, c31);
      y = b[b2 + i];
      c02 = Math.fma(x0, y, c02);
      c12 = Math.fma(x1, y, c12);
      c22 = Math.fma(x2, y, c22);
      c32 = Math.fma(x3, y, c32);
      y = b[b3 + i];
      c03 = Math.fma(x0, y, c03);
      c13 = Math.fma(x1, y, c13);
      c23 = Math.fma(x2, y, c23);
      c33 = Math.fma(x3, y, c33);
    }
    c[at] = c00;
    c[at + 1] = c10;
    c[at + 2] = c20;
    c[at + 3] = c30;
    c[at + ld] = c01;
    c[at + ld + 1] = c11;
    c[at + ld + 2] = c21;
    c[at + ld + 3] = c31;
    c[at + 2 * ld] = c02;
    c[at + 2 * ld + 1] = c12;
    c[at + 2 * ld + 2] = c22;
    c[at + 2 * ld + 3] = c32;
    c[at + 3 * ld] = c03;
    c[at + 3 * ld + 1] = c13;
    c[at + 3 * ld + 2] = c23;
    c[at + 3 * ld + 3] = c33;
  }

  /**
   * {@code B = B + factor · A C}.
   *
   * @param a n × p from offset ao
   * @param c entry (i, j) at {@code co + i + j·ld}, p × q
   * @param b n × q from offset bo
   */
  static void add(int n, double[] a, int ao, int p, double factor, double[] c, int co, int ld, double[] b, int bo, int q) {
    for (int j = 0; j < q; j++) {
      int y = bo + j * n;
      int i = 0;
      for (; i + 4 <= p; i += 4) {
        int at = co + i + j * ld;
        add4(n, a, ao + i * n, factor * c[at], factor * c[at + 1], factor * c[at + 2], factor * c[at + 3], b, y);
      }
      for (; i < p; i++) {
        axpy(n, factor * c[co + i + j * ld], a, ao + i * n, b, y);
      }
    }
  }

  private static void add4(int n, double[] a, int a0, double f0, double f1, double f2, double f3, double[] b, int y) {
    int a1 = a0 + n;
    int a2 = a1 + n;
    int a3 = a2 + n;
    for (int i = 0; i < n; i++) {
      b[y + i] = Math.fma(f3, a[a3 + i], Math.fma(f2, a[a2 + i], Math.fma(f1, a[a1 + i], Math.fma(f0, a[a0 + i], b[y + i]))));
    }
  }

  static void axpy(int n, double factor, double[] a, int ao, double[] b, int bo) {
    for (int i = 0; i < n; i++) {
      b[bo + i] = Math.fma(factor, a[ao + i], b[bo + i]);
    }
  }
}
