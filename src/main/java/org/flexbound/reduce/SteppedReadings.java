package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.flexbound.finding.Where;

/**
 * Finds readings that step to another level and stay there: one gauge alone was touched; several at
 * once by as much as one and the same load would move them speak of the load column; several at once
 * otherwise speak of slip.
 */
final class SteppedReadings {
  /** A step below this share of the gauge's movement is not worth telling (no source). */
  private static final double LEAST = 0.015;

  /** Equivalent loads within this share of their mean are one (no source). */
  private static final double SAME_LOAD = 0.25;

  private final GaugeNoise noise;

  SteppedReadings(GaugeNoise noise) {
    this.noise = noise;
  }

  /** A change of one gauge. */
  private record Change(RunSlope slope, StepChange change) {}

  List<GaugeFault> find(RunRecord record) {
    if (!record.single()) {
      return List.of();
    }
    Map<Where, List<Change>> byPlace = new LinkedHashMap<>();
    for (RunSlope slope : record.slopes()) {
      if (!slope.isFitted()) {
        continue;
      }
      double least =
          Math.max(
              4 * noise.noise(slope.gauge()) + noise.resolution(slope.gauge()),
              LEAST * noise.span(slope.gauge()));
      StepChange.of(slope, least, noise.levelOfOneSlope())
          .ifPresent(
              change ->
                  byPlace
                      .computeIfAbsent(rowOf(change), key -> new ArrayList<>())
                      .add(new Change(slope, change)));
    }
    List<GaugeFault> faults = new ArrayList<>();
    byPlace.values().forEach(changes -> told(record, changes, faults));
    return faults;
  }

  /** Steps of several gauges belong together by their row. */
  private static Where rowOf(StepChange change) {
    return change.after().where().row().isPresent()
        ? Where.line("", change.after().where().row().getAsInt())
        : change.after().where();
  }

  private static void told(RunRecord record, List<Change> changes, List<GaugeFault> faults) {
    if (changes.size() > 1 && oneLoad(changes)) {
      Change first = changes.get(0);
      double load =
          changes.stream().mapToDouble(c -> c.change().equivalentLoad()).average().orElse(0);
      faults.add(
          new GaugeFault(
              GaugeFaultFinding.LOAD_ZERO,
              where(record, first),
              record.run().name(),
              first.slope().load(),
              String.format(
                  Locale.ROOT,
                  "steps by %.3g (SI) against all that %d gauges show, from here on: the cell's zero"
                      + " moved",
                  -load,
                  changes.size()),
              RunVerdict.DOUBTFUL));
      return;
    }
    for (Change change : changes) {
      faults.add(
          new GaugeFault(
              changes.size() > 1 ? GaugeFaultFinding.SLIPPED : GaugeFaultFinding.JUMPED,
              where(record, change),
              record.run().name(),
              change.slope().gauge(),
              String.format(
                  Locale.ROOT,
                  "steps by %.2g (SI) here and stays there, at a load of %.3g%s",
                  change.change().size(),
                  change.change().after().load(),
                  changes.size() > 1
                      ? ", as " + (changes.size() - 1) + " more gauges do"
                      : ""),
              RunVerdict.DOUBTFUL));
    }
  }

  private static Where where(RunRecord record, Change change) {
    int from = change.change().before().where().row().orElse(0);
    int to = change.change().after().where().row().orElse(from);
    return from == 0
        ? change.change().after().where()
        : record.gauge(change.slope().gauge()).rows(from, to);
  }

  private static boolean oneLoad(List<Change> changes) {
    double mean =
        changes.stream().mapToDouble(c -> c.change().equivalentLoad()).average().orElse(0);
    return changes.stream()
        .allMatch(
            c -> Math.abs(c.change().equivalentLoad() - mean) < SAME_LOAD * Math.abs(mean));
  }
}
