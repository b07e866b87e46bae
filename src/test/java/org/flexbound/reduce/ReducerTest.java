package org.flexbound.reduce;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.ArrayList;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Optional;
import java.util.Random;
import java.util.function.IntToDoubleFunction;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Outcome;
import org.flexbound.flexibility.Coefficient;
import org.flexbound.setup.Direction;
import org.flexbound.setup.ReductionOptions;
import org.flexbound.setup.SlopeFit;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;
import org.flexbound.testlog.TestLogMaker;
import org.junit.jupiter.api.Test;

class ReducerTest {
  private static final Direction DOWN = Direction.along(new Vector(0, 0, -1));

  private static final Map<String, Vector> NODES =
      Map.of(
          "A", new Vector(1, 0, 0),
          "B", new Vector(2, 0, 0),
          "base1", new Vector(0, 0, 0),
          "base2", new Vector(0, 1, 0),
          "base3", new Vector(-1, 0, 0));

  private static final Places PLACES =
      station ->
          station instanceof Station.AtNode node
              ? Optional.ofNullable(NODES.get(node.node()))
              : Optional.empty();

  /** Up and down once in ten steps, each gauge following its slope with an offset and scatter. */
  private static double[][] rows(double[] slopes, double scatter, Random random) {
    double[][] rows = new double[11][slopes.length + 1];
    for (int k = 0; k < rows.length; k++) {
      double load = 1000 * (k <= 5 ? k : 10 - k) / 5.0;
      rows[k][0] = load;
      for (int g = 0; g < slopes.length; g++) {
        rows[k][g + 1] = 0.001 + slopes[g] * load + scatter * random.nextGaussian();
      }
    }
    return rows;
  }

  private static Reduction reduce(TestLogMaker maker) {
    Outcome<Reduction> outcome =
        Reducer.reduce(new ReductionProblem("as tested", maker.log(), PLACES));
    assertThat(outcome.hasErrors()).as(outcome.findings().toString()).isFalse();
    return outcome.value().orElseThrow();
  }

  private static TestLogMaker twoByTwo(double[][] a, double scatter, int runs) {
    Random random = new Random(7);
    TestLogMaker maker =
        new TestLogMaker()
            .instrument("cell", 0.01, 0, 0)
            .instrument("dial", 0.002, 1e-6, 0)
            .load("LA", "A", DOWN, "cell")
            .load("LB", "B", DOWN, "cell")
            .gauge("GA", "A", DOWN, "dial", false)
            .gauge("GB", "B", DOWN, "dial", false);
    for (int run = 0; run < runs; run++) {
      maker.run("A" + run, "LA", rows(new double[] {a[0][0], a[1][0]}, scatter, random));
      maker.run("B" + run, "LB", rows(new double[] {a[0][1], a[1][1]}, scatter, random));
    }
    return maker;
  }

  @Test
  void exactReadingsGiveTheExactCoefficients() {
    double[][] a = {{2e-6, 5e-6}, {5e-6, 16e-6}};
    Reduction reduction = reduce(twoByTwo(a, 0, 1));
    for (Coefficient c : reduction.flexibility().coefficients()) {
      assertThat(c.value()).isCloseTo(a[c.gauge()][c.load()], within(1e-18));
    }
    assertThat(reduction.runs()).allMatch(run -> run.verdict() == RunVerdict.ACCEPT);
    assertThat(reduction.withoutSpread()).isTrue();
    assertThat(reduction.findings()).extracting(Finding::code).containsExactly("RED-ONE-RUN");
  }

  @Test
  void calibrationOfTheCellEntersEveryCoefficientAsOneGain() {
    double[][] a = {{2e-6, 5e-6}, {5e-6, 16e-6}};
    Reduction reduction = reduce(twoByTwo(a, 1e-7, 3));
    Coefficient c = reduction.flexibility().coefficients().get(0);
    double floor = reduction.flexibility().absolute().get(0).floorUncertainty();
    // the floor at both ends of the fitted loads; what is open between drift and set adds next to nothing
    assertThat(floor).isCloseTo(Math.sqrt(2) * 1e-6 / 800, within(1e-4 * floor));
    double expected =
        Math.sqrt(
            Math.pow(c.value() * Math.hypot(0.01, 0.002), 2)
                + floor * floor
                + Math.pow(
                    reduction.flexibility().absolute().get(0).scatterUncertainty(), 2));
    assertThat(c.standardUncertainty()).isCloseTo(expected, within(1e-12 * expected));
    assertThat(reduction.flexibility().gains()).hasSize(2);
  }

