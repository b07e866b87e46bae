package org.flexbound.update;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.study.HeldOutCase;
import org.flexbound.study.Rule;
import org.flexbound.finding.Where;
import org.junit.jupiter.api.Test;

class UpdateSolverTest {
  private static final double[][] NOTHING = {{0, 0}, {0, 0}};
  private static final UpdateSolver SOLVER = new UpdateSolver(UpdateSettings.FULL);

  /** Tip and middle of a cantilever (Thomson's matrix, l = 1, EI = 1) on a root spring. */
  private static FlexibilityFunction cantilever(double rootCompliance) {
    double[][] bending = {{27.0 / 3, 14.0 / 3}, {14.0 / 3, 8.0 / 3}};
    double[][] root = {
      {9 * rootCompliance, 6 * rootCompliance}, {6 * rootCompliance, 4 * rootCompliance}
    };
    return Invented.determinate(NOTHING, bending, root);
  }

  private static final List<WorkingParameter> BOTH =
      List.of(Invented.ln("EI", 0.5, 2, 0.3), Invented.ln("root", 0.1, 10, 0.6));

  @Test
  void aDeterminateStructureIsSolvedAsItsClosedFormSays() {
    FlexibilityFunction function = cantilever(1);
    double[] truth = {Math.log(0.9), Math.log(0.5)};
    MeasuredFlexibility measured =
        Invented.measured(
            "as tested",
            Invented.shaped(function.coefficients(truth), 2),
            1e-5,
            0,
            Optional.empty());
    UpdateResult result = SOLVER.solve(Invented.problem(BOTH, measured, function));
    assertThat(result.verdict()).isEqualTo(Verdict.UPDATED);
    assertThat(result.parameters().get(0).factor()).isCloseTo(0.9, within(1e-6));
    assertThat(result.parameters().get(1).factor()).isCloseTo(0.5, within(1e-6));
    assertThat(result.parameters())
        .allSatisfy(p -> assertThat(p.status()).isEqualTo(Status.IDENTIFIED));
  }

  @Test
  void theScaleIsUnbiasedUnderOneLoadCell() {
    // 40 gauges x 10 loads, 1 % cell, 0.5 % scatter: with the gain's covariance built from measured
    // coefficients the scale would come out 4 % low (Peelle's effect).
    double[][] ones = Invented.matrix(40, 10, at -> 1e-6 * (1 + at[0] * 0.1 + at[1] * 0.2));
    FlexibilityFunction function = Invented.determinate(new double[40][10], ones);
    List<WorkingParameter> scale = List.of(Invented.ln("scale", 0.2, 5, 0.4));
    SplittableRandom random = new SplittableRandom(20260101);
    double sum = 0;
    int tests = 12;
    for (int t = 0; t < tests; t++) {
      MeasuredFlexibility measured =
          Invented.measured("as tested", ones, 0.005, 0.01, Optional.of(random));
      UpdateResult result =
          new UpdateSolver(UpdateSettings.ESTIMATES)
              .solve(Invented.problem(scale, measured, function));
      sum += Math.log(result.parameters().get(0).factor());
      assertThat(result.parameters().get(0).posteriorStandardDeviation())
          .isCloseTo(0.01, within(5e-4));
    }
    assertThat(sum / tests).isCloseTo(0, within(4 * 0.01 / Math.sqrt(tests)));
  }

