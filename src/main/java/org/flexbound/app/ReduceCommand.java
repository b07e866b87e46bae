package org.flexbound.app;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;

@Command(
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    sortOptions = false,
    description = {"Reduces the readings of a load test to flexibility coefficients.", "", "LOG is a load-test workbook (.xlsx), or a description (.json) of the files of another program;",
      "flexbound template DIR writes one of each to start from."})
final class ReduceCommand implements Callable<Integer> {
  private final Terminal terminal;

  @Parameters(paramLabel = "LOG", description = "The file to work on.")
  @SuppressWarnings("NullAway.Init") // picocli sets it before call() is called
  private Path file;

  @Mixin private OutputOptions output = new OutputOptions();

  ReduceCommand(Terminal terminal) {
    this.terminal = terminal;
  }

  @Override
  public Integer call() {
    return new Work(terminal, output).reduce(file).number();
  }
}