  @Test
  void reciprocityHoldsOnGoodDataAndFailsOnAMisreadGauge() {
    double[][] good = {{2e-6, 5e-6}, {5e-6, 16e-6}};
    assertThat(reduce(twoByTwo(good, 1e-8, 3)).reciprocity().pairs()).hasSize(1);
    assertThat(reduce(twoByTwo(good, 1e-8, 3)).findings())
        .extracting(Finding::code)
        .doesNotContain("RED-NOT-RECIPROCAL");
    double[][] bad = {{2e-6, 5e-6}, {6e-6, 16e-6}};
    assertThat(reduce(twoByTwo(bad, 1e-8, 3)).findings())
        .extracting(Finding::code)
        .contains("RED-NOT-RECIPROCAL");
  }

  @Test
  void rockingOfTheBaseIsTakenOut() {
    double settle = 1e-6;
    double rock = 3e-6;
    TestLogMaker maker =
        new TestLogMaker()
            .instrument("cell", 0.01, 0, 0)
            .instrument("dial", 0.002, 0, 0)
            .load("LB", "B", DOWN, "cell")
            .gauge("GB", "B", DOWN, "dial", false)
            .gauge("b1", "base1", DOWN, "dial", true)
            .gauge("b2", "base2", DOWN, "dial", true)
            .gauge("b3", "base3", DOWN, "dial", true);
    double[] slopes = {16e-6 + settle + 2 * rock, settle, settle, settle - rock};
    maker.run("1", "LB", rows(slopes, 0, new Random(1)));
    Reduction reduction = reduce(maker);
    assertThat(reduction.flexibility().coefficients()).hasSize(1);
    assertThat(reduction.flexibility().coefficients().get(0).value())
        .isCloseTo(16e-6, within(1e-15));
    assertThat(reduction.baseMotionShare().get("GB|LB")).isCloseTo(7.0 / 23, within(1e-9));
  }

  @Test
  void aSingleBaseGaugeDoesNotDetermineRocking() {
    TestLogMaker maker =
        new TestLogMaker()
            .instrument("cell", 0.01, 0, 0)
            .instrument("dial", 0.002, 0, 0)
            .load("LB", "B", DOWN, "cell")
            .gauge("GB", "B", DOWN, "dial", false)
            .gauge("b1", "base1", DOWN, "dial", true);
    maker.run("1", "LB", rows(new double[] {17e-6, 1e-6}, 0, new Random(1)));
    Reduction reduction = reduce(maker);
    assertThat(reduction.flexibility().coefficients().get(0).value())
        .isCloseTo(17e-6, within(1e-15));
    assertThat(reduction.findings()).extracting(Finding::code).contains("RED-BASE-MOTION-LEFT");
  }

  @Test
  void theFirstOfTwoCyclesIsLeftOut() {
    TestLogMaker maker =
        new TestLogMaker()
            .instrument("cell", 0, 0, 0)
            .instrument("dial", 0, 0, 0)
            .load("LA", "A", DOWN, "cell")
            .gauge("GA", "A", DOWN, "dial", false);
    double[][] first = rows(new double[] {9e-6}, 0, new Random(1));
    double[][] second = rows(new double[] {2e-6}, 0, new Random(1));
    double[][] both = new double[22][];
    System.arraycopy(first, 0, both, 0, 11);
    System.arraycopy(second, 0, both, 11, 11);
    maker.run("1", "LA", both);
    Reduction reduction = reduce(maker);
    assertThat(reduction.flexibility().coefficients().get(0).value())
        .isCloseTo(2e-6, within(1e-15));
    assertThat(reduction.runs().get(0).cycles()).isEqualTo(2);
  }

  @Test
  void pullAndPushAreOneCycleAndBothAreUsed() {
    TestLogMaker maker =
        new TestLogMaker()
            .instrument("cell", 0, 0, 0)
            .instrument("dial", 0, 0, 0)
            .load("LA", "A", DOWN, "cell")
            .gauge("GA", "A", DOWN, "dial", false);
    double[][] pull = rows(new double[] {2e-6}, 0, new Random(1));
    double[][] both = new double[22][];
    for (int k = 0; k < 11; k++) {
      both[k] = pull[k];
      both[11 + k] = new double[] {-pull[k][0], 0.001 - 2e-6 * pull[k][0]};
    }
    maker.run("1", "LA", both);
    Reduction reduction = reduce(maker);
    assertThat(reduction.runs().get(0).cycles()).isEqualTo(1);
    assertThat(reduction.slopes().get(0).steps())
        .filteredOn(step -> step.fate() == LoadStep.Fate.FITTED)
        .extracting(LoadStep::load)
        .contains(1000.0, -1000.0);
  }

