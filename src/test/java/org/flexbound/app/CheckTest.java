package org.flexbound.app;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.text.PDFTextStripper;
import org.flexbound.report.ResultsJson;
import org.flexbound.report.results.Results;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The command {@code check} as somebody would use it. */
class CheckTest {
  @TempDir Path folder;

  private final StringWriter out = new StringWriter();
  private final StringWriter err = new StringWriter();

  private int run(String... arguments) {
    return Flexbound.run(arguments, new PrintWriter(out), new PrintWriter(err));
  }

  /** A description of the example's readings with other limits. */
  private Path log(String limits) throws IOException {
    Path file = folder.resolve("log-description.json");
    Files.deleteIfExists(file);
    run("template", folder.toString());
    String text = Files.readString(file).stripTrailing();
    Files.writeString(
        file,
        text.substring(0, text.length() - 1) + ", \"limits\": [" + limits + "]}");
    return file;
  }

  private static String limit(String name, double upper) {
    return "{\"limit\": \""
        + name
        + "\", \"on\": \"coefficient\", \"gauge\": \"tip\", \"load\": \"tip down\", \"upper\": "
        + upper
        + ", \"unit\": \"mm/kN\"}";
  }

  private int check(Path log) {
    return run("check", log.toString(), "--out", folder.resolve("out").toString());
  }

  @Test
  void theExampleOfTheTemplatesPassesAndGetsACertificateOfOnePage() throws IOException {
    run("template", folder.toString());
    int code = check(folder.resolve("example-log.xlsx"));
    assertThat(code).as(err.toString()).isZero();
    assertThat(out.toString()).contains("Limits", "2 passed, 0 failed, 0 undecided");
    byte[] bytes = Files.readAllBytes(folder.resolve("out/certificate.pdf"));
    try (PDDocument pdf = Loader.loadPDF(bytes)) {
      assertThat(pdf.getNumberOfPages()).isEqualTo(1);
      assertThat(new PDFTextStripper().getText(pdf))
          .contains("Yes: all 2 limits are met", "C-17", "JCGM 106:2012", "no proof of strength");
    }
    Results results = ResultsJson.parse(Files.readAllBytes(folder.resolve("out/results.json")));
    assertThat(results.limits()).extracting("decision").containsExactly("pass", "pass");
    assertThat(results.limits().get(0).upper()).hasValue(12e-6);
  }

  @Test
  void aBrokenLimitEndsWithOneAndAnUndecidedOneWithFive() throws IOException {
    assertThat(check(log(limit("close", 11.54) + "," + limit("tight", 11)))).isEqualTo(1);
    assertThat(check(log(limit("close", 11.54)))).isEqualTo(5);
    assertThat(out.toString()).contains("cannot decide with this test");
  }

  @Test
  void aLogWithoutLimitsIsRefusedAndNothingIsWritten() throws IOException {
    assertThat(check(log(""))).isEqualTo(3);
    assertThat(err.toString()).contains("ACCEPT-NO-LIMITS");
    assertThat(folder.resolve("out")).doesNotExist();
  }
}
