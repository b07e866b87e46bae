package org.flexbound.solve;

import java.util.ArrayList;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;

/** A full 6 × 6 stiffness taken apart into directions that resist by themselves. */
final class FullSprings {
  /** Of the largest, on a matrix scaled to a unit diagonal: below it a direction is free. */
  private static final double FREE = 1e-12;

  private FullSprings() {}

  /**
   * A direction: the force n along it deforms it by n / stiffness.
   *
   * @param stiffness 0 for free
   * @param vector what makes its force out of the six components
   */
  @SuppressWarnings("ArrayRecordComponent") // used at once, never kept
  record Direction(double stiffness, double[] vector) {}

  /**
   * Takes a matrix apart. With D the root of its diagonal, K = D Q Λ Qᵀ D, so that its inverse is the
   * sum of (D⁻¹ q)(D⁻¹ q)ᵀ / λ.
   */
  static List<Direction> split(double[] k) {
    double[] root = new double[6];
    DMatrixRMaj scaled = new DMatrixRMaj(6, 6);
    for (int i = 0; i < 6; i++) {
      root[i] = k[7 * i] > 0 ? Math.sqrt(k[7 * i]) : 1;
    }
    for (int i = 0; i < 6; i++) {
      for (int j = 0; j < 6; j++) {
        scaled.set(i, j, k[6 * i + j] / root[i] / root[j]);
      }
    }
    EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(6, true, true);
    eigen.decompose(scaled);
    List<Direction> result = new ArrayList<>();
    for (int n = 0; n < 6; n++) {
      double lambda = eigen.getEigenvalue(n).getReal();
      DMatrixRMaj q = eigen.getEigenVector(n);
      double[] vector = new double[6];
      for (int i = 0; i < 6; i++) {
        vector[i] = q.get(i, 0) / root[i];
      }
      result.add(new Direction(lambda < FREE ? 0 : lambda, vector));
    }
    return result;
  }

  /** The deformation under forces; along free directions none. */
  static double[] deformation(double[] k, double[] n) {
    double[] d = new double[6];
    for (Direction direction : split(k)) {
      if (direction.stiffness() > 0) {
        double part = Matrix6.dot(direction.vector(), n) / direction.stiffness();
        for (int i = 0; i < 6; i++) {
          d[i] += part * direction.vector()[i];
        }
      }
    }
    return d;
  }
}
