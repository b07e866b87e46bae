package org.flexbound.report.gather;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.flexbound.frame.Connection;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.RigidLink;
import org.flexbound.frame.SectionShape;
import org.flexbound.report.results.Member;
import org.flexbound.report.results.Node;
import org.flexbound.report.results.Place;
import org.flexbound.report.results.Structure;
import org.flexbound.setup.Vector;

/** The frame model as far as its drawing needs it. */
final class StructurePart {
  private static final int SIDES = 16;

  private StructurePart() {}

  static Structure of(FrameModel model, String file) {
    List<Node> nodes = new ArrayList<>();
    model
        .nodes()
        .keySet()
        .forEach(
            name -> {
              Vector at = model.place(name);
              nodes.add(new Node(name, at.x(), at.y(), at.z()));
            });
    List<Member> members = new ArrayList<>();
    List<Place> places = new ArrayList<>();
    for (org.flexbound.frame.Member m : model.members().values()) {
      members.add(
          new Member(
              m.name(),
              m.startNode(),
              m.endNode(),
              m.section(),
              Values.list(model.start(m)),
              Values.list(model.end(m)),
              Values.list(model.axes(m).z()),
              outline(model, m)));
      m.startJoint().ifPresent(j -> places.add(place("joint", j, model.start(m))));
      m.endJoint().ifPresent(j -> places.add(place("joint", j, model.end(m))));
      link(places, model.place(m.startNode()), model.start(m), m.name());
      link(places, model.place(m.endNode()), model.end(m), m.name());
    }
    for (Connection c : model.connections().values()) {
      places.add(place("connection", c.name(), c.at().orElse(model.place(c.firstNode()))));
    }
    model.supports().keySet().forEach(n -> places.add(place("support", n, model.place(n))));
    for (RigidLink l : model.rigidLinks()) {
      link(places, model.place(l.from()), model.place(l.to()), l.from() + " to " + l.to());
    }
    return new Structure(file, Values.list(model.up()), nodes, members, places);
  }

  private static Place place(String kind, String name, Vector at) {
    return new Place(kind, name, Values.list(at), List.of());
  }

  private static void link(List<Place> places, Vector from, Vector to, String name) {
    if (to.minus(from).norm() > 0) {
      places.add(new Place("link", name, Values.list(from), Values.list(to)));
    }
  }

  private static List<List<Double>> outline(FrameModel model, org.flexbound.frame.Member member) {
    org.flexbound.frame.Section section = model.sections().get(member.section());
    if (section == null || !(section.shape() instanceof SectionShape.ByShape shape)) {
      return List.of();
    }
    Map<String, Double> d = shape.dimensions();
    Double diameter = d.get("diameter");
    if (diameter != null) {
      return circle(diameter / 2);
    }
    double depth = d.getOrDefault("depth", 0.0);
    double width = d.getOrDefault("width", 0.0);
    Double web = d.get("web");
    Double flange = d.get("flange");
    if (web != null && flange != null && shape.shape() == org.flexbound.frame.Shape.I) {
      return wideFlange(depth, width, web, flange);
    }
    return List.of(
        List.of(-width / 2, -depth / 2),
        List.of(width / 2, -depth / 2),
        List.of(width / 2, depth / 2),
        List.of(-width / 2, depth / 2));
  }

  private static List<List<Double>> circle(double radius) {
    List<List<Double>> points = new ArrayList<>();
    for (int k = 0; k < SIDES; k++) {
      double angle = 2 * Math.PI * k / SIDES;
      points.add(List.of(radius * Math.cos(angle), radius * Math.sin(angle)));
    }
    return points;
  }

  private static List<List<Double>> wideFlange(
      double depth, double width, double web, double flange) {
    double h = depth / 2;
    double b = width / 2;
    double w = web / 2;
    double f = h - flange;
    return List.of(
        List.of(-b, -h), List.of(b, -h), List.of(b, -f), List.of(w, -f), List.of(w, f),
        List.of(b, f), List.of(b, h), List.of(-b, h), List.of(-b, f), List.of(-w, f),
        List.of(-w, -f), List.of(-b, -f));
  }
}
