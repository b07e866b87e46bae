package org.flexbound.reduce;

/** What may be done with a run. */
public enum RunVerdict {
  /** Nothing speaks against it. */
  ACCEPT("every figure is within its limit and no fault was found"),
  /** Usable, but somebody must look at the reasons. */
  DOUBTFUL("a figure is over its limit, or a column shows a fault that leaves it usable: look at it before it is used"),
  /** Not usable as it is: repeat it. */
  REPEAT("a figure is over three times its limit, a column is not usable, or nothing could be fitted: repeat the run");

  private final String rule;

  RunVerdict(String rule) {
    this.rule = rule;
  }

  /**
   * When the verdict is given (common practice, no source).
   *
   * @return the rule in words
   */
  public String rule() {
    return rule;
  }
}
