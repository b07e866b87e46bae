package org.flexbound.acceptance;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import org.flexbound.finding.Outcome;
import org.junit.jupiter.api.Test;

class RecheckTest {
  private static final double U = 0.01;

  /** Two coefficients with 1 % calibration in common and a scatter of 0.01 each. */
  private static KeptTest kept(
      String place, String certificate, double first, double second, String name) {
    return new KeptTest(
        name,
        "2025-01-01",
        List.of(value("a", place, first), value("b", place, second)),
        List.of(
            new KeptTest.Covariance(
                "as tested",
                20,
                List.of(List.of(U * U, 0.0), List.of(0.0, U * U)),
                List.of(
                    new KeptTest.Shared(
                        "cell, " + certificate,
                        certificate.isEmpty() ? Optional.empty() : Optional.of(certificate),
                        "cell",
                        List.of(0.01 * first, 0.01 * second))))),
        List.of());
  }

  private static KeptTest.Value value(String gauge, String place, double value) {
    return new KeptTest.Value(
        "as tested", gauge, "p", place, value, "m/N", Math.hypot(U, 0.01 * value), U);
  }

  private static ChangeReport report(KeptTest before, KeptTest now) {
    return Recheck.compare(before, now, Optional.empty()).orRefuse();
  }

  @Test
  void theErrorOfASharedCalibrationCancelsInTheDifference() {
    ChangeReport same = report(kept("", "C1", 10, 20, "e"), kept("", "C1", 10, 20.1, "n"));
    // √2 · 0.01 from scatter; the gain acts on the difference of 0.1 alone
    assertThat(same.changes().get(1).standardUncertainty())
        .isCloseTo(Math.hypot(Math.sqrt(2) * U, 0.001), within(1e-12));
    assertThat(same.shared()).containsExactly("cell, C1");
    assertThat(same.changes().get(1).significant()).isTrue();
    assertThat(same.changes().get(0).significant()).isFalse();
  }

  @Test
  void anotherCalibrationDoesNotCancelAndIsNamed() {
    Outcome<ChangeReport> outcome =
        Recheck.compare(
            kept("", "C1", 10, 20, "e"), kept("", "C2", 10, 20.1, "n"), Optional.empty());
    ChangeReport other = outcome.orRefuse();
    assertThat(other.changes().get(1).standardUncertainty())
        .isCloseTo(Math.sqrt(2 * U * U + 0.2 * 0.2 + 0.201 * 0.201), within(1e-12));
    assertThat(other.changes()).noneMatch(Change::significant);
    // a gain acts on both alike: that one of them moved alone is seen by both together
    assertThat(other.changed()).isTrue();
    assertThat(outcome.findings())
        .extracting("code")
        .containsExactly("ACCEPT-CALIBRATION-NOT-SHARED");
  }

  @Test
  void holmsProcedureGivesItsAdjustedProbabilities() {
    // worked by hand from the definition: sorted p times 4, 3, 2, 1, never falling
    assertThat(Recheck.holm(new double[] {0.01, 0.04, 0.03, 0.005}))
        .containsExactly(new double[] {0.03, 0.06, 0.06, 0.02}, within(1e-12));
  }

  @Test
  void gaugesThatWereElsewhereAreNotCompared() {
    Outcome<ChangeReport> outcome =
        Recheck.compare(
            kept("here", "C1", 10, 20, "e"), kept("there", "C1", 10, 20, "n"), Optional.empty());
    assertThat(outcome.findings())
        .extracting("code")
        .contains("ACCEPT-NOT-COMPARABLE", "ACCEPT-NOTHING-IN-COMMON");
  }
}
