package org.flexbound.solve;

import java.util.ArrayList;
import java.util.Collections;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.TreeSet;
import org.flexbound.frame.Axes;
import org.flexbound.frame.Connection;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.Joint;
import org.flexbound.frame.Material;
import org.flexbound.frame.Member;
import org.flexbound.frame.Node;
import org.flexbound.frame.PointMass;
import org.flexbound.frame.Rigidity;
import org.flexbound.frame.RigidLink;
import org.flexbound.frame.Section;
import org.flexbound.frame.SectionProperties;
import org.flexbound.frame.SectionShape;
import org.flexbound.frame.Spring;
import org.flexbound.frame.SpringSet;
import org.flexbound.frame.Stiffness;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessPath.Group;
import org.flexbound.frame.StiffnessSetting;
import org.flexbound.frame.Support;
import org.flexbound.setup.Vector;

/** Turns a model into points and elements. */
final class MeshBuilder {
  /** Places on a member nearer to each other than this share of its length are one. */
  private static final double SAME = 1e-9;

  private final FrameModel model;
  private final List<Vector> places = new ArrayList<>();
  private final List<String> labels = new ArrayList<>();
  private final Map<String, Integer> pointOfNode = new LinkedHashMap<>();
  private final List<MemberElement> members = new ArrayList<>();
  private final Map<String, List<Mesh.Piece>> pieces = new LinkedHashMap<>();
  private final List<SpringElement> springs = new ArrayList<>();
  private final List<String> springNames = new ArrayList<>();
  private final List<Mesh.Tie> ties = new ArrayList<>();
  private final List<Mesh.Spin> spins = new ArrayList<>();
  private final List<BodyElement> bodies = new ArrayList<>();
  private final Slots slots = new Slots();
  private final Map<String, int[]> jointSlots = new HashMap<>();
  private final Map<SectionKey, SectionProperties> sections = new HashMap<>();
  private final Map<PieceKey, UnitFlexibility> units = new HashMap<>();
  private final Map<String, TreeSet<Double>> divisions = new TreeMap<>();
  private boolean forModes;

  private record SectionKey(String section, double poissonRatio) {}

  private record PieceKey(
      SectionKey start, Optional<String> end, double length, double from, double to) {}

  MeshBuilder(FrameModel model) {
    this.model = model;
  }

  /** Asks for a point at a place on a member. */
  void divide(Place place) {
    place
        .member()
        .ifPresent(m -> divisions.computeIfAbsent(m, name -> new TreeSet<>()).add(place.at()));
  }

  /**
   * Asks for what modes need: every member in so many pieces of equal length, joints as elements of
   * their own, whose inner freedoms stay unknowns, and masses.
   */
  void forModes(Map<String, Integer> division) {
    forModes = true;
    division.forEach(
        (member, count) -> {
          TreeSet<Double> at = divisions.computeIfAbsent(member, name -> new TreeSet<>());
          for (int i = 1; i < count; i++) {
            at.add((double) i / count);
          }
        });
  }

  Mesh build() {
    for (Node node : model.nodes().values()) {
      pointOfNode.put(node.name(), point(node.place(), "node " + node.name()));
    }
    for (Joint joint : model.joints().values()) {
      jointSlots(joint);
    }
    model.members().values().forEach(this::member);
    model.connections().values().forEach(this::connection);
    model.supports().values().forEach(this::support);
    for (RigidLink link : model.rigidLinks()) {
      ties.add(new Mesh.Tie(at(link.from()), at(link.to())));
    }
    if (forModes) {
      for (PointMass mass : model.masses()) {
        bodies.add(new BodyElement(at(mass.node()), mass));
      }
    }
    return new Mesh(
        Collections.unmodifiableList(places),
        Collections.unmodifiableList(labels),
        Collections.unmodifiableMap(pointOfNode),
        Collections.unmodifiableList(members),
        Collections.unmodifiableMap(pieces),
        Collections.unmodifiableList(springs),
        Collections.unmodifiableList(springNames),
        Collections.unmodifiableList(ties),
        Collections.unmodifiableList(spins),
        Collections.unmodifiableList(bodies),
        slots);
  }

  private int point(Vector place, String label) {
    places.add(place);
    labels.add(label);
    return places.size() - 1;
  }

  private int at(String node) {
    Integer point = pointOfNode.get(node);
    if (point == null) {
      throw new IllegalArgumentException("no node " + node);
    }
    return point;
  }

