package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.flexbound.finding.Where;

/**
 * Finds drift, kinks and bad steps of a gauge, and readings that step to another level and stay
 * there: one gauge alone was touched; several at
 * once by as much as one and the same load would move them speak of the load column; several at once
 * otherwise speak of slip.
 */
final class SteppedReadings {
  /** A step below this share of the gauge's movement is not worth telling (no source). */
  private static final double LEAST = 0.015;

  /** The same for a drift: half of what may stay behind at zero (no source). */
  private static final double LEAST_DRIFT = 0.025;

  /** Equivalent loads within this share of their mean are one (no source). */
  private static final double SAME_LOAD = 0.25;

  private final GaugeNoise noise;

  SteppedReadings(GaugeNoise noise) {
    this.noise = noise;
  }

  /** A change of one gauge. */
  private record Change(RunSlope slope, RunShape change) {}

  List<GaugeFault> find(RunRecord record) {
    if (!record.single()) {
      return List.of();
    }
    List<GaugeFault> faults = new ArrayList<>();
    Map<Where, List<Change>> byPlace = new LinkedHashMap<>();
    for (RunSlope slope : record.slopes()) {
      if (!slope.isFitted()) {
        continue;
      }
      double least =
          Math.max(
              4 * noise.noise(slope.gauge()) + noise.resolution(slope.gauge()),
              LEAST * noise.span(slope.gauge()));
      RunShape.of(slope, least, noise.levelOfOneSlope())
          .ifPresent(
              shape -> {
                if (shape.kind() == RunShape.Kind.DRIFT
                    && Math.abs(shape.size()) < LEAST_DRIFT * noise.span(slope.gauge())) {
                  return;
                }
                if (shape.kind() == RunShape.Kind.STEP) {
                  byPlace
                      .computeIfAbsent(rowOf(shape), key -> new ArrayList<>())
                      .add(new Change(slope, shape));
                } else {
                  faults.add(alone(record, new Change(slope, shape)));
                }
              });
    }
    byPlace.values().forEach(changes -> told(record, changes, faults));
    return faults;
  }

  /** A drift, a kink or a bad step of one gauge. */
  private static GaugeFault alone(RunRecord record, Change change) {
    RunShape shape = change.change();
    double share = 100 * Math.abs(shape.size()) / span(change.slope());
    return switch (shape.kind()) {
      case DRIFT ->
          fault(
              GaugeFaultFinding.DRIFT, record.gauge(change.slope().gauge()).column(), record, change,
              String.format(
                  Locale.ROOT, "drifts by %.2g (SI) through the run, %.1f %% of its movement",
                  shape.size(), share));
      case KINK ->
          fault(
              GaugeFaultFinding.KINK, shape.after().where(), record, change,
              String.format(
                  Locale.ROOT,
                  "changes its slope at a load of about %.3g (SI): %.2g from a straight line there, %.1f %%"
                      + " of its movement",
                  shape.load(), shape.size(), share));
      default ->
          fault(
              GaugeFaultFinding.OUTLIER, shape.after().where(), record, change,
              String.format(
                  Locale.ROOT, "reads %+.2g (SI) off its line in this step, %.1f %% of its movement",
                  shape.size(), share));
    };
  }

  private static GaugeFault fault(
      GaugeFaultFinding kind, Where where, RunRecord record, Change change, String text) {
    return new GaugeFault(
        kind, where, record.run().name(), change.slope().gauge(), text, RunVerdict.DOUBTFUL);
  }

  private static double span(RunSlope slope) {
    return slope.quality().map(SlopeQuality::span).orElse(Double.NaN);
  }

  /** Steps of several gauges belong together by their row. */
  private static Where rowOf(RunShape change) {
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
