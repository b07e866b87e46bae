package org.flexbound.acceptance;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Where;
import org.flexbound.statistics.Quantiles;

/**
 * Has it changed? Two tests of one thing, coefficient by coefficient and all together.
 *
 * <p>Scatter and floors of the two tests are independent; the error of a calibration that both used
 * (same instrument, same certificate, same date) is one and the same, so that its part of a difference
 * is u (a₂ − a₁), not u √(a₁² + a₂²). Single differences are judged by Student's t with
 * Welch–Satterthwaite degrees of freedom, all of them allowed for by Holm's step-down procedure (Holm
 * 1979, Scand. J. Stat. 6:65); all together by F (or χ²) under their covariance.
 */
public final class Recheck {
  /** The level at which a change counts as one. */
  static final double LEVEL = 0.05;

  private final KeptTest before;
  private final KeptTest now;
  private final List<KeptTest.Value> matched = new ArrayList<>();
  private final List<KeptTest.Value> earlier = new ArrayList<>();
  private final List<String> sharedNames = new ArrayList<>();
  private final Findings findings = new Findings();

  private Recheck(KeptTest before, KeptTest now) {
    this.before = before;
    this.now = now;
  }

  /**
   * Compares.
   *
   * @param before the earlier test
   * @param now this test
   * @param model explains the differences by the parameters of a model, where there is one
   * @return the report; an error where the tests have nothing in common
   */
  public static Outcome<ChangeReport> compare(
      KeptTest before, KeptTest now, Optional<ChangeModel> model) {
    return new Recheck(before, now).report(model);
  }

  private Outcome<ChangeReport> report(Optional<ChangeModel> model) {
    match();
    if (matched.isEmpty()) {
      findings.add(
          AcceptanceFinding.NOTHING_IN_COMMON,
          Where.nowhere(),
          "no coefficient of this test is in " + before.name());
      return Outcome.none(findings.list());
    }
    double[] differences = new double[matched.size()];
    for (int i = 0; i < differences.length; i++) {
      differences[i] = matched.get(i).value() - earlier.get(i).value();
    }
    double[][] covariance = covariance();
    double degrees = degrees(before) + degrees(now);
    Whitening whitening = new Whitening(covariance);
    JointSquares joint = new JointSquares(whitening.squares(differences), whitening.rank());
    double probability = joint.probability(degrees);
    List<Change> changes = changes(differences, covariance);
    ChangeReport plain =
        new ChangeReport(
            before,
            changes,
            joint.statistic(),
            joint.rank(),
            degrees,
            probability,
            sharedNames,
            Optional.empty());
    Optional<Explanation> explanation =
        plain.changed()
            ? model.map(m -> m.explain(matched, differences, whitening, degrees))
            : Optional.empty();
    return Outcome.of(
        new ChangeReport(
            before,
            changes,
            joint.statistic(),
            joint.rank(),
            degrees,
            probability,
            sharedNames,
            explanation),
        findings.list());
  }

  private static double degrees(KeptTest test) {
    return test.covariances().stream()
        .mapToDouble(KeptTest.Covariance::scatterDegreesOfFreedom)
        .sum();
  }

  private void match() {
    Map<String, KeptTest.Value> known = new LinkedHashMap<>();
    before.coefficients().forEach(value -> known.put(value.key(), value));
    List<String> without = new ArrayList<>();
    List<String> moved = new ArrayList<>();
    for (KeptTest.Value value : now.coefficients()) {
      KeptTest.Value old = known.remove(value.key());
      if (old == null) {
        without.add(value.name());
      } else if (!samePlace(old.place(), value.place())) {
        moved.add(value.name());
      } else {
        matched.add(value);
        earlier.add(old);
      }
    }
    note(without, "not in " + before.name());
    note(moved, "of gauges or loads that were elsewhere in " + before.name());
    note(known.values().stream().map(KeptTest.Value::name).toList(), "not in this test");
  }

  /** A place that is not known is not held against it. */
  private static boolean samePlace(String a, String b) {
    return a.isEmpty() || b.isEmpty() || a.equals(b);
  }

  private void note(List<String> names, String what) {
    if (!names.isEmpty()) {
      findings.add(
          AcceptanceFinding.NOT_COMPARABLE,
          Where.nowhere(),
          names.size()
              + (names.size() == 1 ? " coefficient is " : " coefficients are ")
              + what
              + ": "
              + String.join(", ", names.subList(0, Math.min(5, names.size())))
              + (names.size() > 5 ? ", …" : ""));
    }
  }

  /** The place of each matched coefficient within its configuration, or −1. */
  private static int[] places(KeptTest test, String configuration, List<KeptTest.Value> values) {
    Map<String, Integer> index = new LinkedHashMap<>();
    for (KeptTest.Value value : test.coefficients()) {
      if (value.configuration().equals(configuration)) {
        index.put(value.key(), index.size());
      }
    }
    return values.stream()
        .mapToInt(v -> v.configuration().equals(configuration) ? index.getOrDefault(v.key(), -1) : -1)
        .toArray();
  }