  /** Two jacks: A goes up and down while B is held at three levels, twice; the first time A goes up the bracket beds in. */
  private static double[][] twoJacks(double[] slopes, double scatter, Random random) {
    List<double[]> rows = new ArrayList<>();
    for (int round = 0; round < 2; round++) {
      for (double b : new double[] {0, 500, 1000, 0}) {
        for (double a : new double[] {0, 400, 800, 400, 0}) {
          double bedding = rows.size() < 5 ? 3e-4 * Math.max(a / 800, rows.size() > 2 ? 1 : 0) : 3e-4;
          rows.add(new double[] {a, b, bedding + slopes[0] * a + slopes[1] * b + scatter * random.nextGaussian()});
        }
      }
    }
    return rows.toArray(double[][]::new);
  }

  private static TestLogMaker underTwoJacks() {
    return new TestLogMaker()
        .instrument("cell", 0, 0, 0)
        .instrument("dial", 0, 0, 0)
        .load("LA", "A", DOWN, "cell")
        .load("LB", "B", DOWN, "cell")
        .gauge("GA", "A", DOWN, "dial", false);
  }

  @Test
  void severalJacksAtOnceAreToldApartWithoutTheBeddingIn() {
    TestLogMaker maker = underTwoJacks();
    maker.run("1", List.of("LA", "LB"), twoJacks(new double[] {2e-6, 5e-6}, 0, new Random(1)));
    Reduction reduction = reduce(maker);
    assertThat(reduction.flexibility().coefficients().get(0).value()).isCloseTo(2e-6, within(1e-15));
    assertThat(reduction.flexibility().coefficients().get(1).value()).isCloseTo(5e-6, within(1e-15));
    assertThat(reduction.slopes()).allSatisfy(slope -> {
      assertThat(slope.quality()).isPresent();
      assertThat(slope.steps()).anyMatch(step -> step.fate() == LoadStep.Fate.BEDDING_IN);
    });
  }

  @Test
  void theSlopesOfSeveralJacksScatterAsTheirStandardErrorsSay() {
    double squares = 0;
    int tests = 200;
    for (int test = 0; test < tests; test++) {
      TestLogMaker maker = underTwoJacks();
      maker.run("1", List.of("LA", "LB"), twoJacks(new double[] {2e-6, 5e-6}, 1e-5, new Random(100 + test)));
      RunSlope slope = reduce(maker).slopes().get(1);
      squares += Math.pow((slope.slope() - 5e-6) / slope.standardError(), 2);
    }
    // the mean square of Student's t with 20 or so degrees of freedom is 1.1; its standard error here 0.12
    assertThat(squares / tests).isBetween(0.75, 1.5);
  }

  @Test
  void aStatedRepeatabilityCountsWhereItIsLargerThanWhatWasSeen() {
    double[][] a = {{2e-6, 5e-6}, {5e-6, 16e-6}};
    TestLogMaker maker = twoByTwo(a, 1e-8, 3);
    ReductionOptions usual = ReductionOptions.USUAL;
    maker.options(
        new ReductionOptions(
            OptionalDouble.of(0.02), usual.fitRange(), Map.of(), usual.beddingIn(), usual.slopeFit(), usual.localGravity(),
            usual.takeOutBaseMotion(), usual.qualityLimits(), usual.decisionRule()));
    Reduction reduction = reduce(maker);
    assertThat(reduction.flexibility().absolute()).allSatisfy(c ->
        assertThat(c.scatterUncertainty()).isCloseTo(0.02 * c.value() / Math.sqrt(3), within(1e-6 * c.value())));
    assertThat(reduction.findings()).extracting(Finding::code).contains("RED-SCATTER-AND-STATED");
  }

  @Test
  void aRepeatabilityThatTheRunsContradictIsAFinding() {
    double[][] a = {{2e-6, 5e-6}, {5e-6, 16e-6}};
    TestLogMaker maker = twoByTwo(a, 4e-5, 3);
    ReductionOptions usual = ReductionOptions.USUAL;
    maker.options(
        new ReductionOptions(
            OptionalDouble.of(1e-4), usual.fitRange(), Map.of(), usual.beddingIn(), usual.slopeFit(), usual.localGravity(),
            usual.takeOutBaseMotion(), usual.qualityLimits(), usual.decisionRule()));
    assertThat(reduce(maker).findings()).extracting(Finding::code).contains("RED-SCATTER-ABOVE-STATED");
  }

  @Test
  void copiedRunsAreNoRepeats() {
    double[][] a = {{2e-6, 5e-6}, {5e-6, 16e-6}};
    assertThat(reduce(twoByTwo(a, 0, 3)).findings()).extracting(Finding::code).contains("RED-NO-SCATTER");
  }