  @Test
  void duplicatesAreOneDeterminedCombinationSplitByPriorVariances() {
    double[][] half = {{4.5, 3}, {3, 2}};
    double[][] other = {{1, 0.5}, {0.5, 0.3}};
    FlexibilityFunction function =
        x -> {
          FlexibilityFunction.Computed one =
              Invented.determinate(other, half).at(new double[] {x[0] + x[1]});
          double[][] jacobian = new double[4][2];
          for (int i = 0; i < 4; i++) {
            jacobian[i][0] = one.jacobian()[i][0];
            jacobian[i][1] = one.jacobian()[i][0];
          }
          return new FlexibilityFunction.Computed(one.coefficients(), jacobian);
        };
    MeasuredFlexibility measured =
        Invented.measured(
            "as tested",
            Invented.shaped(function.coefficients(new double[] {-0.3, 0}), 2),
            1e-4,
            0,
            Optional.empty());
    List<WorkingParameter> parameters =
        List.of(Invented.ln("knee", 0.05, 20, 0.6), Invented.ln("base", 0.05, 20, 0.3));
    UpdateResult result = SOLVER.solve(Invented.problem(parameters, measured, function));
    double knee = result.parameters().get(0).workingValue();
    double base = result.parameters().get(1).workingValue();
    assertThat(knee + base).isCloseTo(-0.3, within(1e-5));
    assertThat(knee / base).isCloseTo(0.36 / 0.09, within(1e-5));
    assertThat(result.parameters())
        .allSatisfy(
            p -> assertThat(p.status()).isEqualTo(Status.IDENTIFIED_ONLY_IN_COMBINATION));
    assertThat(result.groups()).hasSize(1);
    CollinearGroup group = result.groups().get(0);
    assertThat(group.determined()).isTrue();
    assertThat(group.weights().get(0)).isCloseTo(Math.sqrt(0.5), within(1e-6));
    assertThat(group.value()).isCloseTo(-0.3 * Math.sqrt(0.5), within(1e-5));
    assertThat(group.inWords()).startsWith("knee · base = 0.7408 of nominal");
  }

  @Test
  void aParameterWithoutInfluenceIsNotIdentifiableAndKeepsItsPrior() {
    double[][] part = {{4.5, 3}, {3, 2}};
    FlexibilityFunction function = Invented.determinate(NOTHING, part, NOTHING);
    MeasuredFlexibility measured =
        Invented.measured("as tested", part, 0.01, 0, Optional.empty());
    UpdateResult result = SOLVER.solve(Invented.problem(BOTH, measured, function));
    ParameterResult unseen = result.parameters().get(1);
    assertThat(unseen.status()).isEqualTo(Status.NOT_IDENTIFIABLE);
    assertThat(unseen.posteriorStandardDeviation()).isCloseTo(0.6, within(1e-9));
    assertThat(unseen.factor()).isCloseTo(1, within(1e-9));
  }

  @Test
  void convergesFromAStartAHundredTimesWrong() {
    FlexibilityFunction function = cantilever(1);
    List<WorkingParameter> wide =
        List.of(Invented.ln("EI", 0.5, 2, 0.3), Invented.ln("root", 1e-4, 1e4, 2));
    for (double wrong : new double[] {0.01, 100}) {
      MeasuredFlexibility measured =
          Invented.measured(
              "as tested",
              Invented.shaped(function.coefficients(new double[] {0, Math.log(wrong)}), 2),
              1e-5,
              0,
              Optional.empty());
      UpdateResult result = SOLVER.solve(Invented.problem(wide, measured, function));
      assertThat(result.convergence().converged()).isTrue();
      assertThat(result.parameters().get(1).factor()).isCloseTo(wrong, within(2e-2 * wrong));
    }
  }

  @Test
  void aJointStifferThanTheTestCanSeeHasALowerLimitOnly() {
    // With relative uncertainty r only kL/EI > 3/(1.645 r) can be claimed, EI known.
    double r = 0.01;
    FlexibilityFunction function =
        Invented.determinate(new double[][] {{1.0 / 3}}, new double[][] {{1.0}});
    MeasuredFlexibility measured =
        Invented.measured("as tested", new double[][] {{1.0 / 3}}, r, 0, Optional.empty());
    UpdateResult result =
        SOLVER.solve(
            Invented.problem(
                List.of(Invented.ln("root", 1, 1e5, 3)), measured, function));
    ParameterResult root = result.parameters().get(0);
    assertThat(root.status()).isEqualTo(Status.LOWER_LIMIT_ONLY);
    assertThat(root.upper95()).isInfinite();
    // The profile reaches just that; the posterior, whose prior puts the joint lower, is more careful.
    assertThat(root.lower95()).isBetween(0.9 * 3 / (1.645 * r), 3 / (1.645 * r) + 1);
  }

  @Test
  void theNominalModelThatAlreadyAgreesWarrantsNoChange() {
    FlexibilityFunction function = cantilever(1);
    MeasuredFlexibility measured =
        Invented.measured(
            "as tested",
            Invented.shaped(function.coefficients(new double[] {0, 0}), 2),
            0.01,
            0.01,
            Optional.of(new SplittableRandom(5)));
    UpdateResult result =
        SOLVER.solve(
            new UpdateProblem(
                BOTH, List.of(measured), function, new Rule.Discrepancy(), List.of(), 1));
    assertThat(result.verdict()).isEqualTo(Verdict.NO_CHANGE_WARRANTED);
    assertThat(result.parameters()).allSatisfy(p -> assertThat(p.factor()).isEqualTo(1));
    assertThat(result.undecided()).isFalse();
  }

