package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.flexbound.finding.Where;
import org.flexbound.setup.Load;

/**
 * Judges the load column of a run: past its limit, and whether it comes back to its opening zero. A
 * load that stayed on moves the gauges; a cell whose zero has moved does not.
 */
final class LoadColumn {
  /** A closing load below this share of the peak is back at zero (common practice, no source). */
  private static final double BACK = 0.005;

  /** The first and last step belong to the unloaded state below this share of the peak. */
  private static final double UNLOADED = 0.2;

  /** Gauges that show less than this share of the load left say that it is not there. */
  private static final double SHOWN = 0.5;

  private final Map<String, Load> loads;
  private final GaugeNoise noise;

  LoadColumn(Map<String, Load> loads, GaugeNoise noise) {
    this.loads = loads;
    this.noise = noise;
  }

  List<GaugeFault> find(RunRecord record) {
    List<GaugeFault> faults = new ArrayList<>();
    for (int l = 0; l < record.run().loads().size(); l++) {
      limit(record, l).ifPresent(faults::add);
    }
    if (record.single()) {
      zero(record).ifPresent(faults::add);
    }
    return faults;
  }

  private Optional<GaugeFault> limit(RunRecord record, int channel) {
    String name = record.run().loads().get(channel).name();
    Load load = loads.get(name);
    double reached = record.watch().largestLoad(channel);
    if (load == null || load.limit().isEmpty() || !(reached > load.limit().getAsDouble())) {
      return Optional.empty();
    }
    double limit = load.limit().getAsDouble();
    return Optional.of(
        new GaugeFault(
            GaugeFaultFinding.LOAD_LIMIT,
            record.watch().largestLoadPlace(channel),
            record.run().name(),
            name,
            String.format(
                Locale.ROOT,
                "reaches %.4g; its limit is %.4g (SI), passed by %.1f %%",
                reached,
                limit,
                100 * (reached / limit - 1)),
            RunVerdict.ACCEPT));
  }

  private Optional<GaugeFault> zero(RunRecord record) {
    List<LoadStep> steps = record.slopes().get(0).steps();
    if (steps.size() < 4) {
      return Optional.empty();
    }
    double peak = steps.stream().mapToDouble(s -> Math.abs(s.load())).max().orElse(0);
    LoadStep first = steps.get(0);
    LoadStep last = steps.get(steps.size() - 1);
    double left = last.load() - first.load();
    boolean unloaded =
        Math.abs(first.load()) < UNLOADED * peak && Math.abs(last.load()) < UNLOADED * peak;
    if (!unloaded || !(Math.abs(left) > BACK * peak)) {
      return Optional.empty();
    }
    Optional<double[]> shown = shown(record, left);
    if (shown.isEmpty()) {
      return Optional.empty();
    }
    double share = shown.get()[0] / left;
    double u = shown.get()[1] / Math.abs(left);
    String text =
        String.format(
            Locale.ROOT,
            "ends the run at %.3g (SI), %.1f %% of its peak, against %.3g at the beginning; its gauges"
                + " show %.0f %% of that change",
            last.load(),
            100 * left / peak,
            first.load(),
            100 * share);
    if (share + noise.quantile() * u < SHOWN) {
      return Optional.of(
          new GaugeFault(
              GaugeFaultFinding.LOAD_ZERO, where(record, steps), record.run().name(),
              record.slopes().get(0).load(), text, RunVerdict.DOUBTFUL));
    }
    return Optional.of(
        new GaugeFault(
            GaugeFaultFinding.LOAD_LEFT, where(record, steps), record.run().name(),
            record.slopes().get(0).load(), text, RunVerdict.ACCEPT));
  }

  private static Where where(RunRecord record, List<LoadStep> steps) {
    String load = record.slopes().get(0).load();
    int row = steps.get(steps.size() - 1).where().row().orElse(0);
    for (int l = 0; l < record.run().loads().size(); l++) {
      if (record.run().loads().get(l).name().equals(load) && row > 0) {
        return record.watch().load(l).rows(row, row);
      }
    }
    return record.run().where();
  }

  /**
   * The change of load that the gauges' own closing readings speak of: the mean over the gauges of each
   * reading over its slope, weighted by how well it can tell; with its uncertainty.
   */
  private Optional<double[]> shown(RunRecord record, double left) {
    double weights = 0;
    double sum = 0;
    for (RunSlope slope : record.slopes()) {
      List<LoadStep> steps = slope.steps();
      double change = steps.get(steps.size() - 1).motion() - steps.get(0).motion();
      double u = Math.sqrt(2) * noise.noise(slope.gauge()) / Math.abs(slope.slope());
      if (slope.isFitted() && !Double.isNaN(change) && u < Math.abs(left)) {
        weights += 1 / (u * u);
        sum += change / slope.slope() / (u * u);
      }
    }
    return weights > 0
        ? Optional.of(new double[] {sum / weights, 1 / Math.sqrt(weights)})
        : Optional.empty();
  }
}
