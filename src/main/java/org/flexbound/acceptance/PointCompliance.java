package org.flexbound.acceptance;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.SingularOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;
import org.ejml.interfaces.decomposition.SingularValueDecomposition_F64;
import org.flexbound.flexibility.Coefficient;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.setup.Vector;

/**
 * The compliance at one point: the symmetric 3 × 3 block C of translations under forces (or of
 * rotations under moments) that agrees best with what was measured there.
 *
 * <p>A gauge along e under a load along f reads eᵀ C f. The six entries of C follow by least squares,
 * weighted by scatter and floors, from all such coefficients; what they leave over tests reciprocity
 * before anything is averaged. A direction n has the compliance nᵀ C n. The softest direction is the
 * eigenvector v of the largest eigenvalue, whose change is vᵀ dC v to the first order. Everything is
 * linear in the absolute coefficients, so that their uncertainty is propagated by source.
 */
final class PointCompliance {
  /** A direction is determined where what is left of it is below this share. */
  private static final double SPANNED = 1e-6;

  private final MeasuredFlexibility measured;
  private final Propagation propagation;
  private final List<Integer> rows = new ArrayList<>();
  private final List<Vector> gauges = new ArrayList<>();
  private final List<Vector> loads = new ArrayList<>();

  PointCompliance(MeasuredFlexibility measured, Propagation propagation) {
    this.measured = measured;
    this.propagation = propagation;
  }

  /** Takes a coefficient in, whose gauge and load are at the point. */
  void add(int row) {
    Coefficient c = measured.coefficients().get(row);
    rows.add(row);
    gauges.add(measured.gauges().get(c.gauge()).direction().vector());
    loads.add(measured.loads().get(c.load()).points().get(0).direction().vector());
  }

  boolean isEmpty() {
    return rows.isEmpty();
  }

  /** Whether base motion was taken out of some coefficients and not of others. */
  boolean partlyCorrected() {
    return rows.stream().map(this::corrected).distinct().count() > 1;
  }

  private boolean corrected(int row) {
    int gauge = measured.coefficients().get(row).gauge();
    for (int column : measured.map().columns(row)) {
      if (measured.absolute().get(column).gauge() != gauge) {
        return true;
      }
    }
    return false;
  }

  private static double[] design(Vector e, Vector f) {
    return new double[] {
      e.x() * f.x(),
      e.y() * f.y(),
      e.z() * f.z(),
      e.x() * f.y() + e.y() * f.x(),
      e.x() * f.z() + e.z() * f.x(),
      e.y() * f.z() + e.z() * f.y()
    };
  }

  private double[] weights() {
    double[] weights = new double[rows.size()];
    double least = Double.POSITIVE_INFINITY;
    for (int r = 0; r < weights.length; r++) {
      Budget budget = propagation.budget(propagation.gradient(rows.get(r)));
      weights[r] = budget.standardUncertainty();
      least = weights[r] > 0 ? Math.min(least, weights[r]) : least;
    }
    for (int r = 0; r < weights.length; r++) {
      weights[r] = weights[r] > 0 ? least / weights[r] : 1;
    }
    return weights;
  }

  /** The pseudo-inverse of the weighted design: 6 × coefficients, the weights within. */
  private DMatrixRMaj inverse() {
    double[] weights = weights();
    DMatrixRMaj a = new DMatrixRMaj(rows.size(), 6);
    for (int r = 0; r < rows.size(); r++) {
      double[] row = design(gauges.get(r), loads.get(r));
      for (int c = 0; c < 6; c++) {
        a.set(r, c, weights[r] * row[c]);
      }
    }
    DMatrixRMaj inverse = new DMatrixRMaj(6, rows.size());
    CommonOps_DDRM.pinv(a, inverse);
    for (int c = 0; c < 6; c++) {
      for (int r = 0; r < rows.size(); r++) {
        inverse.set(c, r, inverse.get(c, r) * weights[r]);
      }
    }
    return inverse;
  }

  /** The gradient, by the absolute coefficients, of eᵀ C f; empty where not determined. */
  private Optional<double[]> form(DMatrixRMaj inverse, Vector e, Vector f) {
    double[] wanted = design(e, f);
    double[] combination = new double[rows.size()];
    for (int r = 0; r < rows.size(); r++) {
      for (int c = 0; c < 6; c++) {
        combination[r] += wanted[c] * inverse.get(c, r);
      }
    }
    double[] left = wanted.clone();
    for (int r = 0; r < rows.size(); r++) {
      double[] row = design(gauges.get(r), loads.get(r));
      for (int c = 0; c < 6; c++) {
        left[c] -= combination[r] * row[c];
      }
    }
    for (double rest : left) {
      if (Math.abs(rest) > SPANNED) {
        return Optional.empty();
      }
    }
    double[] gradient = new double[measured.absolute().size()];
    for (int r = 0; r < rows.size(); r++) {
      double[] own = propagation.gradient(rows.get(r));
      for (int k = 0; k < own.length; k++) {
        gradient[k] += combination[r] * own[k];
      }
    }
    return Optional.of(gradient);
  }

  /** The gradient of the compliance in a direction; empty where it was not measured. */
  Optional<double[]> along(Vector direction) {
    return form(inverse(), direction, direction);
  }

  /** The softest direction with the gradient of its compliance. */
  static final class Softest {
    private final Vector direction;
    private final double[] gradient;
    private final int dimensions;
    private final double next;