  @Test
  void theDiscrepancyRuleTakesTheLeastChangeThatStillAgrees() {
    FlexibilityFunction function = cantilever(1);
    MeasuredFlexibility measured =
        Invented.measured(
            "as tested",
            Invented.shaped(function.coefficients(new double[] {0, Math.log(0.5)}), 2),
            0.01,
            0,
            Optional.of(new SplittableRandom(11)));
    UpdateResult result =
        SOLVER.solve(
            new UpdateProblem(
                BOTH, List.of(measured), function, new Rule.Discrepancy(), List.of(), 1));
    assertThat(result.verdict()).isEqualTo(Verdict.UPDATED);
    assertThat(result.weight()).isGreaterThan(1);
    assertThat(result.shown().agrees()).isTrue();
    double misfitRoom = result.shown().limit() - result.shown().value();
    double residualRoom = result.shown().residualLimit() - result.shown().worstResidual();
    assertThat(Math.min(misfitRoom, residualRoom)).isCloseTo(0, within(1e-2));
  }

  @Test
  void aFaultNoParameterCanExplainEndsAsMisfitsWithWidenedIntervals() {
    FlexibilityFunction function = cantilever(1);
    double[][] truth = Invented.shaped(function.coefficients(new double[] {0, 0}), 2);
    truth[0][1] *= 1.3;
    MeasuredFlexibility measured =
        Invented.measured("as tested", truth, 0.01, 0, Optional.empty());
    UpdateResult result = SOLVER.solve(Invented.problem(BOTH, measured, function));
    assertThat(result.verdict()).isEqualTo(Verdict.MISFITS_EVEN_AT_BEST);
    assertThat(result.undecided()).isTrue();
    assertThat(result.widening())
        .isCloseTo(
            Math.sqrt(result.best().value() / result.best().degreesOfFreedom()), within(1e-9));
    assertThat(result.unexplained().correctionSize()).isBetween(0.01, 0.3);
    assertThat(result.unexplained().worst().get(0)).isEqualTo("as tested: g0 / p1");
  }

  @Test
  void heldOutLoadCasesArePredictedWithTheGainsTheyShare() {
    double[][] part = Invented.matrix(4, 5, at -> 1.0 + at[0] + 0.5 * at[1]);
    double[][] own = Invented.matrix(4, 5, at -> at[1] == 4 ? 2.0 : 0.1);
    FlexibilityFunction function = Invented.determinate(new double[4][5], part, own);
    List<HeldOutCase> heldOut =
        List.of(new HeldOutCase(Optional.empty(), "p4", Where.nowhere()));
    double sum = 0;
    int tests = 200;
    SplittableRandom random = new SplittableRandom(77);
    for (int t = 0; t < tests; t++) {
      double[] x = {0.3 * random.nextGaussian(), 0.05 * random.nextGaussian()};
      MeasuredFlexibility measured =
          Invented.measured(
              "as tested",
              Invented.shaped(function.coefficients(x), 4),
              0.005,
              0.02,
              Optional.of(random));
      UpdateResult result =
          new UpdateSolver(UpdateSettings.ESTIMATES)
              .solve(
                  new UpdateProblem(
                      List.of(
                          Invented.ln("a", 0.05, 20, 0.3), Invented.ln("b", 0.05, 20, 0.05)),
                      List.of(measured),
                      function,
                      new Rule.Prior(),
                      heldOut,
                      1));
      sum += result.validation().orElseThrow().misfit();
    }
    // χ² with 4 degrees of freedom: mean 4, standard error of the mean √(8/200)
    assertThat(sum / tests).isCloseTo(4, within(4 * Math.sqrt(8.0 / tests)));
  }

