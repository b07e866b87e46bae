package org.flexbound.report.results;

import java.util.List;

/**
 * The history of one thing over its tests: the content of trend.json.
 *
 * @param format the version of this format
 * @param program the program and its version
 * @param title the title of the latest test
 * @param baseline how many of the first tests are the baseline
 * @param tests the tests in order of their dates
 * @param series a chart for each coefficient and parameter
 * @param findings what was noticed
 */
public record TrendResults(
    int format,
    String program,
    String title,
    int baseline,
    List<TrendTest> tests,
    List<TrendSeries> series,
    List<Finding> findings) {
  /** The version of the format that is written now. */
  public static final int FORMAT = 1;

  /** Copies the lists. */
  public TrendResults {
    tests = List.copyOf(tests);
    series = List.copyOf(series);
    findings = List.copyOf(findings);
  }
}
