package org.flexbound.flexibility;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.LoadPoint;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;

/**
 * A load with the gauge that sits on its point and reads along its line: together they give a direct
 * coefficient. A load pattern has a gauge on each of its points, and their sum weighted by the
 * pattern's shares does the same work.
 *
 * @param load the load's index
 * @param gauges the gauges' indices: one, or one for each point of a pattern
 * @param weights with which they add up; negative where gauge and load point opposite ways
 */
record CollocatedPoint(int load, List<Integer> gauges, List<Double> weights) {
  /** Places within this distance are one, m. */
  private static final double SAME_PLACE = 1e-3;

  /** Directions whose cosine is within this of one are parallel. */
  private static final double PARALLEL = 1e-3;

  CollocatedPoint {
    gauges = List.copyOf(gauges);
    weights = List.copyOf(weights);
  }

  /** All of a test, in the order of its loads; a load with several gauges on it gives several. */
  static List<CollocatedPoint> of(
      AbsoluteMeans means, Function<Station, Optional<Vector>> places) {
    List<CollocatedPoint> found = new ArrayList<>();
    MeasuredFlexibility measured = means.measured();
    for (int l = 0; l < measured.loads().size(); l++) {
      List<LoadPoint> points = measured.loads().get(l).points();
      List<Map<Integer, Double>> mates = new ArrayList<>();
      for (LoadPoint point : points) {
        mates.add(mates(measured.gauges(), point, places));
      }
      if (points.size() == 1) {
        int load = l;
        mates.get(0).forEach((gauge, sign) ->
            found.add(new CollocatedPoint(load, List.of(gauge), List.of(sign))));
      } else if (mates.stream().noneMatch(Map::isEmpty)) {
        List<Integer> gauges = new ArrayList<>();
        List<Double> weights = new ArrayList<>();
        for (int p = 0; p < points.size(); p++) {
          Map.Entry<Integer, Double> first = mates.get(p).entrySet().iterator().next();
          gauges.add(first.getKey());
          weights.add(points.get(p).share() * first.getValue());
        }
        found.add(new CollocatedPoint(l, gauges, weights));
      }
    }
    return found;
  }

  /** The gauges on a point and along its line, each with the sign of its direction. */
  private static Map<Integer, Double> mates(
      List<Gauge> gauges, LoadPoint point, Function<Station, Optional<Vector>> places) {
    Map<Integer, Double> mates = new LinkedHashMap<>();
    GaugeKind kind =
        point.direction().rotation() ? GaugeKind.ROTATION : GaugeKind.DISPLACEMENT;
    for (int g = 0; g < gauges.size(); g++) {
      Gauge gauge = gauges.get(g);
      double cosine = gauge.direction().vector().dot(point.direction().vector());
      if (gauge.kind() == kind
          && Math.abs(cosine) > 1 - PARALLEL
          && samePlace(gauge, point, places)) {
        mates.put(g, Math.signum(cosine));
      }
    }
    return mates;
  }

  private static boolean samePlace(
      Gauge gauge, LoadPoint point, Function<Station, Optional<Vector>> places) {
    if (gauge.station().equals(point.station())) {
      return true;
    }
    Optional<Vector> first = gauge.coordinates().or(() -> places.apply(gauge.station()));
    Optional<Vector> second = point.coordinates().or(() -> places.apply(point.station()));
    return first.isPresent()
        && second.isPresent()
        && first.get().minus(second.get()).norm() < SAME_PLACE;
  }

  boolean isPattern() {
    return gauges.size() > 1;
  }

  /** The motion of this point under a load; empty where one of its gauges was not read. */
  Optional<Combination> under(int otherLoad, AbsoluteMeans means) {
    Combination.Sum sum = new Combination.Sum();
    for (int k = 0; k < gauges.size(); k++) {
      Optional<Combination> part = means.of(gauges.get(k), otherLoad);
      if (part.isEmpty()) {
        return Optional.empty();
      }
      sum.add(part.get(), weights.get(k));
    }
    return Optional.of(sum.made());
  }

  /** The gauge, or the sum of gauges, in words. */
  String gaugeName(AbsoluteMeans means) {
    StringBuilder text = new StringBuilder();
    for (int k = 0; k < gauges.size(); k++) {
      text.append(k > 0 ? " + " : "");
      if (isPattern()) {
        text.append(String.format(java.util.Locale.ROOT, "%.3g·", Math.abs(weights.get(k))));
      }
      text.append(means.measured().gauges().get(gauges.get(k)).name());
    }
    return text.toString();
  }

  String loadName(AbsoluteMeans means) {
    return means.measured().loads().get(load).name();
  }

  /** The motion of this point under a load, in words. */
  String name(int otherLoad, AbsoluteMeans means) {
    return gaugeName(means) + " under " + means.measured().loads().get(otherLoad).name();
  }
}
