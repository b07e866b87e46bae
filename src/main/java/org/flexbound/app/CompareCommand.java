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
    description = {"Reduces the test that a study names and compares it with the model.", "", "STUDY is a JSON file that names model and log (flexbound template DIR makes one)."})
final class CompareCommand implements Callable<Integer> {
  private final Terminal terminal;

  @Parameters(paramLabel = "STUDY", description = "The file to work on.")
  @SuppressWarnings("NullAway.Init") // picocli sets it before call() is called
  private Path file;

  @Mixin private OutputOptions output = new OutputOptions();

  CompareCommand(Terminal terminal) {
    this.terminal = terminal;
  }

  @Override
  public Integer call() {
    return new Work(terminal, output).compare(file).number();
  }
}
