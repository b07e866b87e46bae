package org.flexbound.app;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.flexbound.acceptance.IndividualsChart;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Shows how a fixture changed over its tests. */
@Command(
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    sortOptions = false,
    description = {
      "Puts the results of many tests of one thing in order of their dates and says which"
          + " coefficients and parameters left their control limits, and when. Writes trend.json,"
          + " trend.html and trend.pdf.",
      "",
      "FOLDER holds results.json files, by any name ending in .json, or folders with a results.json"
          + " each."
    })
final class TrendCommand implements Callable<Integer> {
  private final Terminal terminal;

  @Spec
  @SuppressWarnings("NullAway.Init") // picocli sets it before call() is called
  private CommandSpec spec;

  @Parameters(paramLabel = "FOLDER", description = "The folder with the results.")
  @SuppressWarnings("NullAway.Init") // picocli sets it before call() is called
  private Path folder;

  @Option(
      names = "--baseline",
      paramLabel = "TESTS",
      defaultValue = "8",
      description =
          "How many of the first tests are the baseline (default: ${DEFAULT-VALUE}). With fewer than"
              + " eight the limits are those of a prediction interval.")
  private int baseline = IndividualsChart.LEAST_BASELINE;

  @Mixin private OutputOptions output = new OutputOptions();

  TrendCommand(Terminal terminal) {
    this.terminal = terminal;
  }

  @Override
  public Integer call() {
    if (baseline < 2) {
      throw new ParameterException(
          spec.commandLine(), "--baseline " + baseline + ": a baseline has two tests or more");
    }
    return new HistoryWork(terminal, output).trend(folder, baseline).number();
  }
}
