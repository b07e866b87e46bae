package org.flexbound.finding;

import com.google.errorprone.annotations.Immutable;

/**
 * One kind of finding of the catalogue: each room lists its own as an enum that implements this.
 *
 * <p>The code is stable across versions: files and scripts may rely on it.
 */
public interface FindingKind {
  /**
   * What an enum of a room says of one of its constants.
   *
   * @param code the stable code, upper case with hyphens, e.g. {@code LOG-UNKNOWN-UNIT}
   * @param severity how much every finding of the kind weighs
   * @param meaning what the kind is about, as one plain sentence for the catalogue
   * @param remedy what the user should do, in the imperative
   */
  @Immutable
  record Definition(String code, Severity severity, String meaning, String remedy) {}

  /**
   * What the room's enum says of this kind.
   *
   * @return the definition
   */
  Definition definition();

  /**
   * The stable code.
   *
   * @return the code
   */
  default String code() {
    return definition().code();
  }

  /**
   * How much every finding of this kind weighs.
   *
   * @return the severity
   */
  default Severity severity() {
    return definition().severity();
  }

  /**
   * What the kind is about, as one plain sentence for the catalogue.
   *
   * @return the meaning
   */
  default String meaning() {
    return definition().meaning();
  }

  /**
   * What the user should do, in the imperative.
   *
   * @return the remedy
   */
  default String remedy() {
    return definition().remedy();
  }
}