  private SectionProperties section(String name, double poissonRatio) {
    return sections.computeIfAbsent(
        new SectionKey(name, poissonRatio),
        key -> {
          Section section = model.sections().get(key.section());
          if (section == null) {
            throw new IllegalArgumentException("no section " + key.section());
          }
          return section.shape().properties(key.poissonRatio());
        });
  }

  private void jointSlots(Joint joint) {
    int[] six = new int[6];
    for (Spring spring : Spring.values()) {
      StiffnessPath path = StiffnessPath.of(Group.JOINTS, joint.name(), spring);
      six[spring.index()] = slots.add(path, joint.springs().stiffness(spring).value());
      slots.lead(path, six[spring.index()], 1);
    }
    jointSlots.put(joint.name(), six);
  }

  private EndSprings endSprings(String joint) {
    int[] six = jointSlots.get(joint);
    if (six == null) {
      throw new IllegalArgumentException("no joint " + joint);
    }
    return new EndSprings(six, model.joint(joint).springs().matrix());
  }

  private void member(Member member) {
    Material material = model.material(member.material());
    double nu = material.poissonRatio();
    SectionProperties start = section(member.section(), nu);
    int[] six = memberSlots(member, material, start);
    Axes axes = model.axes(member);
    Vector from = model.start(member);
    Vector to = model.end(member);
    double length = to.minus(from).norm();
    List<Double> cuts = cuts(member.name());
    boolean expandStart =
        member.startJoint().isPresent() && (forModes || cuts.contains(0.0));
    boolean expandEnd =
        member.endJoint().isPresent() && (forModes || cuts.contains(1.0));
    List<Double> bounds = new ArrayList<>(List.of(0.0));
    cuts.stream().filter(t -> t > 0 && t < 1).forEach(bounds::add);
    bounds.add(1.0);
    int point = at(member.startNode());
    Vector arm = member.startOffset();
    if (expandStart) {
      int inner = point(from, "start of member " + member.name());
      separate(member.startJoint().orElseThrow(), axes, point, arm, inner, true, member.name());
      point = inner;
      arm = Vector.ZERO;
    }
    List<Mesh.Piece> list = new ArrayList<>();
    for (int i = 1; i < bounds.size(); i++) {
      double a = bounds.get(i - 1);
      double b = bounds.get(i);
      boolean first = i == 1;
      boolean last = i == bounds.size() - 1;
      int nextPoint;
      Vector nextArm;
      if (!last) {
        nextPoint =
            point(
                from.plus(to.minus(from).times(b)),
                "member " + member.name() + " at " + shortest(b));
        nextArm = Vector.ZERO;
      } else if (expandEnd) {
        nextPoint = point(to, "end of member " + member.name());
        nextArm = Vector.ZERO;
        separate(
            member.endJoint().orElseThrow(),
            axes,
            at(member.endNode()),
            member.endOffset(),
            nextPoint,
            false,
            member.name());
      } else {
        nextPoint = at(member.endNode());
        nextArm = member.endOffset();
      }
      double l = length * (b - a);
      UnitFlexibility unit = unit(member, nu, start, l, a, b);
      double[] shape = Mesh.shape(axes, arm.plus(axes.x().times(l)), nextArm);
      list.add(
          new Mesh.Piece(members.size(), a, b, point, arm, nextPoint, nextArm, axes));
      members.add(
          new MemberElement(
              member.name(),
              new int[] {point, nextPoint},
              shape,
              unit,
              six,
              first && !expandStart ? member.startJoint().map(this::endSprings) : Optional.empty(),
              last && !expandEnd ? member.endJoint().map(this::endSprings) : Optional.empty()));
      point = nextPoint;
      arm = nextArm;
    }
    pieces.put(member.name(), Collections.unmodifiableList(list));
    boolean inner = list.size() > 1 || expandStart || expandEnd;
    if (inner && member.startJoint().isPresent() && member.endJoint().isPresent()) {
      EndSprings first = endSprings(member.startJoint().get());
      EndSprings last = endSprings(member.endJoint().get());
      if (!first.full() && !last.full()) {
        Mesh.Piece piece = list.get(0);
        int between =
            expandStart ? piece.startPoint() : list.size() > 1 ? piece.endPoint() : point;
        spins.add(new Mesh.Spin(between, axes.x(), first.slot(3), last.slot(3)));
      }
    }
  }

  private static String shortest(double share) {
    return String.format(java.util.Locale.ROOT, "%.4g", share);
  }

