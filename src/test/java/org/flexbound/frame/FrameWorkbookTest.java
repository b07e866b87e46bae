package org.flexbound.frame;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Consumer;
import org.apache.poi.ss.usermodel.Sheet;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;
import org.flexbound.document.EntryTable;
import org.flexbound.document.Json;
import org.flexbound.document.JsonFile;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Severity;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The workbook form of a model: to it and back without loss, problems by sheet and cell. */
class FrameWorkbookTest {
  @TempDir Path folder;

  private static FrameModel model(String json) {
    return FrameReader.read(JsonFile.parse(json, "model.json").orRefuse()).orRefuse();
  }

  /** Values without places, objects without order. */
  private static Object plain(Json json) {
    if (json instanceof Json.Members members) {
      Map<String, Object> result = new HashMap<>();
      members.members().forEach((key, value) -> result.put(key, plain(value)));
      return result;
    }
    if (json instanceof Json.Items items) {
      List<Object> result = new ArrayList<>();
      items.items().forEach(item -> result.add(plain(item)));
      return result;
    }
    return json instanceof Json.Text text ? text.text() : json.shown();
  }

  private Path written(FrameModel model) throws IOException {
    Path file = folder.resolve("model.xlsx");
    Files.write(file, FrameWorkbook.write(model).bytes());
    return file;
  }

  private FrameModel back(FrameModel model) throws IOException {
    return FrameReader.read(written(model), "model.xlsx").orRefuse();
  }

  @Test
  void everyKeyAndEveryShapeComeBackAsTheUserWroteThem() throws IOException {
    FrameModel model = model(FrameSchemaTest.WHOLE);
    assertThat(FrameWorkbook.write(model).findings()).isEmpty();
    FrameModel back = back(model);
    assertThat(plain(FrameWriter.tree(back))).isEqualTo(plain(FrameWriter.tree(model)));
    assertThat(back.units()).isEqualTo(model.units());
    for (StiffnessPath path : model.stiffnesses()) {
      assertThat(back.stiffness(path)).as("%s", path).isEqualTo(model.stiffness(path));
    }
    // The order of entries within tables counts for what is shown.
    assertThat(new ArrayList<>(back.nodes().keySet()))
        .isEqualTo(new ArrayList<>(model.nodes().keySet()));
    assertThat(back.masses().get(0).inertia()).isEqualTo(model.masses().get(0).inertia());
  }

  @Test
  void factorsAndStiffnessesThatWereSetComeBack() throws IOException {
    FrameModel model =
        model(FrameSchemaTest.WHOLE)
            .with(
                Map.of(
                    StiffnessPath.parse("members.arm.EIz").orElseThrow(),
                    new StiffnessSetting.Factor(0.123456789012345),
                    StiffnessPath.parse("joints.knee.rx").orElseThrow(),
                    new StiffnessSetting.Value(1.2345678901234567e6),
                    StiffnessPath.parse("joints.full.ry").orElseThrow(),
                    new StiffnessSetting.Factor(1.7),
                    StiffnessPath.parse("supports.a.ry").orElseThrow(),
                    new StiffnessSetting.Value(Double.POSITIVE_INFINITY)));
    FrameModel back = back(model);
    assertThat(FrameWriter.write(back).lines().count())
        .isEqualTo(FrameWriter.write(model).lines().count());
    assertThat(plain(FrameWriter.tree(back))).isEqualTo(plain(FrameWriter.tree(model)));
    for (StiffnessPath path : model.stiffnesses()) {
      assertThat(back.stiffness(path)).as("%s", path).isEqualTo(model.stiffness(path));
    }
  }

  @Test
  void fromAWorkbookToJsonAndBackNothingChanges() throws IOException {
    FrameModel first = back(model(FrameSchemaTest.WHOLE));
    String json = FrameWriter.write(first);
    FrameModel second = model(json);
    assertThat(FrameWorkbook.write(second).bytes()).isEqualTo(FrameWorkbook.write(first).bytes());
  }

  @Test
  void theSameModelGivesTheSameBytes() {
    assertThat(FrameWorkbook.write(model(FrameSchemaTest.WHOLE)).bytes())
        .isEqualTo(FrameWorkbook.write(model(FrameSchemaTest.WHOLE)).bytes());
  }

