package org.flexbound.app;

import java.util.Locale;

/**
 * Makes a user's text harmless on a terminal: what would move the cursor, change colours or turn
 * the direction of writing is shown instead of obeyed.
 */
final class PlainText {
  private PlainText() {}

  /**
   * One line of plain text.
   *
   * @param text any text
   * @return the text with controls shown as {@code \n}, {@code \t} or their code
   *     point
   */
  static String of(String text) {
    StringBuilder result = new StringBuilder(text.length());
    text.codePoints().forEach(point -> append(result, point));
    return result.toString();
  }

  private static void append(StringBuilder result, int point) {
    switch (point) {
      case '\n' -> result.append("\\n");
      case '\r' -> result.append("\\r");
      case '\t' -> result.append("\\t");
      default -> {
        int type = Character.getType(point);
        if (type == Character.CONTROL
            || type == Character.FORMAT
            || type == Character.LINE_SEPARATOR
            || type == Character.PARAGRAPH_SEPARATOR) {
          result.append(String.format(Locale.ROOT, "<U+%04X>", point));
        } else {
          result.appendCodePoint(point);
        }
      }
    }
  }

  /**
   * How many columns a terminal uses for a text.
   *
   * @param text plain text
   * @return the columns: none for a combining mark, two for a wide character
   */
  static int width(String text) {
    return text.codePoints().map(PlainText::columns).sum();
  }

  private static int columns(int point) {
    int type = Character.getType(point);
    if (type == Character.NON_SPACING_MARK || type == Character.ENCLOSING_MARK) {
      return 0;
    }
    return isWide(point) ? 2 : 1;
  }

  /** East Asian wide and fullwidth characters and pictographs (Unicode Standard Annex 11). */
  private static boolean isWide(int point) {
    return (point >= 0x1100 && point <= 0x115F)
        || (point >= 0x2E80 && point <= 0xA4CF && point != 0x303F)
        || (point >= 0xAC00 && point <= 0xD7A3)
        || (point >= 0xF900 && point <= 0xFAFF)
        || (point >= 0xFE30 && point <= 0xFE6F)
        || (point >= 0xFF00 && point <= 0xFF60)
        || (point >= 0xFFE0 && point <= 0xFFE6)
        || (point >= 0x1F300 && point <= 0x1FAFF)
        || (point >= 0x20000 && point <= 0x3FFFD);
  }
}
