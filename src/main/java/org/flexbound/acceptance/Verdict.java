package org.flexbound.acceptance;

/** What comes of a limit. */
public enum Verdict {
  /** The true value lies within the limit, with a probability of being wrong below the stated one. */
  PASS,
  /** The true value lies beyond the limit, with a probability of being wrong below the stated one. */
  FAIL,
  /** Neither can be said from this test. */
  UNDECIDED
}
