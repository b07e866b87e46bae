package org.flexbound.app;

import java.nio.file.Path;
import java.time.LocalTime;
import java.util.concurrent.Callable;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

@Command(
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    sortOptions = false,
    description = {
      "Reduces the readings of a load test to flexibility coefficients.",
      "",
      "LOG is a load-test workbook (.xlsx), or a description (.json) of the files of another program;",
      "flexbound template DIR writes one of each to start from."
    })
final class ReduceCommand implements Callable<Integer> {
  /** How long a save in progress may take before a file is tried again. */
  private static final long PAUSE_MILLISECONDS = 400;

  private final Terminal terminal;

  @Parameters(paramLabel = "LOG", description = "The file to work on.")
  @SuppressWarnings("NullAway.Init") // picocli sets it before call() is called
  private Path file;

  @Option(
      names = "--watch",
      description =
          "Reduce again whenever the log, or a file that it names, is saved; print the verdicts and"
              + " what changed. Ctrl-C ends it.")
  private boolean watch;

  @Mixin private OutputOptions output = new OutputOptions();

  ReduceCommand(Terminal terminal) {
    this.terminal = terminal;
  }

  @Override
  public Integer call() {
    Work work = new Work(terminal, output);
    return (watch ? watch(work) : work.reduce(file)).number();
  }

  private ExitCode watch(Work work) {
    try (FolderSaves saves = new FolderSaves(file.toAbsolutePath().normalize())) {
      CountDownLatch ended = new CountDownLatch(1);
      Thread stop = new Thread(() -> stop(saves, ended), "end of the watch");
      Runtime.getRuntime().addShutdownHook(stop);
      try {
        return new ReductionWatch(
                terminal, work, file, output, saves, LocalTime::now, ReduceCommand::pause)
            .run();
      } finally {
        ended.countDown();
      }
    }
  }

  /** On Ctrl-C: lets what is being written come to its end, and ends as done. */
  private void stop(FolderSaves saves, CountDownLatch ended) {
    saves.close();
    try {
      if (ended.await(30, TimeUnit.SECONDS)) {
        terminal.out().println();
        terminal.out().flush();
        Runtime.getRuntime().halt(ExitCode.DONE.number());
      }
    } catch (InterruptedException hurry) {
      Thread.currentThread().interrupt();
    }
  }

  private static void pause() {
    try {
      TimeUnit.MILLISECONDS.sleep(PAUSE_MILLISECONDS);
    } catch (InterruptedException stop) {
      Thread.currentThread().interrupt();
    }
  }
}