  /** A joint as an element between the node, carried along the offset, and an inner point. */
  private void separate(
      String joint, Axes axes, int node, Vector arm, int inner, boolean atStart, String member) {
    double[] shape =
        atStart ? Mesh.shape(axes, arm, Vector.ZERO) : Mesh.shape(axes, Vector.ZERO, arm);
    int[] ends = atStart ? new int[] {node, inner} : new int[] {inner, node};
    springs.add(new SpringElement(ends, shape, endSprings(joint)));
    springNames.add("joint " + joint + " of member " + member);
  }

  private List<Double> cuts(String member) {
    List<Double> result = new ArrayList<>();
    double last = Double.NEGATIVE_INFINITY;
    for (double t : divisions.getOrDefault(member, new TreeSet<>())) {
      double at = t < SAME ? 0 : t > 1 - SAME ? 1 : t;
      if (at - last > SAME) {
        result.add(at);
        last = at;
      }
    }
    return result;
  }

  private int[] memberSlots(Member member, Material material, SectionProperties section) {
    int[] six = new int[6];
    double e = material.youngsModulus() * material.scale();
    double g = material.shearModulus() * material.scale();
    StiffnessPath ofMaterial = new StiffnessPath(Group.MATERIALS, material.name(), "E");
    for (Rigidity rigidity : Rigidity.values()) {
      double nominal = section.stiffness(rigidity, e, g);
      StiffnessPath path = StiffnessPath.of(member.name(), rigidity);
      StiffnessSetting factor = member.factor(rigidity);
      int slot = slots.add(path, factor.of(new Stiffness(nominal)).value());
      six[UnitFlexibility.index(rigidity)] = slot;
      slots.lead(path, slot, 1);
      if (factor instanceof StiffnessSetting.Factor) {
        slots.lead(ofMaterial, slot, 1 / e);
      }
    }
    return six;
  }

  private UnitFlexibility unit(
      Member member, double nu, SectionProperties start, double length, double from, double to) {
    Optional<String> taper = member.endSection().filter(end -> !end.equals(member.section()));
    PieceKey key =
        new PieceKey(
            new SectionKey(member.section(), nu),
            taper,
            length,
            taper.isPresent() ? from : 0,
            taper.isPresent() ? to : 1);
    return units.computeIfAbsent(
        key,
        k ->
            taper.isEmpty()
                ? UnitFlexibility.uniform(length, start)
                : UnitFlexibility.tapered(
                    length,
                    start,
                    x -> sectionAt(model, member, nu, from + (to - from) * x)));
  }

  /** The section of a member at a share of its flexible length. */
  static SectionProperties sectionAt(FrameModel model, Member member, double nu, double share) {
    Section first = model.sections().get(member.section());
    Section last = member.endSection().map(model.sections()::get).orElse(first);
    if (first == null || last == null) {
      throw new IllegalArgumentException("no section of member " + member.name());
    }
    if (!first.name().equals(last.name())
        && first.shape() instanceof SectionShape.ByShape a
        && last.shape() instanceof SectionShape.ByShape b) {
      return a.towards(b, share).properties(nu);
    }
    return first.shape().properties(nu);
  }

  private void connection(Connection connection) {
    SpringSet set = model.springs(connection);
    int[] six = new int[6];
    for (Spring spring : Spring.values()) {
      StiffnessPath path = StiffnessPath.of(Group.CONNECTIONS, connection.name(), spring);
      int slot = slots.add(path, set.stiffness(spring).value());
      six[spring.index()] = slot;
      slots.lead(path, slot, 1);
      StiffnessSetting own =
          connection.factors().getOrDefault(spring, StiffnessSetting.nominal());
      if (own instanceof StiffnessSetting.Factor factor) {
        slots.lead(
            StiffnessPath.of(Group.JOINTS, connection.joint(), spring),
            slot,
            factor.factor());
      }
    }
    int first = at(connection.firstNode());
    int second = at(connection.secondNode());
    Vector place = connection.at().orElse(places.get(first));
    double[] shape =
        Mesh.shape(
            connection.axes(), place.minus(places.get(first)), place.minus(places.get(second)));
    springs.add(
        new SpringElement(
            new int[] {first, second}, shape, new EndSprings(six, set.matrix())));
    springNames.add("connection " + connection.name());
  }

  private void support(Support support) {
    int[] six = new int[6];
    for (Spring spring : Spring.values()) {
      StiffnessPath path = StiffnessPath.of(Group.SUPPORTS, support.node(), spring);
      six[spring.index()] = slots.add(path, support.springs().stiffness(spring).value());
      slots.lead(path, six[spring.index()], 1);
    }
    springs.add(
        new SpringElement(
            new int[] {at(support.node())},
            Mesh.shape(support.axes()),
            new EndSprings(six, support.springs().matrix())));
    springNames.add("support at " + support.node());
  }
}
