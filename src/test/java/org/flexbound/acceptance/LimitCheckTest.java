package org.flexbound.acceptance;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.flexbound.acceptance.InventedTest.atMost;
import static org.flexbound.acceptance.InventedTest.limit;

import java.util.List;
import java.util.Random;
import org.flexbound.finding.Outcome;
import org.flexbound.setup.DecisionRule;
import org.flexbound.setup.LimitKind;
import org.flexbound.setup.LimitSpec;
import org.hipparchus.linear.EigenDecompositionSymmetric;
import org.hipparchus.linear.MatrixUtils;
import org.junit.jupiter.api.Test;

class LimitCheckTest {
  private static final double[][] HEAD = {
    {4.0e-9, 0.5e-9, 0.3e-9}, {0.5e-9, 3.0e-9, 0.2e-9}, {0.3e-9, 0.2e-9, 1.0e-9}
  };
  private static final double[] STILL = {0, 0, 0};
  private static final double NONE = Double.NaN;

  private static InventedTest test(double[] fixture, double scatter) {
    return new InventedTest(HEAD, fixture, 0.002, scatter, new Random(3)).run(3);
  }

  private static Decision only(CheckedConfiguration tested) {
    Outcome<List<Decision>> outcome = LimitCheck.check(List.of(tested));
    assertThat(outcome.hasErrors()).as(outcome.findings().toString()).isFalse();
    List<Decision> decisions = outcome.orRefuse();
    assertThat(decisions).hasSize(1);
    return decisions.get(0);
  }

  private static Decision only(LimitSpec limit) {
    return only(test(STILL, 0.002).checked(DecisionRule.GUARD_BAND, limit));
  }

  @Test
  void aCoefficientFarWithinItsLimitPassesAndFarBeyondItFails() {
    assertThat(only(atMost(LimitKind.COEFFICIENT, "head +x", "push +x", 4.4, "µm/kN")).verdict())
        .isEqualTo(Verdict.PASS);
    Decision fail = only(atMost(LimitKind.COEFFICIENT, "head +x", "push +x", 3.6, "µm/kN"));
    assertThat(fail.verdict()).isEqualTo(Verdict.FAIL);
    assertThat(fail.wrong()).isLessThan(0.001);
  }

  @Test
  void aLimitInsideTheUncertaintyCannotBeDecidedAndTheAdviceNamesASource() {
    Decision decision = only(atMost(LimitKind.COEFFICIENT, "head +x", "push +x", 4.0, "µm/kN"));
    assertThat(decision.verdict()).isEqualTo(Verdict.UNDECIDED);
    assertThat(decision.advice().orElseThrow().words()).contains("probability of");
  }

  @Test
  void theSimpleRuleDecidesByTheValueAloneAndTellsHowOftenItIsWrong() {
    Decision decision =
        only(
            test(STILL, 0.002)
                .checked(
                    DecisionRule.SIMPLE,
                    atMost(LimitKind.COEFFICIENT, "head +x", "push +x", 4.0, "µm/kN")));
    assertThat(decision.verdict()).isIn(Verdict.PASS, Verdict.FAIL);
    assertThat(decision.wrong()).isBetween(0.05, 0.95);
  }

  @Test
  void theSoftestDirectionIsTheLargestPrincipalValueOfTheBlock() {
    EigenDecompositionSymmetric reference =
        new EigenDecompositionSymmetric(MatrixUtils.createRealMatrix(HEAD));
    Decision decision =
        only(
            test(STILL, 1e-6)
                .checked(
                    DecisionRule.GUARD_BAND,
                    limit(
                        LimitKind.SOFTEST_COMPLIANCE, "", "", "P", "", NONE, 5, "µm/kN")));
    Quantity quantity = decision.quantity().orElseThrow();
    assertThat(quantity.value()).isCloseTo(reference.getEigenvalue(0), within(0.01 * 4.3e-9));
    // shared gains of cell and dials only: 0.2 % and 0.1 %
    assertThat(quantity.budget().standardUncertainty() / quantity.value())
        .isCloseTo(Math.hypot(0.002, 0.001), within(1e-5));
    assertThat(quantity.subject()).contains("softest along (0.9");
  }

  @Test
  void aComplianceInADirectionIsTheQuadraticFormOfTheBlock() {
    Decision decision =
        only(
            limit(
                LimitKind.COMPLIANCE, "head +x", "", "", "(1, 1, 0)", NONE, 4.5, "µm/kN"));
    // ½ (4 + 3) + 0.5
    assertThat(decision.quantity().orElseThrow().value()).isCloseTo(4.0e-9, within(0.04e-9));
    assertThat(decision.verdict()).isEqualTo(Verdict.PASS);
  }

  @Test
  void aPointThatContradictsReciprocityIsNotJudged() {
    double[][] skew = {{4e-9, 0.9e-9, 0.3e-9}, {0.5e-9, 3e-9, 0.2e-9}, {0.3e-9, 0.2e-9, 1e-9}};
    Outcome<List<Decision>> outcome =
        LimitCheck.check(
            List.of(
                new InventedTest(skew, STILL, 0.002, 0.002, new Random(3))
                    .run(3)
                    .checked(
                        DecisionRule.GUARD_BAND,
                        limit(
                            LimitKind.SOFTEST_COMPLIANCE, "", "", "P", "", NONE, 9, "µm/kN"))));
    assertThat(outcome.findings()).extracting("code").contains("ACCEPT-NOT-RECIPROCAL");
    assertThat(outcome.orRefuse().get(0).verdict()).isEqualTo(Verdict.UNDECIDED);
  }

