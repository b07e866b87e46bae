package org.flexbound.app;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;

/** Compares a test with an earlier one. */
@Command(
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    sortOptions = false,
    description = {
      "Reduces a test and holds it against the results of an earlier one: which coefficients changed"
          + " beyond chance, with the error of a shared calibration cancelling. With a study, also"
          + " which parameters' change explains it with the fewest parameters. Limits, where the log"
          + " states any, are judged as well.",
      "",
      "BASELINE is the results.json of the earlier test."
    })
final class RecheckCommand implements Callable<Integer> {
  private final Terminal terminal;

  @Parameters(index = "0", paramLabel = "BASELINE", description = "The earlier results.json.")
  @SuppressWarnings("NullAway.Init") // picocli sets it before call() is called
  private Path baseline;

  @Parameters(index = "1", paramLabel = "LOG|STUDY", description = "The file of this test.")
  @SuppressWarnings("NullAway.Init") // picocli sets it before call() is called
  private Path file;

  @Mixin private OutputOptions output = new OutputOptions();

  RecheckCommand(Terminal terminal) {
    this.terminal = terminal;
  }

  @Override
  public Integer call() {
    return new Work(terminal, output).recheck(baseline, file).number();
  }
}
