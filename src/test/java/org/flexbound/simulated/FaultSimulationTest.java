package org.flexbound.simulated;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/** Faults put into simulated tests are found, and named as what they are. */
class FaultSimulationTest {
  private static final int LONG = Integer.getInteger("faults", 100);

  /** The same wrong unit of every load scales everything alike: nothing in a log shows it. */
  private static final String UNSEEN = "load in kgf for N (9.807)";

  @Test
  void everyLargeFaultIsFoundAndMostAreNamed() {
    FaultTable table = FaultTable.of(LogFault.all(), 2, 1);
    int found = 0;
    int named = 0;
    for (FaultTable.Row row : table.rows()) {
      assertThat(row.tests).as(row.fault).isEqualTo(1);
      if (row.fault.equals(UNSEEN)) {
        assertThat(row.found).isZero();
      }
      found += row.found;
      named += row.named;
    }
    // of 20 that can be seen, each once; the long form of this test has the shares
    assertThat(found).isGreaterThanOrEqualTo(16);
    assertThat(named).isGreaterThanOrEqualTo(10);
  }

  @Tag("long")
  @Test
  void theShareOfFaultsThatIsFoundAndNamed() throws IOException {
    FaultTable table = FaultTable.of(LogFault.all(), 0, LONG);
    assertThat(table.rows()).hasSize(3 * LogFault.all().size());
    Files.writeString(Path.of("target", "fault-table.md"), table.markdown());
    for (FaultTable.Row row : table.rows()) {
      boolean smallest = row.size.equals(sizesOf(row.fault).get(0));
      if (!row.fault.equals(UNSEEN) && !smallest) {
        assertThat(row.foundShare()).as(row.fault + ", " + row.size).isGreaterThan(0.2);
      }
    }
  }

  private static List<String> sizesOf(String fault) {
    return LogFault.all().stream()
        .filter(f -> f.name().equals(fault))
        .findFirst()
        .orElseThrow()
        .sizes();
  }
}
