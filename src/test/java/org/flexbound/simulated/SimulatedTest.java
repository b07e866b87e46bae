package org.flexbound.simulated;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.SplittableRandom;
import org.flexbound.finding.Outcome;
import org.flexbound.reduce.Places;
import org.flexbound.reduce.Reducer;
import org.flexbound.reduce.Reduction;
import org.flexbound.reduce.ReductionProblem;
import org.flexbound.setup.Direction;
import org.flexbound.setup.ReductionOptions;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;
import org.flexbound.solve.FrameFlexibility;
import org.flexbound.testlog.TestLog;
import org.flexbound.testlog.TestLogMaker;

/**
 * A simulated load test of an invented structure, sound in every way until a fault is put into it:
 * random loads, gauges, base gauges, steps, cycles, runs, rows a step, noise, resolution,
 * calibration, friction, bedding-in and drift, all of them small.
 */
final class SimulatedTest {
  private static final double CELL = 0.005;
  private static final double DIAL = 0.003;

  final SplittableRandom random;
  final SimulatedFrame frame;
  final List<Place> loads = new ArrayList<>();
  final List<Place> gauges = new ArrayList<>();
  final List<SimulatedRun> runs = new ArrayList<>();
  final double[] resolution;
  final double[] peak;
  final OptionalDouble[] limit;
  double[][] truth = new double[0][];
  private final boolean statedRepeatability;

  /** Where something is loaded or read, and along which axis. */
  record Place(String node, char axis, boolean base) {
    String name() {
      return node + " " + axis;
    }

    Direction direction() {
      return Direction.along(
          switch (axis) {
            case 'x' -> new Vector(1, 0, 0);
            case 'y' -> new Vector(0, 1, 0);
            default -> new Vector(0, 0, 1);
          });
    }
  }

  /** One run as it would be logged: load, then gauges, and which held level each row belongs to. */
  static final class SimulatedRun {
    final int load;
    final int number;
    double[][] rows;
    final int[] level;

    SimulatedRun(int load, int number, double[][] rows, int[] level) {
      this.load = load;
      this.number = number;
      this.rows = rows;
      this.level = level;
    }

    int levels() {
      return level[level.length - 1] + 1;
    }

    /** Largest less smallest reading of a gauge. */
    double span(int gauge) {
      double low = Double.POSITIVE_INFINITY;
      double high = Double.NEGATIVE_INFINITY;
      for (double[] row : rows) {
        low = Math.min(low, row[1 + gauge]);
        high = Math.max(high, row[1 + gauge]);
      }
      return high - low;
    }

    /** The row at which the largest load is reached last. */
    int top() {
      int top = 0;
      for (int r = 0; r < rows.length; r++) {
        top = Math.abs(rows[r][0]) >= Math.abs(rows[top][0]) ? r : top;
      }
      return top;
    }
  }

  SimulatedTest(long seed) {
    random = new SplittableRandom(seed);
    frame = new SimulatedFrame(random, random.nextInt(3) == 0);
    choosePlaces();
    peak = new double[loads.size()];
    limit = new OptionalDouble[loads.size()];
    resolution = new double[gauges.size()];
    TestLog empty = maker().log();
    truth =
        FrameFlexibility.prepare(frame.model(), empty.gauges(), empty.loads(), List.of())
            .orRefuse()
            .solve(List.of())
            .values();
    chooseLoadsAndResolution();
    int runsEach = 1 + random.nextInt(4);
    statedRepeatability = runsEach == 1;
    measure(runsEach);
  }

  private void choosePlaces() {
    List<String> nodes = frame.structure();
    int wanted = 2 + random.nextInt(4);
    Set<Place> chosen = new LinkedHashSet<>();
    while (chosen.size() < wanted) {
      chosen.add(place(nodes));
    }
    loads.addAll(chosen);
    Set<Place> read = new LinkedHashSet<>();
    for (Place load : loads) {
      if (random.nextInt(10) > 0) {
        read.add(load);
      }
    }
    int more = 1 + random.nextInt(6);
    for (int k = 0; k < more; k++) {
      read.add(place(nodes));
    }
    gauges.addAll(read);
    if (frame.movingBase()) {
      for (String base : List.of("b1 z", "b2 z", "b3 z", "b1 x", "b4 x", "b2 y", "b3 y")) {
        gauges.add(new Place(base.substring(0, 2), base.charAt(3), true));
      }
    }
  }

