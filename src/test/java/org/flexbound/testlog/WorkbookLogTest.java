package org.flexbound.testlog;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.zip.ZipEntry;
import java.util.zip.ZipFile;
import java.util.zip.ZipOutputStream;
import org.apache.poi.ss.usermodel.Cell;
import org.apache.poi.ss.usermodel.CellStyle;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Outcome;
import org.flexbound.setup.FitRange;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.ReductionOptions;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class WorkbookLogTest {
  @TempDir Path folder;

  /** One jack moved between two load points, two gauges. */
  static WorkbookMaker twoPoints() {
    WorkbookMaker maker = new WorkbookMaker();
    maker.row("Test", "Item", "Entry").row("Test", "Title", "Bracket").row("Test", "Length unit", "mm");
    maker.row(
        "Instruments",
        "Instrument",
        "Kind",
        "Serial",
        "Calibration reference",
        "Uncertainty of reading (%)",
        "Uncertainty fixed",
        "Unit",
        "As stated",
        "Resolution");
    maker.row("Instruments", "Cell", "load cell", "1", "A-1", 1.0, 2.0, "N", "k=2", 1.0);
    maker.row("Instruments", "Dial", "dial gauge", "2", "A-2", 0.6, null, "mm", "limits ±", 0.001);
    maker.row("Load points", "Load", "Node", "Direction", "Column", "Unit", "Instrument", "X", "Y", "Z");
    maker.row("Load points", "tip", "T", "-z", "Jack", "kN", "Cell", 1000, 0, 0);
    maker.row("Load points", "mid", "M", "-z", "Jack", "kN", "Cell", 500, 0, 0);
    maker.row("Gauges", "Gauge", "Node", "Direction", "Column", "Unit", "Instrument");
    maker.row("Gauges", "at tip", "T", "-z", "G1", "mm", "Dial");
    maker.row("Gauges", "at mid", "arm @ 0.5", "-z", "G2", null, "Dial");
    maker.row("Runs", "Run", "Sheet", "Column", "Load or gauge", "Use");
    maker.row("Runs", "1", "Tip run", "Jack", "tip", null);
    maker.row("Runs", "2", "Mid run", "Jack", "mid", "yes");
    for (String sheet : List.of("Tip run", "Mid run")) {
      maker.row(sheet, "Step", "Jack [kN]", "G1", "G2 [mm]", "Remark");
      maker.row(sheet, 0, 0.0, 0.1, 0.2, null);
      maker.row(sheet, 1, 1.0, 1.1, 0.7, "steady");
      maker.row(sheet, 2, 2.0, 2.1, 1.2, null);
    }
    return maker;
  }

  private Outcome<TestLog> read(WorkbookMaker maker) {
    return WorkbookLog.read(maker.write(folder.resolve("log.xlsx")), "log.xlsx");
  }

  @Test
  void aFilledWorkbookGivesLoadsGaugesAndRunsInSi() {
    Outcome<TestLog> outcome = read(twoPoints());
    assertThat(outcome.findings()).isEmpty();
    TestLog log = outcome.orRefuse();
    assertThat(log.information().title()).isEqualTo("Bracket");
    assertThat(log.instruments().get(0).gainUncertainty()).hasValue(0.005);
    assertThat(log.instruments().get(0).floorUncertainty()).hasValue(1.0);
    assertThat(log.instruments().get(1).gainUncertainty().getAsDouble())
        .isCloseTo(0.006 / Math.sqrt(3), within(1e-15));
    assertThat(log.loads()).extracting("name").containsExactly("tip", "mid");
    assertThat(log.loads().get(0).points().get(0).coordinates()).contains(new Vector(1, 0, 0));
    assertThat(log.gauges().get(1).station()).isEqualTo(new Station.OnMember("arm", 0.5));
    assertThat(log.gauges().get(1).kind()).isEqualTo(GaugeKind.DISPLACEMENT);
    assertThat(log.runs()).hasSize(2);
    Run second = log.runs().get(1);
    assertThat(second.loads()).extracting("name").containsExactly("mid");
    List<Double> seen = new ArrayList<>();
    second.readings().forEach(r -> seen.add(r.load(0) + r.gauge(1)));
    assertThat(seen).hasSize(3);
    assertThat(seen.get(2)).isCloseTo(2000 + 0.0012, within(1e-9));
  }

  @Test
  void everyProblemIsNamedWithItsCellInOneAnswer() {
    WorkbookMaker maker = twoPoints();
    maker.set("Load points", 1, 4, "kNn");
    maker.set("Gauges", 1, 2, "sideways");
    maker.set("Tip run", 2, 2, "broken");
    maker.set("Mid run", 0, 3, "G3");
    Outcome<TestLog> outcome = read(maker);
    assertThat(outcome.hasErrors()).isTrue();
    assertThat(outcome.findings())
        .extracting(finding -> finding.code() + " " + finding.where())
        .contains(
            "LOG-UNIT log.xlsx, sheet Load points, cell E2",
            "LOG-DIRECTION log.xlsx, sheet Gauges, cell C2",
            "LOG-MISSING-COLUMN log.xlsx, sheet Mid run");
  }

  @Test
  void aTextInANumberCellIsNamed() {
    Outcome<TestLog> outcome = read(twoPoints().set("Tip run", 2, 2, "broken"));
    assertThat(outcome.findings()).hasSize(1);
    Finding finding = outcome.findings().get(0);
    assertThat(finding.where().toString()).isEqualTo("log.xlsx, sheet Tip run, cell C3");
    assertThat(finding.message()).contains("'broken'").contains("expected a number");
  }

  @Test
  void unitsThatDisagreeNameBothCells() {
    Outcome<TestLog> outcome = read(twoPoints().set("Tip run", 0, 1, "Jack [N]"));
    assertThat(outcome.findings()).hasSize(1);
    assertThat(outcome.findings().get(0).code()).isEqualTo("LOG-UNITS-DISAGREE");
    assertThat(outcome.findings().get(0).where().cells()).contains("B1");
    assertThat(outcome.findings().get(0).message()).contains("sheet Load points, cell E2");
  }

  @Test
  void numbersAsTextAreTakenWithANote() {
    Outcome<TestLog> outcome = read(twoPoints().set("Tip run", 2, 2, "1,1"));
    assertThat(outcome.hasErrors()).isFalse();
    assertThat(outcome.findings()).extracting(Finding::code).containsExactly("LOG-NUMBER-AS-TEXT");
  }

  @Test
  void aColumnThatTwoLoadsClaimNeedsTheSheetRuns() {
    WorkbookMaker maker = twoPoints();
    maker.set("Runs", 1, 2, null).set("Runs", 1, 3, null);
    Outcome<TestLog> outcome = read(maker);
    assertThat(outcome.findings())
        .extracting(Finding::code)
        .contains("LOG-COLUMN-CLAIMED-TWICE");
  }

  @Test
  void aGaugeMayHaveItsOwnFitRange() {
    WorkbookMaker maker = twoPoints();
    maker.row("Options", "Item", "Entry", "Gauge");
    maker.row("Options", "Fit range lower", 20, null);
    maker.row("Options", "Fit range upper", 60, "at mid");
    ReductionOptions options = read(maker).value().orElseThrow().options();
    assertThat(options.fitRange("at tip")).isEqualTo(new FitRange(0.2, 1));
    assertThat(options.fitRange("at mid")).isEqualTo(new FitRange(0.2, 0.6));
  }

  @Test
  void aFitRangeThatCannotBeIsNamedWithItsCellAlsoForOneGauge() {
    WorkbookMaker maker = twoPoints();
    maker.row("Options", "Item", "Entry", "Gauge");
    maker.row("Options", "Fit range lower", 70, "at mid");
    maker.row("Options", "Fit range upper", 60, "at mid");
    maker.row("Options", "Fit range upper", 60, "at midd");
    maker.row("Options", "Linearity limit", 1, "at mid");
    assertThat(read(maker).findings())
        .extracting(finding -> finding.code() + " " + finding.where())
        .containsExactlyInAnyOrder(
            "LOG-OUT-OF-RANGE log.xlsx, sheet Options, cell B2",
            "LOG-UNKNOWN-NAME log.xlsx, sheet Options, cell C4",
            "LOG-OPTION log.xlsx, sheet Options, cell C5");
  }

  @Test
  void limitsAreReadInTheirUnit() {
    WorkbookMaker maker = twoPoints();
    maker.row("Limits", "Limit", "On", "Gauge", "Load", "Upper", "Unit");
    maker.row("Limits", "L1", "coefficient", "at tip", "tip", 1.0, "mm/kN");
    TestLog log = read(maker).orRefuse();
    assertThat(log.limits()).hasSize(1);
    assertThat(log.limits().get(0).upper()).hasValue(1e-6);
  }

  @Test
  void deadWeightsInKilogramsBecomeForces() {
    WorkbookMaker maker = twoPoints();
    maker.set("Load points", 1, 4, "kg").set("Load points", 2, 4, "kg");
    maker.set("Tip run", 0, 1, "Jack").set("Mid run", 0, 1, "Jack");
    maker.row("Options", "Item", "Entry", "Unit").row("Options", "Local gravity", 9.81, "m/s²");
    TestLog log = read(maker).orRefuse();
    List<Double> seen = new ArrayList<>();
    log.runs().get(0).readings().forEach(r -> seen.add(r.load(0)));
    assertThat(seen.get(2)).isCloseTo(2 * 9.81, within(1e-12));
  }

  @Test
  void aNumberShownInPercentIsWhatItsWriterSaw() throws IOException {
    WorkbookMaker maker = twoPoints();
    maker.row("Options", "Item", "Entry").row("Options", "Linearity limit", 0.015);
    maker.row("Options", "Stated repeatability", 2);
    Path file = maker.write(folder.resolve("percent.xlsx"));
    try (InputStream in = Files.newInputStream(file);
        XSSFWorkbook workbook = new XSSFWorkbook(in)) {
      CellStyle percent = workbook.createCellStyle();
      percent.setDataFormat(workbook.createDataFormat().getFormat("0.0 %"));
      workbook.getSheet("Options").getRow(1).getCell(1).setCellStyle(percent);
      Cell share = workbook.getSheet("Instruments").getRow(1).getCell(4);
      share.setCellValue(0.01);
      share.setCellStyle(percent);
      try (OutputStream out = Files.newOutputStream(file)) {
        workbook.write(out);
      }
    }
    TestLog log = WorkbookLog.read(file, "percent.xlsx").orRefuse();
    assertThat(log.options().qualityLimits().linearity()).isCloseTo(0.015, within(1e-15));
    assertThat(log.options().statedRepeatability()).hasValue(0.02);
    assertThat(log.instruments().get(0).gainUncertainty()).hasValue(0.005);
  }

  @Test
  void aValueMayCarryItsOwnUnit() {
    WorkbookMaker maker = twoPoints();
    maker.set("Load points", 1, 6, "100 cm").set("Instruments", 1, 5, "0,002 kN");
    TestLog log = read(maker).orRefuse();
    assertThat(log.loads().get(0).points().get(0).coordinates()).contains(new Vector(1, 0, 0));
    assertThat(log.instruments().get(0).floorUncertainty()).hasValue(1.0);
    assertThat(read(twoPoints().set("Load points", 1, 6, "1 kg")).findings())
        .extracting(finding -> finding.code() + " " + finding.where().cells().orElse(""))
        .containsExactly("LOG-UNIT G2");
  }

  @Test
  void aHeaderThatNamesAColumnTwiceIsRefused() {
    WorkbookMaker maker = twoPoints();
    maker.set("Tip run", 0, 4, "G1");
    assertThat(read(maker).findings())
        .extracting(finding -> finding.code() + " " + finding.where())
        .containsExactly("LOG-TWICE log.xlsx, sheet Tip run, cell E1");
  }

  @Test
  void aDamagedSheetLosesNothingThatWasFoundBefore() throws IOException {
    WorkbookMaker maker = twoPoints().set("Gauges", 1, 2, "sideways");
    Path file = maker.write(folder.resolve("damaged.xlsx"));
    Path broken = folder.resolve("broken.xlsx");
    try (ZipFile zip = new ZipFile(file.toFile());
        ZipOutputStream out = new ZipOutputStream(Files.newOutputStream(broken))) {
      for (ZipEntry entry : java.util.Collections.list(zip.entries()).toArray(ZipEntry[]::new)) {
        byte[] bytes = zip.getInputStream(entry).readAllBytes();
        out.putNextEntry(new ZipEntry(entry.getName()));
        // the sixth sheet is the first run
        int length = entry.getName().endsWith("sheet6.xml") ? bytes.length * 2 / 3 : bytes.length;
        out.write(bytes, 0, length);
      }
    }
    assertThat(WorkbookLog.read(broken, "broken.xlsx").findings())
        .extracting(finding -> finding.code() + " " + finding.where())
        .contains(
            "LOG-DIRECTION broken.xlsx, sheet Gauges, cell C2",
            "DOC-UNREADABLE broken.xlsx, sheet Tip run");
  }
}
