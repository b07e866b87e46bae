package org.flexbound.document;

import static org.assertj.core.api.Assertions.assertThat;

import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.util.Locale;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class DecimalTextTest {
  private static double parse(String text, char decimalSign) {
    byte[] bytes = ("x" + text + "9").getBytes(StandardCharsets.UTF_8);
    return DecimalText.parse(bytes, 1, bytes.length - 1, (byte) decimalSign);
  }

  private static void same(String text) {
    assertThat(Double.doubleToRawLongBits(parse(text, '.')))
        .as(text)
        .isEqualTo(Double.doubleToRawLongBits(Double.parseDouble(text)));
    assertThat(parse(text.replace('.', ','), ',')).as(text).isEqualTo(Double.parseDouble(text));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "0", "-0", "-0.0", "1", "+1", ".5", "5.", "-.5e1", "1e22", "1e23", "1E-22", "1e-23",
        "9007199254740992", "9007199254740993", "9007199254740993e10", "123456789012345678",
        "1234567890123456789", "0.1234567890123456789", "00000000000000000000000001.5",
        "0.00000000000000000000000015", "4.9e-324", "2.4703282292062327e-324",
        "2.4703282292062328e-324", "2.2250738585072012e-308", "1.7976931348623157e308", "1e0005",
        "1e-400", "0e999999999999", "8.5e+002", "1.00000000000000011102230246251565",
      })
  void oddNumbersAreReadAsTheLibraryReadsThem(String text) {
    same(text);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "", "-", ".", "e5", "1e", "1e+", "1.2.3", "1,2", "NaN", "Infinity", "0x10", "1d", "1f",
        "1 2", "--1", "1e5.0", "1e999", "-1e999", "1_000", "١٢", "12 %",
      })
  void whatIsNoNumberGivesNone(String text) {
    assertThat(parse(text, '.')).isNaN();
  }

  @Test
  void randomNumbersOfEveryLengthAgreeToTheLastBit() {
    Random random = new Random(20261);
    for (int i = 0; i < 200_000; i++) {
      double value = Double.longBitsToDouble(random.nextLong());
      if (Double.isFinite(value)) {
        same(String.valueOf(value));
      }
      same(String.format(Locale.ROOT, "%." + random.nextInt(12) + "f", random.nextGaussian() * 1e3));
      same(new BigDecimal(random.nextDouble()).toString());
    }
  }
}