  @Test
  void whatACellCannotHoldIsTold() {
    FrameModel model =
        model(FrameSchemaTest.WHOLE.replace("\"notes\": \"none\"", "\"notes\": {\"by\": [1]}"));
    assertThat(FrameWorkbook.write(model).findings())
        .extracting(Finding::message)
        .containsExactly("'notes' is not a text, which a cell cannot hold: left out");
  }

  private Outcome<FrameModel> changed(Consumer<XSSFWorkbook> change) throws IOException {
    Path file = written(model(FrameSchemaTest.WHOLE));
    Path broken = folder.resolve("broken.xlsx");
    try (XSSFWorkbook workbook = new XSSFWorkbook(Files.newInputStream(file));
        OutputStream out = Files.newOutputStream(broken)) {
      change.accept(workbook);
      workbook.write(out);
    }
    return FrameReader.read(broken, "broken.xlsx");
  }

  private static void set(Sheet sheet, int row, String header, Object value) {
    for (int c = 0; c < sheet.getRow(0).getLastCellNum(); c++) {
      if (EntryTable.nameAndUnit(sheet.getRow(0).getCell(c).getStringCellValue())[0].equals(header)) {
        org.apache.poi.ss.usermodel.Row line = sheet.getRow(row);
        if (line == null) {
          line = sheet.createRow(row);
        }
        if (value instanceof Double number) {
          line.createCell(c).setCellValue(number);
        } else {
          line.createCell(c).setCellValue(String.valueOf(value));
        }
        return;
      }
    }
    throw new IllegalArgumentException(header);
  }

  @Test
  void allProblemsComeInOneAnswerEachWithItsSheetAndCell() throws IOException {
    Outcome<FrameModel> outcome =
        changed(
            book -> {
              set(book.getSheet("nodes"), 1, "z", "");
              set(book.getSheet("nodes"), 6, "node", "a");
              set(book.getSheet("nodes"), 6, "x", 1.0);
              set(book.getSheet("nodes"), 6, "y", 1.0);
              set(book.getSheet("nodes"), 6, "z", 1.0);
              set(book.getSheet("materials"), 1, "E", "210 GPa/s");
              set(book.getSheet("members"), 1, "section", "tubs");
              set(book.getSheet("joints"), 3, "matrix row", "q");
              set(book.getSheet("units"), 9, "Item", "down");
              set(book.getSheet("units"), 9, "Entry", "-z");
              book.createSheet("suports").createRow(0).createCell(0).setCellValue("node");
              book.getSheet("masses").getRow(0).getCell(1).setCellValue("mass [s]");
            });
    assertThat(outcome.findings().stream().filter(f -> f.severity() != Severity.NOTE))
        .extracting(Finding::toString)
        .anySatisfy(f -> assertThat(f).contains("sheet nodes, cell D2", "'z' is blank"))
        .anySatisfy(f -> assertThat(f).contains("sheet nodes, cell A7", "second row for 'a'"))
        .anySatisfy(f -> assertThat(f).contains("sheet materials, cell B2", "210 GPa/s"))
        .anySatisfy(f -> assertThat(f).contains("sheet members, cell D2", "did you mean 'tube'?"))
        .anySatisfy(f -> assertThat(f).contains("sheet joints, cell B4", "found 'q'"))
        .anySatisfy(f -> assertThat(f).contains("sheet units, cell A10", "the item 'down'"))
        .anySatisfy(f -> assertThat(f).contains("sheet suports", "did you mean 'supports'?"))
        .anySatisfy(f -> assertThat(f).contains("sheet masses, cell B1", "the unit 's'"));
  }

  @Test
  void aNumberUnderAHeaderWithAnotherUnitIsTakenInThatUnit() throws IOException {
    FrameModel model =
        changed(
                book -> {
                  Sheet nodes = book.getSheet("nodes");
                  nodes.getRow(0).getCell(1).setCellValue("x [m]");
                  set(nodes, 3, "x", 2.5);
                })
            .value()
            .orElseThrow();
    assertThat(model.place("c").x()).isEqualTo(2.5);
    assertThat(model.place("d").x()).isEqualTo(2000);
    assertThat(model.place("d").y()).isEqualTo(0.010);
  }
}
