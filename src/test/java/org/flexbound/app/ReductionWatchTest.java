package org.flexbound.app;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.time.LocalTime;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import java.util.Set;
import java.util.concurrent.TimeUnit;
import org.flexbound.testlog.WorkbookMaker;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;

/** A log that is reduced again at every save. */
class ReductionWatchTest {
  @TempDir Path folder;

  private final StringWriter out = new StringWriter();
  private final StringWriter err = new StringWriter();

  /** Saves that happen when the watch waits: each is an action on the files. */
  private static final class Scripted implements SaveEvents {
    private final Deque<Runnable> actions;
    private final List<Set<Path>> asked = new ArrayList<>();

    Scripted(List<Runnable> actions) {
      this.actions = new ArrayDeque<>(actions);
    }

    @Override
    public boolean await(Set<Path> files) {
      asked.add(files);
      if (actions.isEmpty()) {
        return false;
      }
      actions.remove().run();
      return true;
    }

    @Override
    public void close() {
      actions.clear();
    }
  }

  /** Two gauges under one jack, two runs of up and down. */
  private static WorkbookMaker log() {
    WorkbookMaker maker = new WorkbookMaker();
    maker.row("Load points", "Load", "Node", "Direction", "Column", "Unit", "X", "Y", "Z");
    maker.row("Load points", "tip down", "tip", "-z", "Jack", "kN", 1, 0, 0);
    maker.row("Gauges", "Gauge", "Node", "Direction", "Column", "Unit", "X", "Y", "Z");
    maker.row("Gauges", "tip", "tip", "-z", "D tip", "mm", 1, 0, 0);
    maker.row("Gauges", "mid", "mid", "-z", "D mid", "mm", 0.5, 0, 0);
    for (int run = 1; run <= 2; run++) {
      maker.row("Run " + run, "Jack", "D tip", "D mid");
      for (int k = 0; k <= 10; k++) {
        int load = k <= 5 ? k : 10 - k;
        double noise = 0.002 * Math.sin(7 * k + run);
        maker.row("Run " + run, load, 0.1 + 2 * load + noise, 0.2 + 0.7 * load - noise);
      }
    }
    return maker;
  }

  private ExitCode watch(Path file, Runnable pause, Runnable... saves) {
    return watch(file, pause, new Scripted(List.of(saves)));
  }

  private ExitCode watch(Path file, Runnable pause, Scripted saves) {
    Terminal terminal = new Terminal(new PrintWriter(out), new PrintWriter(err));
    OutputOptions output = new OutputOptions();
    output.folder = folder.resolve("out");
    ExitCode code =
        new ReductionWatch(
                terminal,
                new Work(terminal, output),
                file,
                output,
                saves,
                () -> LocalTime.of(12, 0),
                pause)
            .run();
    terminal.out().flush();
    terminal.err().flush();
    return code;
  }

  private static void noPause() {
    throw new AssertionError("nothing had to be tried again");
  }

  @Test
  void aSaveTellsWhichRunsCoefficientsAndFindingsChanged() {
    Path file = log().write(folder.resolve("log.xlsx"));
    ExitCode code =
        watch(
            file,
            ReductionWatchTest::noPause,
            () -> {
              WorkbookMaker changed = log();
              for (int k = 0; k <= 10; k++) {
                int load = k <= 5 ? k : 10 - k;
                changed.set("Run 2", k + 1, 1, 0.1 + 2 * load + (k > 5 ? 1.5 : 0));
              }
              changed.write(file);
            });
    assertThat(code).isEqualTo(ExitCode.DONE);
    assertThat(err.toString()).isEmpty();
    String text = out.toString();
    assertThat(text).contains("Watching log.xlsx; Ctrl-C ends.", "— 12:00:00 —");
    String second = text.substring(text.indexOf("— 12:00:00 —"));
    assertThat(second)
        .contains("Changed since the last time", "run Run 2: accept → ", "files written to")
        .contains("new: warning")
        .doesNotContain("coefficient mid under tip down:");
    assertThat(folder.resolve("out/results.json")).exists();
  }

  @Test
  void aSaveThatChangesNothingSaysSo() {
    Path file = log().write(folder.resolve("log.xlsx"));
    watch(file, ReductionWatchTest::noPause, () -> log().write(file));
    assertThat(out.toString()).contains("Nothing changed by more than its uncertainty.");
  }

