package org.flexbound.acceptance;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Units;
import org.flexbound.reduce.Places;
import org.flexbound.reduce.Reducer;
import org.flexbound.reduce.Reduction;
import org.flexbound.reduce.ReductionProblem;
import org.flexbound.setup.DecisionRule;
import org.flexbound.setup.Direction;
import org.flexbound.setup.DirectionText;
import org.flexbound.setup.LimitKind;
import org.flexbound.setup.LimitSpec;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;
import org.flexbound.testlog.TestLog;
import org.flexbound.testlog.TestLogMaker;

/**
 * An invented test with a known truth: a head at P loaded and read along x, y and z, and three gauges
 * on the fixture below it that read along z; gains are drawn once, slopes scatter from run to run.
 */
final class InventedTest {
  static final List<String> AXES = List.of("+x", "+y", "+z");
  static final Places PLACES =
      station ->
          station instanceof Station.AtNode node
              ? Optional.ofNullable(
                  Map.of(
                          "P", new Vector(0, 0, 0.5),
                          "F1", new Vector(-0.2, -0.2, 0),
                          "F2", new Vector(0.2, -0.2, 0),
                          "F3", new Vector(0, 0.2, 0))
                      .get(node.node()))
              : Optional.empty();

  private final double[][] head;
  private final double[] fixture;
  private final double cellUncertainty;
  private final double scatter;
  private final Random random;
  private final double cellGain;
  private final double dialGain;
  private final List<double[]> slopes = new ArrayList<>();

  /**
   * A test.
   *
   * @param head the true compliance of the head, 3 × 3, m/N
   * @param fixture vertical motion of the whole fixture per unit of each load, m/N
   * @param cellUncertainty standard uncertainty of the load cell's gain
   * @param scatter relative standard deviation of a slope from run to run
   */
  InventedTest(
      double[][] head, double[] fixture, double cellUncertainty, double scatter, Random random) {
    this.head = head;
    this.fixture = fixture;
    this.cellUncertainty = cellUncertainty;
    this.scatter = scatter;
    this.random = random;
    this.cellGain = cellUncertainty * random.nextGaussian();
    this.dialGain = 0.001 * random.nextGaussian();
  }

  /** Runs every load so often more; earlier runs stay. */
  InventedTest run(int times) {
    for (int k = 0; k < times; k++) {
      for (int load = 0; load < 3; load++) {
        double[] row = new double[7];
        row[0] = load;
        for (int gauge = 0; gauge < 6; gauge++) {
          double truth =
              gauge < 3
                  ? head[gauge][load] + (gauge == 2 ? fixture[load] : 0)
                  : fixture[load];
          row[gauge + 1] =
              truth
                  * (1 + cellGain + dialGain)
                  * (1 + scatter * random.nextGaussian());
        }
        slopes.add(row);
      }
    }
    return this;
  }

  private static double[][] rows(double[] slope) {
    double[] loads = {0, 500, 1000, 500, 0};
    double[][] rows = new double[loads.length][7];
    for (int r = 0; r < loads.length; r++) {
      rows[r][0] = loads[r];
      for (int g = 0; g < 6; g++) {
        rows[r][g + 1] = slope[g + 1] * loads[r];
      }
    }
    return rows;
  }

  Reduction reduction() {
    TestLogMaker maker =
        new TestLogMaker()
            .instrument("cell", cellUncertainty, 0, 0)
            .instrument("dials", 0.001, 0, 0);
    for (String axis : AXES) {
      maker.load("push " + axis, "P", direction(axis), "cell");
    }
    for (String axis : AXES) {
      maker.gauge("head " + axis, "P", direction(axis), "dials", false);
    }
    for (String foot : List.of("F1", "F2", "F3")) {
      maker.fixtureGauge("foot " + foot, foot, direction("+z"), "dials");
    }
    for (int k = 0; k < slopes.size(); k++) {
      double[] slope = slopes.get(k);
      maker.run("run " + (k + 1), "push " + AXES.get((int) slope[0]), rows(slope));
    }
    TestLog log = maker.log();
    return Reducer.reduce(new ReductionProblem("as tested", log, PLACES)).orRefuse();
  }

  CheckedConfiguration checked(DecisionRule rule, LimitSpec... limits) {
    return new CheckedConfiguration(
        List.of(limits), rule, reduction(), List.of(), PLACES, Optional.empty());
  }

  static Direction direction(String text) {
    return DirectionText.parse(text).orElseThrow();
  }

  /** A limit; values in the unit, empty texts for what is not named. */
  static LimitSpec limit(
      LimitKind kind, String gauge, String load, String node, String direction,
      double lower, double upper, String unit) {
    return new LimitSpec(
        "limit on " + kind,
        kind,
        text(gauge),
        text(load),
        text(node),
        direction.isEmpty() ? Optional.empty() : DirectionText.parse(direction),
        si(lower, unit),
        si(upper, unit),
        Units.known(unit),
        Where.cells("log.xlsx", "Limits", "A2"));
  }

  static LimitSpec atMost(LimitKind kind, String gauge, String load, double upper, String unit) {
    return limit(kind, gauge, load, "", "", Double.NaN, upper, unit);
  }

  private static Optional<String> text(String text) {
    return text.isEmpty() ? Optional.empty() : Optional.of(text);
  }

  private static OptionalDouble si(double value, String unit) {
    return Double.isNaN(value)
        ? OptionalDouble.empty()
        : OptionalDouble.of(Units.known(unit).toSi(value));
  }
}
