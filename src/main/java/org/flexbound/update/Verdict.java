package org.flexbound.update;

/** How the update ended. */
public enum Verdict {
  /** A change within the bounds agrees with the data. */
  UPDATED("updated"),
  /** The nominal model already agrees with the data (rule discrepancy). */
  NO_CHANGE_WARRANTED("no change warranted"),
  /** Even the best fit within the bounds does not agree with the data. */
  MISFITS_EVEN_AT_BEST("misfits even at best"),
  /** The solver did not converge. */
  NOT_CONVERGED("not converged");

  private final String words;

  Verdict(String words) {
    this.words = words;
  }

  /**
   * The words for people.
   *
   * @return as in reports and results
   */
  public String words() {
    return words;
  }
}
