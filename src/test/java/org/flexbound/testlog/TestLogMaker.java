package org.flexbound.testlog;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Unit;
import org.flexbound.setup.Direction;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Instrument;
import org.flexbound.setup.Load;
import org.flexbound.setup.LoadPoint;
import org.flexbound.setup.Part;
import org.flexbound.setup.Placing;
import org.flexbound.setup.ReductionOptions;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;

/** Builds test logs in memory, in SI units, for tests and simulations. */
public final class TestLogMaker {
  private final List<Instrument> instruments = new ArrayList<>();
  private final Map<String, Load> loads = new LinkedHashMap<>();
  private final Map<String, Gauge> gauges = new LinkedHashMap<>();
  private final List<Run> runs = new ArrayList<>();
  private ReductionOptions options = ReductionOptions.USUAL;

  /** Adds an instrument with a relative gain uncertainty and a fixed floor. */
  public TestLogMaker instrument(String name, double gain, double floor, double resolution) {
    instruments.add(
        new Instrument(
            name,
            "",
            "",
            "certificate of " + name,
            "",
            OptionalDouble.of(gain),
            OptionalDouble.of(floor),
            resolution > 0 ? OptionalDouble.of(resolution) : OptionalDouble.empty(),
            OptionalDouble.empty(),
            Where.nowhere()));
    return this;
  }

  /** Adds a load at a node. */
  public TestLogMaker load(String name, String node, Direction direction, String instrument) {
    LoadPoint point =
        new LoadPoint(
            new Station.AtNode(node, Vector.ZERO), Optional.empty(), direction, 1, Placing.UNSTATED);
    loads.put(
        name,
        new Load(
            name,
            List.of(point),
            Optional.of(instrument),
            OptionalDouble.empty(),
            "",
            Where.nowhere()));
    return this;
  }

  /** States the limit of a load. */
  public TestLogMaker limit(String name, double limit) {
    loads.computeIfPresent(
        name,
        (key, load) ->
            new Load(
                load.name(),
                load.points(),
                load.instrument(),
                OptionalDouble.of(limit),
                load.remark(),
                load.where()));
    return this;
  }

  /** Adds a displacement (or, by its direction, rotation) gauge at a node. */
  public TestLogMaker gauge(
      String name, String node, Direction direction, String instrument, boolean base) {
    gauges.put(
        name,
        new Gauge(
            name,
            direction.rotation() ? GaugeKind.ROTATION : GaugeKind.DISPLACEMENT,
            new Station.AtNode(node, Vector.ZERO),
            Optional.empty(),
            Optional.empty(),
            direction,
            Optional.empty(),
            base ? Part.FIXTURE : Part.ARTICLE,
            Part.GROUND,
            base,
            Optional.of(instrument),
            Placing.UNSTATED,
            "",
            Where.nowhere()));
    return this;
  }

  /** Adds a displacement gauge at a node that measures the fixture and is no base gauge. */
  public TestLogMaker fixtureGauge(
      String name, String node, Direction direction, String instrument) {
    gauge(name, node, direction, instrument, false);
    gauges.computeIfPresent(
        name,
        (key, g) ->
            new Gauge(
                g.name(),
                g.kind(),
                g.station(),
                g.second(),
                g.coordinates(),
                g.direction(),
                g.sectionPoint(),
                Part.FIXTURE,
                Part.GROUND,
                false,
                g.instrument(),
                g.placing(),
                g.remark(),
                g.where()));
    return this;
  }

  /** Replaces the options. */
  public TestLogMaker options(ReductionOptions other) {
    options = other;
    return this;
  }

  /**
   * Adds a run of one load with a reading for every gauge in the order in which they were added.
   *
   * @param name the run's name
   * @param load the load's name
   * @param rows for each row the load, then the gauges, SI; NaN for blank
   */
  public TestLogMaker run(String name, String load, double[][] rows) {
    return run(name, List.of(load), rows);
  }

  /**
   * Adds a run of several loads.
   *
   * @param name the run's name
   * @param names the loads' names
   * @param rows for each row the loads, then the gauges, SI; NaN for blank
   */
  public TestLogMaker run(String name, List<String> names, double[][] rows) {
    List<Channel> gaugeChannels =
        gauges.values().stream()
            .map(
                g ->
                    new Channel(
                        g.name(),
                        g.name(),
                        g.kind() == GaugeKind.ROTATION ? Unit.RADIAN : Unit.METRE,
                        g.instrument(),
                        Where.nowhere()))
            .toList();
    List<Channel> loadChannels =
        names.stream()
            .map(load -> new Channel(load, load, Unit.NEWTON, loads.get(load).instrument(), Where.nowhere()))
            .toList();
    runs.add(
        new Run(
            name,
            "",
            OptionalDouble.empty(),
            true,
            "",
            loadChannels,
            gaugeChannels,
            visitor -> {
              for (int r = 0; r < rows.length; r++) {
                visitor.visit(new ArrayReading(rows[r], names.size(), r + 2));
              }
            },
            Where.sheet("made", name)));
    return this;
  }

  /** The log. */
  public TestLog log() {
    return new TestLog(
        new TestInformation("made", "", "", "", "", "", "", ""),
        instruments,
        List.copyOf(loads.values()),
        List.copyOf(gauges.values()),
        runs,
        options,
        List.of(),
        List.of());
  }

  private static final class ArrayReading implements Reading {
    private final double[] values;
    private final int loads;
    private final int row;

    ArrayReading(double[] values, int loads, int row) {
      this.values = values;
      this.loads = loads;
      this.row = row;
    }

    @Override
    public int row() {
      return row;
    }

    @Override
    public double load(int channel) {
      return values[channel];
    }

    @Override
    public double gauge(int channel) {
      return values[loads + channel];
    }

    @Override
    public double time() {
      return Double.NaN;
    }

    @Override
    public String step() {
      return "";
    }

    @Override
    public boolean use() {
      return true;
    }

    @Override
    public String remark() {
      return "";
    }

    @Override
    public Where whereLoad(int channel) {
      return Where.cells("made", "readings", "A" + row);
    }

    @Override
    public Where whereGauge(int channel) {
      return Where.cells("made", "readings", (char) ('B' + channel) + "" + row);
    }
  }
}
