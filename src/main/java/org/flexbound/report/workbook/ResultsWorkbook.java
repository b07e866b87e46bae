package org.flexbound.report.workbook;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.apache.poi.ooxml.POIXMLProperties;
import org.apache.poi.xssf.usermodel.XSSFName;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;
import org.flexbound.document.WorkbookBytes;
import org.flexbound.report.Program;
import org.flexbound.report.UnitSystem;
import org.flexbound.report.results.Coefficient;
import org.flexbound.report.results.Comparison;
import org.flexbound.report.results.Covariance;
import org.flexbound.report.results.Exclusion;
import org.flexbound.report.results.Finding;
import org.flexbound.report.results.JointClass;
import org.flexbound.report.results.Parameter;
import org.flexbound.report.results.Reciprocity;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.Run;
import org.flexbound.report.results.SharedFactor;

/** Writes results.xlsx. */
public final class ResultsWorkbook {
  private final Results results;
  private final UnitSystem units;
  private final XSSFWorkbook workbook = new XSSFWorkbook();
  private final Styles styles = new Styles(workbook);

  private ResultsWorkbook(Results results, UnitSystem units) {
    this.results = results;
    this.units = units;
  }

  /**
   * The bytes of results.xlsx.
   *
   * @param results the results
   * @param units the units to show
   * @return the workbook
   */
  public static byte[] bytes(Results results, UnitSystem units) {
    return new ResultsWorkbook(results, units).write();
  }

  private byte[] write() {
    try (workbook) {
      runs();
      coefficients();
      covariance();
      reciprocity();
      MatrixSheets.write(workbook, styles, results);
    LimitSheets.write(workbook, styles, results);
      comparison();
      parameters();
      new UpdateSheets(workbook, styles, results, units).write();
      findings();
      new ReadingsSheet(workbook, styles, units).write(results);
      left();
      POIXMLProperties.CoreProperties core = workbook.getProperties().getCoreProperties();
      core.setTitle(results.title());
      core.setCreator(Program.NAME);
      return WorkbookBytes.of(workbook);
    } catch (IOException impossible) {
      throw new UncheckedIOException("the workbook could not be put together", impossible);
    }
  }

  private double shown(double si, String unit) {
    return units.shown(si, unit);
  }

  private OptionalDouble shown(OptionalDouble si, String unit) {
    return si.isPresent() ? OptionalDouble.of(shown(si.getAsDouble(), unit)) : si;
  }

  private void runs() {
    SheetWriter sheet =
        new SheetWriter(
            workbook, styles, "Runs", "Configuration", "Run", "Verdict", "Reasons", "Used", "Loads",
            "Steps", "Cycles", "Peak load", "Unit", "Date", "Temperature [K]", "Remark", "Where");
    for (Run r : results.runs()) {
      sheet.row(
          r.configuration(), r.name(), r.verdict(), String.join("; ", r.reasons()), r.used(),
          String.join(", ", r.loads()), r.steps(), r.cycles(), shown(r.peakLoad(), r.loadUnit()),
          units.symbol(r.loadUnit()), r.date(), r.temperature(), r.remark(), r.where());
    }
    sheet.finish();
  }

  private void coefficients() {
    SheetWriter sheet =
        new SheetWriter(
            workbook, styles, "Coefficients", "Configuration", "Gauge", "Load", "Value",
            "Standard uncertainty", "of it scatter", "of it floor", "of it gains",
            "Degrees of freedom", "Before base motion was taken out", "Runs", "Unit");
    for (Coefficient c : results.coefficients()) {
      sheet.row(
          c.configuration(), c.gauge(), c.load(), shown(c.value(), c.unit()),
          shown(c.standardUncertainty(), c.unit()), shown(c.scatter(), c.unit()),
          shown(c.floor(), c.unit()), shown(c.gain(), c.unit()), c.degreesOfFreedom(),
          shown(c.absolute(), c.unit()), c.runs(), units.symbol(c.unit()));
    }
    sheet.finish();
    name("coefficients", sheet, "D");
    name("standard_uncertainties", sheet, "E");
  }

  private void name(String name, SheetWriter sheet, String column) {
    if (sheet.rows() > 1) {
      XSSFName range = workbook.createName();
      range.setNameName(name);
      range.setRefersToFormula(
          sheet.sheet().getSheetName() + "!$" + column + "$2:$" + column + "$" + sheet.rows());
    }
  }

