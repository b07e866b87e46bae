package org.flexbound.reduce;

/**
 * What a gauge shows at no load at the end of a run against its beginning.
 *
 * <p>A difference is drift only where it goes on at no load, or where the zeros of later cycles move on or come back; otherwise it is set: what
 * does not come back. Set belongs to the structure and drift to the measurement, so that the slope is corrected for drift and not for set; what
 * the other treatment would have made of the slope is carried as an uncertainty, because the evidence is seldom strong.
 *
 * @param kind what the difference is taken for
 * @param share closing less opening reading, share of the peak motion; NaN where there are not both zeros
 * @param otherSlope the slope under the other treatment; NaN where there is none
 */
public record ZeroReturn(Kind kind, double share, double otherSlope) {
  /** What a difference of zeros is. */
  public enum Kind {
    /** Opening or closing zero was not read. */
    NOT_READ,
    /** It does not come back after the load. */
    SET,
    /** It goes on at no load, or from cycle to cycle. */
    DRIFT
  }
}
