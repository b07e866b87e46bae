package org.flexbound.acceptance;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Path;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

class ConformityTest {
  private static Quantity normal(double value, double u) {
    return new Quantity(
        "made",
        value,
        new Budget(0, Double.POSITIVE_INFINITY, List.of(new Budget.Source("stated", u, Double.NaN))),
        1,
        Quantity.Law.ABOUT_VALUE);
  }

  @Test
  void theWorkedExampleOfTheStandardHasItsConformanceProbability() {
    JsonNode check =
        JsonMapper.shared()
            .readTree(Path.of("src/test/resources/checks/jcgm-106-zener.json").toFile());
    Quantity diode =
        normal(
            check.get("value").asDouble(), check.get("standardUncertainty").asDouble());
    double probability =
        Conformity.probability(
            diode, OptionalDouble.empty(), OptionalDouble.of(check.get("upper").asDouble()));
    assertThat(probability)
        .isCloseTo(
            check.get("probability").asDouble(), within(check.get("roundedTo").asDouble()));
    assertThat(LimitCheck.guarded(probability, 0.05)).isEqualTo(Verdict.UNDECIDED);
    assertThat(LimitCheck.guarded(probability, 0.10)).isEqualTo(Verdict.PASS);
  }

  @Test
  void theGuardBandEndsWhereTheProbabilityOfBeingWrongReachesTheStatedOne() {
    Quantity quantity =
        new Quantity(
            "made",
            3.0,
            new Budget(0.1, 4, List.of(new Budget.Source("cell", 0.05, 0.02))),
            3,
            Quantity.Law.ABOUT_VALUE);
    double guard = Conformity.guard(quantity, 0.05);
    assertThat(
            Conformity.probability(
                quantity, OptionalDouble.empty(), OptionalDouble.of(3.0 + guard)))
        .isCloseTo(0.95, within(1e-9));
    // u = 0.1118, Welch-Satterthwaite 4 · 1.25² = 6.25, t(0.95; 6.25) lies between 1.943 and 1.895
    assertThat(guard).isBetween(1.895 * 0.111803, 1.943 * 0.111804);
  }

  @Test
  void bothSidesOfATwoSidedLimitCount() {
    double probability =
        Conformity.probability(normal(0, 1), OptionalDouble.of(-1.96), OptionalDouble.of(1.96));
    assertThat(probability).isCloseTo(0.95, within(1e-4));
  }

  @Test
  void aStiffnessIsJudgedThroughItsCoefficient() {
    // a = 0.2 ± 0.01, so that 1/a ≥ 4.5 where a ≤ 0.2222: z = 2.222
    Quantity stiffness =
        new Quantity(
            "made",
            5,
            new Budget(
                0, Double.POSITIVE_INFINITY, List.of(new Budget.Source("cell", 0.25, 0.05))),
            1,
            Quantity.Law.INVERSE);
    assertThat(
            Conformity.probability(stiffness, OptionalDouble.of(4.5), OptionalDouble.empty()))
        .isCloseTo(0.98687, within(1e-4));
  }

  @Test
  void aStandardDeviationIsJudgedByChiSquared() {
    // χ² with 4 degrees of freedom: 5 % lie below 0.711 (published tables), so that s = L √(0.711/4)
    Quantity deviation =
        new Quantity(
            "made",
            Math.sqrt(0.710723 / 4),
            new Budget(0.1, 4, List.of()),
            5,
            Quantity.Law.STANDARD_DEVIATION);
    assertThat(Conformity.probability(deviation, OptionalDouble.empty(), OptionalDouble.of(1)))
        .isCloseTo(0.95, within(1e-5));
  }
}
