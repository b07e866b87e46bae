package org.flexbound.compare;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.flexbound.finding.Outcome;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;
import org.flexbound.solve.FrameFlexibility;

/** What a gauge would show at the model's other nodes, in its own direction. */
final class OtherNodes {
  /** So many nodes are tried, the nearest first. */
  private static final int MOST = 200;

  private final ConfiguredFrame frame;
  private final Gauge gauge;

  OtherNodes(ConfiguredFrame frame, int gauge) {
    this.frame = frame;
    this.gauge = frame.measured().gauges().get(gauge);
  }

  /** By node: what the nominal model computes for each load. */
  Map<String, double[]> computed() {
    if (!(gauge.station() instanceof Station.AtNode own)
        || (gauge.kind() != GaugeKind.DISPLACEMENT && gauge.kind() != GaugeKind.ROTATION)) {
      return Map.of();
    }
    Vector place = frame.model().place(own.node());
    List<String> nodes =
        frame.model().nodes().keySet().stream()
            .filter(node -> !node.equals(own.node()))
            .sorted(
                Comparator.comparingDouble(
                    node -> frame.model().place(node).minus(place).norm()))
            .limit(MOST)
            .toList();
    List<Gauge> gauges = new ArrayList<>();
    for (String node : nodes) {
      gauges.add(at(node));
    }
    Outcome<double[][]> solved =
        FrameFlexibility.prepare(frame.model(), gauges, frame.measured().loads(), List.of())
            .then(ready -> Outcome.of(ready.solve(List.of()).values(), List.of()));
    Map<String, double[]> result = new LinkedHashMap<>();
    solved
        .value()
        .ifPresent(
            values -> {
              for (int k = 0; k < nodes.size(); k++) {
                result.put(nodes.get(k), values[k]);
              }
            });
    return result;
  }

  private Gauge at(String node) {
    return new Gauge(
        gauge.name(),
        gauge.kind(),
        new Station.AtNode(node, Vector.ZERO),
        Optional.empty(),
        Optional.empty(),
        gauge.direction(),
        Optional.empty(),
        gauge.measures(),
        gauge.standsOn(),
        gauge.base(),
        gauge.instrument(),
        gauge.placing(),
        gauge.remark(),
        gauge.where());
  }
}
