package org.flexbound.flexibility;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.flexbound.statistics.Quantiles;

/**
 * What wrong gains leave behind in reciprocal pairs: with gauge i reading (1 + g_i) times and the load
 * at i (1 + c_i) times too much, ln(a_ij/a_ji) = s_i − s_j with s_i = g_i − c_i, up to a constant.
 * The s are fitted by least squares, each pair weighted by its scatter and floors; a pattern of gains
 * fits within scatter, a misplaced gauge, seating or non-linearity does not.
 *
 * <p>A pattern tells gauge i from the load at i no better than that both belong to one point; with two
 * points not even which of them; and nothing of what is common to all.
 *
 * @param points what each point shows against the mean of the others
 * @param misfit χ² of the pattern, scatter and floors only
 * @param degreesOfFreedom pairs less points plus one
 * @param probability of so large a misfit if gains alone were wrong; 1 without degrees of freedom
 * @param suspect the point that explains the pairs by itself, clearly better than any other; empty
 *     where nothing is wrong or no point stands out
 */
public record GainPattern(
    List<PointGain> points,
    double misfit,
    int degreesOfFreedom,
    double probability,
    OptionalInt suspect) {
  /** Coefficients must be this many times their uncertainty for their logarithm to mean anything. */
  static final double CLEAR = 5;

  /** One explanation is clearly better: a likelihood ratio of a hundred (2 ln 100). */
  static final double CLEARLY_BETTER = 9.2;

  /** Copies the list. */
  public GainPattern {
    points = List.copyOf(points);
  }

  /**
   * What one point shows.
   *
   * @param gauge the gauge there, in words
   * @param load the load there
   * @param gaugeIndex the gauge's index
   * @param logRatio s of the point less the mean s of the others: ln of the factor by which the gauge
   *     reads too much, or the load too little
   * @param standardUncertainty of it, calibration included; 0 where nothing is known
   * @param limit what |z| may be, all points allowed for
   */
  public record PointGain(
      String gauge,
      String load,
      int gaugeIndex,
      double logRatio,
      double standardUncertainty,
      double limit) {
    /**
     * The factor in standard uncertainties.
     *
     * @return s/u(s); empty where nothing is known of the uncertainty
     */
    public OptionalDouble z() {
      return standardUncertainty > 0
          ? OptionalDouble.of(logRatio / standardUncertainty)
          : OptionalDouble.empty();
    }
  }

  /** ln(a_ij/a_ji) of the points i and j. */
  private record Edge(int i, int j, double value, Combination logarithm, double random) {}

  /** Of one point for each load, all that hang together; empty where no pair can be used. */
  static Optional<GainPattern> of(
      List<CollocatedPoint> all, AbsoluteMeans means, double single) {
    List<CollocatedPoint> points = new ArrayList<>();
    for (CollocatedPoint point : all) {
      if (!point.isPattern() && points.stream().noneMatch(p -> p.load() == point.load())) {
        points.add(point);
      }
    }
    List<Edge> edges = edges(points, means);
    List<CollocatedPoint> kept = connected(points, edges);
    List<Edge> used = edges(kept, means);
    return used.isEmpty() ? Optional.empty() : Optional.of(fit(kept, used, means, single));
  }

  private static List<Edge> edges(List<CollocatedPoint> points, AbsoluteMeans means) {
    List<Edge> edges = new ArrayList<>();
    for (int i = 0; i < points.size(); i++) {
      for (int j = 0; j < i; j++) {
        Optional<Combination> first = points.get(i).under(points.get(j).load(), means);
        Optional<Combination> second = points.get(j).under(points.get(i).load(), means);
        if (first.isPresent()
            && second.isPresent()
            && isClear(first.get(), means)
            && isClear(second.get(), means)) {
          double one = means.value(first.get());
          double two = means.value(second.get());
          Combination logarithm =
              new Combination.Sum().add(first.get(), 1 / one).add(second.get(), -1 / two).made();
          double random = means.random(logarithm, logarithm);
          if (random > 0) {
            edges.add(new Edge(i, j, Math.log(Math.abs(one / two)), logarithm, random));
          }
        }
      }
    }
    return edges;
  }

  static boolean isClear(Combination combination, AbsoluteMeans means) {
    double value = Math.abs(means.value(combination));
    return value > 0
        && value > CLEAR * Math.sqrt(means.random(combination, combination));
  }

  /** The largest set of points that pairs connect. */
  private static List<CollocatedPoint> connected(
      List<CollocatedPoint> points, List<Edge> edges) {
    int[] part = new int[points.size()];
    for (int k = 0; k < part.length; k++) {
      part[k] = k;
    }
    for (Edge edge : edges) {
      int from = part[edge.i()];
      int to = part[edge.j()];
      for (int k = 0; k < part.length; k++) {
        part[k] = part[k] == from ? to : part[k];
      }
    }
    List<CollocatedPoint> largest = List.of();
    for (int candidate = 0; candidate < part.length; candidate++) {
      List<CollocatedPoint> members = new ArrayList<>();
      for (int k = 0; k < part.length; k++) {
        if (part[k] == candidate) {
          members.add(points.get(k));
        }
      }
      largest = members.size() > largest.size() ? members : largest;
    }
    return largest;
  }

  private static GainPattern fit(
      List<CollocatedPoint> points, List<Edge> edges, AbsoluteMeans means, double single) {
    int n = points.size();
    // L + J/n is regular where the pairs connect all points, and gives s with mean nought
    DMatrixRMaj laplacian = new DMatrixRMaj(n, n);
    double weights = edges.stream().mapToDouble(e -> 1 / e.random()).sum();
    CommonOps_DDRM.fill(laplacian, weights / n);
    for (Edge e : edges) {
      double w = 1 / e.random();
      laplacian.add(e.i(), e.i(), w);
      laplacian.add(e.j(), e.j(), w);
      laplacian.add(e.i(), e.j(), -w);
      laplacian.add(e.j(), e.i(), -w);
    }
    DMatrixRMaj inverse = new DMatrixRMaj(n, n);
    CommonOps_DDRM.invert(laplacian, inverse);
    double[] s = new double[n];
    Combination.Sum[] sums = new Combination.Sum[n];
    for (int k = 0; k < n; k++) {
      sums[k] = new Combination.Sum();
      for (Edge e : edges) {
        double share = (inverse.get(k, e.i()) - inverse.get(k, e.j())) / e.random();
        s[k] += share * e.value();
        sums[k].add(e.logarithm(), share);
      }
    }
    double misfit = 0;
    for (Edge e : edges) {
      double left = e.value() - (s[e.i()] - s[e.j()]);
      misfit += left * left / e.random();
    }
    int degrees = edges.size() - n + 1;
    List<PointGain> gains = new ArrayList<>();
    // the sum of all s is nought, so that s less the mean of the others is s·n/(n − 1)
    double stretch = n / (n - 1.0);
    for (int k = 0; k < n; k++) {
      Combination combination = sums[k].made();
      gains.add(
          new PointGain(
              points.get(k).gaugeName(means),
              points.get(k).loadName(means),
              points.get(k).gauges().get(0),
              stretch * s[k],
              stretch * means.uncertainty(combination),
              Quantiles.manyStudentT(single, n, means.degreesOfFreedom(combination))));
    }
    return new GainPattern(
        gains,
        misfit,
        degrees,
        degrees < 1
            ? 1
            : Quantiles.fTail(
                misfit / degrees, degrees, means.measured().scatterDegreesOfFreedom()),
        suspect(gains, edges, means));
  }

  /** The one point that, its gain set free, explains the pairs clearly better than any other does. */
  private static OptionalInt suspect(
      List<PointGain> gains, List<Edge> edges, AbsoluteMeans means) {
    int n = gains.size();
    if (n < 3 || gains.stream().noneMatch(g -> Math.abs(g.z().orElse(0)) > g.limit())) {
      return OptionalInt.empty();
    }
    double[] left = new double[n];
    for (int k = 0; k < n; k++) {
      double above = 0;
      double below = 0;
      for (Edge e : edges) {
        if (e.i() == k || e.j() == k) {
          double w = 1 / means.covariance(e.logarithm(), e.logarithm());
          above += w * (e.i() == k ? e.value() : -e.value());
          below += w;
        }
      }
      double own = below > 0 ? above / below : 0;
      for (Edge e : edges) {
        double rest = e.value() - (e.i() == k ? own : 0) + (e.j() == k ? own : 0);
        left[k] += rest * rest / means.covariance(e.logarithm(), e.logarithm());
      }
    }
    int best = 0;
    for (int k = 1; k < n; k++) {
      best = left[k] < left[best] ? k : best;
    }
    for (int k = 0; k < n; k++) {
      if (k != best && left[k] < left[best] + CLEARLY_BETTER) {
        return OptionalInt.empty();
      }
    }
    return OptionalInt.of(best);
  }
}
