package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.SingularValueDecomposition_F64;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Part;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;

/**
 * The rigid motion that the base gauges show, as weights: what another gauge would read if it only
 * went along with the base.
 *
 * <p>A gauge at p along e reads e·t + (p × e)·θ of a motion t, θ; rotations are scaled by the spread
 * of the gauges, so that nothing depends on the unit of length or (for what is determined) on the
 * origin. A gauge's row is expressed by the base gauges' rows by minimum norm, and only where it
 * lies in what they span.
 */
public final class BaseMotion {
  /** Singular values below this share of the largest count as nothing. */
  private static final double RANK = 1e-6;

  /** A row counts as spanned where what is left is below this share of its length. */
  private static final double SPANNED = 1e-6;

  private final Places places;

  /**
   * With places.
   *
   * @param places where stations are
   */
  public BaseMotion(Places places) {
    this.places = places;
  }

  /** Whether the base's motion is part of what a gauge reads. */
  static boolean concerns(Gauge gauge) {
    return !gauge.base()
        && gauge.standsOn() == Part.GROUND
        && gauge.measures() != Part.GROUND
        && gauge.kind() != GaugeKind.STRAIN;
  }

  private Optional<Vector> place(Station station, Optional<Vector> stated) {
    return stated.or(() -> places.of(station));
  }

  /** Whether the place of a gauge is known. */
  boolean knows(Gauge gauge) {
    return row(gauge, Vector.ZERO, 1).isPresent();
  }

  private Optional<double[]> row(Gauge gauge, Vector centre, double length) {
    Vector e = gauge.direction().vector();
    if (gauge.kind() == GaugeKind.ROTATION) {
      return Optional.of(
          new double[] {0, 0, 0, e.x() / length, e.y() / length, e.z() / length});
    }
    Optional<Vector> p = place(gauge.station(), gauge.coordinates());
    if (p.isEmpty()) {
      return Optional.empty();
    }
    Vector arm = p.get().minus(centre);
    if (gauge.kind() == GaugeKind.RELATIVE) {
      Optional<Vector> q = gauge.second().flatMap(places::of);
      if (q.isEmpty()) {
        return Optional.empty();
      }
      Vector turn = q.get().minus(p.get()).cross(e).times(1 / length);
      return Optional.of(new double[] {0, 0, 0, turn.x(), turn.y(), turn.z()});
    }
    Vector turn = arm.cross(e).times(1 / length);
    return Optional.of(new double[] {e.x(), e.y(), e.z(), turn.x(), turn.y(), turn.z()});
  }

  /**
   * The weights with which the base gauges' readings make up the base's part of a gauge's reading.
   *
   * @param gauge the gauge
   * @param bases the base gauges that were read
   * @return one weight for each; empty where they do not determine it
   */
  public Optional<double[]> weights(Gauge gauge, List<Gauge> bases) {
    List<Vector> points = new ArrayList<>();
    for (Gauge base : bases) {
      place(base.station(), base.coordinates()).ifPresent(points::add);
    }
    place(gauge.station(), gauge.coordinates()).ifPresent(points::add);
    Vector centre = Vector.ZERO;
    for (Vector point : points) {
      centre = centre.plus(point.times(1.0 / points.size()));
    }
    double length = 0;
    for (Vector point : points) {
      length = Math.max(length, point.minus(centre).norm());
    }
    if (!(length > 0)) {
      length = 1;
    }
    Optional<double[]> wanted = row(gauge, centre, length);
    DMatrixRMaj rows = new DMatrixRMaj(bases.size(), 6);
    for (int b = 0; b < bases.size(); b++) {
      Optional<double[]> row = row(bases.get(b), centre, length);
      if (row.isEmpty()) {
        return Optional.empty();
      }
      for (int c = 0; c < 6; c++) {
        rows.set(b, c, row.get()[c]);
      }
    }
    return wanted.flatMap(found -> express(rows, found));
  }

  private static Optional<double[]> express(DMatrixRMaj rows, double[] wanted) {
    int n = rows.numRows;
    SingularValueDecomposition_F64<DMatrixRMaj> svd =
        DecompositionFactory_DDRM.svd(n, 6, true, true, true);
    svd.decompose(rows.copy());
    DMatrixRMaj u = svd.getU(null, false);
    DMatrixRMaj v = svd.getV(null, false);
    double[] s = svd.getSingularValues();
    double largest = 0;
    for (double value : s) {
      largest = Math.max(largest, value);
    }
    double[] weights = new double[n];
    double[] left = wanted.clone();
    double norm = 0;
    for (double value : wanted) {
      norm += value * value;
    }
    for (int k = 0; k < Math.min(n, 6); k++) {
      if (s[k] <= RANK * largest) {
        continue;
      }
      double along = 0;
      for (int c = 0; c < 6; c++) {
        along += wanted[c] * v.get(c, k);
      }
      for (int c = 0; c < 6; c++) {
        left[c] -= along * v.get(c, k);
      }
      for (int b = 0; b < n; b++) {
        weights[b] += along / s[k] * u.get(b, k);
      }
    }
    double rest = 0;
    for (double value : left) {
      rest += value * value;
    }
    return rest > SPANNED * SPANNED * norm ? Optional.empty() : Optional.of(weights);
  }
}