  @Test
  void resolutionLeavesAnUncertaintyWhereNothingScatters() {
    TestLogMaker maker =
        new TestLogMaker()
            .instrument("cell", 0, 0, 0)
            .instrument("dial", 0, 0, 1e-5)
            .load("LA", "A", DOWN, "cell")
            .gauge("GA", "A", DOWN, "dial", false);
    for (int run = 0; run < 3; run++) {
      maker.run("r" + run, "LA", rows(new double[] {2e-6}, 0, new Random(1)));
    }
    Coefficient c = reduce(maker).flexibility().coefficients().get(0);
    // fitted loads up 200 to 1000 and down 800 to 200, each about its own mean: 400 000 + 200 000 N²
    assertThat(c.standardUncertainty()).isCloseTo(1e-5 / Math.sqrt(12 * 600_000.0), within(1e-12));
  }

  /** One gauge through cycles with held loads; what it shows beside its line is a function of row and cycle. */
  private static TestLogMaker oneGauge(int cycles, ReductionOptions options, IntToDoubleFunction beside) {
    TestLogMaker maker =
        new TestLogMaker()
            .instrument("cell", 0, 0, 0)
            .instrument("dial", 0, 0, 0)
            .load("LA", "A", DOWN, "cell")
            .gauge("GA", "A", DOWN, "dial", false)
            .options(options);
    List<double[]> rows = new ArrayList<>();
    for (int cycle = 0; cycle < cycles; cycle++) {
      for (int k = 0; k < 12; k++) {
        double load = 1000 * (k <= 6 ? k : 12 - k) / 6.0;
        for (int held = 0; held < 5; held++) {
          rows.add(new double[] {load, 2e-6 * load + beside.applyAsDouble(rows.size())});
        }
      }
    }
    for (int held = 0; held < 5; held++) {
      rows.add(new double[] {0, beside.applyAsDouble(rows.size())});
    }
    return maker.run("1", "LA", rows.toArray(double[][]::new));
  }

  private static ReductionOptions fitted(SlopeFit how) {
    ReductionOptions usual = ReductionOptions.USUAL;
    return new ReductionOptions(usual.statedRepeatability(), usual.fitRange(), Map.of(), usual.beddingIn(), how, usual.localGravity(),
        usual.takeOutBaseMotion(), usual.qualityLimits(), usual.decisionRule());
  }

  @Test
  void whatGoesOnAtNoLoadIsDriftAndIsTakenOut() {
    Random random = new Random(2);
    Reduction reduction = reduce(oneGauge(1, ReductionOptions.USUAL, row -> 4e-6 * row + 1e-7 * random.nextGaussian()));
    RunSlope slope = reduction.slopes().get(0);
    assertThat(slope.quality().orElseThrow().zero()).isEqualTo(ZeroReturn.Kind.DRIFT);
    assertThat(slope.slope()).isCloseTo(2e-6, within(1e-9));
  }

  @Test
  void whatDoesNotComeBackIsSetAndTheOtherTreatmentIsCarried() {
    // rises with the load only on the way up: at the top it has moved for good
    Reduction reduction = reduce(oneGauge(1, ReductionOptions.USUAL, row -> 2e-7 * Math.max(0, Math.min(row, 35) - 5)));
    RunSlope slope = reduction.slopes().get(0);
    assertThat(slope.quality().orElseThrow().zero()).isEqualTo(ZeroReturn.Kind.SET);
    assertThat(slope.quality().orElseThrow().zeroReturn()).isCloseTo(6e-6 / 2.006e-3, within(1e-4));
    assertThat(reduction.flexibility().absolute().get(0).floorUncertainty())
        .isCloseTo(slope.otherTreatment() / Math.sqrt(3), within(1e-15));
  }

  @Test
  void zerosThatMoveOnFromCycleToCycleAreDrift() {
    Reduction reduction = reduce(oneGauge(3, ReductionOptions.USUAL, row -> 2e-6 * Math.floorDiv(row, 60)));
    assertThat(reduction.slopes().get(0).quality().orElseThrow().zero()).isEqualTo(ZeroReturn.Kind.DRIFT);
    reduction = reduce(oneGauge(3, ReductionOptions.USUAL, row -> row < 60 ? 0 : 2e-6));
    assertThat(reduction.slopes().get(0).quality().orElseThrow().zero()).isEqualTo(ZeroReturn.Kind.SET);
  }

