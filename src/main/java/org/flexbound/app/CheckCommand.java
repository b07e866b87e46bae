package org.flexbound.app;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;

/** Judges a test against its acceptance limits. */
@Command(
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    sortOptions = false,
    description = {
      "Reduces a test and judges it against its acceptance limits: pass, fail, or cannot decide, with"
          + " the probability of being wrong and what would settle it. Writes the report and a"
          + " certificate of one page.",
      "",
      "LOG is a load-test log with a sheet Limits; STUDY is a JSON file that names model and log, for"
          + " limits on the agreement with the model.",
      "",
      "Ends with 1 where a limit fails, with 5 where one cannot be decided."
    })
final class CheckCommand implements Callable<Integer> {
  private final Terminal terminal;

  @Parameters(paramLabel = "LOG|STUDY", description = "The file to work on.")
  @SuppressWarnings("NullAway.Init") // picocli sets it before call() is called
  private Path file;

  @Mixin private OutputOptions output = new OutputOptions();

  CheckCommand(Terminal terminal) {
    this.terminal = terminal;
  }

  @Override
  public Integer call() {
    return new Work(terminal, output).check(file).number();
  }
}