  /** A place that moves: not along the post, nor along the arm where that hardly moves. */
  private Place place(List<String> nodes) {
    while (true) {
      String node = nodes.get(random.nextInt(nodes.size()));
      char axis = "xyz".charAt(random.nextInt(3));
      boolean top = node.equals(lastOfPost(nodes));
      boolean moves = axis != 'z' || (node.startsWith("a") && !top);
      if (moves) {
        return new Place(node, axis, false);
      }
    }
  }

  private static String lastOfPost(List<String> nodes) {
    return nodes.stream().filter(n -> n.startsWith("p")).reduce((a, b) -> b).orElseThrow();
  }

  private double uniform(double low, double high) {
    return low + (high - low) * random.nextDouble();
  }

  private void chooseLoadsAndResolution() {
    for (int j = 0; j < peak.length; j++) {
      double largest = 0;
      for (int i = 0; i < gauges.size(); i++) {
        largest = Math.max(largest, Math.abs(truth[i][j]));
      }
      peak[j] = round(uniform(0.004, 0.02) / largest, 2);
      limit[j] =
          random.nextInt(2) == 0 ? OptionalDouble.of(1.1 * peak[j]) : OptionalDouble.empty();
    }
    for (int i = 0; i < resolution.length; i++) {
      double largest = 0;
      for (int j = 0; j < peak.length; j++) {
        largest = Math.max(largest, Math.abs(truth[i][j]) * peak[j]);
      }
      // a finger's breadth on a dial of 0.01 mm, or finer by as much as the movement is smaller
      resolution[i] = Math.pow(10, Math.floor(Math.log10(largest / 500)));
    }
  }

  private static double round(double value, int digits) {
    double scale = Math.pow(10, digits - 1 - Math.floor(Math.log10(value)));
    return Math.round(value * scale) / scale;
  }

  private void measure(int runsEach) {
    double cell = CELL * random.nextGaussian();
    double[] dial = new double[gauges.size()];
    for (int i = 0; i < dial.length; i++) {
      dial[i] = DIAL * random.nextGaussian();
    }
    double noise = uniform(0.2, 1.5);
    double share = uniform(0.0005, 0.005);
    int steps = 5 + random.nextInt(5);
    int cycles = 1 + random.nextInt(3);
    int rowsEach = random.nextInt(2) == 0 ? 1 : 1 + random.nextInt(12);
    boolean bothWays = random.nextInt(10) == 0;
    boolean fewerDown = random.nextInt(3) == 0;
    double friction = uniform(0, 0.008);
    double bedding = uniform(0, 0.01);
    double drift = uniform(0, 0.004);
    for (int j = 0; j < loads.size(); j++) {
      for (int n = 0; n < runsEach; n++) {
        List<double[]> levels = levels(steps, cycles, bothWays, fewerDown);
        List<double[]> rows = new ArrayList<>();
        List<Integer> level = new ArrayList<>();
        double[] tare = new double[gauges.size()];
        double[] own = new double[gauges.size()];
        double[] wander = new double[gauges.size()];
        double common = share * random.nextGaussian();
        for (int i = 0; i < own.length; i++) {
          tare[i] = random.nextInt(2) == 0 ? 0 : uniform(-0.002, 0.002);
          own[i] =
              truth[i][j] * (1 + dial[i]) * (1 + cell) * (1 + common + share * random.nextGaussian());
          wander[i] = drift * (2 * random.nextDouble() - 1);
        }
        double[] trail = new double[1];
        double reached = 0;
        for (int k = 0; k < levels.size(); k++) {
          double target = levels.get(k)[0] * peak[j];
          double held = target == 0 ? 0 : target + 0.003 * peak[j] * random.nextGaussian();
          double time = k / (double) levels.size();
          reached = Math.max(reached, Math.abs(levels.get(k)[0]));
          double settled = bedding * reached;
          trail[0] = friction(trail[0], held / peak[j], friction);
          for (int r = 0; r < rowsEach; r++) {
            double[] row = new double[1 + own.length];
            double load = held + 0.0002 * peak[j] * random.nextGaussian();
            row[0] = Math.rint(load / (1e-4 * peak[j])) * 1e-4 * peak[j];
            for (int i = 0; i < own.length; i++) {
              double span = own[i] * peak[j];
              double motion =
                  own[i] * load + span * (trail[0] - held / peak[j] + settled + wander[i] * time);
              double read = tare[i] + motion + noise * resolution[i] * random.nextGaussian();
              row[1 + i] = Math.rint(read / resolution[i]) * resolution[i];
            }
            rows.add(row);
            level.add(k);
          }
        }
        runs.add(
            new SimulatedRun(
                j,
                n,
                rows.toArray(double[][]::new),
                level.stream().mapToInt(Integer::intValue).toArray()));
      }
    }
  }

