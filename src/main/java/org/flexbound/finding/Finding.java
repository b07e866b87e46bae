package org.flexbound.finding;

/**
 * Something the user should know, tied to its place.
 *
 * @param kind what kind of finding this is: code, severity, remedy
 * @param where the place it speaks of
 * @param message one sentence that says what was found and what was expected, without the place
 */
public record Finding(FindingKind kind, Where where, String message) {
  /**
   * How much it weighs.
   *
   * @return the severity of its kind
   */
  public Severity severity() {
    return kind.severity();
  }

  /**
   * The stable code of its kind.
   *
   * @return the code
   */
  public String code() {
    return kind.code();
  }

  /** One line: severity, place, message, remedy, code. */
  @Override
  public String toString() {
    String place = where.toString();
    return kind.severity()
        + " "
        + (place.isEmpty() ? "" : place + ": ")
        + message
        + " "
        + kind.remedy()
        + " ["
        + kind.code()
        + "]";
  }
}