    private Softest(Vector direction, double[] gradient, int dimensions, double next) {
      this.direction = direction;
      this.gradient = gradient;
      this.dimensions = dimensions;
      this.next = next;
    }

    Vector direction() {
      return direction;
    }

    /** By the absolute coefficients. */
    double[] gradient() {
      return gradient;
    }

    /** How many directions were measured: 3, or fewer. */
    int dimensions() {
      return dimensions;
    }

    /** The compliance of the next softest direction at right angles; NaN for one dimension. */
    double next() {
      return next;
    }
  }

  /** The softest of the directions that were both loaded and measured; empty for none. */
  Optional<Softest> softest() {
    List<Vector> basis = smaller(basis(gauges), basis(loads));
    int n = basis.size();
    DMatrixRMaj inverse = inverse();
    DMatrixRMaj block = new DMatrixRMaj(n, n);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        Optional<double[]> gradient = form(inverse, basis.get(i), basis.get(j));
        if (gradient.isEmpty()) {
          return Optional.empty();
        }
        block.set(i, j, propagation.value(gradient.get()));
      }
    }
    EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(n, true, true);
    eigen.decompose(block);
    int largest = 0;
    for (int k = 1; k < n; k++) {
      if (eigen.getEigenvalue(k).getReal() > eigen.getEigenvalue(largest).getReal()) {
        largest = k;
      }
    }
    double next = Double.NaN;
    for (int k = 0; k < n; k++) {
      double value = eigen.getEigenvalue(k).getReal();
      if (k != largest && !(value < next)) {
        next = value;
      }
    }
    Vector direction = Vector.ZERO;
    for (int i = 0; i < n; i++) {
      direction =
          direction.plus(basis.get(i).times(eigen.getEigenVector(largest).get(i)));
    }
    Vector unit = signed(direction.unit());
    double second = next;
    return form(inverse, unit, unit).map(g -> new Softest(unit, g, n, second));
  }

  /** The largest component points forward, so that one line has one name. */
  private static Vector signed(Vector v) {
    double largest = v.x();
    largest = Math.abs(v.y()) > Math.abs(largest) + 1e-9 ? v.y() : largest;
    largest = Math.abs(v.z()) > Math.abs(largest) + 1e-9 ? v.z() : largest;
    return largest < 0 ? v.times(-1) : v;
  }

  private static List<Vector> smaller(List<Vector> a, List<Vector> b) {
    return a.size() <= b.size() ? a : b;
  }

  private static List<Vector> basis(List<Vector> directions) {
    DMatrixRMaj a = new DMatrixRMaj(directions.size(), 3);
    for (int r = 0; r < directions.size(); r++) {
      a.set(r, 0, directions.get(r).x());
      a.set(r, 1, directions.get(r).y());
      a.set(r, 2, directions.get(r).z());
    }
    SingularValueDecomposition_F64<DMatrixRMaj> svd =
        DecompositionFactory_DDRM.svd(directions.size(), 3, false, true, true);
    svd.decompose(a);
    DMatrixRMaj v = svd.getV(null, false);
    double[] s = svd.getSingularValues();
    int rank = SingularOps_DDRM.rank(svd, 1e-3);
    List<Vector> basis = new ArrayList<>();
    List<Integer> order = new ArrayList<>();
    for (int k = 0; k < svd.numberOfSingularValues(); k++) {
      order.add(k);
    }
    order.sort(java.util.Comparator.comparingDouble(k -> -s[k]));
    for (int k : order.subList(0, rank)) {
      basis.add(new Vector(v.get(0, k), v.get(1, k), v.get(2, k)));
    }
    return basis;
  }

  /** How well the coefficients agree with a symmetric block, gains cancelling as they should. */
  JointSquares reciprocity() {
    DMatrixRMaj inverse = inverse();
    int m = rows.size();
    double[][] contrasts = new double[m][measured.absolute().size()];
    for (int r = 0; r < m; r++) {
      double[] design = design(gauges.get(r), loads.get(r));
      for (int q = 0; q < m; q++) {
        double fitted = 0;
        for (int c = 0; c < 6; c++) {
          fitted += design[c] * inverse.get(c, q);
        }
        double weight = (r == q ? 1 : 0) - fitted;
        double[] own = propagation.gradient(rows.get(q));
        for (int k = 0; k < own.length; k++) {
          contrasts[r][k] += weight * own[k];
        }
      }
    }
    double[] differences = new double[m];
    double[][] covariance = new double[m][m];
    for (int r = 0; r < m; r++) {
      differences[r] = propagation.value(contrasts[r]);
      for (int q = 0; q < m; q++) {
        covariance[r][q] = propagation.covariance(contrasts[r], contrasts[q]);
      }
    }
    return JointSquares.of(differences, seen(covariance));
  }

  /** Contrasts that are nothing but rounding carry no weight. */
  private double[][] seen(double[][] covariance) {
    for (int r = 0; r < covariance.length; r++) {
      double[] own = propagation.gradient(rows.get(r));
      if (covariance[r][r] < 1e-12 * propagation.covariance(own, own)) {
        for (int q = 0; q < covariance.length; q++) {
          covariance[r][q] = 0;
          covariance[q][r] = 0;
        }
      }
    }
    return covariance;
  }
}
