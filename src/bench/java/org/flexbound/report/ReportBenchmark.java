package org.flexbound.report;

import java.nio.charset.StandardCharsets;
import java.util.Locale;
import java.util.function.Supplier;
import org.flexbound.report.page.ReportMaker;
import org.flexbound.report.page.ReportPage;
import org.flexbound.report.results.Results;
import org.flexbound.report.workbook.ResultsWorkbook;

/**
 * Time and size of the outputs for a large test: 60 gauges × 12 loads, two runs each, some 100 000 readings in the plots (invented). Goal for
 * the web page: less than 15 MB.
 */
public final class ReportBenchmark {
  private static final int REPEATS = 3;

  private ReportBenchmark() {}

  /**
   * Prints a table.
   *
   * @param args number of gauges, of loads and of load steps up a branch; 60, 12 and 35 where left out
   */
  public static void main(String[] args) {
    int gauges = args.length > 0 ? Integer.parseInt(args[0]) : 60;
    int loads = args.length > 1 ? Integer.parseInt(args[1]) : 12;
    int steps = args.length > 2 ? Integer.parseInt(args[2]) : 35;
    Results results = InventedResults.large(gauges, loads, steps);
    long readings = results.curves().stream().mapToLong(c -> c.points().size()).sum();
    System.out.printf(Locale.ROOT, "%d gauges, %d loads, %d readings%n%n| output | best of %d, s | MB |%n| --- | --- | --- |%n", gauges, loads,
        readings, REPEATS);
    measure("figures and tables", () -> {
      ReportPage page = ReportMaker.make(results, UnitSystem.MM_KN);
      return page.sections().size();
    });
    ReportPage page = ReportMaker.make(results, UnitSystem.MM_KN);
    measure("report.html", () -> ReportHtml.page(page).getBytes(StandardCharsets.UTF_8).length);
    measure("report.pdf", () -> ReportPdf.bytes(page).length);
    measure("results.xlsx", () -> ResultsWorkbook.bytes(results, UnitSystem.MM_KN).length);
    measure("results.json", () -> ResultsJson.bytes(results).length);
  }

  private static void measure(String name, Supplier<Integer> work) {
    double best = Double.POSITIVE_INFINITY;
    int size = 0;
    for (int k = 0; k < REPEATS; k++) {
      long start = System.nanoTime();
      size = work.get();
      best = Math.min(best, (System.nanoTime() - start) * 1e-9);
    }
    System.out.printf(Locale.ROOT, "| %s | %.2f | %s |%n", name, best, size < 1000 ? "–" : String.format(Locale.ROOT, "%.1f", size * 1e-6));
  }
}