  /** A slider that follows within half the gap (play operator), in shares of the peak. */
  private static double friction(double trail, double load, double gap) {
    double half = gap / 2;
    return Math.max(load - half, Math.min(load + half, trail));
  }

  /** Shares of the peak, held one after another, each with its cycle. */
  private static List<double[]> levels(
      int steps, int cycles, boolean bothWays, boolean fewerDown) {
    List<double[]> levels = new ArrayList<>();
    levels.add(new double[] {0, 1});
    for (int c = 1; c <= cycles; c++) {
      for (double sign : bothWays ? new double[] {1, -1} : new double[] {1}) {
        for (int k = 1; k <= steps; k++) {
          levels.add(new double[] {sign * k / steps, c});
        }
        for (int k = steps - 1; k >= 0; k--) {
          if (!fewerDown || k % 2 == 0) {
            levels.add(new double[] {sign * k / steps, c});
          }
        }
      }
    }
    return levels;
  }

  private TestLogMaker maker() {
    TestLogMaker maker = new TestLogMaker().instrument("cell", CELL, 0, 0);
    for (int i = 0; i < gauges.size(); i++) {
      Place place = gauges.get(i);
      double step = resolution == null ? 0 : resolution[i];
      maker.instrument("dial " + place.name(), DIAL, step, step);
      maker.gauge(
          place.name(), place.node(), place.direction(), "dial " + place.name(), place.base());
    }
    for (int j = 0; j < loads.size(); j++) {
      Place place = loads.get(j);
      maker.load(place.name(), place.node(), place.direction(), "cell");
      if (limit != null && limit[j] != null) {
        limit[j].ifPresent(value -> maker.limit(place.name(), value));
      }
    }
    return maker;
  }

  TestLog log() {
    TestLogMaker maker = maker();
    for (SimulatedRun run : runs) {
      Place load = loads.get(run.load);
      maker.run(load.name() + " run " + (run.number + 1), load.name(), run.rows);
    }
    ReductionOptions usual = ReductionOptions.USUAL;
    if (statedRepeatability) {
      maker.options(
          new ReductionOptions(
              OptionalDouble.of(0.007),
              usual.fitRange(),
              usual.fitRangeByGauge(),
              usual.beddingIn(),
              usual.slopeFit(),
              usual.localGravity(),
              usual.takeOutBaseMotion(),
              usual.qualityLimits(),
              usual.decisionRule()));
    }
    return maker.log();
  }

  /** What a gauge elsewhere would show, for each load. */
  double[] row(Place place) {
    return solve(List.of(place), loads)[0];
  }

  /** What each gauge would show of a load elsewhere. */
  double[] column(Place place) {
    double[][] one = solve(gauges, List.of(place));
    return Arrays.stream(one).mapToDouble(line -> line[0]).toArray();
  }

  private double[][] solve(List<Place> read, List<Place> loaded) {
    TestLogMaker maker = new TestLogMaker().instrument("cell", CELL, 0, 0);
    read.forEach(p -> maker.gauge(p.name(), p.node(), p.direction(), "cell", false));
    loaded.forEach(p -> maker.load(p.name(), p.node(), p.direction(), "cell"));
    TestLog empty = maker.log();
    return FrameFlexibility.prepare(frame.model(), empty.gauges(), empty.loads(), List.of())
        .orRefuse()
        .solve(List.of())
        .values();
  }

  Places places() {
    return station ->
        station instanceof Station.AtNode at
            ? Optional.of(frame.place(at.node()))
            : Optional.empty();
  }

  Outcome<Reduction> reduce() {
    return Reducer.reduce(new ReductionProblem("as tested", log(), places()));
  }

  /** Largest movement of a gauge over all runs of a load. */
  double movement(int gauge, int load) {
    return Math.abs(truth[gauge][load]) * peak[load];
  }

  /** The load under which a gauge moves most. */
  int bestLoad(int gauge) {
    int best = 0;
    for (int j = 0; j < loads.size(); j++) {
      best = movement(gauge, j) > movement(gauge, best) ? j : best;
    }
    return best;
  }

  @Override
  public String toString() {
    return loads + " / " + gauges + " / " + runs.size() + " runs of "
        + Arrays.toString(runs.stream().mapToInt(r -> r.rows.length).distinct().toArray());
  }
}
