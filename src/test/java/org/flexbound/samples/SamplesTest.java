package org.flexbound.samples;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Path;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Severity;
import org.flexbound.frame.FrameReader;
import org.flexbound.testlog.TestLog;
import org.flexbound.testlog.WorkbookLog;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The samples are what their generators make, and the program's readers accept them. */
class SamplesTest {
  @TempDir Path folder;

  @Test
  void theGeneratorMakesTheGantrysLogAgainValueForValue() throws IOException {
    Path again = folder.resolve("again.xlsx");
    SignGantry.write(again);
    assertThat(SampleWorkbook.content(again))
        .isEqualTo(SampleWorkbook.content(SignGantry.FOLDER.resolve(SignGantry.LOG)));
  }

  @Test
  void theGeneratorMakesTheLoadCellRecordAgainValueForValue() throws IOException {
    Path again = folder.resolve("again.xlsx");
    LoadCellRecord.write(again);
    assertThat(SampleWorkbook.content(again))
        .isEqualTo(SampleWorkbook.content(LoadCellRecord.FOLDER.resolve(LoadCellRecord.LOG)));
  }

  @Test
  void theGantrysLogIsReadWithTenGaugesThreeLoadsAndThreeRunsEach() {
    Outcome<TestLog> outcome =
        WorkbookLog.read(SignGantry.FOLDER.resolve(SignGantry.LOG), SignGantry.LOG);
    assertThat(outcome.findings()).filteredOn(f -> f.severity() != Severity.NOTE).isEmpty();
    TestLog log = outcome.orRefuse();
    assertThat(log.gauges()).hasSize(10);
    assertThat(log.loads()).extracting("name").containsExactly("pull arm down", "pull arm side", "pull knee side");
    assertThat(log.runs()).hasSize(9);
    assertThat(log.runs().get(4).loads()).extracting("name").containsExactly("pull arm side");
  }

  @Test
  void theGantrysModelIsReadWithoutFindings() {
    assertThat(FrameReader.read(SignGantry.FOLDER.resolve("model.json"), "model.json").findings())
        .isEmpty();
  }
}
