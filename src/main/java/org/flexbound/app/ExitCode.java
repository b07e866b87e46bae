package org.flexbound.app;

import java.util.Collection;
import java.util.Comparator;

/** How a command ended, as the number that the shell sees. */
public enum ExitCode {
  /** The system would not let the program read or write. */
  SYSTEM(6),
  /** A fault of the program. */
  FAULT(4),
  /** The command line is wrong. */
  COMMAND_LINE(2),
  /** Input refused: its content, or a file it names is missing. */
  REFUSED(3),
  /** An acceptance limit failed. */
  LIMIT_FAILED(1),
  /** Done, but undecided, not converged, misfits even at best, or not validated. */
  UNDECIDED(5),
  /** Done. */
  DONE(0);

  private final int number;

  ExitCode(int number) {
    this.number = number;
  }

  /**
   * The number that the shell sees.
   *
   * @return 0 to 6
   */
  public int number() {
    return number;
  }

  /**
   * The one that counts where several apply: the first in the order in which they are declared.
   *
   * @param codes all that apply
   * @return the one that takes precedence; done, where none applies
   */
  public static ExitCode of(Collection<ExitCode> codes) {
    return codes.stream().min(Comparator.naturalOrder()).orElse(DONE);
  }
}
