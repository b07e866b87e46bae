package org.flexbound.reduce;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.flexbound.finding.Finding;
import org.flexbound.setup.Direction;
import org.flexbound.setup.Vector;
import org.flexbound.testlog.TestLogMaker;
import org.junit.jupiter.api.Test;

/** Rows of a logger without step labels. */
class HeldStepsTest {
  private static final double[] LEVELS = {0, 200, 400, 600, 800, 1000, 800, 600, 400, 200, 0};
  private static final double SLOPE = 2e-6;

  /**
   * Held loads and ramps between them.
   *
   * @param hold rows at each level
   * @param ramp rows between levels; there the gauge lags, or leads, by 0.1 mm
   * @param noise of the load, N; the gauge follows the true load
   * @param relaxed load that is lost during each hold, N
   */
  private static double[][] logged(int hold, int ramp, double noise, double relaxed) {
    Random random = new Random(5);
    List<double[]> rows = new ArrayList<>();
    for (int k = 0; k < LEVELS.length; k++) {
      for (int i = 0; i < hold; i++) {
        double load = LEVELS[k] - (LEVELS[k] > 0 ? relaxed * i / hold : 0);
        rows.add(new double[] {load + noise * random.nextGaussian(), SLOPE * load});
      }
      for (int i = 1; i <= ramp && k + 1 < LEVELS.length; i++) {
        double load = LEVELS[k] + (LEVELS[k + 1] - LEVELS[k]) * i / (ramp + 1.0);
        rows.add(new double[] {load + noise * random.nextGaussian(), SLOPE * load - 1e-4});
      }
    }
    return rows.toArray(double[][]::new);
  }

  private static Reduction reduce(List<String> loads, double[][] rows) {
    Direction down = Direction.along(new Vector(0, 0, -1));
    TestLogMaker maker =
        new TestLogMaker()
            .instrument("cell", 0, 0, 0)
            .instrument("dial", 0, 0, 0)
            .load("LA", "A", down, "cell")
            .load("LB", "B", down, "cell")
            .gauge("GA", "A", down, "dial", false);
    maker.run("1", loads, rows);
    return Reducer.reduce(new ReductionProblem("as tested", maker.log(), station -> Optional.empty())).orRefuse();
  }

  private static Reduction reduce(double[][] rows) {
    return reduce(List.of("LA"), rows);
  }

  private static double slope(Reduction reduction) {
    return reduction.slopes().get(0).slope();
  }

  @Test
  void readingsTakenWhileTheLoadMovesAreLeftOutAndToldWithTheirPlace() {
    Reduction reduction = reduce(logged(20, 9, 0, 0));
    assertThat(reduction.runs().get(0).steps()).isEqualTo(LEVELS.length);
    assertThat(slope(reduction)).isCloseTo(SLOPE, within(1e-3 * SLOPE));
    assertThat(reduction.findings())
        .filteredOn(finding -> finding.code().equals("RED-RAMPS-LEFT-OUT"))
        .singleElement()
        .satisfies(finding -> {
          assertThat(finding.where().cells()).contains("A22");
          assertThat(finding.message()).contains("run '1'");
        });
    assertThat(reduction.excluded()).anyMatch(exclusion -> exclusion.reason().equals("the load was on its way"));
  }

  @Test
  void rampsThatTakeMoreTimeThanTheHeldLoadsAreStillRamps() {
    Reduction reduction = reduce(logged(30, 120, 0, 0));
    assertThat(reduction.runs().get(0).steps()).isEqualTo(LEVELS.length);
    assertThat(slope(reduction)).isCloseTo(SLOPE, within(2e-3 * SLOPE));
  }

  @Test
  void aLoadThatCreepsWhileItIsHeldIsHeld() {
    Reduction reduction = reduce(logged(40, 6, 0, 15));
    assertThat(reduction.runs().get(0).steps()).isEqualTo(LEVELS.length);
    assertThat(slope(reduction)).isCloseTo(SLOPE, within(2e-3 * SLOPE));
  }

  @Test
  void theNoiseOfTheCellDoesNotPartAHeldLoad() {
    Reduction reduction = reduce(logged(50, 6, 5, 0));
    assertThat(reduction.runs().get(0).steps()).isEqualTo(LEVELS.length);
  }

  @Test
  void theNoiseOfAnIdleCellDoesNotPartTheStepsOfTheOther() {
    Random random = new Random(3);
    double[][] rows = logged(20, 6, 0, 0);
    for (int r = 0; r < rows.length; r++) {
      rows[r] = new double[] {rows[r][0], 3 * random.nextGaussian(), rows[r][1]};
    }
    Reduction reduction = reduce(List.of("LA", "LB"), rows);
    assertThat(reduction.runs().get(0).steps()).isEqualTo(LEVELS.length);
    assertThat(reduction.runs().get(0).loads()).containsExactly("LA");
  }

  @Test
  void loadsReadByHandAreAllHeld() {
    for (int readings = 1; readings <= 3; readings++) {
      Reduction reduction = reduce(logged(readings, 0, 0.5, 0));
      assertThat(reduction.runs().get(0).steps()).as(readings + " a step").isEqualTo(LEVELS.length);
      assertThat(reduction.findings()).extracting(Finding::code).containsExactly("RED-NOT-MEASURED", "RED-ONE-RUN");
    }
  }

  @Test
  void oneReadingBeforeTheFirstRampIsTheOpeningZero() {
    double[][] all = logged(20, 9, 0, 0);
    double[][] rows = java.util.Arrays.copyOfRange(all, 19, all.length - 19);
    List<LoadStep> steps = reduce(rows).slopes().get(0).steps();
    assertThat(steps).hasSize(LEVELS.length);
    assertThat(steps.get(0).readings()).isEqualTo(1);
    assertThat(steps).extracting(LoadStep::load).usingElementComparator(Comparator.naturalOrder()).contains(0.0, 1000.0);
  }

  @Test
  void aLoadThatNeverStandsStillIsAFinding() {
    double[][] slow = new double[2000][];
    double[][] fast = new double[200][];
    for (double[][] rows : List.of(slow, fast)) {
      for (int r = 0; r < rows.length; r++) {
        double load = 1000 * (1 - Math.abs(2.0 * r / (rows.length - 1) - 1));
        rows[r] = new double[] {load, SLOPE * load};
      }
      Reduction reduction = reduce(rows);
      assertThat(reduction.findings()).extracting(Finding::code).contains("RED-NEVER-HELD");
      assertThat(slope(reduction)).isCloseTo(SLOPE, within(1e-9 * SLOPE));
    }
  }
}
