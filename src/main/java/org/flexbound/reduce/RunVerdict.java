package org.flexbound.reduce;

/** What may be done with a run. */
public enum RunVerdict {
  /** Nothing speaks against it. */
  ACCEPT,
  /** Usable, but somebody must look at the reasons. */
  DOUBTFUL,
  /** Not usable as it is: repeat it. */
  REPEAT
}
