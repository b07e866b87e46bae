package org.flexbound.report;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.charset.StandardCharsets;
import org.flexbound.report.results.Results;
import org.junit.jupiter.api.Test;

/** results.json, written and read back. */
class ResultsJsonTest {
  private static String text(Results results) {
    return new String(ResultsJson.bytes(results), StandardCharsets.UTF_8);
  }

  @Test
  void whatIsReadBackIsWhatWasWritten() {
    Results results = InventedResults.small();
    assertThat(ResultsJson.parse(ResultsJson.bytes(results))).isEqualTo(results);
  }

  @Test
  void theSameResultsGiveTheSameBytes() {
    assertThat(ResultsJson.bytes(InventedResults.small()))
        .isEqualTo(ResultsJson.bytes(InventedResults.small()));
  }

  @Test
  void fieldsStandInTheOrderOfTheRecordAndMissingOnesAreLeftOut() {
    String text = text(InventedResults.small());
    assertThat(text).startsWith("{\n  \"format\" : 1,\n  \"program\" : \"flexbound 0.1.0\"");
    assertThat(text).endsWith("}\n").doesNotContain("null").doesNotContain("\r");
    assertThat(text.indexOf("\"runs\"")).isLessThan(text.indexOf("\"coefficients\""));
  }

  @Test
  void fieldsOfALaterProgramArePassedOver() {
    String text =
        text(InventedResults.small()).replaceFirst("\\{", "{ \"fromTheFuture\" : [ 1, 2 ],");
    assertThat(ResultsJson.parse(text.getBytes(StandardCharsets.UTF_8)).format()).isEqualTo(1);
  }

  @Test
  void aLaterFormatIsRefusedWithWhatToDo() {
    byte[] bytes =
        text(InventedResults.small())
            .replaceFirst("\"format\" : 1", "\"format\" : 99")
            .getBytes(StandardCharsets.UTF_8);
    assertThatThrownBy(() -> ResultsJson.parse(bytes))
        .isExactlyInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("format 99")
        .hasMessageContaining("use the version of the program that wrote them");
  }

  @Test
  void whatIsNoResultsFileIsRefused() {
    assertThatThrownBy(() -> ResultsJson.parse("[1]".getBytes(StandardCharsets.UTF_8)))
        .isExactlyInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("not a results.json");
  }
}
