package org.flexbound.app;

import java.util.concurrent.Callable;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

/** A command that is part of the plan and not made yet: refused, never ignored. */
@Command(mixinStandardHelpOptions = true, versionProvider = Version.class)
final class LaterCommand implements Callable<Integer> {
  private final String purpose;

  @Spec
  @SuppressWarnings("NullAway.Init") // picocli sets it before call() is called
  private CommandSpec spec;

  private LaterCommand(String purpose) {
    this.purpose = purpose;
  }

  /** The command, taking any words: the answer is then "not supported yet" whatever they are. */
  static CommandLine make(String purpose) {
    CommandLine line = new CommandLine(new LaterCommand(purpose));
    line.setUnmatchedArgumentsAllowed(true);
    line.getCommandSpec().usageMessage().description("Not supported yet: will " + purpose + ".");
    return line;
  }

  @Override
  public Integer call() {
    throw new ParameterException(
        spec.commandLine(),
        "the command '" + spec.name() + "' (to " + purpose + ") is not supported yet");
  }
}
