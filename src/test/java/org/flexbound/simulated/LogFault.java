package org.flexbound.simulated;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.function.DoubleUnaryOperator;
import org.flexbound.simulated.SimulatedTest.Place;
import org.flexbound.simulated.SimulatedTest.SimulatedRun;

/**
 * A fault that is put into a sound simulated test.
 *
 * @param name what it is, for the table
 * @param sizes what its three sizes are, for the table
 * @param codes the findings that name it as what it is
 * @param injector puts it in
 */
record LogFault(String name, List<String> sizes, Set<String> codes, Injector injector) {
  LogFault {
    sizes = List.copyOf(sizes);
    codes = Set.copyOf(codes);
  }

  /** Puts a fault into a test. */
  interface Injector {
    /**
     * Puts it in.
     *
     * @return the gauge or load at fault, by name (or names parted by a bar); empty where the test does
     *     not lend itself to the fault
     */
    Optional<String> into(SimulatedTest test, int size);
  }

  // ---- where a fault goes ----

  /** Any gauge but a base gauge that some load moves. */
  private static int someGauge(SimulatedTest test) {
    double largest = 0;
    for (int i = 0; i < test.gauges.size(); i++) {
      largest = Math.max(largest, test.movement(i, test.bestLoad(i)));
    }
    List<Integer> free = new ArrayList<>();
    for (int i = 0; i < test.gauges.size(); i++) {
      // a gauge that no load moves can have no fault that its readings show
      boolean moves = test.movement(i, test.bestLoad(i)) > 0.05 * largest;
      if (!test.gauges.get(i).base() && moves) {
        free.add(i);
      }
    }
    return free.get(test.random.nextInt(free.size()));
  }

  /** A gauge on a load point; −1 where there are fewer than so many. */
  private static int collocated(SimulatedTest test, int least) {
    List<Integer> found = new ArrayList<>();
    for (Place load : test.loads) {
      int i = test.gauges.indexOf(load);
      if (i >= 0) {
        found.add(i);
      }
    }
    return found.size() < least ? -1 : found.get(test.random.nextInt(found.size()));
  }

  private static List<SimulatedRun> runsOf(SimulatedTest test, int load) {
    return test.runs.stream().filter(r -> r.load == load).toList();
  }

  private static SimulatedRun lastRun(SimulatedTest test, int load) {
    List<SimulatedRun> runs = runsOf(test, load);
    return runs.get(runs.size() - 1);
  }

  /** The last run of a load, all its runs, or all runs of the test. */
  private static List<SimulatedRun> extent(SimulatedTest test, int load, int size) {
    return switch (size) {
      case 0 -> List.of(lastRun(test, load));
      case 1 -> runsOf(test, load);
      default -> test.runs;
    };
  }

  private static final List<String> EXTENTS =
      List.of("in one run", "in all runs of one load", "in all runs");

  /** The first row of a level, at a share of the last cycle. */
  private static int row(SimulatedRun run, double share) {
    int level = (int) Math.round(run.levels() * (1 - 0.3 * (1 - share)));
    level = Math.min(level, run.levels() - 2);
    for (int r = 0; r < run.level.length; r++) {
      if (run.level[r] == level) {
        return r;
      }
    }
    return run.level.length - 1;
  }

  private static void each(SimulatedRun run, int gauge, DoubleUnaryOperator change) {
    for (double[] row : run.rows) {
      row[1 + gauge] = change.applyAsDouble(row[1 + gauge]);
    }
  }

  private static double levelLoad(SimulatedRun run, int level) {
    double sum = 0;
    int n = 0;
    for (int r = 0; r < run.level.length; r++) {
      if (run.level[r] == level) {
        sum += run.rows[r][0];
        n++;
      }
    }
    return sum / n;
  }

  // ---- the faults ----

  private static Optional<String> stuck(SimulatedTest test, int size) {
    int gauge = someGauge(test);
    SimulatedRun run = lastRun(test, test.bestLoad(gauge));
    double share = new double[] {0.3, 0.6, 1}[size];
    int from = (int) Math.round((1 - share) * (run.rows.length - 1));
    double value = run.rows[from][1 + gauge];
    for (int r = from; r < run.rows.length; r++) {
      run.rows[r][1 + gauge] = value;
    }
    return name(test, gauge);
  }

  private static Optional<String> name(SimulatedTest test, int gauge) {
    return Optional.of(test.gauges.get(gauge).name());
  }

  private static Optional<String> saturated(SimulatedTest test, int size) {
    int gauge = someGauge(test);
    int load = test.bestLoad(gauge);
    double share = new double[] {0.85, 0.7, 0.5}[size];
    double reach = share * test.movement(gauge, load);
    for (SimulatedRun run : runsOf(test, load)) {
      double tare = run.rows[0][1 + gauge];
      each(run, gauge, y -> Math.max(tare - reach, Math.min(tare + reach, y)));
    }
    return name(test, gauge);
  }

