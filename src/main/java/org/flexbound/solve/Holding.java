package org.flexbound.solve;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.frame.Axes;
import org.flexbound.frame.Connection;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.Member;
import org.flexbound.frame.Spring;
import org.flexbound.frame.SpringSet;
import org.flexbound.frame.Support;
import org.flexbound.setup.Direction;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.setup.LoadPoint;
import org.flexbound.setup.Vector;

/**
 * What the program holds by itself: a plane model in its plane, where no load, gauge or support acts
 * out of it; and one point of a structure without any support, whose loads balance.
 */
final class Holding {
  /** Directions and places agree with a plane within this (of one, or of the extent). */
  private static final double FLAT = 1e-9;

  private final FrameModel model;
  private final Mesh mesh;
  private final Findings findings;
  private final Where where;

  Holding(FrameModel model, Mesh mesh, Findings findings) {
    this.model = model;
    this.mesh = mesh;
    this.findings = findings;
    this.where = model.where();
  }

  List<Map<Integer, Double>> rows(
      List<Gauge> gauges,
      List<List<Place>> gaugePlaces,
      List<Load> loads,
      List<List<Place>> loadPlaces,
      List<Functional> loadColumns) {
    List<Map<Integer, Double>> rows = new ArrayList<>();
    Optional<Vector> normal = plane(gauges, gaugePlaces, loads, loadPlaces);
    if (normal.isPresent()) {
      findings.add(
          SolveFinding.HELD_IN_PLANE,
          where,
          "all nodes lie in a plane with the normal "
              + show(normal.get())
              + ", and no load, gauge or support acts out of it: the model is held in this plane");
      rows.addAll(inPlane(normal.get()));
    }
    if (model.supports().isEmpty()) {
      rows.addAll(free(loads, loadColumns));
    }
    return rows;
  }

  private static String show(Vector v) {
    return String.format(
        Locale.ROOT, "(%s, %s, %s)", plain(v.x()), plain(v.y()), plain(v.z()));
  }

  private static String plain(double value) {
    return value == Math.rint(value)
        ? String.valueOf((long) value)
        : String.format(Locale.ROOT, "%.4g", value);
  }

  private List<Map<Integer, Double>> inPlane(Vector normal) {
    Axes axes =
        Axes.fromXy(
            normal,
            Math.abs(normal.z()) < 0.9 ? new Vector(0, 0, 1) : new Vector(1, 0, 0));
    List<Map<Integer, Double>> rows = new ArrayList<>();
    for (int p = 0; p < mesh.pointCount(); p++) {
      rows.add(row(6 * p, normal));
      rows.add(row(6 * p + 3, axes.y()));
      rows.add(row(6 * p + 3, axes.z()));
    }
    return rows;
  }

  private static Map<Integer, Double> row(int freedom, Vector v) {
    double[] c = {v.x(), v.y(), v.z()};
    int largest = 0;
    for (int i = 1; i < 3; i++) {
      largest = Math.abs(c[i]) > Math.abs(c[largest]) ? i : largest;
    }
    Map<Integer, Double> row = new java.util.LinkedHashMap<>();
    row.put(freedom + largest, c[largest]);
    for (int i = 0; i < 3; i++) {
      if (i != largest && c[i] != 0) {
        row.put(freedom + i, c[i]);
      }
    }
    return row;
  }

  /** The normal of the plane in which the model is held, if any. */
  private Optional<Vector> plane(
      List<Gauge> gauges,
      List<List<Place>> gaugePlaces,
      List<Load> loads,
      List<List<Place>> loadPlaces) {
    if (model.members().isEmpty()) {
      return Optional.empty();
    }
    for (Vector normal : candidates()) {
      if (flat(normal)
          && membersLie(normal)
          && springsStay(normal)
          && gaugesStay(normal, gauges, gaugePlaces)
          && loadsStay(normal, loads, loadPlaces)) {
        return Optional.of(normal);
      }
    }
    return Optional.empty();
  }

  private List<Vector> candidates() {
    List<Vector> result =
        new ArrayList<>(List.of(Axes.GLOBAL.y(), Axes.GLOBAL.z(), Axes.GLOBAL.x()));
    Vector first = mesh.places().get(0);
    Vector along = Vector.ZERO;
    Vector across = Vector.ZERO;
    for (Vector place : mesh.places()) {
      Vector d = place.minus(first);
      if (d.norm() > along.norm()) {
        along = d;
      }
    }
    for (Vector place : mesh.places()) {
      Vector n = along.cross(place.minus(first));
      if (n.norm() > across.norm()) {
        across = n;
      }
    }
    if (across.norm() > 1e-6 * along.dot(along)) {
      result.add(across.unit());
    }
    return result;
  }

