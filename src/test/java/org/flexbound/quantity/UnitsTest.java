package org.flexbound.quantity;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class UnitsTest {
  /** Factors: NIST Special Publication 811 (2008), appendix B.8, exact or to all printed digits. */
  @ParameterizedTest
  @CsvSource({
    "N, 1",
    "kN, 1e3",
    "daN, 10",
    "kgf, 9.80665",
    "lbf, 4.4482216152605",
    "kip, 4448.2216152605",
    "in, 0.0254",
    "mil, 2.54e-5",
    "ft, 0.3048",
    "psi, 6894.757293168361",
    "ksi, 6894757.293168361",
    "lbf/in, 175.12683524647636",
    "lbf·in/rad, 0.1129848290276167",
    "N·m/rad, 1",
    "N*m/rad, 1",
    "kNm/rad, 1000",
    "N mm, 1e-3",
    "deg, 0.017453292519943295",
    "arcmin, 2.908882086657216e-4",
    "GPa, 1e9",
    "N/mm², 1e6",
    "N/mm^2, 1e6",
    "mm^4, 1e-12",
    "mm4, 1e-12",
    "cm⁴, 1e-8",
    "µm, 1e-6",
    "um, 1e-6",
    "kg/m3, 1",
    "µm/m, 1e-6",
    "%, 0.01",
    "kN/(mm·rad), 1e6",
  })
  void factorToSiIsThePublishedOne(String spelling, double factor) throws UnitException {
    assertThat(Units.parse(spelling).toSi(1)).isCloseTo(factor, within(1e-15 * Math.abs(factor)));
  }

  @Test
  void dimensionsAreToldApart() throws UnitException {
    assertThat(Units.parse("N·m/rad").dimension()).isEqualTo(Dimension.ROTATIONAL_STIFFNESS);
    assertThat(Units.parse("N·m").dimension().fits(Dimension.ROTATIONAL_STIFFNESS)).isTrue();
    assertThat(Units.parse("N/mm").dimension()).isEqualTo(Dimension.STIFFNESS);
    assertThat(Units.parse("N/mm").dimension().fits(Dimension.ROTATIONAL_STIFFNESS)).isFalse();
    assertThat(Units.parse("mm").dimension().fits(Dimension.ANGLE)).isFalse();
  }

  @Test
  void temperaturesHaveAnOffset() throws UnitException {
    assertThat(Units.parse("°C").toSi(20)).isEqualTo(293.15);
    assertThat(Units.parse("°F").toSi(68)).isCloseTo(293.15, within(1e-12));
  }

  @Test
  void aPoundByItselfIsRefusedWithBothReadings() {
    assertThatThrownBy(() -> Units.parse("lb"))
        .isInstanceOf(UnitException.class)
        .hasMessageContaining("lbf for the force, lbm for the mass");
  }

  @Test
  void aMisspeltUnitGetsASuggestion() {
    assertThatThrownBy(() -> Units.parse("kNewt"))
        .isInstanceOf(UnitException.class)
        .hasMessageContaining("'kNewt' is not a unit that is known here");
    assertThatThrownBy(() -> Units.parse("Mpa"))
        .isInstanceOf(UnitException.class)
        .hasMessageContaining("did you mean");
  }

  @Test
  void everySpellingOfferedIsReadBack() throws UnitException {
    assertThat(Units.spellings(Dimension.FORCE)).contains("N", "kN", "lbf");
    for (String spelling : Units.spellings(Dimension.LENGTH)) {
      assertThat(Units.parse(spelling).dimension()).isEqualTo(Dimension.LENGTH);
    }
  }

  @Test
  void aQuantityIsANumberAndAUnit() throws UnitException {
    assertThat(Quantity.parse("12.5 kN/m").si()).isEqualTo(12500);
    assertThat(Quantity.parse("210GPa").si()).isEqualTo(210e9);
    assertThat(Quantity.parse("1e3 mm").si()).isCloseTo(1, within(1e-15));
  }
}
