package org.flexbound.document;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Outcome;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class JsonFileTest {
  @TempDir Path folder;

  @Test
  void valuesKnowTheirPointerAndLine() {
    Json json =
        JsonFile.parse("\uFEFF{\n \"a/b\": [1, 2.5e3],\n \"c~\": {\"d\": null, \"e\": true}\n}", "m.json")
            .orRefuse();
    Json.Members top = (Json.Members) json;
    Json.Items items = (Json.Items) top.get("a/b").orElseThrow();
    assertThat(items.items().get(1)).isEqualTo(new Json.Numeral(items.items().get(1).where(), 2500));
    assertThat(items.items().get(1).where()).hasToString("m.json, /a~1b/1, line 2");
    Json.Members inner = (Json.Members) top.get("c~").orElseThrow();
    assertThat(inner.get("e").orElseThrow().where()).hasToString("m.json, /c~0/e, line 3");
    assertThat(inner.get("d")).get().isInstanceOf(Json.Nothing.class);
  }

  @Test
  void everyKeyThatStandsTwiceIsNamedInOneAnswer() {
    Outcome<Json> outcome =
        JsonFile.parse("{\"a\": 1,\n\"a\": 2,\n\"b\": {\"c\": 1,\n \"c\": 2}}", "m.json");
    assertThat(outcome.findings()).extracting(Finding::code)
        .containsExactly("DOC-DUPLICATE-KEY", "DOC-DUPLICATE-KEY");
    assertThat(outcome.findings().get(1).message())
        .isEqualTo("found the key 'c' a second time; it stands already at line 3");
    assertThat(outcome.findings().get(1).where()).hasToString("m.json, /b/c, line 4");
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "{\"a\": 1 // why               | found a comment",
        "{\"a\": [1, 2                  | the file ends in the middle of a value",
        "{\"a\": NaN}                   | found NaN or Infinity",
        "{\"a\": 1,}                    | expected a key in double quotes",
        "{\"a\": 1 \"b\": 2}            | expected a comma",
        "{\"a\": 01}                    | begins with 0",
        "{\"a\": 1} x                   | found",
        "{\"a\": 1} {\"b\": 2}          | found more text after the end of the value",
        "{a: 1}                         | expected a key in double quotes",
        "{\"a\": 1e999}                 | expected a number that 64 bits hold",
      })
  void whatIsNotJsonIsRefusedInPlainWords(String text, String words) {
    Outcome<Json> outcome = JsonFile.parse(text.strip(), "m.json");
    assertThat(outcome.hasErrors()).isTrue();
    assertThat(outcome.findings()).hasSize(1);
    assertThat(outcome.findings().get(0).message()).contains(words);
    assertThat(outcome.findings().get(0).where().line()).hasValue(1);
  }

  @Test
  void depthAndSizeAreLimitedByName() throws IOException {
    String deep = "[".repeat(200) + "]".repeat(200);
    assertThat(JsonFile.parse(deep, "m.json").findings()).extracting(Finding::message)
        .containsExactly("found more than the limit 'json-depth' = 100 lets through");
    Path file = Files.writeString(folder.resolve("m.json"), "{\"a\": \"text\"}");
    assertThat(
            JsonFile.read(file, "m.json", ReadLimits.USUAL.with("json-bytes", 5).orElseThrow())
                .findings())
        .extracting(Finding::message)
        .containsExactly("found more than the limit 'json-bytes' = 5 lets through");
  }

  private void refused(Path file, DocumentFinding kind, String words) {
    Outcome<Json> outcome = JsonFile.read(file, "m.json");
    assertThat(outcome.value()).isEmpty();
    assertThat(outcome.findings()).hasSize(1);
    assertThat(outcome.findings().get(0).kind()).isEqualTo(kind);
    assertThat(outcome.findings().get(0).message()).contains(words);
  }

  @Test
  void filesOfAnotherKindAreRefused() throws IOException {
    Path file = folder.resolve("m.json");
    refused(file, DocumentFinding.MISSING, "there is no such file; expected a JSON file");
    refused(folder, DocumentFinding.UNREADABLE, "found a folder");
    Files.write(file, new byte[0]);
    refused(file, DocumentFinding.UNREADABLE, "the file is empty");
    Files.writeString(file, " \n");
    refused(file, DocumentFinding.UNREADABLE, "nothing but blanks");
    Files.write(file, "{\"größe\": 1}".getBytes(StandardCharsets.ISO_8859_1));
    refused(file, DocumentFinding.UNREADABLE, "bytes that are not UTF-8");
    Files.write(file, new byte[] {'P', 'K', 3, 4});
    refused(file, DocumentFinding.UNREADABLE, "found a zip archive; expected a JSON file");
  }
}
