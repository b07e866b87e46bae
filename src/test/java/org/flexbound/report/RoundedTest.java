package org.flexbound.report;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Values and uncertainties rounded together (JCGM 100:2008, 7.2.6). */
class RoundedTest {
  /** The first is the example of JCGM 100:2008, 7.2.2: m = 100,021 47 g, u = 0,35 mg. */
  @ParameterizedTest
  @CsvSource({
    "100.02147, 0.00035, 100.02147 ± 0.00035",
    "12.34567, 0.0666, 12.346 ± 0.067",
    "-12.34567, 0.0996, −12.35 ± 0.10",
    "1234567, 12345, 1235000 ± 12000",
    "0.5, 123.4, 0 ± 120",
    "3.21456e-9, 4.1e-11, 3.215e-9 ± 4.1e-11",
    "7, 0, 7.000 ± 0"
  })
  void valueAndUncertaintyShowTheSameLastDigit(double value, double uncertainty, String shown) {
    assertThat(Rounded.pair(value, uncertainty)).isEqualTo(shown);
  }

  @ParameterizedTest
  @CsvSource({
    "0.0123456, 3, 0.0123",
    "9.9996, 4, 10.00",
    "123456, 3, 123000",
    "-1.5e-7, 2, −1.5e-7",
    "0, 3, 0",
    "Infinity, 3, ∞"
  })
  void significantDigitsAreKept(double value, int digits, String shown) {
    assertThat(Rounded.significant(value, digits)).isEqualTo(shown);
  }
}
