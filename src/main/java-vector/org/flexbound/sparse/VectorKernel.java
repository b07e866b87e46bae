package org.flexbound.sparse;

import jdk.incubator.vector.DoubleVector;
import jdk.incubator.vector.VectorSpecies;

/** The kernel on the Vector API: three vectors of eight by four columns in registers. */
final class VectorKernel implements DenseKernel {
  private static final VectorSpecies<Double> S = DoubleVector.SPECIES_512;

  @Override
  public String name() {
    return "Vector API";
  }

  @Override
  public void subtract(double[] a, int ao, int as, double[] b, int b0, int b1, int b2, int b3, int bs, int depth, double[] c, int c0, int c1,
      int c2, int c3) {
    DoubleVector s00 = DoubleVector.zero(S);
    DoubleVector s10 = s00;
    DoubleVector s20 = s00;
    DoubleVector s01 = s00;
    DoubleVector s11 = s00;
    DoubleVector s21 = s00;
    DoubleVector s02 = s00;
    DoubleVector s12 = s00;
    DoubleVector s22 = s00;
    DoubleVector s03 = s00;
    DoubleVector s13 = s00;
    DoubleVector s23 = s00;
    int p = ao;
    int q = 0;
    for (int k = 0; k < depth; k++) {
      DoubleVector a0 = DoubleVector.fromArray(S, a, p);
      DoubleVector a1 = DoubleVector.fromArray(S, a, p + 8);
      DoubleVector a2 = DoubleVector.fromArray(S, a, p + 16);
      DoubleVector y = DoubleVector.broadcast(S, b[b0 + q]);
      s00 = a0.fma(y, s00);
      s10 = a1.fma(y, s10);
      s20 = a2.fma(y, s20);
      y = DoubleVector.broadcast(S, b[b1 + q]);
      s01 = a0.fma(y, s01);
      s11 = a1.fma(y, s11);
      s21 = a2.fma(y, s21);
      y = DoubleVector.broadcast(S, b[b2 + q]);
      s02 = a0.fma(y, s02);
      s12 = a1.fma(y, s12);
      s22 = a2.fma(y, s22);
      y = DoubleVector.broadcast(S, b[b3 + q]);
      s03 = a0.fma(y, s03);
      s13 = a1.fma(y, s13);
      s23 = a2.fma(y, s23);
      p += as;
      q += bs;
    }
    DoubleVector.fromArray(S, c, c0).sub(s00).intoArray(c, c0);
    DoubleVector.fromArray(S, c, c0 + 8).sub(s10).intoArray(c, c0 + 8);
    DoubleVector.fromArray(S, c, c0 + 16).sub(s20).intoArray(c, c0 + 16);
    DoubleVector.fromArray(S, c, c1).sub(s01).intoArray(c, c1);
    DoubleVector.fromArray(S, c, c1 + 8).sub(s11).intoArray(c, c1 + 8);
    DoubleVector.fromArray(S, c, c1 + 16).sub(s21).intoArray(c, c1 + 16);
    DoubleVector.fromArray(S, c, c2).sub(s02).intoArray(c, c2);
    DoubleVector.fromArray(S, c, c2 + 8).sub(s12).intoArray(c, c2 + 8);
    DoubleVector.fromArray(S, c, c2 + 16).sub(s22).intoArray(c, c2 + 16);
    DoubleVector.fromArray(S, c, c3).sub(s03).intoArray(c, c3);
    DoubleVector.fromArray(S, c, c3 + 8).sub(s13).intoArray(c, c3 + 8);
    DoubleVector.fromArray(S, c, c3 + 16).sub(s23).intoArray(c, c3 + 16);
  }

  @Override
  public void subtractNarrow(double[] a, int ao, int as, double[] b, int b0, int b1, int b2, int b3, int bs, int depth, double[] c, int c0,
      int c1, int c2, int c3) {
    DoubleVector s0 = DoubleVector.zero(S);
    DoubleVector s1 = s0;
    DoubleVector s2 = s0;
    DoubleVector s3 = s0;
    int p = ao;
    int q = 0;
    for (int k = 0; k < depth; k++) {
      DoubleVector x = DoubleVector.fromArray(S, a, p);
      s0 = x.fma(DoubleVector.broadcast(S, b[b0 + q]), s0);
      s1 = x.fma(DoubleVector.broadcast(S, b[b1 + q]), s1);
      s2 = x.fma(DoubleVector.broadcast(S, b[b2 + q]), s2);
      s3 = x.fma(DoubleVector.broadcast(S, b[b3 + q]), s3);
      p += as;
      q += bs;
    }
    DoubleVector.fromArray(S, c, c0).sub(s0).intoArray(c, c0);
    DoubleVector.fromArray(S, c, c1).sub(s1).intoArray(c, c1);
    DoubleVector.fromArray(S, c, c2).sub(s2).intoArray(c, c2);
    DoubleVector.fromArray(S, c, c3).sub(s3).intoArray(c, c3);
  }
}
