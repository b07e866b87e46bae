package org.flexbound.app;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Parameters;

/** Writes a blank workbook and small files to start from. */
@Command(
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    sortOptions = false,
    description = {
      "Writes a blank load-test workbook, a small filled one, a small frame model and a study "
          + "that run as they stand. Files that are already there are not touched."
    })
final class TemplateCommand implements Callable<Integer> {
  private final Terminal terminal;

  @Parameters(paramLabel = "DIR", description = "The folder to write to.")
  @SuppressWarnings("NullAway.Init") // picocli sets it before call() is called
  private Path folder;

  TemplateCommand(Terminal terminal) {
    this.terminal = terminal;
  }

  @Override
  public Integer call() {
    return new Templates(terminal).write(folder).number();
  }
}
