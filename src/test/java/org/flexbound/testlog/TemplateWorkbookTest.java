package org.flexbound.testlog;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.flexbound.document.SheetFile;
import org.flexbound.document.WorkbookFile;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Outcome;
import org.flexbound.reduce.Places;
import org.flexbound.reduce.Reducer;
import org.flexbound.reduce.Reduction;
import org.flexbound.reduce.ReductionProblem;
import org.flexbound.reduce.RunVerdict;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class TemplateWorkbookTest {
  @TempDir Path folder;

  private Path blank() throws IOException {
    Path file = folder.resolve("blank.xlsx");
    try (OutputStream out = Files.newOutputStream(file)) {
      TemplateWorkbook.write(out);
    }
    return file;
  }

  private Path example() throws IOException {
    Path file = folder.resolve("example.xlsx");
    try (OutputStream out = Files.newOutputStream(file)) {
      ExampleWorkbook.write(out);
    }
    return file;
  }

  @Test
  void theBlankTemplateReadBackSaysWhatToFillIn() throws IOException {
    Outcome<TestLog> outcome = WorkbookLog.read(blank(), "blank.xlsx");
    assertThat(outcome.hasErrors()).isTrue();
    assertThat(outcome.findings())
        .extracting(finding -> finding.code() + " " + finding.where())
        .contains(
            "LOG-EMPTY-SHEET blank.xlsx, sheet Load points",
            "LOG-EMPTY-SHEET blank.xlsx, sheet Gauges");
    assertThat(outcome.findings()).extracting(Finding::code).doesNotContain("DOC-UNKNOWN-KEY");
  }

  @Test
  void theExampleReadsAndReducesAsItStands() throws IOException {
    Outcome<TestLog> outcome = WorkbookLog.read(example(), "example.xlsx");
    assertThat(outcome.findings()).isEmpty();
    Reduction reduction =
        Reducer.reduce(new ReductionProblem("as tested", outcome.orRefuse(), Places.STATED))
            .orRefuse();
    assertThat(reduction.findings()).isEmpty();
    assertThat(reduction.runs()).hasSize(6).allMatch(r -> r.verdict() == RunVerdict.ACCEPT);
    assertThat(reduction.reciprocity().pairs()).hasSize(1);
  }

  @Test
  void theTemplatesInTheRepositoryAreTheOnesTheProgramWrites() throws IOException {
    assertThat(cells(Path.of("templates/load-test-log.xlsx"))).isEqualTo(cells(blank()));
    assertThat(cells(Path.of("templates/example-log.xlsx"))).isEqualTo(cells(example()));
    for (String name : List.of("frame-model.json", "study.json")) {
      assertThat(Path.of("templates", name))
          .hasSameTextualContentAs(Path.of("src/main/resources/templates", name));
    }
  }

  private static List<String> cells(Path file) {
    List<String> cells = new ArrayList<>();
    try (SheetFile workbook = WorkbookFile.open(file, "file").orRefuse()) {
      workbook
          .sheets()
          .forEach(
              sheet ->
                  sheet.forEachRow(
                      row -> {
                        for (int c = 0; c < row.width(); c++) {
                          cells.add(row.where(c) + " " + row.text(c));
                        }
                        return true;
                      }));
    }
    return cells;
  }
}
