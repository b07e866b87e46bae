package org.flexbound.sparse;

/** The kernel in plain Java: four by four blocks in registers. */
final class PlainKernel implements DenseKernel {
  @Override
  public String name() {
    return "plain Java";
  }

  @Override
  public void subtract(double[] a, int ao, int as, double[] b, int b0, int b1, int b2, int b3, int bs, int depth, double[] c, int c0, int c1,
      int c2, int c3) {
    for (int i = 0; i < WIDTH; i += 4) {
      block(a, ao + i, as, b, b0, b1, b2, b3, bs, depth, c, c0 + i, c1 + i, c2 + i, c3 + i);
    }
  }

  @Override
  public void subtractNarrow(double[] a, int ao, int as, double[] b, int b0, int b1, int b2, int b3, int bs, int depth, double[] c, int c0,
      int c1, int c2, int c3) {
    for (int i = 0; i < NARROW; i += 4) {
      block(a, ao + i, as, b, b0, b1, b2, b3, bs, depth, c, c0 + i, c1 + i, c2 + i, c3 + i);
    }
  }

  private static void block(double[] a, int ao, int as, double[] b, int b0, int b1, int b2, int b3, int bs, int depth, double[] c, int c0,
      int c1, int c2, int c3) {
    double s00 = 0;
    double s10 = 0;
    double s20 = 0;
    double s30 = 0;
    double s01 = 0;
    double s11 = 0;
    double s21 = 0;
    double s31 = 0;
    double s02 = 0;
    double s12 = 0;
    double s22 = 0;
    double s32 = 0;
    double s03 = 0;
    double s13 = 0;
    double s23 = 0;
    double s33 = 0;
    int p = ao;
    int q = 0;
    for (int k = 0; k < depth; k++) {
      double a0 = a[p];
      double a1 = a[p + 1];
      double a2 = a[p + 2];
      double a3 = a[p + 3];
      double y = b[b0 + q];
      s00 = Math.fma(a0, y, s00);
      s10 = Math.fma(a1, y, s10);
      s20 = Math.fma(a2, y, s20);
      s30 = Math.fma(a3, y, s30);
      y = b[b1 + q];
      s01 = Math.fma(a0, y, s01);
      s11 = Math.fma(a1, y, s11);
      s21 = Math.fma(a2, y, s21);
      s31 = Math.fma(a3, y, s31);
      y = b[b2 + q];
      s02 = Math.fma(a0, y, s02);
      s12 = Math.fma(a1, y, s12);
      s22 = Math.fma(a2, y, s22);
      s32 = Math.fma(a3, y, s32);
      y = b[b3 + q];
      s03 = Math.fma(a0, y, s03);
      s13 = Math.fma(a1, y, s13);
      s23 = Math.fma(a2, y, s23);
      s33 = Math.fma(a3, y, s33);
      p += as;
      q += bs;
    }
    c[c0] -= s00;
    c[c0 + 1] -= s10;
    c[c0 + 2] -= s20;
    c[c0 + 3] -= s30;
    c[c1] -= s01;
    c[c1 + 1] -= s11;
    c[c1 + 2] -= s21;
    c[c1 + 3] -= s31;
    c[c2] -= s02;
    c[c2 + 1] -= s12;
    c[c2 + 2] -= s22;
    c[c2 + 3] -= s32;
    c[c3] -= s03;
    c[c3 + 1] -= s13;
    c[c3 + 2] -= s23;
    c[c3 + 3] -= s33;
  }
}