  private static Optional<String> jumped(SimulatedTest test, int size) {
    int gauge = someGauge(test);
    int load = test.bestLoad(gauge);
    SimulatedRun run = lastRun(test, load);
    double by = new double[] {0.03, 0.1, 0.3}[size] * test.movement(gauge, load);
    for (int r = row(run, 0); r < run.rows.length; r++) {
      run.rows[r][1 + gauge] += by;
    }
    return name(test, gauge);
  }

  private static Optional<String> droppedOut(SimulatedTest test, int size) {
    int gauge = someGauge(test);
    SimulatedRun run = lastRun(test, test.bestLoad(gauge));
    int rows = new int[] {1, 2, 5}[size];
    int from = Math.max(1, run.top() - rows + 1);
    for (int r = from; r < Math.min(from + rows, run.rows.length - 1); r++) {
      run.rows[r][1 + gauge] = 0;
    }
    return name(test, gauge);
  }

  private static Optional<String> coarse(SimulatedTest test, int size) {
    int gauge = someGauge(test);
    double step =
        new double[] {0.02, 0.05, 0.15}[size] * test.movement(gauge, test.bestLoad(gauge));
    for (SimulatedRun run : test.runs) {
      each(run, gauge, y -> Math.rint(y / step) * step);
    }
    return name(test, gauge);
  }

  private static Optional<String> reversed(SimulatedTest test, int size) {
    int gauge = collocated(test, 2);
    if (gauge < 0) {
      return Optional.empty();
    }
    for (SimulatedRun run : extent(test, test.bestLoad(gauge), size)) {
      each(run, gauge, y -> -y);
    }
    return name(test, gauge);
  }

  private static Optional<String> exchanged(SimulatedTest test, int size) {
    int gauge = collocated(test, 3);
    if (gauge < 0) {
      return Optional.empty();
    }
    int load = test.bestLoad(gauge);
    int other = gauge;
    for (int tries = 0; tries < 50 && other == gauge; tries++) {
      int candidate = someGauge(test);
      double ratio = test.truth[candidate][load] / test.truth[gauge][load];
      other = candidate == gauge || Math.abs(ratio - 1) < 0.2 ? gauge : candidate;
    }
    if (other == gauge) {
      return Optional.empty();
    }
    int second = other;
    for (SimulatedRun run : extent(test, load, size)) {
      for (double[] row : run.rows) {
        double kept = row[1 + gauge];
        row[1 + gauge] = row[1 + second];
        row[1 + second] = kept;
      }
    }
    return Optional.of(test.gauges.get(gauge).name() + "|" + test.gauges.get(second).name());
  }

  private static Optional<String> inch(SimulatedTest test, int size) {
    int gauge = collocated(test, 2);
    if (gauge < 0) {
      return Optional.empty();
    }
    for (SimulatedRun run : extent(test, test.bestLoad(gauge), size)) {
      each(run, gauge, y -> 25.4 * y);
    }
    return name(test, gauge);
  }

  private static Optional<String> kilogram(SimulatedTest test, int size) {
    int gauge = collocated(test, 2);
    if (gauge < 0) {
      return Optional.empty();
    }
    int load = test.loads.indexOf(test.gauges.get(gauge));
    for (SimulatedRun run : extent(test, load, size)) {
      for (double[] row : run.rows) {
        row[0] /= 9.80665;
      }
    }
    Arrays.fill(test.limit, OptionalDouble.empty());
    return size == 2 ? Optional.of("") : Optional.of(test.loads.get(load).name());
  }

  private static Optional<String> misplaced(SimulatedTest test, int size) {
    int gauge = collocated(test, 3);
    if (gauge < 0) {
      return Optional.empty();
    }
    Place own = test.gauges.get(gauge);
    List<String> nodes = test.frame.structure();
    int at = nodes.indexOf(own.node());
    String next = nodes.get(at + 1 < nodes.size() ? at + 1 : at - 1);
    double[] there = test.row(new Place(next, own.axis(), false));
    double share = new double[] {0.25, 0.5, 1}[size];
    for (SimulatedRun run : test.runs) {
      double by = share * (there[run.load] - test.truth[gauge][run.load]);
      for (double[] row : run.rows) {
        row[1 + gauge] += by * row[0];
      }
    }
    return name(test, gauge);
  }

