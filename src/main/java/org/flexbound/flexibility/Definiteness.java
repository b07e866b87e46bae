package org.flexbound.flexibility;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;
import org.flexbound.statistics.Quantiles;

/**
 * Whether the square part of the matrix, collocated points only, is positive definite: the smallest
 * eigenvalue of its symmetric part, scaled to a unit diagonal so that units and sizes do not matter
 * (the signs of the eigenvalues stay: Sylvester's law of inertia).
 *
 * <p>The eigenvalue's standard uncertainty is that of vᵀ A v with its vector v held (first-order
 * perturbation: Golub &amp; Van Loan, Matrix Computations, 4th ed., 8.1). The smallest of n
 * eigenvalues is drawn below its true value by scatter, at worst by √(2n) uncertainties where all of
 * them are near nought (edge of Wigner's semicircle, 1958, Ann. Math. 67:325); the limit allows for
 * that.
 *
 * @param points the points of the square part, by their loads
 * @param smallest the smallest eigenvalue; an article's is above nought
 * @param standardUncertainty of it; 0 where nothing is known
 * @param limit how many standard uncertainties below nought it may come out
 * @param vector its vector, in the order of the points: the combination of loads that would give work
 *     instead of taking it
 */
public record Definiteness(
    List<String> points,
    double smallest,
    double standardUncertainty,
    double limit,
    List<Double> vector) {
  /** Without any uncertainty, an eigenvalue above this share of the mean one is no fault. */
  private static final double ROUNDING = 1e-9;

  /** Copies the lists. */
  public Definiteness {
    points = List.copyOf(points);
    vector = List.copyOf(vector);
  }

  /**
   * The eigenvalue in standard uncertainties.
   *
   * @return λ/u(λ); empty where nothing is known of the uncertainty
   */
  public OptionalDouble z() {
    return standardUncertainty > 0
        ? OptionalDouble.of(smallest / standardUncertainty)
        : OptionalDouble.empty();
  }

  /**
   * Whether the matrix is indefinite by more than chance explains.
   *
   * @return true where it is
   */
  public boolean broken() {
    return z().isPresent() ? z().getAsDouble() < -limit : smallest < -ROUNDING;
  }

  /** Of the largest set of points that can be had whole; empty below two. */
  static Optional<Definiteness> of(
      List<CollocatedPoint> all, AbsoluteMeans means, double single) {
    List<CollocatedPoint> points = whole(all, means);
    int n = points.size();
    if (n < 2) {
      return Optional.empty();
    }
    double[] scale = new double[n];
    for (int i = 0; i < n; i++) {
      scale[i] = 1 / Math.sqrt(means.value(entry(points, i, i, means)));
    }
    DMatrixRMaj matrix = new DMatrixRMaj(n, n);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        double value =
            0.5
                * (means.value(entry(points, i, j, means))
                    + means.value(entry(points, j, i, means)));
        matrix.set(i, j, value * scale[i] * scale[j]);
      }
    }
    EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(n, true, true);
    if (!eigen.decompose(matrix)) {
      return Optional.empty();
    }
    int least = 0;
    for (int k = 1; k < n; k++) {
      if (eigen.getEigenvalue(k).getReal() < eigen.getEigenvalue(least).getReal()) {
        least = k;
      }
    }
    DMatrixRMaj v = eigen.getEigenVector(least);
    Combination.Sum sum = new Combination.Sum();
    List<Double> vector = new ArrayList<>();
    double sign = 0;
    for (int i = 0; i < n; i++) {
      sign = sign == 0 ? Math.signum(v.get(i)) : sign;
      vector.add(sign * v.get(i));
      for (int j = 0; j < n; j++) {
        sum.add(entry(points, i, j, means), v.get(i) * v.get(j) * scale[i] * scale[j]);
      }
    }
    Combination form = sum.made();
    double limit =
        Quantiles.manyStudentT(single, 1, means.degreesOfFreedom(form)) + Math.sqrt(2.0 * (n - 1));
    return Optional.of(
        new Definiteness(
            points.stream().map(p -> p.loadName(means)).toList(),
            eigen.getEigenvalue(least).getReal(),
            means.uncertainty(form),
            limit,
            vector));
  }

  private static Combination entry(
      List<CollocatedPoint> points, int i, int j, AbsoluteMeans means) {
    return points.get(i).under(points.get(j).load(), means).orElseThrow();
  }

  /**
   * One point a load, direct coefficient above nought, all cross coefficients measured; the point that
   * lacks most is dropped until none lacks any. A direct coefficient that is not above nought is a
   * broken bound by itself.
   */
  private static List<CollocatedPoint> whole(List<CollocatedPoint> all, AbsoluteMeans means) {
    List<CollocatedPoint> points = new ArrayList<>();
    for (CollocatedPoint point : all) {
      Optional<Combination> direct = point.under(point.load(), means);
      if (direct.isPresent()
          && means.value(direct.get()) > 0
          && points.stream().noneMatch(p -> p.load() == point.load())) {
        points.add(point);
      }
    }
    while (points.size() > 1) {
      int worst = -1;
      long most = 0;
      for (int i = 0; i < points.size(); i++) {
        CollocatedPoint point = points.get(i);
        long missing =
            points.stream()
                .filter(
                    p ->
                        p.under(point.load(), means).isEmpty()
                            || point.under(p.load(), means).isEmpty())
                .count();
        if (missing > most) {
          most = missing;
          worst = i;
        }
      }
      if (worst < 0) {
        return points;
      }
      points.remove(worst);
    }
    return points;
  }
}
