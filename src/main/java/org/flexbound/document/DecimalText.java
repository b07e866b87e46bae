package org.flexbound.document;

import java.nio.charset.StandardCharsets;

/**
 * Reads decimal numbers off bytes, with the result of {@link Double#parseDouble} to the last bit.
 *
 * <p>Up to 2⁵³ as digits and 10²² as power of ten both are exact doubles, and their one product or
 * quotient is rounded correctly (W. D. Clinger, How to read floating point numbers accurately, PLDI
 * 1990); what lies beyond goes to {@link Double#parseDouble}.
 */
final class DecimalText {
  private static final long EXACT = 1L << 53;
  private static final double[] TENS = {
    1e0, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15, 1e16,
    1e17, 1e18, 1e19, 1e20, 1e21, 1e22
  };

  private DecimalText() {}

  /**
   * Reads a number: sign, digits with at most one decimal sign, power of ten.
   *
   * @param bytes the text in ASCII or a superset of it
   * @param from where the number begins
   * @param to where it ends
   * @param decimalSign point or comma
   * @return the number; NaN where the text is not wholly one, or is beyond the largest double
   */
  static double parse(byte[] bytes, int from, int to, byte decimalSign) {
    int at = from;
    boolean negative = false;
    if (at < to && (bytes[at] == '-' || bytes[at] == '+')) {
      negative = bytes[at] == '-';
      at++;
    }
    long digits = 0;
    int significant = 0;
    int seen = 0;
    int scale = 0;
    boolean fraction = false;
    for (; at < to; at++) {
      int digit = bytes[at] - '0';
      if (digit >= 0 && digit <= 9) {
        seen++;
        if (significant < 18) {
          digits = digits * 10 + digit;
          significant += digits == 0 ? 0 : 1;
          scale -= fraction ? 1 : 0;
        } else {
          significant++;
        }
      } else if (bytes[at] == decimalSign && !fraction) {
        fraction = true;
      } else {
        break;
      }
    }
    if (seen == 0) {
      return Double.NaN;
    }
    if (at < to) {
      if (bytes[at] != 'e' && bytes[at] != 'E') {
        return Double.NaN;
      }
      int end = power(bytes, at + 1, to);
      if (end < 0) {
        return Double.NaN;
      }
      if (to - at > 6) {
        return slow(bytes, from, to, decimalSign);
      }
      scale += powerValue(bytes, at + 1, to);
    }
    if (significant > 18 || digits > EXACT || scale > 22 || scale < -22) {
      return slow(bytes, from, to, decimalSign);
    }
    double value = scale < 0 ? digits / TENS[-scale] : digits * TENS[scale];
    return negative ? -value : value;
  }

  /** The end of a power of ten that takes the whole rest; −1 where it does not. */
  private static int power(byte[] bytes, int from, int to) {
    int at = from;
    if (at < to && (bytes[at] == '-' || bytes[at] == '+')) {
      at++;
    }
    int first = at;
    while (at < to && bytes[at] >= '0' && bytes[at] <= '9') {
      at++;
    }
    return at == to && at > first ? at : -1;
  }

  private static int powerValue(byte[] bytes, int from, int to) {
    int value = 0;
    for (int at = from; at < to; at++) {
      if (bytes[at] >= '0') {
        value = value * 10 + (bytes[at] - '0');
      }
    }
    return bytes[from] == '-' ? -value : value;
  }

  private static double slow(byte[] bytes, int from, int to, byte decimalSign) {
    String text = new String(bytes, from, to - from, StandardCharsets.ISO_8859_1);
    double value =
        Double.parseDouble(decimalSign == '.' ? text : text.replace((char) decimalSign, '.'));
    return Double.isInfinite(value) ? Double.NaN : value;
  }

  /** The shortest decimal text that reads back to the same number; whole numbers without a point. */
  static String shortest(double value) {
    return value == Math.rint(value) && Math.abs(value) < 1e15
        ? String.valueOf((long) value)
        : String.valueOf(value);
  }
}
