package org.flexbound.flexibility;

import java.util.List;

/**
 * What a wrong matrix looks like: a guess with its evidence, never applied.
 *
 * @param kind what it looks like
 * @param gauges indices of the gauges concerned; where there are several of a kind other than
 *     exchanged columns, the data cannot tell which of them
 * @param looksLike what it looks like, as the end of a sentence that begins with "looks like"
 * @param because the evidence, as the end of a sentence that goes on with "because"
 * @param before the misfit as measured: sum of z² of what should agree
 * @param after the same, had the guess been put right
 */
public record Hint(
    Kind kind,
    List<Integer> gauges,
    String looksLike,
    String because,
    double before,
    double after) {
  /** Copies the list. */
  public Hint {
    gauges = List.copyOf(gauges);
  }

  /** What a wrong matrix can look like. */
  public enum Kind {
    /** A gauge (or load) reads the other way. */
    REVERSED,
    /** Two columns are exchanged. */
    EXCHANGED,
    /** A factor between units. */
    UNIT,
    /** A gauge sits, or was entered, elsewhere. */
    PLACE,
    /** A load acted off its line. */
    OFF_LINE
  }

  /**
   * The whole sentence.
   *
   * @return "looks like … because …"
   */
  public String sentence() {
    return "looks like " + looksLike + ", because " + because;
  }
}
