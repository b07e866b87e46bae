package org.flexbound.app;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.PrintWriter;
import java.io.StringWriter;
import org.junit.jupiter.api.Test;

class ProgressBarTest {
  private final StringWriter err = new StringWriter();
  private long now;

  @Test
  void aBarIsShownOnlyAfterASecondAndTakenAwayAtTheEnd() {
    ProgressBar bar = new ProgressBar(new PrintWriter(err), () -> now);
    now = 900_000_000L;
    bar.read("log.csv", 0.4);
    assertThat(err.toString()).isEmpty();
    now = 1_100_000_000L;
    bar.read("log.csv", 0.5);
    String line = "\rreading log.csv [" + "#".repeat(15) + " ".repeat(15) + "]  50 %";
    assertThat(err.toString()).isEqualTo(line);
    now += 50_000_000L;
    bar.read("log.csv", 0.51);
    assertThat(err.toString()).isEqualTo(line);
    bar.end();
    assertThat(err.toString()).isEqualTo(line + "\r" + " ".repeat(line.length() - 1) + "\r");
  }

  @Test
  void nothingIsShownWhereNobodyLooks() {
    Terminal piped = new Terminal(new PrintWriter(err), new PrintWriter(err));
    String word =
        piped.withProgress(
            progress -> {
              progress.read("log.csv", 0.5);
              return "done";
            });
    assertThat(word).isEqualTo("done");
    assertThat(err.toString()).isEmpty();
  }
}
