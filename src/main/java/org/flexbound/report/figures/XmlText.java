package org.flexbound.report.figures;

/** Text that may stand in XML. */
public final class XmlText {
  private XmlText() {}

  /**
   * Replaces what XML 1.0 does not allow, whatever the escaping, by the replacement character.
   *
   * @param text any text
   * @return text of characters that XML 1.0 allows
   */
  public static String clean(String text) {
    StringBuilder result = new StringBuilder(text.length());
    text.codePoints()
        .map(point -> allowed(point) ? point : 0xFFFD)
        .forEach(result::appendCodePoint);
    return result.toString();
  }

  private static boolean allowed(int point) {
    return point == '\t'
        || point == '\n'
        || point == '\r'
        || (point >= 0x20 && point <= 0xD7FF)
        || (point >= 0xE000 && point <= 0xFFFD)
        || point >= 0x10000;
  }
}