  private static Optional<String> drift(SimulatedTest test, int size) {
    int gauge = someGauge(test);
    int load = test.bestLoad(gauge);
    SimulatedRun run = lastRun(test, load);
    double by = new double[] {0.03, 0.1, 0.3}[size] * test.movement(gauge, load);
    for (int r = 0; r < run.rows.length; r++) {
      run.rows[r][1 + gauge] += by * r / run.rows.length;
    }
    return name(test, gauge);
  }

  private static Optional<String> kink(SimulatedTest test, int size) {
    int gauge = someGauge(test);
    int load = test.bestLoad(gauge);
    double by = new double[] {0.1, 0.3, 1}[size] * test.truth[gauge][load];
    for (SimulatedRun run : runsOf(test, load)) {
      for (double[] row : run.rows) {
        double past = Math.max(0, Math.abs(row[0]) - 0.5 * test.peak[load]);
        row[1 + gauge] += by * past * Math.signum(row[0]);
      }
    }
    return name(test, gauge);
  }

  private static Optional<String> curved(SimulatedTest test, int size) {
    int gauge = someGauge(test);
    int load = test.bestLoad(gauge);
    double by = new double[] {0.1, 0.2, 0.5}[size] * test.truth[gauge][load];
    for (SimulatedRun run : runsOf(test, load)) {
      for (double[] row : run.rows) {
        row[1 + gauge] += by * row[0] * Math.abs(row[0]) / test.peak[load];
      }
    }
    return name(test, gauge);
  }

  private static Optional<String> outlier(SimulatedTest test, int size) {
    int gauge = someGauge(test);
    int load = test.bestLoad(gauge);
    SimulatedRun run = lastRun(test, load);
    double by = new double[] {0.03, 0.1, 0.3}[size] * test.movement(gauge, load);
    int level = run.level[row(run, 0.2)];
    for (int r = 0; r < run.rows.length; r++) {
      run.rows[r][1 + gauge] += run.level[r] == level ? by : 0;
    }
    return name(test, gauge);
  }

  private static Optional<String> loadZero(SimulatedTest test, int size) {
    int load = test.random.nextInt(test.loads.size());
    SimulatedRun run = lastRun(test, load);
    double by = new double[] {0.01, 0.03, 0.1}[size] * test.peak[load];
    for (int r = row(run, 0); r < run.rows.length; r++) {
      run.rows[r][0] += by;
    }
    test.limit[load] = OptionalDouble.empty();
    return Optional.of(test.loads.get(load).name());
  }

  private static Optional<String> offLine(SimulatedTest test, int size) {
    int load = test.random.nextInt(test.loads.size());
    if (runsOf(test, load).size() < 3) {
      return Optional.empty();
    }
    Place own = test.loads.get(load);
    char side = own.axis() == 'y' ? (own.node().startsWith("a") ? 'z' : 'x') : 'y';
    double[] across = test.column(new Place(own.node(), side, false));
    double tangent = Math.tan(Math.toRadians(new double[] {1, 3, 10}[size]));
    for (double[] row : lastRun(test, load).rows) {
      for (int i = 0; i < across.length; i++) {
        row[1 + i] += tangent * across[i] * row[0];
      }
    }
    return Optional.of(own.name());
  }

  private static Optional<String> gain(SimulatedTest test, int size) {
    int gauge = collocated(test, 3);
    if (gauge < 0) {
      return Optional.empty();
    }
    double by = 1 + new double[] {0.05, 0.1, 0.2}[size];
    for (SimulatedRun run : test.runs) {
      double tare = run.rows[0][1 + gauge];
      each(run, gauge, y -> tare + by * (y - tare));
    }
    return name(test, gauge);
  }

  private static Optional<String> oneRunOff(SimulatedTest test, int size) {
    int gauge = someGauge(test);
    int load = test.bestLoad(gauge);
    if (runsOf(test, load).size() < 2) {
      return Optional.empty();
    }
    SimulatedRun run = lastRun(test, load);
    double by = 1 + new double[] {0.05, 0.1, 0.2}[size];
    double tare = run.rows[0][1 + gauge];
    each(run, gauge, y -> tare + by * (y - tare));
    return name(test, gauge);
  }

  private static Optional<String> looseJoint(SimulatedTest test, int size) {
    int load = test.random.nextInt(test.loads.size());
    int other = (load + 1) % test.loads.size();
    SimulatedRun run = lastRun(test, load);
    double largest = 0;
    double of = 0;
    for (int i = 0; i < test.gauges.size(); i++) {
      largest = Math.max(largest, test.movement(i, load));
      of = Math.max(of, test.movement(i, other));
    }
    double share = new double[] {0.03, 0.1, 0.3}[size] * largest / of;
    for (int r = run.top(); r < run.rows.length; r++) {
      for (int i = 0; i < test.gauges.size(); i++) {
        run.rows[r][1 + i] += share * test.truth[i][other] * test.peak[other];
      }
    }
    return Optional.of("");
  }

