package org.flexbound.report;

import java.nio.charset.StandardCharsets;
import org.flexbound.document.OutputFolder;
import org.flexbound.report.page.ReportMaker;
import org.flexbound.report.page.ReportPage;
import org.flexbound.report.results.Results;
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
}
