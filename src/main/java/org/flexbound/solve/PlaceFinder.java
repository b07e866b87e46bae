package org.flexbound.solve;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.Member;
import org.flexbound.frame.NearestName;
import org.flexbound.frame.Node;
import org.flexbound.frame.Section;
import org.flexbound.frame.SectionShape;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.setup.LoadPoint;
import org.flexbound.setup.Placing;
import org.flexbound.setup.SectionPoint;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;

/** Holds gauges and loads against the model: finds their places, and says what does not fit. */
final class PlaceFinder {
  /** Places agree within this share of the model's extent (and three times the uncertainty stated). */
  private static final double AGREES = 1e-3;

  private final FrameModel model;
  private final Findings findings;
  private final double tolerance;

  PlaceFinder(FrameModel model, Findings findings) {
    this.model = model;
    this.findings = findings;
    this.tolerance = AGREES * extent(model);
  }

  /** The diagonal of the box around all nodes; 1 m where they are one point. */
  static double extent(FrameModel model) {
    double[] low = {Double.MAX_VALUE, Double.MAX_VALUE, Double.MAX_VALUE};
    double[] high = {-Double.MAX_VALUE, -Double.MAX_VALUE, -Double.MAX_VALUE};
    for (Node node : model.nodes().values()) {
      double[] p = {node.place().x(), node.place().y(), node.place().z()};
      for (int i = 0; i < 3; i++) {
        low[i] = Math.min(low[i], p[i]);
        high[i] = Math.max(high[i], p[i]);
      }
    }
    double d = Math.hypot(Math.hypot(high[0] - low[0], high[1] - low[1]), high[2] - low[2]);
    return d > 0 && Double.isFinite(d) ? d : 1;
  }

  /** The places of a gauge: one, or two for a difference; empty where anything is wrong. */
  List<Place> of(Gauge gauge) {
    String owner = "the gauge '" + gauge.name() + "'";
    Optional<Place> first =
        find(gauge.station(), gauge.coordinates(), gauge.placing(), owner, gauge.where());
    if (gauge.kind() == GaugeKind.STRAIN) {
      return strain(gauge, first);
    }
    if (gauge.kind() == GaugeKind.RELATIVE) {
      if (gauge.second().isEmpty()) {
        findings.add(
            SolveFinding.NOTHING_THERE, gauge.where(), owner + " states no second place");
        return List.of();
      }
      Optional<Place> second =
          find(gauge.second().get(), Optional.empty(), gauge.placing(), owner, gauge.where());
      return first.isPresent() && second.isPresent()
          ? List.of(first.get(), second.get())
          : List.of();
    }
    return first.map(List::of).orElse(List.of());
  }

  private List<Place> strain(Gauge gauge, Optional<Place> place) {
    if (place.isEmpty()) {
      return List.of();
    }
    if (place.get().member().isEmpty()) {
      findings.add(
          SolveFinding.STRAIN_WITHOUT_MEMBER,
          gauge.where(),
          "the strain gauge '" + gauge.name() + "' stands at a node, not on a member");
      return List.of();
    }
    Member member = member(place.get().member().get());
    Section section = section(member);
    SectionPoint point = gauge.sectionPoint().orElse(new SectionPoint(0, 0));
    if (section.shape() instanceof SectionShape.ByShape shape
        && !shape.shape().mayHold(shape.dimensions(), point)) {
      findings.add(
          SolveFinding.POINT_OFF_SECTION,
          gauge.where(),
          "the point of the strain gauge '"
              + gauge.name()
              + "' lies outside of the section '"
              + section.name()
              + "'");
    }
    return List.of(place.get());
  }

  private Member member(String name) {
    Member member = model.members().get(name);
    if (member == null) {
      throw new IllegalArgumentException("no member " + name);
    }
    return member;
  }

  private Section section(Member member) {
    Section section = model.sections().get(member.section());
    if (section == null) {
      throw new IllegalArgumentException("no section " + member.section());
    }
    return section;
  }