  private boolean flat(Vector normal) {
    double extent = PlaceFinder.extent(model);
    double level = mesh.places().get(0).dot(normal);
    boolean flat = true;
    for (Vector place : mesh.places()) {
      flat &= Math.abs(place.dot(normal) - level) <= FLAT * extent;
    }
    for (Member member : model.members().values()) {
      flat &= Math.abs(member.startOffset().dot(normal)) <= FLAT * extent;
      flat &= Math.abs(member.endOffset().dot(normal)) <= FLAT * extent;
    }
    for (Connection connection : model.connections().values()) {
      flat &=
          Math.abs(
                  connection.at().orElse(model.place(connection.firstNode())).dot(normal)
                      - level)
              <= FLAT * extent;
    }
    return flat;
  }

  /** One of the principal axes of every member along the normal: bending does not leave the plane. */
  private boolean membersLie(Vector normal) {
    for (Member member : model.members().values()) {
      Axes axes = model.axes(member);
      double angle = model.startSection(member).principalAngle();
      Vector y = axes.y().times(Math.cos(angle)).plus(axes.z().times(Math.sin(angle)));
      double along = Math.abs(y.dot(normal));
      if (along > FLAT && along < 1 - FLAT) {
        return false;
      }
      if (model.startSection(member).hasOffsetShearCentre()) {
        return false;
      }
    }
    return true;
  }

  private boolean springsStay(Vector normal) {
    for (Support support : model.supports().values()) {
      SpringSet set = support.springs();
      for (Spring spring : Spring.values()) {
        Vector axis = support.axes().axis(spring.index() % 3);
        boolean stays =
            spring.rotation() ? along(axis, normal) : Math.abs(axis.dot(normal)) <= FLAT;
        if (!set.stiffness(spring).isFree() && !stays) {
          return false;
        }
      }
    }
    for (Connection connection : model.connections().values()) {
      for (int i = 0; i < 3; i++) {
        double along = Math.abs(connection.axes().axis(i).dot(normal));
        if (along > FLAT && along < 1 - FLAT) {
          return false;
        }
      }
    }
    return true;
  }

  private static boolean along(Vector axis, Vector normal) {
    return Math.abs(axis.dot(normal)) >= 1 - FLAT;
  }

  private static boolean stays(Direction direction, Place place, Vector normal, double extent) {
    boolean direct =
        direction.rotation()
            ? along(direction.vector(), normal)
            : Math.abs(direction.vector().dot(normal)) <= FLAT;
    return direct && Math.abs(place.offset().dot(normal)) <= FLAT * extent;
  }

  private boolean gaugesStay(Vector normal, List<Gauge> gauges, List<List<Place>> places) {
    double extent = PlaceFinder.extent(model);
    for (int g = 0; g < gauges.size(); g++) {
      if (gauges.get(g).kind() != GaugeKind.STRAIN) {
        for (Place place : places.get(g)) {
          if (!stays(gauges.get(g).direction(), place, normal, extent)) {
            return false;
          }
        }
      }
    }
    return true;
  }

  private boolean loadsStay(Vector normal, List<Load> loads, List<List<Place>> places) {
    double extent = PlaceFinder.extent(model);
    for (int l = 0; l < loads.size(); l++) {
      List<LoadPoint> points = loads.get(l).points();
      for (int p = 0; p < points.size(); p++) {
        if (!stays(points.get(p).direction(), places.get(l).get(p), normal, extent)) {
          return false;
        }
      }
    }
    return true;
  }

  /** Holds the first point of a structure without supports, and sees that its loads balance. */
  List<Map<Integer, Double>> free(List<Load> loads, List<Functional> columns) {
    double extent = PlaceFinder.extent(model);
    for (int l = 0; l < loads.size(); l++) {
      double unbalanced = columns.get(l).unbalanced(mesh, extent);
      if (unbalanced > 1e-9) {
        findings.add(
            SolveFinding.LOAD_NOT_BALANCED,
            loads.get(l).where(),
            "the load '"
                + loads.get(l).name()
                + "' does not balance itself, but the model has no support");
      }
    }
    String node = model.members().values().iterator().next().startNode();
    findings.add(
        SolveFinding.FREE_STRUCTURE,
        where,
        "the model has no support; motions are relative to the node '" + node + "'");
    List<Map<Integer, Double>> rows = new ArrayList<>();
    for (int i = 0; i < 6; i++) {
      Map<Integer, Double> row = new HashMap<>();
      row.put(6 * mesh.point(node) + i, 1.0);
      rows.add(row);
    }
    return rows;
  }
}
