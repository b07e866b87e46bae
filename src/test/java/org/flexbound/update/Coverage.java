package org.flexbound.update;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.SplittableRandom;
import java.util.TreeMap;
import java.util.stream.IntStream;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.frame.FrameModel;
import org.flexbound.study.Study;

/** How often intervals hold the truth, for each status apart; the simulated test is the unit. */
final class Coverage {
  private static final String COMBINATION = "determined combination";

  /** For each status: tests, intervals, hits, Σ hits², Σ hits·n, Σ n² per test. */
  private final Map<String, double[]> sums = new TreeMap<>();

  private int misfits;
  private int tests;

  /**
   * Simulates tests of a twin on all processors. Every test draws from its own stream and is counted
   * in its turn, so that the table does not depend on how many there are.
   */
  static Coverage of(Twin twin, int tests, long seed) {
    Coverage coverage = new Coverage();
    FrameModel frame = twin.frame();
    Study study = twin.study();
    List<WorkingParameter> parameters = twin.working();
    IntStream.range(0, tests)
        .parallel()
        .mapToObj(t -> one(twin, study, frame, parameters, new SplittableRandom(stream(seed, t))))
        .toList()
        .forEach(one -> coverage.add(one.result(), parameters, one.truth()));
    return coverage;
  }

  static long stream(long seed, int test) {
    return seed * 1_000_003L + test;
  }

  @SuppressWarnings("ArrayRecordComponent") // handed over at once, not kept
  private record One(UpdateResult result, double[] truth) {}

  private static One one(
      Twin twin,
      Study study,
      FrameModel frame,
      List<WorkingParameter> parameters,
      SplittableRandom random) {
    double[] x = twin.truth(parameters, random);
    MeasuredFlexibility measured = twin.test(frame, x, parameters, random);
    return new One(
        StudyUpdate.run(study, frame, List.of(measured), UpdateSettings.ESTIMATES).orRefuse(), x);
  }

  private void add(UpdateResult result, List<WorkingParameter> parameters, double[] x) {
    tests++;
    misfits += result.verdict() == Verdict.MISFITS_EVEN_AT_BEST ? 1 : 0;
    Map<String, double[]> own = new TreeMap<>();
    for (int k = 0; k < x.length; k++) {
      ParameterResult p = result.parameters().get(k);
      double truth = parameters.get(k).stiffness(x[k]);
      count(own, p.status().words(), truth >= p.lower95() && truth <= p.upper95());
    }
    for (CollinearGroup group : result.groups()) {
      if (!group.determined()) {
        continue;
      }
      double value = 0;
      for (int i = 0; i < group.parameters().size(); i++) {
        for (int k = 0; k < x.length; k++) {
          if (parameters.get(k).name().equals(group.parameters().get(i))) {
            value += group.weights().get(i) * (x[k] - parameters.get(k).nominal());
          }
        }
      }
      count(own, COMBINATION, value >= group.lower95() && value <= group.upper95());
    }
    own.forEach(
        (status, counted) -> {
          double[] sum = sums.computeIfAbsent(status, unused -> new double[6]);
          double n = counted[0];
          double hits = counted[1];
          sum[0]++;
          sum[1] += n;
          sum[2] += hits;
          sum[3] += hits * hits;
          sum[4] += hits * n;
          sum[5] += n * n;
        });
  }

  private static void count(Map<String, double[]> own, String status, boolean hit) {
    double[] counted = own.computeIfAbsent(status, unused -> new double[2]);
    counted[0]++;
    counted[1] += hit ? 1 : 0;
  }

  void merge(Coverage other) {
    tests += other.tests;
    misfits += other.misfits;
    other.sums.forEach(
        (status, values) -> {
          double[] sum = sums.computeIfAbsent(status, unused -> new double[6]);
          for (int i = 0; i < sum.length; i++) {
            sum[i] += values[i];
          }
        });
  }

  double misfitShare() {
    return (double) misfits / tests;
  }

  /** The share of intervals that hold the truth; NaN where there is none. */
  double share(String status) {
    double[] s = sums.get(status);
    return s == null ? Double.NaN : s[2] / s[1];
  }

  /** Its standard error, tests as units (ratio estimator). */
  double error(String status) {
    double[] s = sums.get(status);
    double r = s[2] / s[1];
    double squares = s[3] - 2 * r * s[4] + r * r * s[5];
    return Math.sqrt(Math.max(squares, 0)) / s[1];
  }

  double intervals(String status) {
    double[] s = sums.get(status);
    return s == null ? 0 : s[1];
  }

  Iterable<String> statuses() {
    return sums.keySet();
  }

  static String combination() {
    return COMBINATION;
  }

  String table(String name) {
    StringBuilder text = new StringBuilder();
    for (String status : sums.keySet()) {
      text.append(
          String.format(
              Locale.ROOT,
              "| %s | %s | %.0f | %.0f | %.1f ± %.1f %% |%n",
              name,
              status,
              sums.get(status)[0],
              intervals(status),
              100 * share(status),
              100 * error(status)));
    }
    text.append(
        String.format(
            Locale.ROOT,
            "| %s | ended as misfits | %d | | %.1f %% |%n",
            name,
            tests,
            100 * misfitShare()));
    return text.toString();
  }
}