  @Test
  void aDirectStiffnessIsTheInverseOfTheDirectCoefficient() {
    Decision decision =
        only(limit(LimitKind.DIRECT_STIFFNESS, "", "push +y", "", "", 300, NONE, "kN/mm"));
    assertThat(decision.quantity().orElseThrow().value()).isCloseTo(1 / 3.0e-9, within(3e6));
    assertThat(decision.verdict()).isEqualTo(Verdict.PASS);
  }

  @Test
  void theFixturesShareIsWhatTheGaugesOnItShow() {
    double[] sinking = {0.05e-9, 0.03e-9, 0.4e-9};
    Decision decision =
        only(
            test(sinking, 0.002)
                .checked(
                    DecisionRule.GUARD_BAND,
                    atMost(LimitKind.FIXTURE_SHARE, "head +z", "push +z", 35, "%")));
    // 0.4 of 1.4; gains cancel
    Quantity share = decision.quantity().orElseThrow();
    assertThat(share.value()).isCloseTo(0.4 / 1.4, within(0.003));
    assertThat(share.budget().fixedVariance()).isLessThan(1e-12);
    assertThat(decision.verdict()).isEqualTo(Verdict.PASS);
  }

  @Test
  void theArticlesOwnFlexibilityIsWhatIsLeftAndItsUncertaintyIsLarger() {
    double[] sinking = {0.05e-9, 0.03e-9, 4e-9};
    FixtureShare share =
        LimitCheck.fixture(
                List.of(test(sinking, 0.002).checked(DecisionRule.GUARD_BAND)), 0.5)
            .orRefuse()
            .stream()
            .filter(s -> s.gauge().equals("head +z") && s.load().equals("push +z"))
            .findFirst()
            .orElseThrow();
    assertThat(share.own()).isCloseTo(1e-9, within(0.03e-9));
    assertThat(share.ownUncertainty() / share.own())
        .isGreaterThan(2 * share.totalUncertainty() / share.total());
    assertThat(
            LimitCheck.fixture(
                    List.of(test(sinking, 0.002).checked(DecisionRule.GUARD_BAND)), 0.5)
                .findings())
        .extracting("code")
        .containsOnly("ACCEPT-FIXTURE-LARGE");
  }

  @Test
  void reciprocityLinearityHysteresisSetAndRepeatabilityAreJudgedOverAllThatWasMeasured() {
    List<Decision> decisions =
        LimitCheck.check(
                List.of(
                    test(STILL, 0.002)
                        .checked(
                            DecisionRule.GUARD_BAND,
                            atMost(LimitKind.RECIPROCITY, "", "", 5, "%"),
                            atMost(LimitKind.LINEARITY, "", "", 8, "%"),
                            atMost(LimitKind.HYSTERESIS, "", "", 8, "%"),
                            atMost(LimitKind.SET, "", "", 8, "%"),
                            atMost(LimitKind.REPEATABILITY, "", "", 10, "%"))))
            .orRefuse();
    assertThat(decisions).extracting(Decision::verdict).containsOnly(Verdict.PASS);
    assertThat(decisions).extracting(Decision::judged).containsExactly(3, 9, 9, 9, 9);
  }

  @Test
  void aLimitOnSomethingUnmeasuredIsRefusedWithWhatWasMeasured() {
    Outcome<List<Decision>> outcome =
        LimitCheck.check(
            List.of(
                test(STILL, 0.002)
                    .checked(
                        DecisionRule.GUARD_BAND,
                        atMost(LimitKind.COEFFICIENT, "tail +x", "push +x", 4, "µm/kN"))));
    assertThat(outcome.findings()).extracting("code").contains("ACCEPT-UNMEASURED");
    assertThat(outcome.findings().get(0).message())
        .contains("'tail +x'")
        .contains("head +x")
        .contains("push +z");
    assertThat(outcome.findings().get(0).where().toString()).contains("Limits").contains("A2");
  }

  @Test
  void aLimitInAnotherUnitOrWithoutAModelIsRefused() {
    Outcome<List<Decision>> outcome =
        LimitCheck.check(
            List.of(
                test(STILL, 0.002)
                    .checked(
                        DecisionRule.GUARD_BAND,
                        atMost(LimitKind.COEFFICIENT, "head +x", "push +x", 4, "mrad/kN"),
                        atMost(LimitKind.MODEL_AGREEMENT, "", "", 5, "%"))));
    assertThat(outcome.findings())
        .extracting("code")
        .contains("ACCEPT-UNIT", "ACCEPT-UNMEASURED");
    assertThat(outcome.hasErrors()).isTrue();
  }

  @Test
  void oneRunWithoutAStatedRepeatabilityCannotDecide() {
    InventedTest once = new InventedTest(HEAD, STILL, 0.002, 0.002, new Random(3)).run(1);
    Outcome<List<Decision>> outcome =
        LimitCheck.check(
            List.of(
                once.checked(
                    DecisionRule.GUARD_BAND,
                    atMost(LimitKind.COEFFICIENT, "head +x", "push +x", 9, "µm/kN"))));
    assertThat(outcome.findings()).extracting("code").contains("ACCEPT-WITHOUT-SPREAD");
    Decision decision = outcome.orRefuse().get(0);
    assertThat(decision.verdict()).isEqualTo(Verdict.UNDECIDED);
    assertThat(decision.advice().orElseThrow().words()).contains("repeat it");
  }
}
