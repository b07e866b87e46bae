package org.flexbound.app;

import java.nio.file.Path;
import java.util.Objects;

/** The steps of the commands that read a test. */
final class Work {
  private final Terminal terminal;
  private final OutputOptions output;

  Work(Terminal terminal, OutputOptions output) {
    this.terminal = terminal;
    this.output = output;
  }

  ExitCode reduce(Path log) {
    return refuse(log);
  }

  ExitCode compare(Path study) {
    return refuse(study);
  }

  ExitCode update(Path study) {
    return refuse(study);
  }

  private ExitCode refuse(Path file) {
    Objects.requireNonNull(output.folder);
    terminal.err().println("flexbound: reading " + file + " is not supported yet");
    return ExitCode.COMMAND_LINE;
  }
}
