package org.flexbound.app;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ConvertCommandTest {
  @TempDir Path folder;
  private final StringWriter out = new StringWriter();
  private final StringWriter err = new StringWriter();

  private int run(String... words) {
    return Flexbound.run(words, new PrintWriter(out, true), new PrintWriter(err, true));
  }

  @Test
  void theTemplateModelGoesToAWorkbookAndBackAndAStudyTakesTheWorkbook() throws Exception {
    Path work = folder.resolve("work");
    assertThat(run("template", work.toString())).isZero();
    Path json = work.resolve("frame-model.json");
    Path workbook = work.resolve("frame-model.xlsx");
    assertThat(run("convert", json.toString())).isZero();
    assertThat(out.toString()).contains("frame-model.xlsx written");
    assertThat(workbook).exists();
    Path back = folder.resolve("back");
    assertThat(run("convert", workbook.toString(), "--out", back.toString())).isZero();
    assertThat(back.resolve("frame-model.json")).exists();
    String study = Files.readString(work.resolve("study.json"));
    assertThat(study).contains("frame-model.json");
    Files.writeString(
        work.resolve("study2.json"), study.replace("frame-model.json", "frame-model.xlsx"));
    Path one = folder.resolve("one");
    Path two = folder.resolve("two");
    assertThat(run("compare", work.resolve("study.json").toString(), "--out", one.toString()))
        .isZero();
    assertThat(run("compare", work.resolve("study2.json").toString(), "--out", two.toString()))
        .as(err.toString())
        .isZero();
    assertThat(comparison(two)).isEqualTo(comparison(one));
  }

  /** The part of results.json that the model makes. */
  private static String comparison(Path results) throws Exception {
    String text = Files.readString(results.resolve("results.json"));
    return text.substring(text.indexOf("\"comparison\""), text.indexOf("\"parameters\""));
  }

  @Test
  void aFileThatIsThereAlreadyIsNotTouched() throws Exception {
    Path work = folder.resolve("work");
    run("template", work.toString());
    Path workbook = work.resolve("frame-model.xlsx");
    Files.writeString(workbook, "mine");
    assertThat(run("convert", work.resolve("frame-model.json").toString())).isEqualTo(2);
    assertThat(err.toString()).contains("frame-model.xlsx is there already");
    assertThat(Files.readString(workbook)).isEqualTo("mine");
  }

  @Test
  void aWorkbookThatIsNoneIsRefusedWithoutATrace() throws Exception {
    Path file = folder.resolve("model.xlsx");
    Files.writeString(file, "{}");
    assertThat(run("convert", file.toString())).isEqualTo(3);
    assertThat(err.toString()).contains("Refused").doesNotContain("Exception");
  }
}
