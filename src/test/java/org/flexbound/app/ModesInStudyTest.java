package org.flexbound.app;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

/** A study that compares with the lowest modes, and with a table of measured ones. */
class ModesInStudyTest {
  @TempDir Path folder;
  private final StringWriter out = new StringWriter();
  private final StringWriter err = new StringWriter();

  private int run(String... words) {
    return Flexbound.run(words, new PrintWriter(out, true), new PrintWriter(err, true));
  }

  @BeforeEach
  void template() throws Exception {
    assertThat(run("template", folder.toString())).isZero();
    replace("frame-model.json", "\"nu\": 0.3", "\"nu\": 0.3, \"density\": \"7850 kg/m3\"");
  }

  private void replace(String file, String from, String to) throws Exception {
    String text = Files.readString(folder.resolve(file));
    assertThat(text).contains(from);
    Files.writeString(folder.resolve(file), text.replace(from, to));
  }

  private JsonNode results(String command) throws Exception {
    Path results = folder.resolve("out-" + command);
    assertThat(run(command, folder.resolve("study.json").toString(), "--out", results.toString()))
        .as("%s%s", out, err)
        .isIn(0, 5);
    return JsonMapper.shared().readTree(Files.readString(results.resolve("results.json")));
  }

  @Test
  void comparingWithTheLowestModesTellsWhatTruncationAloneExplains() throws Exception {
    JsonNode whole = results("compare");
    replace("study.json", "\"rule\": \"prior\"", "\"rule\": \"prior\", \"flexibility\": {\"modes\": 1}");
    JsonNode few = results("compare");
    boolean told = false;
    for (JsonNode finding : few.get("findings")) {
      told |= finding.get("code").asString().equals("COMPARE-TRUNCATION");
    }
    assertThat(told).isTrue();
    JsonNode comparison = few.get("comparison");
    assertThat(comparison.size()).isEqualTo(whole.get("comparison").size()).isPositive();
    for (int i = 0; i < comparison.size(); i++) {
      JsonNode c = comparison.get(i);
      double full = whole.get("comparison").get(i).get("computed").asDouble();
      assertThat(c.get("full").asDouble())
          .isCloseTo(full, org.assertj.core.api.Assertions.within(1e-8 * Math.abs(full)));
      assertThat(c.get("computed").asDouble()).isNotEqualTo(full);
      assertThat(c.get("modesWithin10").asInt()).isPositive();
      assertThat(c.get("modesWithin1").asInt())
          .isGreaterThanOrEqualTo(c.get("modesWithin5").asInt());
      assertThat(c.get("massless").asDouble()).isZero();
    }
    assertThat(whole.get("comparison").get(0).has("full")).isFalse();
  }

  @Test
  void anUpdateWithTheLowestModesRunsToItsEnd() throws Exception {
    replace("study.json", "\"rule\": \"prior\"", "\"rule\": \"prior\", \"flexibility\": {\"modes\": 2}");
    JsonNode updated = results("update");
    assertThat(updated.get("parameters").size()).isEqualTo(2);
    assertThat(updated.get("parameters").get(0).get("updated").asDouble()).isPositive();
  }

  @Test
  void aTableOfMeasuredModesIsAThirdSource() throws Exception {
    JsonNode plain = results("compare");
    StringBuilder header = new StringBuilder("Mode,Frequency [Hz]");
    StringBuilder row = new StringBuilder("1,20");
    for (String list : new String[] {"gauges", "loads"}) {
      for (JsonNode one : plain.get(list)) {
        header.append(',').append(one.get("name").asString());
        row.append(",0.5");
      }
    }
    Files.writeString(folder.resolve("modes.csv"), header + "\n" + row + "\n");
    replace("study.json", "\"rule\": \"prior\"", "\"rule\": \"prior\", \"measuredModes\": \"modes.csv\"");
    JsonNode with = results("compare");
    double w = 2 * Math.PI * 20;
    boolean any = false;
    for (JsonNode c : with.get("comparison")) {
      if (c.has("measuredModes")) {
        any = true;
        assertThat(c.get("measuredModes").asDouble())
            .isCloseTo(0.25 / (w * w), org.assertj.core.api.Assertions.within(1e-9));
      }
    }
    assertThat(any).isTrue();
  }
}
