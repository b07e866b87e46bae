package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SplittableRandom;
import org.flexbound.flexibility.Coefficient;
import org.flexbound.setup.Direction;
import org.flexbound.setup.ReductionOptions;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;
import org.flexbound.statistics.Quantiles;
import org.flexbound.testlog.TestLogMaker;

/**
 * Simulated load tests of an invented bracket on a moving base, from raw readings: coefficients known, all errors drawn anew for each test.
 *
 * @param name what is special
 * @param runs runs of each load
 * @param own scatter of each slope from run to run, relative
 * @param shared scatter that all gauges of a run share, relative
 * @param noise noise of a single reading, m
 * @param resolution smallest step of the dials, m
 * @param base whether the base moves and base gauges stand on it
 * @param stated repeatability as the user states it; empty for none
 */
record SimulatedTest(
    String name, int runs, double own, double shared, double noise, double resolution, boolean base, OptionalDouble stated) {
  private static final double CELL = 0.01;
  private static final double DIAL = 0.004;
  private static final double FLOOR = 1e-6;
  private static final double PEAK = 20_000;
  private static final Direction DOWN = Direction.along(new Vector(0, 0, -1));
  private static final double[] LEVELS = {0, 0.2, 0.4, 0.6, 0.8, 1, 0.8, 0.6, 0.4, 0.2, 0};

  /** A held load is read so often. */
  private static final int HELD = 3;

  private static final Map<String, Vector> NODES = new LinkedHashMap<>();

  static {
    NODES.put("A", new Vector(0.6, 0, 0.4));
    NODES.put("B", new Vector(1.2, 0, 0.4));
    NODES.put("C", new Vector(0.6, 0.3, 0.4));
    NODES.put("base 1", new Vector(-0.2, -0.2, 0));
    NODES.put("base 2", new Vector(0.2, -0.2, 0));
    NODES.put("base 3", new Vector(0, 0.3, 0));
  }

  private static final List<String> GAUGES = List.of("A", "B", "C", "base 1", "base 2", "base 3");

  /** Motion of the article's gauges per unit load at A and at B, m/N. */
  private static final double[][] TRUTH = {{2.2e-8, 4.4e-8}, {4.4e-8, 1.5e-7}, {1.6e-8, 3.1e-8}};

  /** Settling and rocking of the base per unit load at A and at B: translation down, rotations about x and y. */
  private static final double[][] BASE = {{6e-9, 2e-9, 9e-9}, {7e-9, -1e-9, 2e-8}};

  private static final Places PLACES =
      station -> station instanceof Station.AtNode node ? Optional.ofNullable(NODES.get(node.node())) : Optional.empty();

  /** What the base alone moves a gauge downwards, per unit load. */
  private static double ofBase(String gauge, int load) {
    Vector p = NODES.getOrDefault(gauge, Vector.ZERO);
    // u = t + θ × p, along −z
    return BASE[load][0] - (BASE[load][1] * p.y() - BASE[load][2] * p.x());
  }

  /**
   * One test: how many of its coefficients lie within their 95 % intervals.
   *
   * @return hits and coefficients
   */
  int[] hits(SplittableRandom random) {
    Reduction reduction = reduce(random);
    int hits = 0;
    int count = 0;
    for (Coefficient c : reduction.flexibility().coefficients()) {
      double truth = TRUTH[c.gauge()][c.load()];
      double t = Quantiles.studentT(0.975, Math.max(1, c.degreesOfFreedom()));
      hits += Math.abs(c.value() - truth) <= t * c.standardUncertainty() ? 1 : 0;
      count++;
    }
    return new int[] {hits, count};
  }

  Reduction reduce(SplittableRandom random) {
    List<String> names = base ? GAUGES : GAUGES.subList(0, TRUTH.length);
    TestLogMaker maker = new TestLogMaker().instrument("cell", CELL, 0, 0);
    for (String name : names) {
      maker.instrument("dial " + name, DIAL, FLOOR, resolution);
      maker.gauge(name, name, DOWN, "dial " + name, name.startsWith("base"));
    }
    maker.load("at A", "A", DOWN, "cell").load("at B", "B", DOWN, "cell");
    if (stated.isPresent()) {
      ReductionOptions usual = ReductionOptions.USUAL;
      maker.options(new ReductionOptions(stated, usual.fitRange(), Map.of(), usual.beddingIn(), usual.slopeFit(), usual.localGravity(),
          usual.takeOutBaseMotion(), usual.qualityLimits(), usual.decisionRule()));
    }
    double cell = CELL * random.nextGaussian();
    double[] dial = new double[names.size()];
    for (int g = 0; g < dial.length; g++) {
      dial[g] = DIAL * random.nextGaussian();
    }
    List<String> loads = List.of("at A", "at B");
    for (int load = 0; load < loads.size(); load++) {
      double[] slope = new double[dial.length];
      for (int g = 0; g < dial.length; g++) {
        double motion = (g < TRUTH.length ? TRUTH[g][load] : 0) + (base ? ofBase(names.get(g), load) : 0);
        // a fixed error at both ends of the fitted loads, which span four fifths of the peak
        slope[g] = (1 + dial[g]) * (1 + cell) * motion + Math.sqrt(2) * FLOOR / (0.8 * PEAK) * random.nextGaussian();
      }
      for (int run = 0; run < runs; run++) {
        maker.run(loads.get(load) + " " + run, loads.get(load), rows(slope, random));
      }
    }
    return Reducer.reduce(new ReductionProblem("as tested", maker.log(), PLACES)).orRefuse();
  }

  private double[][] rows(double[] slope, SplittableRandom random) {
    double together = shared * random.nextGaussian();
    double[] these = new double[slope.length];
    double[] tare = new double[slope.length];
    for (int g = 0; g < slope.length; g++) {
      these[g] = slope[g] * (1 + own * random.nextGaussian() + together);
      tare[g] = 1e-3 * random.nextDouble();
    }
    List<double[]> rows = new ArrayList<>();
    for (double level : LEVELS) {
      for (int k = 0; k < HELD; k++) {
        double[] row = new double[1 + slope.length];
        row[0] = level * PEAK;
        for (int g = 0; g < slope.length; g++) {
          double reading = tare[g] + these[g] * row[0] + noise * random.nextGaussian();
          row[1 + g] = resolution > 0 ? resolution * Math.rint(reading / resolution) : reading;
        }
        rows.add(row);
      }
    }
    return rows.toArray(double[][]::new);
  }

}