  @Test
  void aHeldOutLoadCaseThatTheModelCannotPredictIsNotValidated() {
    double[][] part = Invented.matrix(3, 3, at -> 1.0 + at[0] + at[1]);
    FlexibilityFunction function = Invented.determinate(new double[3][3], part);
    double[][] truth = Invented.matrix(3, 3, at -> part[at[0]][at[1]] * (at[1] == 2 ? 1.2 : 1));
    MeasuredFlexibility measured =
        Invented.measured("as tested", truth, 0.01, 0.01, Optional.empty());
    UpdateResult result =
        SOLVER.solve(
            new UpdateProblem(
                List.of(Invented.ln("a", 0.2, 5, 0.3)),
                List.of(measured),
                function,
                new Rule.Prior(),
                List.of(new HeldOutCase(Optional.empty(), "p2", Where.nowhere())),
                1));
    assertThat(result.validation().orElseThrow().validated()).isFalse();
    assertThat(result.undecided()).isTrue();
    assertThat(result.verdict()).isEqualTo(Verdict.UPDATED);
  }

  @Test
  void nothingDependsOnTheOrderOfTheParameters() {
    FlexibilityFunction function = cantilever(1);
    FlexibilityFunction turned =
        x -> {
          FlexibilityFunction.Computed c = function.at(new double[] {x[1], x[0]});
          double[][] jacobian = new double[4][2];
          for (int i = 0; i < 4; i++) {
            jacobian[i] = new double[] {c.jacobian()[i][1], c.jacobian()[i][0]};
          }
          return new FlexibilityFunction.Computed(c.coefficients(), jacobian);
        };
    MeasuredFlexibility measured =
        Invented.measured(
            "as tested",
            Invented.shaped(function.coefficients(new double[] {0.1, -0.4}), 2),
            0.02,
            0.01,
            Optional.of(new SplittableRandom(3)));
    UpdateResult one = SOLVER.solve(Invented.problem(BOTH, measured, function));
    UpdateResult other =
        SOLVER.solve(
            Invented.problem(List.of(BOTH.get(1), BOTH.get(0)), measured, turned));
    for (int k = 0; k < 2; k++) {
      ParameterResult a = one.parameters().get(k);
      ParameterResult b = other.parameters().get(1 - k);
      assertThat(b.factor()).isCloseTo(a.factor(), within(1e-9));
      assertThat(b.lower95()).isCloseTo(a.lower95(), within(1e-6));
      assertThat(b.upper95()).isCloseTo(a.upper95(), within(1e-6));
      assertThat(b.status()).isEqualTo(a.status());
    }
  }

  @Test
  void severalStartsSayWhetherTheyAgree() {
    FlexibilityFunction function = cantilever(1);
    MeasuredFlexibility measured =
        Invented.measured(
            "as tested",
            Invented.shaped(function.coefficients(new double[] {0.1, -0.4}), 2),
            0.02,
            0.01,
            Optional.of(new SplittableRandom(3)));
    UpdateResult result =
        SOLVER.solve(
            new UpdateProblem(BOTH, List.of(measured), function, new Rule.Prior(), List.of(), 6));
    assertThat(result.convergence().starts()).hasSize(6);
    assertThat(result.convergence().startsAgree()).isTrue();
  }

  @Test
  void leavingOutALoadCaseInTheTableIsLeavingItOutOfTheFit() {
    double[][] part = Invented.matrix(3, 3, at -> 1.0 + at[0] + at[1]);
    double[][] own = Invented.matrix(3, 3, at -> 0.3 * (at[0] + 1) * (3 - at[1]));
    FlexibilityFunction function = Invented.determinate(new double[3][3], part, own);
    MeasuredFlexibility measured =
        Invented.measured(
            "as tested",
            Invented.shaped(function.coefficients(new double[] {0.1, -0.4}), 3),
            0.02,
            0.01,
            Optional.of(new SplittableRandom(9)));
    UpdateResult result = SOLVER.solve(Invented.problem(BOTH, measured, function));
    assertThat(result.withoutLoadCase()).hasSize(3);
    List<Double> factors = new ArrayList<>();
    for (int j = 0; j < 3; j++) {
      UpdateResult without =
          SOLVER.solve(
              new UpdateProblem(
                  BOTH,
                  List.of(measured),
                  function,
                  new Rule.Prior(),
                  List.of(new HeldOutCase(Optional.empty(), "p" + j, Where.nowhere())),
                  1));
      factors.add(without.parameters().get(1).updated());
      assertThat(result.withoutLoadCase().get(j).values().get(1))
          .isCloseTo(factors.get(j), within(1e-7));
      assertThat(result.withoutLoadCase().get(j).prediction().misfit())
          .isCloseTo(without.validation().orElseThrow().misfit(), within(0.6));
    }
  }
}