  @Test
  void aHalfWrittenFileIsTriedAgainBeforeAnythingIsSaid() {
    Path file = log().write(folder.resolve("log.xlsx"));
    watch(
        file,
        () -> log().write(file),
        () -> {
          try {
            byte[] whole = Files.readAllBytes(file);
            Files.write(file, java.util.Arrays.copyOf(whole, whole.length / 2));
          } catch (IOException refused) {
            throw new UncheckedIOException(refused);
          }
        });
    assertThat(err.toString()).isEmpty();
    assertThat(out.toString()).contains("Nothing changed");
  }

  @Test
  void aRefusedLogIsToldAndTheWatchGoesOn() {
    Path file = log().set("Run 1", 3, 1, "broken").write(folder.resolve("log.xlsx"));
    ExitCode code = watch(file, ReductionWatchTest::noPause, () -> log().write(file));
    assertThat(err.toString()).contains("Refused", "'broken'", "cell B4");
    assertThat(out.toString()).contains("Runs", "accept");
    assertThat(code).isEqualTo(ExitCode.DONE);
  }

  @Test
  void theFilesOfADescriptionAreWatchedToo() throws IOException {
    Files.writeString(folder.resolve("run.csv"), "Jack;D\n0;0\n1;1\n2;2\n3;3\n", StandardCharsets.UTF_8);
    Path file = folder.resolve("log.json");
    Files.writeString(
        file,
        """
        {"loadPoints": [{"load": "P", "node": "a", "direction": "-z", "column": "Jack", "unit": "kN"}],
         "gauges": [{"gauge": "g", "node": "a", "direction": "-z", "column": "D", "unit": "mm"}],
         "readings": [{"file": "run.csv"}]}
        """,
        StandardCharsets.UTF_8);
    Scripted saves = new Scripted(List.of());
    watch(file, ReductionWatchTest::noPause, saves);
    assertThat(saves.asked)
        .containsExactly(Set.of(file.toAbsolutePath(), folder.resolve("run.csv").toAbsolutePath()));
  }

  @Test
  @Timeout(30)
  void aFileMovedIntoPlaceIsASaveAndALockFileBesideItIsNone() throws Exception {
    Path file = Files.writeString(folder.resolve("log.xlsx"), "1");
    try (FolderSaves saves = new FolderSaves(file)) {
      Thread saver =
          new Thread(
              () -> {
                try {
                  Files.writeString(folder.resolve("~$log.xlsx"), "lock");
                  TimeUnit.MILLISECONDS.sleep(100);
                  Path written = Files.writeString(folder.resolve("save.tmp"), "2");
                  Files.move(written, file, StandardCopyOption.REPLACE_EXISTING);
                } catch (IOException | InterruptedException stop) {
                  throw new IllegalStateException(stop);
                }
              });
      saver.start();
      assertThat(saves.await(Set.of(file))).isTrue();
      assertThat(file).hasContent("2");
      saver.join();
      Thread closer = new Thread(saves::close);
      closer.start();
      assertThat(saves.await(Set.of(file))).isFalse();
      closer.join();
    }
  }

  @Test
  @Tag("long")
  @Timeout(120)
  void aRealWatchEndsCleanlyWhenItIsToldToStop() throws Exception {
    Path file = log().write(folder.resolve("log.xlsx"));
    Path printed = folder.resolve("printed.txt");
    Process process =
        new ProcessBuilder(
                Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-cp",
                System.getProperty("java.class.path"),
                "org.flexbound.app.Flexbound",
                "reduce",
                "--watch",
                file.toString(),
                "--out",
                folder.resolve("out").toString())
            .redirectErrorStream(true)
            .redirectOutput(printed.toFile())
            .start();
    try {
      await(printed, "Ctrl-C ends");
      log().set("Run 1", 1, 1, 5.0).write(file);
      await(printed, "Changed since the last time");
      process.destroy();
      assertThat(process.waitFor(20, TimeUnit.SECONDS)).isTrue();
      assertThat(process.exitValue()).isZero();
      assertThat(folder.resolve("out/report.pdf")).exists();
    } finally {
      process.destroyForcibly();
    }
  }

  private static void await(Path printed, String text) throws Exception {
    while (!Files.exists(printed) || !Files.readString(printed).contains(text)) {
      TimeUnit.MILLISECONDS.sleep(100);
    }
  }
}
