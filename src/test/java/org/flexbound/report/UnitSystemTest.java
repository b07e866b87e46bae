package org.flexbound.report;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** SI values shown in the units a reader chose. */
class UnitSystemTest {
  @ParameterizedTest
  @CsvSource({
    "SI, m/N, 2, 2, m/N",
    "MM_KN, m/N, 1e-6, 1, mm/kN",
    "MM_KN, rad/N, 1e-6, 1, mrad/kN",
    "MM_KN, N·m/rad, 2e6, 2000, kN·m/rad",
    "MM_KN, m/(N·m), 1e-6, 1, mm/(kN·m)",
    "MM_KN, N/m, 1e6, 1, kN/mm",
    "MM_KN, Pa, 210e9, 210, GPa",
    "IN_LBF, m, 0.0254, 1, in",
    "IN_LBF, m/N, 5.7101471547326465e-3, 1, in/lbf",
    "IN_LBF, N·m/rad, 0.1129848290276167, 1, lbf·in/rad",
    "IN_LBF, N·m², 2.869814657e-3, 1, lbf·in²",
    "MM_KN, N·m², 1000, 1, kN·m²"
  })
  void conversionsAgreeWithNistSp811(
      UnitSystem system, String unit, double si, double shown, String symbol) {
    assertThat(system.shown(si, unit)).isCloseTo(shown, within(1e-9 * Math.abs(shown)));
    assertThat(system.symbol(unit)).isEqualTo(symbol);
  }
}
