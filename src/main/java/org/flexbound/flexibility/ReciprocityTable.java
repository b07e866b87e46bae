package org.flexbound.flexibility;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.setup.LoadPoint;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;
import org.flexbound.statistics.Quantiles;

/**
 * Reciprocity of the absolute coefficients (Maxwell 1864, Betti 1872): a gauge at a load point and
 * along it makes a pair with the gauge at the other load point; a_ij = a_ji. Opposed directions
 * change the sign. Shared gains cancel in the difference as they should.
 *
 * <p>A scale error common to everything cannot be seen by reciprocity.
 *
 * @param pairs the pairs
 * @param statistic dᵀ V⁺ d over all pairs
 * @param degreesOfFreedom rank of V
 * @param probability of so large a statistic by chance
 * @param breaches bounds that are broken beyond three standard uncertainties
 */
public record ReciprocityTable(
    List<Pair> pairs,
    double statistic,
    int degreesOfFreedom,
    double probability,
    List<Breach> breaches) {
  /** Places within this distance are one, m. */
  private static final double SAME_PLACE = 1e-3;

  /** Directions whose cosine is within this of one are parallel. */
  private static final double PARALLEL = 1e-3;

  /** Copies the lists. */
  public ReciprocityTable {
    pairs = List.copyOf(pairs);
    breaches = List.copyOf(breaches);
  }

  /**
   * A pair of absolute coefficients that should be equal.
   *
   * @param first gauge and load of the first
   * @param second gauge and load of the second
   * @param firstValue value of the first, SI
   * @param secondValue value of the second, its sign turned where directions are opposed
   * @param difference first less second
   * @param standardUncertainty of the difference
   */
  public record Pair(
      String first,
      String second,
      double firstValue,
      double secondValue,
      double difference,
      double standardUncertainty) {
    /**
     * The difference in standard uncertainties.
     *
     * @return d/u(d); 0 where both are equal
     */
    public double z() {
      return difference == 0 ? 0 : difference / standardUncertainty;
    }
  }

  /**
   * A bound that every elastic structure keeps, broken.
   *
   * @param message what was found and what was expected
   */
  public record Breach(String message) {}

  /** A gauge that sits on a load point and reads along it. */
  private record Mate(int gauge, int load, double sign) {}

  /**
   * Makes the table.
   *
   * @param measured the measured flexibility
   * @param places where stations are in space, where known
   * @return the table; without pairs where nothing can be paired
   */
  public static ReciprocityTable of(
      MeasuredFlexibility measured, Function<Station, Optional<Vector>> places) {
    List<Mate> mates = mates(measured, places);
    List<double[]> rows = new ArrayList<>();
    List<Pair> pairs = new ArrayList<>();
    double[] values =
        measured.absolute().stream().mapToDouble(AbsoluteCoefficient::value).toArray();
    for (int i = 0; i < mates.size(); i++) {
      for (int j = 0; j < i; j++) {
        Mate a = mates.get(i);
        Mate b = mates.get(j);
        double[] first = row(measured, a.gauge(), b.load());
        double[] second = row(measured, b.gauge(), a.load());
        if (a.load() == b.load() || first.length == 0 || second.length == 0) {
          continue;
        }
        double sign = a.sign() * b.sign();
        double[] difference = new double[values.length];
        double firstValue = 0;
        double secondValue = 0;
        for (int k = 0; k < values.length; k++) {
          firstValue += first[k] * values[k];
          secondValue += sign * second[k] * values[k];
          difference[k] = first[k] - sign * second[k];
        }
        rows.add(difference);
        pairs.add(
            new Pair(
                name(measured, a.gauge(), b.load()),
                name(measured, b.gauge(), a.load()),
                firstValue,
                secondValue,
                firstValue - secondValue,
                Math.sqrt(covariance(measured, difference, difference))));
      }
    }
    return joint(measured, pairs, rows, breaches(measured, mates, values));
  }

  private static String name(MeasuredFlexibility measured, int gauge, int load) {
    return measured.gauges().get(gauge).name() + " under " + measured.loads().get(load).name();
  }

  private static List<Mate> mates(
      MeasuredFlexibility measured, Function<Station, Optional<Vector>> places) {
    List<Mate> mates = new ArrayList<>();
    for (int l = 0; l < measured.loads().size(); l++) {
      Load load = measured.loads().get(l);
      if (load.isPattern()) {
        continue;
      }
      LoadPoint point = load.points().get(0);
      for (int g = 0; g < measured.gauges().size(); g++) {
        Gauge gauge = measured.gauges().get(g);
        double cosine = gauge.direction().vector().dot(point.direction().vector());
        boolean kind =
            gauge.kind() == (load.isMoment() ? GaugeKind.ROTATION : GaugeKind.DISPLACEMENT);
        if (kind
            && Math.abs(cosine) > 1 - PARALLEL
            && samePlace(gauge, point, places)
            && row(measured, g, l).length > 0) {
          mates.add(new Mate(g, l, Math.signum(cosine)));
        }
      }
    }
    return mates;
  }

  private static boolean samePlace(
      Gauge gauge, LoadPoint point, Function<Station, Optional<Vector>> places) {
    if (gauge.station().equals(point.station())) {
      return true;
    }
    Optional<Vector> first = gauge.coordinates().or(() -> places.apply(gauge.station()));
    Optional<Vector> second = point.coordinates().or(() -> places.apply(point.station()));
    return first.isPresent()
        && second.isPresent()
        && first.get().minus(second.get()).norm() < SAME_PLACE;
  }

  /** The weights that average the absolute coefficients of a gauge and a load; empty for none. */
  private static double[] row(MeasuredFlexibility measured, int gauge, int load) {
    double[] row = new double[measured.absolute().size()];
    double runs = 0;
    for (int k = 0; k < row.length; k++) {
      AbsoluteCoefficient a = measured.absolute().get(k);
      if (a.gauge() == gauge && a.load() == load) {
        row[k] = a.runs();
        runs += a.runs();
      }
    }
    for (int k = 0; k < row.length; k++) {
      row[k] /= Math.max(runs, 1);
    }
    return runs > 0 ? row : new double[0];
  }

  private static double covariance(MeasuredFlexibility measured, double[] p, double[] q) {
    double sum = 0;
    double[] gainP = new double[measured.gains().size()];
    double[] gainQ = new double[measured.gains().size()];
    for (int k = 0; k < p.length; k++) {
      AbsoluteCoefficient a = measured.absolute().get(k);
      double variance =
          a.scatterUncertainty() * a.scatterUncertainty()
              + a.floorUncertainty() * a.floorUncertainty();
      sum += p[k] * q[k] * variance;
      for (int gain : a.gains()) {
        double u = measured.gains().get(gain).priorUncertainty();
        gainP[gain] += p[k] * u * a.value();
        gainQ[gain] += q[k] * u * a.value();
      }
    }
    for (int g = 0; g < gainP.length; g++) {
      sum += gainP[g] * gainQ[g];
    }
    return sum;
  }

  private static ReciprocityTable joint(
      MeasuredFlexibility measured, List<Pair> pairs, List<double[]> rows, List<Breach> breaches) {
    int n = pairs.size();
    if (n == 0) {
      return new ReciprocityTable(pairs, 0, 0, 1, breaches);
    }
    DMatrixRMaj z = new DMatrixRMaj(n, n);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        double scale = pairs.get(i).standardUncertainty() * pairs.get(j).standardUncertainty();
        z.set(i, j, scale > 0 ? covariance(measured, rows.get(i), rows.get(j)) / scale : 0);
      }
    }
    EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(n, true, true);
    eigen.decompose(z);
    double statistic = 0;
    int rank = 0;
    for (int k = 0; k < n; k++) {
      double value = eigen.getEigenvalue(k).getReal();
      if (value < 1e-9 * n) {
        continue;
      }
      DMatrixRMaj vector = eigen.getEigenVector(k);
      double along = 0;
      for (int i = 0; i < n; i++) {
        along += vector.get(i) * pairs.get(i).z();
      }
      statistic += along * along / value;
      rank++;
    }
    double probability =
        rank == 0
            ? 1
            : Quantiles.fTail(statistic / rank, rank, measured.scatterDegreesOfFreedom());
    return new ReciprocityTable(pairs, statistic, rank, probability, breaches);
  }

  private static List<Breach> breaches(
      MeasuredFlexibility measured, List<Mate> mates, double[] values) {
    List<Breach> breaches = new ArrayList<>();
    for (Mate a : mates) {
      double direct = a.sign() * value(row(measured, a.gauge(), a.load()), values);
      double u = uncertainty(measured, a.gauge(), a.load());
      if (direct < -3 * u) {
        breaches.add(
            new Breach(
                name(measured, a.gauge(), a.load())
                    + " is negative; a direct coefficient is above zero (a direction reversed?)"));
      }
    }
    for (int i = 0; i < mates.size(); i++) {
      for (int j = 0; j < i; j++) {
        Mate a = mates.get(i);
        Mate b = mates.get(j);
        double[] crossRow = row(measured, a.gauge(), b.load());
        if (a.load() == b.load() || crossRow.length == 0) {
          continue;
        }
        double cross = value(crossRow, values);
        double aa = a.sign() * value(row(measured, a.gauge(), a.load()), values);
        double bb = b.sign() * value(row(measured, b.gauge(), b.load()), values);
        double bound = Math.sqrt(Math.max(aa, 0) * Math.max(bb, 0));
        double relative =
            uncertainty(measured, a.gauge(), b.load()) / Math.abs(cross)
                + 0.5 * uncertainty(measured, a.gauge(), a.load()) / Math.abs(aa)
                + 0.5 * uncertainty(measured, b.gauge(), b.load()) / Math.abs(bb);
        if (Math.abs(cross) > bound * (1 + 3 * relative)) {
          breaches.add(
              new Breach(
                  name(measured, a.gauge(), b.load())
                      + " is larger than the geometric mean of the two direct coefficients"));
        }
      }
    }
    return breaches;
  }

  private static double value(double[] row, double[] values) {
    double sum = 0;
    for (int k = 0; k < row.length; k++) {
      sum += row[k] * values[k];
    }
    return sum;
  }

  private static double uncertainty(MeasuredFlexibility measured, int gauge, int load) {
    double[] row = row(measured, gauge, load);
    return Math.sqrt(covariance(measured, row, row));
  }
}
