package org.flexbound.quantity;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class QuantityTest {
  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "12,5 kN        | '12,5 kN' has a comma in its number; write a decimal point",
        "1,234.5 N      | has a comma in its number",
        "1 234 N        | has a gap or a second point in its number",
        "1.2.3 N        | has a gap or a second point in its number",
        "NaN N          | 'NaN N' does not begin with a number",
        "Infinity N     | does not begin with a number",
        "kN             | does not begin with a number",
        "1e999 N        | is beyond the largest number",
        "5 lb           | write lbf for the force, lbm for the mass",
        "5 mm^999999999 | a power is a whole number of at most 12",
        "5 mm^-         | a power is a whole number of at most 12",
        "5 (mm          | a parenthesis is not closed",
        "5 N//m         | is not a unit",
        "5 furlong      | 'furlong' is not a unit that is known here",
      })
  void whatCannotBeReadIsRefusedInPlainWords(String text, String words) {
    assertThatThrownBy(() -> Quantity.parse(text))
        .isInstanceOf(UnitException.class)
        .hasMessageContaining(words);
  }

  @ParameterizedTest
  @CsvSource({
    "5, 5", "-.5 kN, -500", "1.E3 N, 1000", "\u22122 kN, -2000", "1e-3 m, 0.001", "12 %, 0.12",
    "250 µε, 2.5e-4", "250 \u03bcm/m, 2.5e-4", "20 °C, 293.15", "3 kN m, 3000", "3 kNm, 3000",
    "2 N/mm/mm, 2000000", "4 (N/mm)^2, 4000000", "5 m s^-2, 5", "7 1/m, 7"
  })
  void whatPeopleWriteIsRead(String text, double si) throws UnitException {
    assertThat(Quantity.parse(text).si()).isCloseTo(si, org.assertj.core.data.Percentage.withPercentage(1e-12));
  }

  @Test
  void noTextMakesTheReaderFailOtherwiseThanByItsMessage() {
    String signs = "0123456789.,eE+-kMmNµ°%\"'()/^·*² inftlbpsrad⁻⁴";
    Random random = new Random(3);
    int read = 0;
    for (int i = 0; i < 20_000; i++) {
      StringBuilder text = new StringBuilder();
      for (int k = random.nextInt(14); k >= 0; k--) {
        text.append(signs.charAt(random.nextInt(signs.length())));
      }
      try {
        assertThat(Quantity.parse(text.toString()).value()).isFinite();
        read++;
      } catch (UnitException refused) {
        assertThat(refused.getMessage()).isNotBlank();
      }
    }
    assertThat(read).isPositive();
    assertThatThrownBy(() -> Units.parse("(".repeat(100_000)))
        .isInstanceOf(UnitException.class)
        .hasMessageContaining("longer than 100 characters");
  }
}
