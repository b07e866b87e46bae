package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.SortedSet;
import java.util.TreeSet;
import org.flexbound.setup.Instrument;

/**
 * Finds gauges that are coarse against the largest movement they saw in any run (a smaller movement
 * under another load is no fault: its uncertainty says so), by the stated resolution or by the steps
 * in which the readings go; and readings past the stated range.
 */
final class CoarseGauges {
  /** A grid this many times the stated resolution contradicts it (no source). */
  private static final double CONTRADICTS = 1.5;

  /** Scatter about the line that rounding to a grid makes at least, as a share of the grid. */
  private static final double ROUNDED = 0.1;

  private final Map<String, Instrument> instruments;
  private final GaugeNoise noise;
  private final double limit;

  CoarseGauges(Map<String, Instrument> instruments, GaugeNoise noise, double limit) {
    this.instruments = instruments;
    this.noise = noise;
    this.limit = limit;
  }

  List<GaugeFault> find(List<RunRecord> records) {
    List<GaugeFault> faults = new ArrayList<>();
    Map<String, SortedSet<Double>> values = new LinkedHashMap<>();
    Map<String, RunRecord> widest = new LinkedHashMap<>();
    Map<String, Double> width = new LinkedHashMap<>();
    for (RunRecord record : records) {
      for (RunSlope slope : record.slopes()) {
        double span = slope.quality().map(SlopeQuality::span).orElse(0.0);
        if (span > width.getOrDefault(slope.gauge(), 0.0)) {
          width.put(slope.gauge(), span);
          widest.put(slope.gauge(), record);
        }
        values
            .computeIfAbsent(slope.gauge(), key -> new TreeSet<>())
            .addAll(record.gauge(slope.gauge()).values());
        range(record, slope, faults);
      }
    }
    widest.forEach(
        (gauge, record) ->
            coarse(
                gauge,
                record,
                ColumnWatch.grid(values.getOrDefault(gauge, new TreeSet<>())),
                faults));
    return faults;
  }

  private void coarse(
      String gauge, RunRecord record, OptionalDouble grid, List<GaugeFault> faults) {
    double stated = noise.resolution(gauge);
    ColumnWatch watch = record.gauge(gauge);
    // exact multiples without any rounding about the line come of equal load steps
    boolean rounded = noise.noise(gauge) > ROUNDED * grid.orElse(Double.POSITIVE_INFINITY);
    double step = rounded ? Math.max(stated, grid.orElse(0)) : stated;
    double share = step / noise.span(gauge);
    if (!(share > limit)) {
      return;
    }
    boolean seen = rounded && grid.getAsDouble() > CONTRADICTS * stated;
    String text =
        String.format(
            Locale.ROOT,
            "goes in steps of %.2g (SI), %.1f %% of the largest movement it saw; limit %.1f %%%s",
            step,
            100 * share,
            100 * limit,
            seen && stated > 0
                ? String.format(Locale.ROOT, " (the stated resolution is %.2g)", stated)
                : seen ? " (seen in the readings; no resolution is stated)" : "");
    faults.add(
        new GaugeFault(
            GaugeFaultFinding.COARSE,
            watch.column(),
            "",
            gauge,
            text,
            RunVerdict.ACCEPT));
  }

  private void range(RunRecord record, RunSlope slope, List<GaugeFault> faults) {
    Instrument instrument = instruments.get(slope.gaugeInstrument().orElse(""));
    if (instrument == null || instrument.range().isEmpty()) {
      return;
    }
    double range = instrument.range().getAsDouble();
    ColumnWatch watch = record.gauge(slope.gauge());
    if (Math.abs(watch.largest()) > range * (1 + 1e-6)) {
      faults.add(
          new GaugeFault(
              GaugeFaultFinding.OUT_OF_RANGE,
              watch.rows(watch.largestRow(), watch.largestRow()),
              record.run().name(),
              slope.gauge(),
              String.format(
                  Locale.ROOT,
                  "reads %.4g; the range of '%s' ends at %.4g (SI)",
                  watch.largest(),
                  instrument.name(),
                  range),
              RunVerdict.DOUBTFUL));
    }
  }
}
