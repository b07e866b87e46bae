package org.flexbound.setup;

/** What becomes of the first load cycle of a run. */
public enum BeddingIn {
  /** Left out of the fit where the run has other cycles. */
  LEAVE_OUT_WHERE_OTHERS,
  /** Kept like any other. */
  KEEP
}
