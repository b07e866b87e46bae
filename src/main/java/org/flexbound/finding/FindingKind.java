package org.flexbound.finding;

/**
 * One kind of finding of the catalogue: each room lists its own as an enum that implements this.
 *
 * <p>The code is stable across versions: files and scripts may rely on it.
 */
public interface FindingKind {
  /**
   * The stable code, upper case with hyphens, e.g. {@code LOG-UNKNOWN-UNIT}.
   *
   * @return the code
   */
  String code();

  /**
   * How much every finding of this kind weighs.
   *
   * @return the severity
   */
  Severity severity();

  /**
   * What the kind is about, as one plain sentence for the catalogue.
   *
   * @return the meaning
   */
  String meaning();

  /**
   * What the user should do, in the imperative.
   *
   * @return the remedy
   */
  String remedy();
}