  private void covariance() {
    for (Covariance covariance : results.covariance()) {
      List<Coefficient> order =
          results.coefficients().stream()
              .filter(c -> c.configuration().equals(covariance.configuration()))
              .limit(covariance.scatter().size())
              .toList();
      List<String> headings = new ArrayList<>();
      headings.add("Scatter and floors, SI");
      order.forEach(c -> headings.add(c.gauge() + " / " + c.load()));
      for (SharedFactor factor : covariance.factors()) {
        headings.add("one u of " + factor.key());
      }
      boolean first = workbook.getSheet("Covariance") == null;
      SheetWriter sheet =
          new SheetWriter(
              workbook,
              styles,
              first ? "Covariance" : "Covariance " + workbook.getNumberOfSheets(),
              headings.toArray(new String[0]));
      for (int row = 0; row < order.size(); row++) {
        List<Object> values = new ArrayList<>();
        values.add(order.get(row).gauge() + " / " + order.get(row).load());
        values.addAll(covariance.scatter().get(row).subList(0, order.size()));
        for (SharedFactor factor : covariance.factors()) {
          values.add(factor.effect().get(row));
        }
        sheet.row(values.toArray());
      }
      sheet.finish();
    }
  }

  private void reciprocity() {
    SheetWriter sheet =
        new SheetWriter(
            workbook, styles, "Reciprocity", "Configuration", "First", "Second", "First value",
            "Second value", "Difference", "Standard uncertainty", "z", "Unit");
    for (Reciprocity p : results.reciprocity()) {
      sheet.row(
          p.configuration(), p.first(), p.second(), shown(p.firstValue(), p.unit()),
          shown(p.secondValue(), p.unit()), shown(p.difference(), p.unit()),
          shown(p.standardUncertainty(), p.unit()), p.z(), units.symbol(p.unit()));
    }
    sheet.finish();
  }

  private void comparison() {
    SheetWriter sheet =
        new SheetWriter(
            workbook, styles, "Comparison", "Configuration", "Gauge", "Load", "Measured",
            "Standard uncertainty", "Nominal model", "Ratio", "z", "Updated model",
            "Ratio, updated", "z, updated", "Held out", "All modes", "Modes within 10 %",
            "Modes within 5 %", "Modes within 1 %", "Without mass", "Measured modes", "Unit");
    for (Comparison c : results.comparison()) {
      sheet.row(
          c.configuration(), c.gauge(), c.load(), shown(c.measured(), c.unit()),
          shown(c.standardUncertainty(), c.unit()), shown(c.computed(), c.unit()), c.ratio(), c.z(),
          shown(c.updated(), c.unit()), c.updatedRatio(), c.updatedZ(), c.heldOut(),
          shown(c.full(), c.unit()), c.modesWithin10(), c.modesWithin5(), c.modesWithin1(),
          shown(c.massless(), c.unit()), shown(c.measuredModes(), c.unit()),
          units.symbol(c.unit()));
    }
    sheet.finish();
  }

  private void parameters() {
    SheetWriter sheet =
        new SheetWriter(
            workbook, styles, "Parameters", "Parameter", "Scales", "Nominal", "Updated", "Factor",
            "Lower 95 %", "Upper 95 %", "Lower bound", "Upper bound", "Unit", "Working variable",
            "Prior standard deviation", "Posterior standard deviation", "Variance removed", "Status",
            "On a bound", "Justification", "EN 1993-1-8 before", "EN 1993-1-8 after",
            "AISC 360 before", "AISC 360 after");
    for (Parameter p : results.parameters()) {
      // A factor has no unit; everything else is shown in the unit of its stiffness.
      boolean factor = p.unit().equals("1");
      String unit = factor ? "" : p.unit();
      sheet.row(
          p.name(), String.join(", ", p.scales()), shown(p.nominal(), unit),
          shown(p.updated(), unit), p.factor(), shown(p.lower95(), unit), shown(p.upper95(), unit),
          shown(p.lowerBound(), unit), shown(p.upperBound(), unit),
          factor ? "× nominal" : units.symbol(unit), p.working(), p.priorStandardDeviation(),
          p.posteriorStandardDeviation(), p.varianceRemoved(), p.status(), p.onBound(),
          p.justification(), p.classBefore().map(JointClass::en1993).orElse(""),
          p.classAfter().map(JointClass::en1993).orElse(""),
          p.classBefore().map(JointClass::aisc360).orElse(""),
          p.classAfter().map(JointClass::aisc360).orElse(""));
    }
    sheet.finish();
  }

  private void findings() {
    SheetWriter sheet =
        new SheetWriter(
            workbook, styles, "Findings", "Severity", "Code", "Where", "Message", "What to do");
    for (Finding f : results.findings()) {
      sheet.row(f.severity(), f.code(), f.where(), f.message(), f.remedy());
    }
    sheet.finish();
  }

  private void left() {
    SheetWriter sheet =
        new SheetWriter(
            workbook, styles, "Left out", "Configuration", "Run", "What", "Where", "Reason",
            "Decided by", "Readings");
    for (Exclusion e : results.excluded()) {
      sheet.row(
          e.configuration(), e.run(), e.what(), e.where(), e.reason(), e.by(), e.readings());
    }
    sheet.finish();
  }
}
