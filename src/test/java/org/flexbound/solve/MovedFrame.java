package org.flexbound.solve;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.UnaryOperator;
import org.flexbound.frame.Axes;
import org.flexbound.frame.Connection;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.Member;
import org.flexbound.frame.Node;
import org.flexbound.frame.Support;
import org.flexbound.setup.Direction;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Load;
import org.flexbound.setup.LoadPoint;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;

/** A whole frame with its gauges and loads turned and shifted. */
record MovedFrame(FrameModel model, List<Gauge> gauges, List<Load> loads) {
  /**
   * Turns everything by the rotation vector and shifts it then.
   *
   * @param turn rad
   * @param shift m
   */
  static MovedFrame of(
      FrameModel model, List<Gauge> gauges, List<Load> loads, Vector turn, Vector shift) {
    UnaryOperator<Vector> r = v -> turned(v, turn);
    Map<String, Node> nodes = new LinkedHashMap<>();
    model
        .nodes()
        .forEach(
            (name, node) ->
                nodes.put(
                    name, new Node(name, r.apply(node.place()).plus(shift), node.where())));
    Map<String, Member> members = new LinkedHashMap<>();
    model
        .members()
        .forEach(
            (name, m) ->
                members.put(
                    name,
                    new Member(
                        name,
                        m.startNode(),
                        m.endNode(),
                        m.section(),
                        m.endSection(),
                        m.material(),
                        m.reference().map(r),
                        r.apply(m.startOffset()),
                        r.apply(m.endOffset()),
                        m.startJoint(),
                        m.endJoint(),
                        m.massPerLength(),
                        m.factors(),
                        m.where())));
    Map<String, Connection> connections = new LinkedHashMap<>();
    model
        .connections()
        .forEach(
            (name, c) ->
                connections.put(
                    name,
                    new Connection(
                        name,
                        c.firstNode(),
                        c.secondNode(),
                        c.joint(),
                        axes(c.axes(), r),
                        c.at().map(r).map(v -> v.plus(shift)),
                        c.factors(),
                        c.where())));
    Map<String, Support> supports = new LinkedHashMap<>();
    model
        .supports()
        .forEach(
            (name, s) ->
                supports.put(
                    name, new Support(s.node(), s.springs(), axes(s.axes(), r), s.where())));
    FrameModel moved =
        new FrameModel(
            model.units(),
            r.apply(model.up()),
            nodes,
            model.materials(),
            model.sections(),
            members,
            model.joints(),
            connections,
            supports,
            model.rigidLinks(),
            model.masses(),
            model.source());
    return new MovedFrame(
        moved,
        gauges.stream().map(g -> gauge(g, r)).toList(),
        loads.stream().map(l -> load(l, r)).toList());
  }

  /** Rodrigues' formula. */
  private static Vector turned(Vector v, Vector turn) {
    double angle = turn.norm();
    Vector k = turn.unit();
    return v.times(Math.cos(angle))
        .plus(k.cross(v).times(Math.sin(angle)))
        .plus(k.times(k.dot(v) * (1 - Math.cos(angle))));
  }

  private static Axes axes(Axes a, UnaryOperator<Vector> r) {
    return new Axes(r.apply(a.x()), r.apply(a.y()), r.apply(a.z()));
  }

  private static Station station(Station s, UnaryOperator<Vector> r) {
    return s instanceof Station.AtNode node
        ? new Station.AtNode(node.node(), r.apply(node.offset()))
        : s;
  }

  private static Direction direction(Direction d, UnaryOperator<Vector> r) {
    return new Direction(d.rotation(), r.apply(d.vector()));
  }

  private static Gauge gauge(Gauge g, UnaryOperator<Vector> r) {
    return new Gauge(
        g.name(),
        g.kind(),
        station(g.station(), r),
        g.second().map(s -> station(s, r)),
        Optional.empty(),
        direction(g.direction(), r),
        g.sectionPoint(),
        g.measures(),
        g.standsOn(),
        g.base(),
        g.instrument(),
        g.placing(),
        g.remark(),
        g.where());
  }

  private static Load load(Load l, UnaryOperator<Vector> r) {
    List<LoadPoint> points = new ArrayList<>();
    for (LoadPoint p : l.points()) {
      points.add(
          new LoadPoint(
              station(p.station(), r),
              Optional.empty(),
              direction(p.direction(), r),
              p.share(),
              p.placing()));
    }
    return new Load(l.name(), points, l.instrument(), l.limit(), l.remark(), l.where());
  }
}
