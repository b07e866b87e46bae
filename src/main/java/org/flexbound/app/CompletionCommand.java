package org.flexbound.app;

import java.util.concurrent.Callable;
import picocli.AutoComplete;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Spec;

/** Prints the script that completes the program's words in a shell. */
@Command(
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    description = {
      "Prints a script that lets bash and zsh complete the words of flexbound.",
      "",
      "  source <(flexbound completion)"
    })
final class CompletionCommand implements Callable<Integer> {
  private final Terminal terminal;

  @Spec
  @SuppressWarnings("NullAway.Init") // picocli sets it before call() is called
  private CommandSpec spec;

  CompletionCommand(Terminal terminal) {
    this.terminal = terminal;
  }

  @Override
  public Integer call() {
    terminal.out().print(AutoComplete.bash("flexbound", spec.root().commandLine()));
    return ExitCode.DONE.number();
  }
}