  private static Optional<String> friction(SimulatedTest test, int size) {
    int load = test.random.nextInt(test.loads.size());
    double half = 0.5 * new double[] {0.06, 0.12, 0.3}[size];
    for (SimulatedRun run : runsOf(test, load)) {
      double trail = 0;
      for (int r = 0; r < run.rows.length; r++) {
        double share = levelLoad(run, run.level[r]) / test.peak[load];
        trail = Math.max(share - half, Math.min(share + half, trail));
        for (int i = 0; i < test.gauges.size(); i++) {
          run.rows[r][1 + i] += test.truth[i][load] * test.peak[load] * (trail - share);
        }
      }
    }
    return Optional.of("");
  }

  private static Optional<String> overLimit(SimulatedTest test, int size) {
    int load = test.random.nextInt(test.loads.size());
    double by = 1 + new double[] {0.02, 0.05, 0.2}[size];
    test.limit[load] = OptionalDouble.of(test.peak[load] / by);
    return Optional.of(test.loads.get(load).name());
  }

  private static final List<String> SHARES = List.of("3 % of span", "10 %", "30 %");

  /** All faults of the table. */
  static List<LogFault> all() {
    return List.of(
        new LogFault("gauge stuck", List.of("last 30 % of a run", "last 60 %", "whole run"),
            Set.of("RED-STUCK"), LogFault::stuck),
        new LogFault("gauge saturated", List.of("at 85 % of its movement", "70 %", "50 %"),
            Set.of("RED-SATURATED"), LogFault::saturated),
        new LogFault("gauge jumped", SHARES, Set.of("RED-JUMPED"), LogFault::jumped),
        new LogFault("gauge dropped out", List.of("1 row", "2 rows", "5 rows"),
            Set.of("RED-DROPPED-OUT"), LogFault::droppedOut),
        new LogFault("gauge coarse", List.of("steps of 2 % of span", "5 %", "15 %"),
            Set.of("RED-COARSE"), LogFault::coarse),
        new LogFault("gauge reversed", EXTENTS, Set.of("RED-LOOKS-REVERSED"), LogFault::reversed),
        new LogFault("two columns exchanged", EXTENTS, Set.of("RED-LOOKS-EXCHANGED"),
            LogFault::exchanged),
        new LogFault("gauge in inches for mm (25.4)", EXTENTS, Set.of("RED-LOOKS-LIKE-UNIT"),
            LogFault::inch),
        new LogFault("load in kgf for N (9.807)", EXTENTS, Set.of("RED-LOOKS-LIKE-UNIT"),
            LogFault::kilogram),
        new LogFault("gauge misplaced", List.of("by 1/4 of the way to the next node", "1/2", "1"),
            Set.of("RED-TRIPLE-PRODUCT"), LogFault::misplaced),
        new LogFault("drift", SHARES, Set.of("RED-DRIFT"), LogFault::drift),
        new LogFault("kink at half load", List.of("slope +10 % past it", "+30 %", "+100 %"),
            Set.of("RED-KINK"), LogFault::kink),
        new LogFault("curved response", List.of("slope +20 % at peak", "+40 %", "+100 %"),
            Set.of("RED-CURVED"), LogFault::curved),
        new LogFault("one step misread", SHARES, Set.of("RED-OUTLIER", "RED-SPIKE"),
            LogFault::outlier),
        new LogFault("load cell's zero moved", List.of("1 % of peak", "3 %", "10 %"),
            Set.of("RED-LOAD-ZERO"), LogFault::loadZero),
        new LogFault("load off its line in one run", List.of("1°", "3°", "10°"),
            Set.of("RED-OFF-LINE"), LogFault::offLine),
        new LogFault("gauge's gain wrong", List.of("+5 %", "+10 %", "+20 %"),
            Set.of("RED-GAIN-STANDS-OUT"), LogFault::gain),
        new LogFault("gauge's gain wrong in one run", List.of("+5 %", "+10 %", "+20 %"),
            Set.of("RED-NOT-REPEATABLE"), LogFault::oneRunOff),
        new LogFault("joint slips at peak (set)", SHARES,
            Set.of("RED-SLIPPED", "RED-ZERO-RETURN", "RED-SET"), LogFault::looseJoint),
        new LogFault("friction", List.of("gap 6 % of span", "12 %", "30 %"),
            Set.of("RED-HYSTERESIS"), LogFault::friction),
        new LogFault("load past its limit", List.of("by 2 %", "5 %", "20 %"),
            Set.of("RED-LOAD-LIMIT"), LogFault::overLimit));
  }
}
