package org.flexbound.study;

/** What kind of computed flexibility is held against the measured one. */
public sealed interface FlexibilityChoice {
  /** The whole static flexibility. */
  record Full() implements FlexibilityChoice {}

  /**
   * The flexibility of the lowest modes only.
   *
   * @param modes how many modes, at least 1
   */
  record Truncated(int modes) implements FlexibilityChoice {}
}
