package org.flexbound.solve;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.Member;
import org.flexbound.frame.Rigidity;
import org.flexbound.frame.SectionProperties;
import org.flexbound.setup.Direction;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.setup.SectionPoint;
import org.flexbound.setup.Vector;

/** Makes functionals of gauges and loads, and of their derivatives by place and direction. */
final class Readings {
  private static final Vector[] AXES = {
    new Vector(1, 0, 0), new Vector(0, 1, 0), new Vector(0, 0, 1)
  };

  private final FrameModel model;
  private final Mesh mesh;

  Readings(FrameModel model, Mesh mesh) {
    this.model = model;
    this.mesh = mesh;
  }

  /**
   * A point and what leads from it to a place.
   *
   * @param point the point
   * @param arm m, global axes
   */
  record Spot(int point, Vector arm) {}

  Spot spot(Place place) {
    if (place.node().isPresent()) {
      return new Spot(mesh.point(place.node().get()), place.offset());
    }
    List<Mesh.Piece> pieces = mesh.pieces(place.member().orElseThrow());
    Mesh.Piece nearest = pieces.get(0);
    boolean atStart = true;
    double distance = Math.abs(place.at() - nearest.from());
    for (Mesh.Piece piece : pieces) {
      if (Math.abs(place.at() - piece.to()) < distance) {
        distance = Math.abs(place.at() - piece.to());
        nearest = piece;
        atStart = false;
      }
    }
    return atStart
        ? new Spot(nearest.startPoint(), nearest.startArm())
        : new Spot(nearest.endPoint(), nearest.endArm());
  }

  Functional of(Gauge gauge, List<Place> places) {
    if (gauge.kind() == GaugeKind.STRAIN) {
      return strain(gauge, places.get(0));
    }
    Sum sum = new Sum();
    for (int i = 0; i < places.size(); i++) {
      sum.add(spot(places.get(i)), gauge.direction(), sign(gauge, i));
    }
    return sum.functional();
  }

  /** A difference is the second place less the first. */
  private static double sign(Gauge gauge, int place) {
    return gauge.kind() == GaugeKind.RELATIVE && place == 0 ? -1 : 1;
  }

  Functional of(Load load, List<Place> places) {
    Sum sum = new Sum();
    for (int i = 0; i < places.size(); i++) {
      sum.add(
          spot(places.get(i)), load.points().get(i).direction(), load.points().get(i).share());
    }
    return sum.functional();
  }

  /** Derivatives by x, y, z of the place and by the angle about x, y, z; none for a strain. */
  List<Functional> byPlace(Gauge gauge, List<Place> places, int place) {
    if (gauge.kind() == GaugeKind.STRAIN) {
      return strainByPlace(gauge, places.get(0));
    }
    return byPlace(spot(places.get(place)), gauge.direction(), sign(gauge, place));
  }

  List<Functional> byPlace(Load load, List<Place> places, int point) {
    return byPlace(
        spot(places.get(point)),
        load.points().get(point).direction(),
        load.points().get(point).share());
  }

  private static List<Functional> byPlace(Spot spot, Direction direction, double factor) {
    List<Functional> result = new ArrayList<>();
    for (Vector axis : AXES) {
      Sum sum = new Sum();
      if (!direction.rotation()) {
        sum.turn(spot, axis.cross(direction.vector()), factor);
      }
      result.add(sum.functional());
    }
    for (Vector axis : AXES) {
      Vector turned = axis.cross(direction.vector());
      Sum sum = new Sum();
      if (direction.rotation()) {
        sum.turn(spot, turned, factor);
      } else {
        sum.shift(spot, turned, factor);
      }
      result.add(sum.functional());
    }
    return result;
  }

  private static final class Sum {
    private final List<Integer> freedoms = new ArrayList<>();
    private final List<Double> coefficients = new ArrayList<>();

    void add(Spot spot, Direction direction, double factor) {
      if (direction.rotation()) {
        turn(spot, direction.vector(), factor);
      } else {
        shift(spot, direction.vector(), factor);
      }
    }

    /** d · (u + θ × arm). */
    void shift(Spot spot, Vector d, double factor) {
      put(6 * spot.point(), d, factor);
      put(6 * spot.point() + 3, spot.arm().cross(d), factor);
    }

    /** d · θ. */
    void turn(Spot spot, Vector d, double factor) {
      put(6 * spot.point() + 3, d, factor);
    }

    private void put(int freedom, Vector v, double factor) {
      double[] c = {v.x(), v.y(), v.z()};
      for (int i = 0; i < 3; i++) {
        if (c[i] != 0) {
          freedoms.add(freedom + i);
          coefficients.add(factor * c[i]);
        }
      }
    }

