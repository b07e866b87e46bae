package org.flexbound.acceptance;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Where;

/**
 * The history of one thing over its tests: a chart for each coefficient and each parameter.
 *
 * @param tests the tests in order of their dates
 * @param baseline how many of the first are the baseline
 * @param series the charts
 */
public record Trend(List<KeptTest> tests, int baseline, List<Series> series) {
  /** Fewer tests than this say nothing of a trend. */
  private static final int LEAST_TESTS = 3;

  /** Copies the lists. */
  public Trend {
    tests = List.copyOf(tests);
    series = List.copyOf(series);
  }

  /**
   * One coefficient or parameter over time.
   *
   * @param parameter true for a parameter
   * @param configuration the configuration of a coefficient, or empty
   * @param name the coefficient (gauge and load) or the parameter
   * @param unit the SI unit
   * @param chart its limits
   * @param points its values in order of time
   */
  public record Series(
      boolean parameter,
      String configuration,
      String name,
      String unit,
      IndividualsChart chart,
      List<Point> points) {
    /** Copies the list. */
    public Series {
      points = List.copyOf(points);
    }

    /**
     * The points outside of the limits.
     *
     * @return by value or by moving range
     */
    public List<Point> outside() {
      return points.stream().filter(p -> p.outside() || p.jump()).toList();
    }
  }

  /**
   * One value.
   *
   * @param test the test's name
   * @param date its date
   * @param value the value, SI
   * @param standardUncertainty its standard uncertainty; NaN where not known
   * @param range distance to the value before; NaN for the first
   * @param baseline whether it is one of the baseline
   * @param outside whether it lies outside of the limits
   * @param jump whether its moving range does
   */
  public record Point(
      String test,
      String date,
      double value,
      double standardUncertainty,
      double range,
      boolean baseline,
      boolean outside,
      boolean jump) {}

  private record Entry(KeptTest test, double value, double u) {}

  private record Name(boolean parameter, String configuration, String name, String unit) {}

  /**
   * Makes the charts.
   *
   * @param kept the tests in any order; those without a date are left out with a finding
   * @param wanted how many of the first tests are the baseline
   * @return the history; an error where there are too few tests
   */
  public static Outcome<Trend> of(List<KeptTest> kept, int wanted) {
    Findings findings = new Findings();
    List<KeptTest> tests = new ArrayList<>();
    for (KeptTest test : kept) {
      if (test.date().matches("\\d{4}-\\d{2}-\\d{2}.*")) {
        tests.add(test);
      } else {
        findings.add(
            AcceptanceFinding.HISTORY_FILE,
            Where.file(test.name()),
            "found the date '" + test.date() + "'; expected one such as 2026-03-31");
      }
    }
    tests.sort(Comparator.comparing(KeptTest::date).thenComparing(KeptTest::name));
    if (tests.size() < LEAST_TESTS) {
      findings.add(
          AcceptanceFinding.HISTORY_SHORT,
          Where.nowhere(),
          "found " + tests.size() + " tests with a date; expected at least " + LEAST_TESTS);
      return Outcome.none(findings.list());
    }
    // at least one test must lie after the baseline, and two within it
    int baseline = Math.max(2, Math.min(wanted, tests.size() - 1));
    Map<Name, List<Entry>> values = values(tests);
    List<Series> series = new ArrayList<>();
    List<String> gaps = new ArrayList<>();
    values.forEach(
        (name, entries) -> {
          if (entries.size() < tests.size()) {
            gaps.add(name.name());
          }
          if (entries.size() >= LEAST_TESTS) {
            series.add(series(name, entries, Math.min(baseline, entries.size() - 1)));
          }
        });
    if (!gaps.isEmpty()) {
      findings.add(
          AcceptanceFinding.HISTORY_GAPS,
          Where.nowhere(),
          "not in every test: " + String.join(", ", gaps));
    }
    return Outcome.of(new Trend(tests, baseline, series), findings.list());
  }

  private static Map<Name, List<Entry>> values(List<KeptTest> tests) {
    Map<Name, List<Entry>> values = new LinkedHashMap<>();
    for (KeptTest test : tests) {
      for (KeptTest.Value value : test.coefficients()) {
        values
            .computeIfAbsent(
                new Name(false, value.configuration(), value.name(), value.unit()),
                unused -> new ArrayList<>())
            .add(new Entry(test, value.value(), value.standardUncertainty()));
      }
      for (KeptTest.ParameterValue value : test.parameters()) {
        if (Double.isFinite(value.value())) {
          values
              .computeIfAbsent(
                  new Name(true, "", value.name(), value.unit()), unused -> new ArrayList<>())
              .add(new Entry(test, value.value(), value.standardUncertainty()));
        }
      }
    }
    return values;
  }

  private static Series series(Name name, List<Entry> entries, int baseline) {
    double[] values = entries.stream().mapToDouble(Entry::value).toArray();
    IndividualsChart chart = IndividualsChart.of(values, baseline);
    List<Point> points = new ArrayList<>();
    for (int k = 0; k < values.length; k++) {
      Entry entry = entries.get(k);
      double range = k == 0 ? Double.NaN : Math.abs(values[k] - values[k - 1]);
      // a prediction interval is for values that it was not made of
      boolean judged = !chart.predicted() || k >= baseline;
      points.add(
          new Point(
              entry.test().name(),
              entry.test().date(),
              values[k],
              entry.u(),
              range,
              k < baseline,
              judged && chart.outside(values[k]),
              judged && chart.rangeOutside(range)));
    }
    return new Series(
        name.parameter(), name.configuration(), name.name(), name.unit(), chart, points);
  }
}
