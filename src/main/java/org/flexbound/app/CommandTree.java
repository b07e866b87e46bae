package org.flexbound.app;

import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** Puts the commands together. */
final class CommandTree {
  private CommandTree() {}

  /** The whole command line, printing to a terminal. */
  static CommandLine make(Terminal terminal) {
    CommandLine root = new CommandLine(new Root());
    root.addSubcommand("reduce", new ReduceCommand(terminal))
        .addSubcommand("compare", new CompareCommand(terminal))
        .addSubcommand("update", new UpdateCommand(terminal))
        .addSubcommand("check", new CheckCommand(terminal))
        .addSubcommand("recheck", new RecheckCommand(terminal))
        .addSubcommand("trend", new TrendCommand(terminal))
        .addSubcommand("template", new TemplateCommand(terminal))
        .addSubcommand("convert", new ConvertCommand(terminal))
        .addSubcommand("completion", new CompletionCommand(terminal));
    return root;
  }

  @Command(
      name = "flexbound",
      mixinStandardHelpOptions = true,
      versionProvider = Version.class,
      sortOptions = false,
      synopsisSubcommandLabel = "COMMAND",
      description = {
        "",
        "Turns the readings of a static load test into flexibility coefficients with their "
            + "uncertainties, says whether the test can be trusted, compares it with a frame "
            + "model, and finds the smallest change of joint and section stiffnesses that makes "
            + "the model agree, with what the data cannot tell.",
        ""
      },
      commandListHeading = "%nCommands:%n",
      footer = {
        "",
        "First steps:",
        "  flexbound template my-test           a blank workbook, a small example to run",
        "  flexbound reduce my-test/log.xlsx    coefficients from the readings alone",
        "  flexbound update my-test/study.json  the model made to agree, with a report",
        "",
        "Exit codes:",
        "  0  done",
        "  1  an acceptance limit failed",
        "  2  the command line is wrong",
        "  3  input refused: its content, or a file that it names is missing",
        "  4  a fault of the program",
        "  5  done, but undecided, not converged, misfits even at best or not validated",
        "  6  the system would not let the program read or write",
        "Where several apply, the first of 6, 4, 2, 3, 1, 5, 0."
      })
  private static final class Root implements Runnable {
    @Spec
    @SuppressWarnings("NullAway.Init") // picocli sets it before run() is called
    private CommandSpec spec;

    @Override
    public void run() {
      throw new ParameterException(spec.commandLine(), "no command given");
    }
  }
}
