package org.flexbound.app;

import org.flexbound.report.Program;
import picocli.CommandLine.IVersionProvider;

/** The program's version, for {@code --version}. */
final class Version implements IVersionProvider {
  /** The version's number. */
  static final String NUMBER = Program.VERSION;

  @Override
  public String[] getVersion() {
    return new String[] {"flexbound " + NUMBER};
  }
}
