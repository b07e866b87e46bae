package org.flexbound.report;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Locale;

/**
 * Numbers as a reader should see them: a value and its uncertainty rounded together, to two
 * significant digits of the uncertainty (JCGM 100:2008, 7.2.6).
 */
public final class Rounded {
  private static final int DIGITS_OF_UNCERTAINTY = 2;
  private static final char MINUS = '\u2212';

  private Rounded() {}

  /**
   * A value with its standard uncertainty.
   *
   * @param value the value
   * @param uncertainty its uncertainty
   * @return such as {@code 12.345 ± 0.067}
   */
  public static String pair(double value, double uncertainty) {
    return value(value, uncertainty) + " ± " + uncertainty(uncertainty);
  }

  /**
   * A value rounded to the last digit of its uncertainty's two.
   *
   * @param value the value
   * @param uncertainty its uncertainty; where it is nought or not a number, four significant digits
   *     are shown
   * @return the text
   */
  public static String value(double value, double uncertainty) {
    if (!Double.isFinite(value)) {
      return "–";
    }
    if (!(uncertainty > 0) || !Double.isFinite(uncertainty)) {
      return significant(value, 4);
    }
    BigDecimal u = round(uncertainty);
    BigDecimal rounded = BigDecimal.valueOf(value).setScale(u.scale(), RoundingMode.HALF_EVEN);
    return text(rounded, Math.max(Math.abs(value), uncertainty));
  }

  /**
   * An uncertainty rounded to two significant digits.
   *
   * @param uncertainty the uncertainty
   * @return the text
   */
  public static String uncertainty(double uncertainty) {
    if (!Double.isFinite(uncertainty)) {
      return "–";
    }
    return uncertainty == 0 ? "0" : text(round(uncertainty), uncertainty);
  }

  /**
   * A number with so many significant digits.
   *
   * @param value the number
   * @param digits the digits
   * @return the text
   */
  public static String significant(double value, int digits) {
    if (Double.isNaN(value)) {
      return "–";
    }
    if (Double.isInfinite(value)) {
      return value > 0 ? "∞" : MINUS + "∞";
    }
    if (value == 0) {
      return "0";
    }
    BigDecimal rounded =
        BigDecimal.valueOf(value).round(new MathContext(digits, RoundingMode.HALF_EVEN));
    int scale = digits - 1 - (int) Math.floor(Math.log10(rounded.abs().doubleValue()));
    return text(rounded.setScale(scale, RoundingMode.HALF_EVEN), Math.abs(value));
  }

  /**
   * A number with a fixed number of decimals.
   *
   * @param value the number
   * @param decimals the decimals
   * @return the text
   */
  public static String fixed(double value, int decimals) {
    if (!Double.isFinite(value)) {
      return significant(value, 1);
    }
    BigDecimal rounded = BigDecimal.valueOf(value).setScale(decimals, RoundingMode.HALF_EVEN);
    return sign(rounded.signum() == 0 ? rounded.abs() : rounded).toString();
  }

  /**
   * A share as per cent.
   *
   * @param share the share
   * @return such as {@code 4.3 %}
   */
  public static String percent(double share) {
    if (!Double.isFinite(share)) {
      return "–";
    }
    double percent = 100 * share;
    return fixed(percent, Math.abs(percent) < 9.95 ? 1 : 0) + " %";
  }

  private static BigDecimal round(double uncertainty) {
    BigDecimal u =
        BigDecimal.valueOf(uncertainty)
            .round(new MathContext(DIGITS_OF_UNCERTAINTY, RoundingMode.HALF_UP));
    int scale =
        DIGITS_OF_UNCERTAINTY - 1 - (u.precision() - u.scale() - 1);
    return u.setScale(scale, RoundingMode.HALF_UP);
  }

  /** Plain digits where they are few; a power of ten where the number is very large or small. */
  private static String text(BigDecimal number, double size) {
    if (size < 1e-4 || size >= 1e7) {
      int exponent = (int) Math.floor(Math.log10(size));
      BigDecimal mantissa = number.movePointLeft(exponent);
      return sign(mantissa) + "e" + String.format(Locale.ROOT, "%d", exponent);
    }
    return sign(number.scale() < 0 ? number.setScale(0, RoundingMode.HALF_EVEN) : number)
        .toString();
  }

  private static CharSequence sign(BigDecimal number) {
    String plain = number.abs().toPlainString();
    return number.signum() < 0 ? MINUS + plain : plain;
  }
}