  /** The places of a load's points; empty where anything is wrong. */
  List<Place> of(Load load) {
    List<Place> result = new java.util.ArrayList<>();
    for (LoadPoint point : load.points()) {
      find(
              point.station(),
              point.coordinates(),
              point.placing(),
              "the load '" + load.name() + "'",
              load.where())
          .ifPresent(result::add);
    }
    return result.size() == load.points().size() ? result : List.of();
  }

  private Optional<Place> find(
      Station station,
      Optional<Vector> coordinates,
      Placing placing,
      String owner,
      Where where) {
    if (station instanceof Station.AtNode at) {
      Node node = model.nodes().get(at.node());
      if (node == null) {
        findings.add(
            SolveFinding.UNKNOWN_NODE,
            where,
            owner
                + " stands at the node '"
                + at.node()
                + "', which the model does not have"
                + NearestName.hint(at.node(), model.nodes().keySet()));
        return Optional.empty();
      }
      agree(owner, where, coordinates, placing, node.place().plus(at.offset()), "node", at.node());
      return Optional.of(Place.atNode(at.node(), at.offset()));
    }
    if (station instanceof Station.OnMember on) {
      Member member = model.members().get(on.member());
      if (member == null) {
        findings.add(
            SolveFinding.UNKNOWN_MEMBER,
            where,
            owner
                + " stands on the member '"
                + on.member()
                + "', which the model does not have"
                + NearestName.hint(on.member(), model.members().keySet()));
        return Optional.empty();
      }
      Vector start = model.start(member);
      Vector place = start.plus(model.end(member).minus(start).times(on.at()));
      agree(owner, where, coordinates, placing, place, "place on the member", on.member());
      return Optional.of(Place.onMember(on.member(), on.at()));
    }
    return atPoint(((Station.AtPoint) station).point(), owner, where);
  }

  private void agree(
      String owner,
      Where where,
      Optional<Vector> stated,
      Placing placing,
      Vector inModel,
      String what,
      String name) {
    if (stated.isEmpty()) {
      return;
    }
    OptionalDouble uncertainty = placing.positionUncertainty();
    double allowed = tolerance + 3 * uncertainty.orElse(0);
    double apart = stated.get().minus(inModel).norm();
    if (apart > allowed) {
      findings.add(
          SolveFinding.PLACES_DISAGREE,
          where,
          owner
              + " is stated at "
              + show(stated.get())
              + ", but the "
              + what
              + " '"
              + name
              + "' is at "
              + show(inModel)
              + ", "
              + millimetres(apart)
              + " away (allowed "
              + millimetres(allowed)
              + ")");
    }
  }

  private Optional<Place> atPoint(Vector point, String owner, Where where) {
    String nearest = "";
    double distance = Double.POSITIVE_INFINITY;
    for (Node node : model.nodes().values()) {
      double d = node.place().minus(point).norm();
      if (d < distance) {
        distance = d;
        nearest = node.name();
      }
    }
    if (distance <= tolerance) {
      return Optional.of(Place.atNode(nearest, point.minus(model.place(nearest))));
    }
    for (Map.Entry<String, Member> entry : model.members().entrySet()) {
      Vector start = model.start(entry.getValue());
      Vector along = model.end(entry.getValue()).minus(start);
      double t = point.minus(start).dot(along) / along.dot(along);
      if (t >= 0 && t <= 1 && start.plus(along.times(t)).minus(point).norm() <= tolerance) {
        return Optional.of(Place.onMember(entry.getKey(), t));
      }
    }
    findings.add(
        SolveFinding.NOTHING_THERE,
        where,
        owner
            + " stands at "
            + show(point)
            + ", where the model has neither a node nor a member; the nearest node is '"
            + nearest
            + "', "
            + millimetres(distance)
            + " away");
    return Optional.empty();
  }

  private static String millimetres(double metres) {
    return String.format(Locale.ROOT, "%.4g mm", metres * 1000);
  }

  private static String show(Vector v) {
    return String.format(Locale.ROOT, "(%.4g, %.4g, %.4g) m", v.x(), v.y(), v.z());
  }
}
