package org.flexbound.report.workbook;

import org.apache.poi.xssf.usermodel.XSSFWorkbook;
import org.flexbound.report.results.CoefficientChange;
import org.flexbound.report.results.FixtureShare;
import org.flexbound.report.results.Limit;
import org.flexbound.report.results.Recheck;
import org.flexbound.report.results.Results;

/** The sheets with limits and decisions, and with the fixture's shares. */
final class LimitSheets {
  private LimitSheets() {}

  static void write(XSSFWorkbook workbook, Styles styles, Results results) {
    if (!results.limits().isEmpty()) {
      limits(workbook, styles, results);
    }
    if (!results.fixture().isEmpty()) {
      fixture(workbook, styles, results);
    }
    results.recheck().ifPresent(recheck -> changes(workbook, styles, recheck));
  }

  private static void limits(XSSFWorkbook workbook, Styles styles, Results results) {
    SheetWriter sheet =
        new SheetWriter(
            workbook, styles, "Limits", "Configuration", "Limit", "On", "Quantity", "Judged",
            "Value", "Standard uncertainty", "Lower", "Upper", "Unit", "Guard band",
            "Probability within", "Decision", "Probability wrong", "Rule", "Advice");
    for (Limit l : results.limits()) {
      sheet.row(
          l.configuration(), l.name(), l.on(), l.subject(), l.judged(), stated(l, l.value()),
          stated(l, l.standardUncertainty()), stated(l, l.lower()), stated(l, l.upper()),
          l.statedUnit(), stated(l, l.guard()), l.probability(), l.decision(), l.wrong(),
          l.rule() + (l.rule().equals("guarded") ? ", at most " + l.largestProbability() : ""),
          l.advice());
    }
    sheet.finish();
  }

  private static java.util.OptionalDouble stated(Limit limit, java.util.OptionalDouble si) {
    return si.isPresent() ? java.util.OptionalDouble.of(limit.stated(si.getAsDouble())) : si;
  }

  private static void changes(XSSFWorkbook workbook, Styles styles, Recheck recheck) {
    SheetWriter sheet =
        new SheetWriter(
            workbook, styles, "Changes", "Configuration", "Gauge", "Load", "Before", "Now",
            "Difference", "Standard uncertainty", "Degrees of freedom", "Unit", "Probability",
            "Probability adjusted", "Changed");
    for (CoefficientChange c : recheck.changes()) {
      sheet.row(
          c.configuration(), c.gauge(), c.load(), c.before(), c.now(), c.difference(),
          c.standardUncertainty(), c.degreesOfFreedom(), c.unit(), c.probability(), c.adjusted(),
          c.significant());
    }
    sheet.finish();
  }

  private static void fixture(XSSFWorkbook workbook, Styles styles, Results results) {
    SheetWriter sheet =
        new SheetWriter(
            workbook, styles, "Fixture", "Configuration", "Gauge", "Load", "As read",
            "Standard uncertainty", "Article's own", "Standard uncertainty of it", "Unit",
            "Share of base and fixture", "Standard uncertainty of the share");
    for (FixtureShare f : results.fixture()) {
      sheet.row(
          f.configuration(), f.gauge(), f.load(), f.total(), f.totalUncertainty(), f.own(),
          f.ownUncertainty(), f.unit(), f.share(), f.shareUncertainty());
    }
    sheet.finish();
  }
}
