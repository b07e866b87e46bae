package org.flexbound.app;

import java.nio.file.Path;

/** Writes the files to start from. */
final class Templates {
  private final Terminal terminal;

  Templates(Terminal terminal) {
    this.terminal = terminal;
  }

  ExitCode write(Path folder) {
    terminal.err().println("flexbound: templates for " + folder + " are not supported yet");
    return ExitCode.COMMAND_LINE;
  }
}