  private double[][] covariance() {
    int n = matched.size();
    double[][] sum = new double[n][n];
    Map<String, double[]> calibrations = new LinkedHashMap<>();
    Map<String, String> descriptions = new LinkedHashMap<>();
    List<double[]> alone = new ArrayList<>();
    addTest(before, earlier, -1, sum, calibrations, descriptions, alone);
    List<String> ofBefore = new ArrayList<>(calibrations.keySet());
    List<String> instruments = instruments(before);
    addTest(now, matched, 1, sum, calibrations, descriptions, alone);
    List<String> ofNow = calibrations(now);
    for (String key : ofBefore) {
      if (ofNow.contains(key)) {
        sharedNames.add(descriptions.getOrDefault(key, key));
      }
    }
    for (KeptTest.Covariance part : now.covariances()) {
      for (KeptTest.Shared source : part.shared()) {
        boolean known = source.calibration().filter(ofBefore::contains).isPresent();
        if (!known
            && !source.instrument().isEmpty()
            && instruments.contains(source.instrument())) {
          findings.add(
              AcceptanceFinding.CALIBRATION_NOT_SHARED,
              Where.nowhere(),
              source.description()
                  + ": its error is taken to be another one in "
                  + before.name());
          instruments.remove(source.instrument());
        }
      }
    }
    alone.addAll(calibrations.values());
    for (double[] effect : alone) {
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          sum[i][j] += effect[i] * effect[j];
        }
      }
    }
    return sum;
  }

  private static List<String> instruments(KeptTest test) {
    return new ArrayList<>(
        test.covariances().stream()
            .flatMap(c -> c.shared().stream())
            .map(KeptTest.Shared::instrument)
            .filter(text -> !text.isEmpty())
            .distinct()
            .toList());
  }

  private static List<String> calibrations(KeptTest test) {
    return test.covariances().stream()
        .flatMap(c -> c.shared().stream())
        .flatMap(s -> s.calibration().stream())
        .distinct()
        .toList();
  }

  private static void addTest(
      KeptTest test,
      List<KeptTest.Value> values,
      double sign,
      double[][] sum,
      Map<String, double[]> calibrations,
      Map<String, String> descriptions,
      List<double[]> alone) {
    int n = values.size();
    for (KeptTest.Covariance part : test.covariances()) {
      int[] places = places(test, part.configuration(), values);
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          if (places[i] >= 0 && places[j] >= 0) {
            sum[i][j] += part.scatter().get(places[i]).get(places[j]);
          }
        }
      }
      for (KeptTest.Shared source : part.shared()) {
        double[] effect = new double[n];
        for (int i = 0; i < n; i++) {
          effect[i] = places[i] >= 0 ? sign * source.effect().get(places[i]) : 0;
        }
        if (source.calibration().isEmpty()) {
          alone.add(effect);
          continue;
        }
        String key = source.calibration().get();
        descriptions.putIfAbsent(key, source.description());
        double[] known = calibrations.computeIfAbsent(key, unused -> new double[n]);
        for (int i = 0; i < n; i++) {
          known[i] += effect[i];
        }
      }
    }
  }

  private List<Change> changes(double[] differences, double[][] covariance) {
    int n = differences.length;
    double[] probabilities = new double[n];
    double[] degrees = new double[n];
    for (int i = 0; i < n; i++) {
      double u = Math.sqrt(covariance[i][i]);
      degrees[i] = degrees(i, covariance[i][i]);
      probabilities[i] =
          u > 0
              ? 2 * Quantiles.studentTProbability(-Math.abs(differences[i]) / u, degrees[i])
              : differences[i] == 0 ? 1 : 0;
    }
    double[] adjusted = holm(probabilities);
    List<Change> changes = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      changes.add(
          new Change(
              matched.get(i),
              earlier.get(i).value(),
              differences[i],
              Math.sqrt(covariance[i][i]),
              degrees[i],
              probabilities[i],
              adjusted[i],
              adjusted[i] < LEVEL));
    }
    return changes;
  }

  /** Welch–Satterthwaite over the scatter of the two tests. */
  private double degrees(int i, double variance) {
    double old = Math.pow(earlier.get(i).scatter(), 2);
    double own = Math.pow(matched.get(i).scatter(), 2);
    double parts =
        old * old / own(before, earlier.get(i)) + own * own / own(now, matched.get(i));
    return parts > 0 ? variance * variance / parts : Double.POSITIVE_INFINITY;
  }

  private static double own(KeptTest test, KeptTest.Value value) {
    return test.covariances().stream()
        .filter(c -> c.configuration().equals(value.configuration()))
        .mapToDouble(KeptTest.Covariance::scatterDegreesOfFreedom)
        .findFirst()
        .orElse(Double.POSITIVE_INFINITY);
  }

  /** Holm's adjusted probabilities: the k-th smallest times (n − k + 1), never falling. */
  static double[] holm(double[] probabilities) {
    int n = probabilities.length;
    Integer[] order = new Integer[n];
    Arrays.setAll(order, k -> k);
    Arrays.sort(order, Comparator.comparingDouble(k -> probabilities[k]));
    double[] adjusted = new double[n];
    double running = 0;
    for (int k = 0; k < n; k++) {
      running = Math.max(running, Math.min(1, (n - k) * probabilities[order[k]]));
      adjusted[order[k]] = running;
    }
    return adjusted;
  }
}