  @Test
  void aRobustFitIsNotMovedByAMisreadStep() {
    IntToDoubleFunction misread = row -> (row >= 25 && row < 30 ? 4e-4 : 0) + 1e-7 * Math.sin(row);
    assertThat(reduce(oneGauge(1, fitted(SlopeFit.ROBUST), misread)).slopes().get(0).slope()).isCloseTo(2e-6, within(2e-9));
    assertThat(reduce(oneGauge(1, fitted(SlopeFit.ORDINARY), misread)).slopes().get(0).slope()).isNotCloseTo(2e-6, within(2e-8));
  }

  @Test
  void theFitThatWasUsedIsSaid() {
    IntToDoubleFunction noise = row -> 1e-6 * Math.sin(12.9898 * row);
    assertThat(reduce(oneGauge(1, fitted(SlopeFit.AUTOMATIC), noise)).slopes().get(0).fit()).isEqualTo(SlopeFit.ORDINARY);
    assertThat(reduce(oneGauge(1, fitted(SlopeFit.WEIGHTED), noise)).slopes().get(0).fit()).isEqualTo(SlopeFit.WEIGHTED);
    // a load that is exact leaves nothing to weigh in both variables
    assertThat(reduce(oneGauge(1, fitted(SlopeFit.BOTH_VARIABLES), noise)).slopes().get(0).fit()).isEqualTo(SlopeFit.ORDINARY);
  }

  @Test
  void pullAndPushAreHeldAgainstEachOther() {
    TestLogMaker maker =
        new TestLogMaker()
            .instrument("cell", 0, 0, 0)
            .instrument("dial", 0, 0, 0)
            .load("LA", "A", DOWN, "cell")
            .gauge("GA", "A", DOWN, "dial", false);
    double[][] pull = rows(new double[] {2e-6}, 1e-6, new Random(1));
    double[][] both = new double[22][];
    for (int k = 0; k < 11; k++) {
      both[k] = pull[k];
      both[11 + k] = new double[] {-pull[k][0], 0.001 - 3e-6 * pull[k][0] + 1e-6 * Math.cos(k)};
    }
    SlopePair pair = reduce(maker.run("1", "LA", both)).slopes().get(0).quality().orElseThrow().pullPush().orElseThrow();
    assertThat(pair.first()).isCloseTo(2e-6, within(1e-8));
    assertThat(pair.second()).isCloseTo(3e-6, within(1e-8));
    assertThat(pair.probability()).isLessThan(1e-6);
  }

  @Test
  void pullAndPushThatDifferAreToldWithTheirSlopes() {
    TestLogMaker maker =
        new TestLogMaker()
            .instrument("cell", 0, 0, 0)
            .instrument("dial", 0, 0, 0)
            .load("LA", "A", DOWN, "cell")
            .gauge("GA", "A", DOWN, "dial", false);
    double[][] pull = rows(new double[] {2e-6}, 1e-6, new Random(1));
    double[][] push = rows(new double[] {2.1e-6}, 1e-6, new Random(2));
    double[][] both = new double[22][];
    for (int k = 0; k < 11; k++) {
      both[k] = pull[k];
      both[11 + k] = new double[] {-push[k][0], 0.002 - push[k][1]};
    }
    maker.run("1", "LA", both);
    Reduction reduction = reduce(maker);
    assertThat(reduction.findings())
        .filteredOn(finding -> finding.code().equals("RED-PULL-PUSH"))
        .singleElement()
        .satisfies(finding -> assertThat(finding.message()).contains("by -4.").contains("limit 2.0 %"));
    assertThat(reduction.runs().get(0).verdict()).isNotEqualTo(RunVerdict.ACCEPT);
  }

  @Test
  void aGaugeIsJudgedAmongThoseOfItsKind() {
    Direction tilt = Direction.about(new Vector(0, 1, 0));
    TestLogMaker maker =
        new TestLogMaker()
            .instrument("cell", 0, 0, 0)
            .instrument("dial", 0, 0, 0)
            .load("LA", "A", DOWN, "cell")
            .gauge("GA", "A", DOWN, "dial", false)
            .gauge("tilt", "A", tilt, "dial", false);
    // a thousand times smaller as numbers go, but radians are no metres; its unloading is far off its loading
    double[][] rows = rows(new double[] {2e-6, 2e-9}, 0, new Random(1));
    for (int k = 6; k < rows.length; k++) {
      rows[k][2] += 4e-7;
    }
    maker.run("1", "LA", rows);
    Reduction reduction = reduce(maker);
    assertThat(reduction.runs().get(0).verdict()).isNotEqualTo(RunVerdict.ACCEPT);
    assertThat(reduction.runs().get(0).reasons()).anyMatch(reason -> reason.startsWith("tilt"));
  }
}
