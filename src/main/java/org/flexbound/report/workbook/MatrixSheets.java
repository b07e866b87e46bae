package org.flexbound.report.workbook;

import org.apache.poi.xssf.usermodel.XSSFWorkbook;
import org.flexbound.report.results.BoundCheck;
import org.flexbound.report.results.Hint;
import org.flexbound.report.results.MatrixCheck;
import org.flexbound.report.results.PointGain;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.TripleProduct;

/** The sheet with the checks of the flexibility matrices. */
final class MatrixSheets {
  private MatrixSheets() {}

  static void write(XSSFWorkbook workbook, Styles styles, Results results) {
    SheetWriter sheet =
        new SheetWriter(
            workbook, styles, "Matrix checks", "Configuration", "Check", "Of", "Value", "z",
            "Limit of z", "Passed", "Remark");
    for (MatrixCheck check : results.matrixChecks()) {
      String configuration = check.configuration();
      check
          .eigenvalue()
          .ifPresent(
              e ->
                  sheet.row(
                      configuration, "smallest eigenvalue", String.join(", ", e.points()),
                      e.value(), e.z(), -e.limit(), e.passed(),
                      "square part, scaled to a unit diagonal; above nought"));
      for (BoundCheck b : check.bounds()) {
        sheet.row(
            configuration, b.direct() ? "direct coefficient" : "cross coefficient", b.name(),
            b.ratio(), b.z(), b.limit(), b.passed(),
            b.direct() ? "SI; above nought" : "over the geometric mean of the direct ones; not above 1");
      }
      for (PointGain g : check.gains()) {
        sheet.row(
            configuration, "gain pattern", g.gauge() + ", " + g.load(), g.factor(), g.z(),
            g.limit(), !g.suspect(),
            g.suspect() ? "stands out from all other points" : "factor against the other points");
      }
      for (TripleProduct t : check.triples()) {
        sheet.row(
            configuration, "triple product", String.join(", ", t.points()), t.ratio(), t.z(),
            t.limit(), t.passed(), "ratio of the two products; 1");
      }
      for (Hint hint : check.hints()) {
        sheet.row(
            configuration, "looks like", hint.looksLike(), hint.after(), "", "", "",
            "because " + hint.because());
      }
    }
    sheet.finish();
  }
}
