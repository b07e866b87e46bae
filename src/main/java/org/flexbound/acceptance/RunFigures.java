package org.flexbound.acceptance;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.ToDoubleFunction;
import org.flexbound.reduce.Reduction;
import org.flexbound.reduce.RunSlope;
import org.flexbound.reduce.SlopeQuality;
import org.flexbound.setup.Instrument;
import org.flexbound.setup.LimitKind;

/**
 * The quality figures of the runs as quantities: linearity, hysteresis and set are the largest that
 * any run showed, repeatability is the relative standard deviation of the slopes.
 *
 * <p>A figure is the difference of two readings as a share of the gauge's span; its uncertainty is
 * that of two readings, √2 √(u₀² + q²/12) over the span, u₀ the instrument's fixed uncertainty and q
 * its resolution (JCGM 100:2008, F.2.2.1). The gain cancels in a share.
 */
final class RunFigures {
  private final Reduction reduction;
  private final Map<String, Instrument> instruments = new LinkedHashMap<>();

  RunFigures(Reduction reduction, List<Instrument> instruments) {
    this.reduction = reduction;
    instruments.forEach(i -> this.instruments.put(i.name(), i));
  }

  private static ToDoubleFunction<SlopeQuality> figure(LimitKind kind) {
    return switch (kind) {
      case LINEARITY -> SlopeQuality::linearity;
      case HYSTERESIS -> SlopeQuality::hysteresis;
      case SET -> quality -> Math.abs(quality.zeroReturn());
      default -> throw new IllegalArgumentException(kind + " is no figure of a run");
    };
  }

  /** The largest figure of any run; empty where none has it. */
  Optional<Quantity> largest(LimitKind kind, String gauge, String load, String subject) {
    Optional<Quantity> worst = Optional.empty();
    int runs = 0;
    for (RunSlope slope : slopes(gauge, load)) {
      SlopeQuality quality = slope.quality().orElseThrow();
      double value = figure(kind).applyAsDouble(quality);
      if (!Double.isFinite(value)) {
        continue;
      }
      runs++;
      if (worst.isEmpty() || value > worst.get().value()) {
        worst =
            Optional.of(
                new Quantity(
                    subject + " in " + slope.run(),
                    value,
                    new Budget(0, Double.POSITIVE_INFINITY, List.of(readings(slope, quality))),
                    1,
                    Quantity.Law.ABOUT_VALUE));
      }
    }
    int all = runs;
    return worst.map(
        q -> new Quantity(q.subject(), q.value(), q.budget(), all, Quantity.Law.ABOUT_VALUE));
  }

  private Budget.Source readings(RunSlope slope, SlopeQuality quality) {
    Instrument instrument = slope.gaugeInstrument().map(instruments::get).orElse(null);
    double variance = 0;
    if (instrument != null) {
      double floor = instrument.floorUncertainty().orElse(0);
      double resolution = instrument.resolution().orElse(0);
      variance = floor * floor + resolution * resolution / 12;
    }
    double span = quality.span();
    return new Budget.Source(
        "fixed part and resolution of " + slope.gaugeInstrument().orElse("the gauge"),
        span > 0 ? Math.sqrt(2 * variance) / span : 0,
        Double.NaN);
  }

  /** The relative standard deviation of the slopes over runs; empty for fewer than two runs. */
  Optional<Quantity> repeatability(String gauge, String load, String subject) {
    Double value = reduction.repeatability().get(Reduction.key(gauge, load));
    int runs = slopes(gauge, load).size();
    if (value == null || !Double.isFinite(value) || runs < 2) {
      return Optional.empty();
    }
    double degrees = runs - 1.0;
    return Optional.of(
        new Quantity(
            subject,
            value,
            new Budget(value / Math.sqrt(2 * degrees), degrees, List.of()),
            runs,
            Quantity.Law.STANDARD_DEVIATION));
  }

  private List<RunSlope> slopes(String gauge, String load) {
    List<RunSlope> result = new ArrayList<>();
    for (RunSlope slope : reduction.slopes()) {
      if (slope.gauge().equals(gauge)
          && slope.load().equals(load)
          && slope.isFitted()
          && slope.quality().isPresent()) {
        result.add(slope);
      }
    }
    return result;
  }
}