    Functional functional() {
      return new Functional(
          freedoms.stream().mapToInt(Integer::intValue).toArray(),
          coefficients.stream().mapToDouble(Double::doubleValue).toArray(),
          Optional.empty());
    }
  }

  private Member member(Place place) {
    Member member = model.members().get(place.member().orElseThrow());
    if (member == null) {
      throw new IllegalArgumentException("no member " + place.member());
    }
    return member;
  }

  private Mesh.Piece piece(Place place) {
    List<Mesh.Piece> pieces = mesh.pieces(place.member().orElseThrow());
    for (Mesh.Piece piece : pieces) {
      if (place.at() <= piece.to() + 1e-9) {
        return piece;
      }
    }
    return pieces.get(pieces.size() - 1);
  }

  private Functional strain(Gauge gauge, Place place) {
    SectionPoint point = gauge.sectionPoint().orElse(new SectionPoint(0, 0));
    SectionProperties here = sectionAt(place);
    double c = Math.cos(here.principalAngle());
    double s = Math.sin(here.principalAngle());
    double y = c * point.y() + s * point.z();
    double z = -s * point.y() + c * point.z();
    return strain(place, 0, new double[] {1, z, -y});
  }

  private SectionProperties sectionAt(Place place) {
    Member member = member(place);
    double nu = model.material(member.material()).poissonRatio();
    return MeshBuilder.sectionAt(model, member, nu, place.at());
  }

  /**
   * Σ lever · section force / rigidity, or (order 1) with the change of section forces along the
   * member in place of them.
   */
  private Functional strain(Place place, int order, double[] levers) {
    Mesh.Piece piece = piece(place);
    MemberElement element = mesh.members().get(piece.element());
    UnitFlexibility unit = element.unit();
    Member member = member(place);
    double nu = model.material(member.material()).poissonRatio();
    SectionProperties start = MeshBuilder.sectionAt(model, member, nu, 0);
    SectionProperties here = sectionAt(place);
    double share =
        Math.min(1, Math.max(0, (place.at() - piece.from()) / (piece.to() - piece.from())));
    Rigidity[] rigidities = {Rigidity.EA, Rigidity.EI_Y, Rigidity.EI_Z};
    int[] slots = new int[3];
    double[][] rows = new double[3][];
    for (int p = 0; p < 3; p++) {
      slots[p] = element.slot(UnitFlexibility.index(rigidities[p]));
      double factor = levers[p] * UnitFlexibility.ratio(rigidities[p], start, here);
      double[] row = unit.row(rigidities[p], share);
      if (order == 1) {
        // Section forces are linear along the piece.
        double[] from = unit.row(rigidities[p], 0);
        double[] to = unit.row(rigidities[p], 1);
        for (int i = 0; i < 6; i++) {
          row[i] = (to[i] - from[i]) / unit.length();
        }
      }
      for (int i = 0; i < 6; i++) {
        row[i] *= factor;
      }
      rows[p] = row;
    }
    return new Functional(
        new int[0],
        new double[0],
        Optional.of(new Functional.Strain(piece.element(), slots, rows)));
  }

  /**
   * Along the member by the change of the section forces (the section taken as constant there), and
   * across it by the levers; by angles not at all.
   */
  private List<Functional> strainByPlace(Gauge gauge, Place place) {
    SectionPoint point = gauge.sectionPoint().orElse(new SectionPoint(0, 0));
    SectionProperties here = sectionAt(place);
    double c = Math.cos(here.principalAngle());
    double s = Math.sin(here.principalAngle());
    double y = c * point.y() + s * point.z();
    double z = -s * point.y() + c * point.z();
    Mesh.Piece piece = piece(place);
    List<Functional> result = new ArrayList<>();
    for (Vector axis : AXES) {
      double along = axis.dot(piece.axes().x());
      double acrossY = axis.dot(piece.axes().y());
      double acrossZ = axis.dot(piece.axes().z());
      double dy = c * acrossY + s * acrossZ;
      double dz = -s * acrossY + c * acrossZ;
      Functional changing = strain(place, 1, new double[] {along, along * z, -along * y});
      Functional lever = strain(place, 0, new double[] {0, dz, -dy});
      result.add(sum(changing, lever));
    }
    for (int i = 0; i < 3; i++) {
      result.add(new Sum().functional());
    }
    return result;
  }

  private static Functional sum(Functional a, Functional b) {
    Functional.Strain first = a.strain().orElseThrow();
    Functional.Strain second = b.strain().orElseThrow();
    double[][] rows = new double[3][6];
    for (int p = 0; p < 3; p++) {
      for (int i = 0; i < 6; i++) {
        rows[p][i] = first.rows()[p][i] + second.rows()[p][i];
      }
    }
    return new Functional(
        new int[0],
        new double[0],
        Optional.of(new Functional.Strain(first.element(), first.slots(), rows)));
  }
}
