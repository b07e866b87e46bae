package org.flexbound.acceptance;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.flexbound.flexibility.AbsoluteCoefficient;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.reduce.Places;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.setup.LoadPoint;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;

/** Which gauges sit on which load points. */
final class Collocation {
  /** Places within this distance are one, m. */
  private static final double SAME_PLACE = 1e-3;

  /** Directions whose cosine is within this of one are parallel. */
  private static final double PARALLEL = 1e-3;

  private final MeasuredFlexibility measured;
  private final Places places;

  Collocation(MeasuredFlexibility measured, Places places) {
    this.measured = measured;
    this.places = places;
  }

  /**
   * A gauge on a load point and along its line.
   *
   * @param gauge its index
   * @param load the load's index
   * @param sign −1 where the two point opposite ways
   */
  record Mate(int gauge, int load, double sign) {}

  /** All of them, in the order of the loads; load patterns have none. */
  List<Mate> mates() {
    List<Mate> mates = new ArrayList<>();
    for (int l = 0; l < measured.loads().size(); l++) {
      Load load = measured.loads().get(l);
      if (load.isPattern()) {
        continue;
      }
      for (int g = 0; g < measured.gauges().size(); g++) {
        Gauge gauge = measured.gauges().get(g);
        double cosine =
            gauge.direction().vector().dot(load.points().get(0).direction().vector());
        if (likeKind(gauge, load) && Math.abs(cosine) > 1 - PARALLEL && together(gauge, load)) {
          mates.add(new Mate(g, l, Math.signum(cosine)));
        }
      }
    }
    return mates;
  }

  /** Whether a gauge reads the motion that a load drives: translation and force, or the turns. */
  static boolean likeKind(Gauge gauge, Load load) {
    return gauge.kind() == (load.isMoment() ? GaugeKind.ROTATION : GaugeKind.DISPLACEMENT);
  }

  private boolean together(Gauge gauge, Load load) {
    LoadPoint point = load.points().get(0);
    return same(
        gauge.station(), gauge.coordinates(), point.station(), point.coordinates());
  }

  private boolean same(
      Station a, Optional<Vector> statedA, Station b, Optional<Vector> statedB) {
    if (a.equals(b)) {
      return true;
    }
    Optional<Vector> first = statedA.or(() -> places.of(a));
    Optional<Vector> second = statedB.or(() -> places.of(b));
    return first.isPresent()
        && second.isPresent()
        && first.get().minus(second.get()).norm() < SAME_PLACE;
  }

  /** Whether a gauge is at a point named by a node, or by another gauge. */
  boolean at(Gauge gauge, String point) {
    return at(gauge.station(), gauge.coordinates(), point);
  }

  /** Whether a load is at a point named by a node, or by a gauge. */
  boolean at(Load load, String point) {
    LoadPoint only = load.points().get(0);
    return !load.isPattern() && at(only.station(), only.coordinates(), point);
  }

  private boolean at(Station station, Optional<Vector> stated, String point) {
    if (same(station, stated, new Station.AtNode(point, Vector.ZERO), Optional.empty())) {
      return true;
    }
    return measured.gauges().stream()
        .filter(g -> g.name().equals(point))
        .anyMatch(g -> same(station, stated, g.station(), g.coordinates()));
  }

  /** The weights that average a gauge's absolute coefficients under a load; empty for none. */
  Optional<double[]> absolute(int gauge, int load) {
    double[] row = new double[measured.absolute().size()];
    double runs = 0;
    for (int k = 0; k < row.length; k++) {
      AbsoluteCoefficient a = measured.absolute().get(k);
      if (a.gauge() == gauge && a.load() == load) {
        row[k] = a.runs();
        runs += a.runs();
      }
    }
    for (int k = 0; k < row.length; k++) {
      row[k] /= Math.max(runs, 1);
    }
    return runs > 0 ? Optional.of(row) : Optional.empty();
  }
}
