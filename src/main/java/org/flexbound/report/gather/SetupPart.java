package org.flexbound.report.gather;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.Member;
import org.flexbound.report.results.Gauge;
import org.flexbound.report.results.Instrument;
import org.flexbound.report.results.Load;
import org.flexbound.report.results.Option;
import org.flexbound.report.results.Point;
import org.flexbound.report.results.Test;
import org.flexbound.setup.Direction;
import org.flexbound.setup.LoadPoint;
import org.flexbound.setup.Placing;
import org.flexbound.setup.ReductionOptions;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;
import org.flexbound.testlog.TestInformation;
import org.flexbound.testlog.TestLog;

/** What the log says of the test: instruments, loads, gauges, options. */
final class SetupPart {
  private final Optional<FrameModel> model;
  private final String configuration;

  /** Places that only the model knows are looked up in it, where there is one. */
  SetupPart(Optional<FrameModel> model, String configuration) {
    this.model = model;
    this.configuration = configuration;
  }

  static Test test(TestInformation i) {
    return new Test(
        i.title(),
        i.article(),
        i.fixture(),
        i.date(),
        i.place(),
        i.testedBy(),
        i.ambientTemperature(),
        i.notes());
  }

  List<Instrument> instruments(TestLog log) {
    return log.instruments().stream()
        .map(
            i ->
                new Instrument(
                    configuration,
                    i.name(),
                    i.kind(),
                    i.serial(),
                    i.calibrationReference(),
                    i.calibrationDate(),
                    i.gainUncertainty(),
                    i.floorUncertainty(),
                    i.resolution(),
                    i.range()))
        .toList();
  }

  List<Load> loads(TestLog log) {
    List<Load> result = new ArrayList<>();
    for (org.flexbound.setup.Load load : log.loads()) {
      List<Point> points = new ArrayList<>();
      for (LoadPoint p : load.points()) {
        points.add(point(p.station(), p.coordinates(), p.direction(), p.share(), p.placing()));
      }
      result.add(
          new Load(
              configuration,
              load.name(),
              points,
              load.instrument().orElse(""),
              load.limit(),
              load.remark()));
    }
    return result;
  }

  List<Gauge> gauges(TestLog log) {
    List<Gauge> result = new ArrayList<>();
    for (org.flexbound.setup.Gauge g : log.gauges()) {
      result.add(
          new Gauge(
              configuration,
              g.name(),
              Values.word(g.kind()),
              point(g.station(), g.coordinates(), g.direction(), 1, g.placing()),
              g.second()
                  .map(second -> point(second, Optional.empty(), g.direction(), 1, g.placing())),
              Values.word(g.measures()),
              Values.word(g.standsOn()),
              g.base(),
              g.instrument().orElse(""),
              g.remark()));
    }
    return result;
  }

  private Point point(
      Station station,
      Optional<Vector> coordinates,
      Direction direction,
      double share,
      Placing placing) {
    Optional<Vector> place = coordinates.or(() -> place(station));
    return new Point(
        words(station),
        place.map(Values::list).orElse(List.of()),
        Values.list(direction.vector()),
        direction.rotation(),
        share,
        placing.positionUncertainty(),
        placing.angleUncertainty());
  }

  private static String words(Station station) {
    if (station instanceof Station.AtNode at) {
      return at.offset().norm() > 0 ? "beside node " + at.node() : "node " + at.node();
    }
    if (station instanceof Station.OnMember on) {
      return "member " + on.member() + " at " + on.at();
    }
    return "a point";
  }

  private Optional<Vector> place(Station station) {
    if (station instanceof Station.AtPoint at) {
      return Optional.of(at.point());
    }
    if (station instanceof Station.AtNode at) {
      return model
          .filter(m -> m.nodes().containsKey(at.node()))
          .map(m -> m.place(at.node()).plus(at.offset()));
    }
    Station.OnMember on = (Station.OnMember) station;
    return model.flatMap(
        m -> {
          Member member = m.members().get(on.member());
          return member == null
              ? Optional.empty()
              : Optional.of(
                  m.start(member).plus(m.end(member).minus(m.start(member)).times(on.at())));
        });
  }

  static List<Option> options(ReductionOptions o) {
    List<Option> result = new ArrayList<>();
    result.add(
        option("fit range", share(o.fitRange().lower()) + " to " + share(o.fitRange().upper())
            + " of the peak load"));
    o.fitRangeByGauge().entrySet().stream()
        .sorted(java.util.Map.Entry.comparingByKey())
        .forEach(
            e ->
                result.add(
                    option(
                        "fit range of gauge " + e.getKey(),
                        share(e.getValue().lower()) + " to " + share(e.getValue().upper())
                            + " of the peak load")));
    result.add(
        option(
            "bedding-in",
            switch (o.beddingIn()) {
              case LEAVE_OUT_WHERE_OTHERS -> "the first cycle is left out where there are others";
              case KEEP -> "the first cycle is kept";
            }));
    result.add(option("fit of slopes", Values.word(o.slopeFit())));
    result.add(
        option(
            "stated repeatability",
            o.statedRepeatability().isPresent()
                ? share(o.statedRepeatability().getAsDouble())
                : "none: scatter comes from the runs"));
    result.add(option("local gravity", o.localGravity() + " m/s²"));
    result.add(
        option("base motion", o.takeOutBaseMotion() ? "taken out where determined" : "left in"));
    result.add(
        option(
            "quality limits",
            "linearity " + share(o.qualityLimits().linearity())
                + ", hysteresis " + share(o.qualityLimits().hysteresis())
                + ", repeatability " + share(o.qualityLimits().repeatability())
                + ", zero return " + share(o.qualityLimits().zeroReturn())
                + ", resolution " + share(o.qualityLimits().resolution())
                + ", curvature " + share(o.qualityLimits().curvature())
                + ", reciprocity |z| " + o.qualityLimits().reciprocityZ()
                + " (common practice, no standard behind them)"));
    result.add(
        option(
            "decision rule for limits",
            o.decisionRule().guarded()
                ? "guarded, wrong with at most " + share(o.decisionRule().largestProbability())
                : "simple: the value alone decides"));
    return result;
  }

  private static Option option(String name, String value) {
    return new Option(name, value, "");
  }

  private static String share(double value) {
    return org.flexbound.report.Rounded.percent(value);
  }
}
