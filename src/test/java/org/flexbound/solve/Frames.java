package org.flexbound.solve;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.document.JsonFile;
import org.flexbound.finding.Where;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.FrameReader;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.setup.Direction;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.setup.LoadPoint;
import org.flexbound.setup.Part;
import org.flexbound.setup.Placing;
import org.flexbound.setup.SectionPoint;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;

/** Models, gauges and loads for tests, in few words. */
final class Frames {
  private Frames() {}

  static FrameModel model(String json) {
    return FrameReader.read(JsonFile.parse(json, "model.json").orRefuse()).orRefuse();
  }

  static Station at(String place) {
    int at = place.indexOf('@');
    return at < 0
        ? new Station.AtNode(place, Vector.ZERO)
        : new Station.OnMember(
            place.substring(0, at).strip(), Double.parseDouble(place.substring(at + 1)));
  }

  static Direction direction(String text) {
    boolean rotation = text.startsWith("r");
    String rest = rotation ? text.substring(1) : text;
    double sign = rest.startsWith("-") ? -1 : 1;
    String letter = rest.startsWith("-") || rest.startsWith("+") ? rest.substring(1) : rest;
    Vector v =
        switch (letter) {
          case "x" -> new Vector(sign, 0, 0);
          case "y" -> new Vector(0, sign, 0);
          case "z" -> new Vector(0, 0, sign);
          default -> throw new IllegalArgumentException(text);
        };
    return new Direction(rotation, v);
  }

  static Gauge gauge(String place, String direction) {
    return gauge(
        direction.startsWith("r") ? GaugeKind.ROTATION : GaugeKind.DISPLACEMENT,
        at(place),
        Optional.empty(),
        direction(direction),
        Optional.empty());
  }

  static Gauge relative(String first, String second, String direction) {
    return gauge(
        GaugeKind.RELATIVE,
        at(first),
        Optional.of(at(second)),
        direction(direction),
        Optional.empty());
  }

  static Gauge strain(String place, double y, double z) {
    return gauge(
        GaugeKind.STRAIN,
        at(place),
        Optional.empty(),
        direction("x"),
        Optional.of(new SectionPoint(y, z)));
  }

  static Gauge gauge(
      GaugeKind kind,
      Station station,
      Optional<Station> second,
      Direction direction,
      Optional<SectionPoint> point) {
    return new Gauge(
        station + " " + direction,
        kind,
        station,
        second,
        Optional.empty(),
        direction,
        point,
        Part.ARTICLE,
        Part.GROUND,
        false,
        Optional.empty(),
        Placing.UNSTATED,
        "",
        Where.nowhere());
  }

  static Load load(String place, String direction) {
    return load(List.of(point(at(place), direction(direction), 1)));
  }

  static LoadPoint point(Station station, Direction direction, double share) {
    return new LoadPoint(station, Optional.empty(), direction, share, Placing.UNSTATED);
  }

  static Load load(List<LoadPoint> points) {
    return new Load(
        points.get(0).station() + " " + points.get(0).direction(),
        points,
        Optional.empty(),
        OptionalDouble.empty(),
        "",
        Where.nowhere());
  }

  static FlexibilitySolution solve(FrameModel model, List<Gauge> gauges, List<Load> loads) {
    FrameFlexibility ready =
        FrameFlexibility.prepare(model, gauges, loads, List.<StiffnessPath>of()).orRefuse();
    return ready.solve(ready.nominal());
  }

  /** One coefficient. */
  static double coefficient(FrameModel model, Gauge gauge, Load load) {
    return solve(model, List.of(gauge), List.of(load)).value(0, 0);
  }
}
