package org.flexbound.flexibility;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;
import org.flexbound.statistics.Quantiles;

/**
 * Reciprocity of the absolute coefficients (Maxwell 1864, Betti 1872): a gauge at a load point and
 * along it makes a pair with the gauge at the other load point; a_ij = a_ji. Opposed directions
 * change the sign. Shared gains cancel in the difference as they should.
 *
 * <p>A scale error common to everything cannot be seen by reciprocity.
 *
 * @param pairs the pairs
 * @param limit what |z| of a pair may be: the level of one pair alone, shared over all pairs (Šidák
 *     1967) and turned into Student's t where the scatter is estimated; for a pair whose uncertainty
 *     is known without end of degrees of freedom
 * @param statistic dᵀ V⁺ d over all pairs
 * @param degreesOfFreedom rank of V; 0 where no pair has a known uncertainty
 * @param probability of so large a statistic by chance
 */
public record ReciprocityTable(
    List<Pair> pairs, double limit, double statistic, int degreesOfFreedom, double probability) {
  /** Without any uncertainty, two values that differ by less than this share of them are equal. */
  private static final double EQUAL = 1e-9;

  /** Copies the list. */
  public ReciprocityTable {
    pairs = List.copyOf(pairs);
  }

  /**
   * A pair of absolute coefficients that should be equal.
   *
   * @param first gauge and load of the first
   * @param second gauge and load of the second
   * @param gauge index of the first coefficient's gauge (of a pattern, of its first gauge)
   * @param load index of the first coefficient's load
   * @param firstValue value of the first, SI
   * @param secondValue value of the second, its sign turned where directions are opposed
   * @param difference first less second
   * @param standardUncertainty of the difference; 0 where nothing is known of it
   * @param limit what |z| may be, all pairs allowed for
   */
  public record Pair(
      String first,
      String second,
      int gauge,
      int load,
      double firstValue,
      double secondValue,
      double difference,
      double standardUncertainty,
      double limit) {
    /**
     * The difference in standard uncertainties.
     *
     * @return d/u(d); empty where nothing is known of the uncertainty
     */
    public OptionalDouble z() {
      return standardUncertainty > 0
          ? OptionalDouble.of(difference / standardUncertainty)
          : OptionalDouble.empty();
    }

    /**
     * The difference as a share.
     *
     * @return |d| over the larger of the two values; 0 where both are nought
     */
    public double share() {
      double size = Math.max(Math.abs(firstValue), Math.abs(secondValue));
      return size > 0 ? Math.abs(difference) / size : 0;
    }

    /**
     * Whether the two differ by more than chance explains.
     *
     * @return true where |z| is past its limit, or where they differ and no uncertainty is known
     */
    public boolean broken() {
      return z().isPresent() ? Math.abs(z().getAsDouble()) > limit : share() > EQUAL;
    }
  }

  /**
   * Makes the table.
   *
   * @param points the collocated points
   * @param means the absolute coefficients
   * @param single what |z| of one pair alone may be
   * @return the table; without pairs where nothing can be paired
   */
  static ReciprocityTable of(List<CollocatedPoint> points, AbsoluteMeans means, double single) {
    List<Combination> differences = new ArrayList<>();
    List<Pair> pairs = pairs(points, means, single, differences);
    return joint(means, pairs, differences, single);
  }

  /** The pairs; their differences as combinations are added to the list given. */
  static List<Pair> pairs(
      List<CollocatedPoint> points,
      AbsoluteMeans means,
      double single,
      List<Combination> differences) {
    List<CollocatedPoint[]> couples = new ArrayList<>();
    for (int i = 0; i < points.size(); i++) {
      for (int j = 0; j < i; j++) {
        CollocatedPoint a = points.get(i);
        CollocatedPoint b = points.get(j);
        if (a.load() != b.load()
            && a.under(b.load(), means).isPresent()
            && b.under(a.load(), means).isPresent()) {
          couples.add(new CollocatedPoint[] {a, b});
        }
      }
    }
    List<Pair> pairs = new ArrayList<>();
    for (CollocatedPoint[] couple : couples) {
      CollocatedPoint a = couple[0];
      CollocatedPoint b = couple[1];
      Combination first = a.under(b.load(), means).orElseThrow();
      Combination second = b.under(a.load(), means).orElseThrow();
      // the first coefficient is shown with its own sign, the second turned to suit
      double sign = Math.signum(a.weights().get(0));
      Combination difference =
          new Combination.Sum().add(first, sign).add(second, -sign).made();
      differences.add(difference);
      double one = sign * means.value(first);
      double two = sign * means.value(second);
      pairs.add(
          new Pair(
              a.name(b.load(), means),
              b.name(a.load(), means),
              a.gauges().get(0),
              b.load(),
              one,
              two,
              one - two,
              means.uncertainty(difference),
              Quantiles.manyStudentT(
                  single, couples.size(), means.degreesOfFreedom(difference))));
    }
    return pairs;
  }

  private static ReciprocityTable joint(
      AbsoluteMeans means, List<Pair> all, List<Combination> combinations, double single) {
    List<Pair> pairs = new ArrayList<>();
    List<Combination> rows = new ArrayList<>();
    for (int k = 0; k < all.size(); k++) {
      if (all.get(k).standardUncertainty() > 0) {
        pairs.add(all.get(k));
        rows.add(combinations.get(k));
      }
    }
    double limit =
        Quantiles.manyStudentT(single, Math.max(1, all.size()), Double.POSITIVE_INFINITY);
    int n = pairs.size();
    if (n == 0) {
      return new ReciprocityTable(all, limit, 0, 0, 1);
    }
    DMatrixRMaj z = new DMatrixRMaj(n, n);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j <= i; j++) {
        double scale = pairs.get(i).standardUncertainty() * pairs.get(j).standardUncertainty();
        double correlation = means.covariance(rows.get(i), rows.get(j)) / scale;
        z.set(i, j, correlation);
        z.set(j, i, correlation);
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
        along +=
            vector.get(i) * pairs.get(i).difference() / pairs.get(i).standardUncertainty();
      }
      statistic += along * along / value;
      rank++;
    }
    double probability =
        rank == 0
            ? 1
            : Quantiles.fTail(statistic / rank, rank, means.measured().scatterDegreesOfFreedom());
    return new ReciprocityTable(all, limit, statistic, rank, probability);
  }
}
