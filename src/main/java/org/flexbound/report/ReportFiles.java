package org.flexbound.report;

import java.nio.charset.StandardCharsets;
import org.flexbound.document.OutputFolder;
import org.flexbound.report.page.CertificateMaker;
import org.flexbound.report.page.ReportMaker;
import org.flexbound.report.page.ReportPage;
import org.flexbound.report.page.TrendMaker;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.TrendResults;
import org.flexbound.report.workbook.ResultsWorkbook;

/** The files of a report. */
public final class ReportFiles {
  private ReportFiles() {}

  /**
   * Adds results.json, results.xlsx, report.html and report.pdf to a folder's outputs.
   *
   * @param folder the folder
   * @param results what was found
   * @param units the units to show
   */
  public static void add(OutputFolder folder, Results results, UnitSystem units) {
    folder.add("results.json", ResultsJson.bytes(results));
    folder.add("results.xlsx", ResultsWorkbook.bytes(results, units));
    ReportPage page = ReportMaker.make(results, units);
    folder.add("report.html", ReportHtml.page(page).getBytes(StandardCharsets.UTF_8));
    folder.add("report.pdf", ReportPdf.bytes(page));
  }

  /**
   * Adds trend.json, trend.html and trend.pdf.
   *
   * @param folder the folder
   * @param trend the history
   * @param units the units to show
   */
  public static void addTrend(OutputFolder folder, TrendResults trend, UnitSystem units) {
    folder.add("trend.json", ResultsJson.bytes(trend));
    ReportPage page = TrendMaker.make(trend, units);
    folder.add("trend.html", ReportHtml.page(page).getBytes(StandardCharsets.UTF_8));
    folder.add("trend.pdf", ReportPdf.bytes(page));
  }

  /**
   * Adds certificate.pdf, one page.
   *
   * @param folder the folder
   * @param results what was found, with decisions on limits
   */
  public static void addCertificate(OutputFolder folder, Results results) {
    folder.add("certificate.pdf", ReportPdf.certificate(CertificateMaker.make(results)));
  }
}
