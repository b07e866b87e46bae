package org.flexbound.simulated;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import java.util.TreeMap;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Severity;
import org.flexbound.reduce.Reduction;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/** Random sound tests raise no warning, but for a few in a hundred. */
class CleanLogsTest {
  private static final int SHORT = 40;
  private static final int LONG = Integer.getInteger("logs", 1000);

  /** How many of the tests raise any warning; what they raise is counted by code. */
  private static int alarms(int tests, Map<String, Integer> codes) {
    int alarms = 0;
    for (int seed = 0; seed < tests; seed++) {
      Outcome<Reduction> outcome = new SimulatedTest(seed).reduce();
      boolean any = false;
      for (Finding finding : outcome.findings()) {
        if (finding.severity() != Severity.NOTE) {
          any = true;
          codes.merge(finding.code(), 1, Integer::sum);
        }
      }
      alarms += any ? 1 : 0;
    }
    return alarms;
  }

  @Test
  void fewOfFortySoundTestsRaiseAnyWarning() {
    Map<String, Integer> codes = new TreeMap<>();
    // at 5 % two are expected; more than five come by chance in one of seventy such runs
    assertThat(alarms(SHORT, codes)).as(codes.toString()).isLessThanOrEqualTo(5);
  }

  @Tag("long")
  @Test
  void atMostFiveInAHundredSoundTestsRaiseAnyWarning() throws IOException {
    Map<String, Integer> codes = new TreeMap<>();
    int alarms = alarms(LONG, codes);
    Files.writeString(
        Path.of("target", "clean-logs.md"),
        alarms + " of " + LONG + " sound tests raise any warning: " + codes + "\n");
    assertThat(alarms).as(codes.toString()).isLessThanOrEqualTo(LONG / 20);
  }
}
