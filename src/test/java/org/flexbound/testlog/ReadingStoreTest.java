package org.flexbound.testlog;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;
import java.util.Random;
import java.util.Set;
import org.flexbound.document.CsvFile;
import org.flexbound.document.CsvLayout;
import org.flexbound.document.ReadLimits;
import org.flexbound.document.Sheet;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Unit;
import org.flexbound.quantity.Units;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Readings made into numbers once, and shown as often as somebody asks. */
class ReadingStoreTest {
  @TempDir Path folder;

  private static ReadingColumns.Column column(String name, int index, String unit) {
    return new ReadingColumns.Column(
        new ReadingsSheet.HeaderCell(name, index, unit, Where.nowhere(), Where.nowhere()),
        Units.known(unit));
  }

  private static ReadingColumns columns() {
    return new ReadingColumns(
        List.of(column("F", 1, "kN")),
        List.of(column("D1", 2, "mm"), column("D2", 3, "mm")),
        0,
        new Unit("s", org.flexbound.quantity.Dimension.TIME, 1, 0),
        4,
        5,
        6);
  }

  private Sheet sheet(String text) throws IOException {
    Path file = Files.writeString(folder.resolve("log.csv"), text, StandardCharsets.UTF_8);
    return CsvFile.open(file, "log.csv", CsvLayout.FOUND_BY_ITSELF, ReadLimits.USUAL)
        .orRefuse()
        .sheets()
        .get(0);
  }

  private static ReadingPass read(
      Sheet sheet, ReadingsLayout layout, ReadingMemory memory, Findings findings) {
    return ReadingPass.read(
        sheet, layout, 2, Integer.MAX_VALUE, columns(), memory, (file, share) -> {}, findings);
  }

  private static List<String> words(Readings readings) {
    List<String> words = new ArrayList<>();
    readings.forEach(
        r ->
            words.add(
                r.row() + " " + r.time() + " " + r.load(0) + " " + r.gauge(0) + " " + r.gauge(1)
                    + " <" + r.step() + "> " + r.use() + " <" + r.remark() + "> "
                    + r.whereGauge(1)));
    return words;
  }

  @Test
  void everythingThatARowSaysComesBackAsOftenAsItIsAskedFor() throws IOException {
    Findings findings = new Findings();
    ReadingStore store =
        read(
                sheet(
                    """
                    Time,F,D1,D2,Step,Use,Remark
                    0.5,1,2,,1,,
                    00:01:02.5,2,3,4,top,no,bumped
                    2026-03-02 12:00:00,3,4,5,top,yes,
                    ,,,,,,only a remark
                    later,4,OVL,5,2.5,,
                    """),
                ReadingsLayout.OPEN,
                new ReadingMemory(),
                findings)
            .readings();
    List<String> expected =
        List.of(
            "2 0.5 1000.0 0.002 NaN <1> true <> log.csv, cell D2, line 2",
            "3 62.5 2000.0 0.003 0.004 <top> false <bumped> log.csv, cell D3, line 3",
            "4 1.7724528E9 3000.0 0.004 0.005 <top> true <> log.csv, cell D4, line 4",
            "6 NaN 4000.0 NaN 0.005 <2.5> true <> log.csv, cell D6, line 6");
    assertThat(words(store)).isEqualTo(expected);
    assertThat(words(store)).isEqualTo(expected);
    assertThat(findings.list()).extracting(Finding::code)
        .containsExactly("LOG-NOT-A-NUMBER", "LOG-TIME-NOT-READ");
  }

  @Test
  void aFileTakesWhatMemoryMayNotHoldAndGivesTheSameBack() throws IOException {
    StringBuilder text = new StringBuilder("Time,F,D1,D2,Step,Use,Remark\n");
    Random random = new Random(5);
    for (int row = 0; row < 20_000; row++) {
      text.append(row).append(',').append(random.nextInt(1000)).append(",1.").append(row).append(",,")
          .append(row / 500).append(",,").append(row % 7 == 0 ? "seventh" : "").append('\n');
    }
    Sheet sheet = sheet(text.toString());
    Findings findings = new Findings();
    Readings inMemory =
        read(sheet, ReadingsLayout.OPEN, new ReadingMemory(), findings).readings();
    Readings inFile =
        read(sheet, ReadingsLayout.OPEN, new ReadingMemory(100_000), findings).readings();
    assertThat(words(inFile)).hasSize(20_000).isEqualTo(words(inMemory)).isEqualTo(words(inFile));
  }

  @Test
  void rowsOutsideTheStatedOnesAndTextsForAMissingReadingDoNotCount() throws IOException {
    ReadingsLayout layout =
        new ReadingsLayout(
            OptionalInt.empty(),
            OptionalInt.empty(),
            OptionalInt.empty(),
            OptionalInt.empty(),
            List.of(),
            java.util.Map.of(),
            java.util.Map.of(),
            Set.of("ovl", "-9999"),
            Where.nowhere());
    Findings findings = new Findings();
    ReadingPass pass =
        read(sheet("Time,F,D1,D2\n0,OVL,-9999,OVL\n1,1,2,3\n"), layout, new ReadingMemory(), findings);
    assertThat(pass.usable()).isEqualTo(1);
    assertThat(findings.list()).extracting(Finding::code)
        .containsOnly("LOG-READINGS-MISSING").hasSize(3);
  }
}
