package org.flexbound.app;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

@Command(
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    sortOptions = false,
    description = {"Reduces the test that a study names, compares it with the model, and finds the smallest change of the parameters within their bounds that makes the model agree.", "", "STUDY is a JSON file that names model, log and parameters (flexbound template DIR makes one)."})
final class UpdateCommand implements Callable<Integer> {
  private final Terminal terminal;

  @Parameters(paramLabel = "STUDY", description = "The file to work on.")
  @SuppressWarnings("NullAway.Init") // picocli sets it before call() is called
  private Path file;

  @Option(
      names = "--before-test",
      description =
          "Say what each parameter would get from the planned gauges, loads and stated "
              + "uncertainties, before any reading exists: the log needs no readings.")
  private boolean beforeTest;

  @Mixin private OutputOptions output = new OutputOptions();

  UpdateCommand(Terminal terminal) {
    this.terminal = terminal;
  }

  @Override
  public Integer call() {
    Work work = new Work(terminal, output);
    return (beforeTest ? work.beforeTest(file) : work.update(file)).number();
  }
}
