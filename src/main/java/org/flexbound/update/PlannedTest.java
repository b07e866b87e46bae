package org.flexbound.update;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeMap;
import org.flexbound.finding.Findings;
import org.flexbound.flexibility.AbsoluteCoefficient;
import org.flexbound.flexibility.Coefficient;
import org.flexbound.flexibility.Gain;
import org.flexbound.flexibility.LinearMap;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Instrument;
import org.flexbound.setup.Load;

/**
 * A test before it is run: its gauges, loads and instruments, and how well a slope is expected to
 * repeat.
 *
 * @param configuration the configuration
 * @param instruments the instruments
 * @param gauges the gauges; base gauges are passed over, and base motion is taken as none
 * @param loads the loads, each with its limit, up to which it is taken to be used
 * @param repeatability relative standard deviation of a slope from run to run
 * @param runs how many runs of each load are planned
 */
public record PlannedTest(
    String configuration,
    List<Instrument> instruments,
    List<Gauge> gauges,
    List<Load> loads,
    OptionalDouble repeatability,
    int runs) {
  /** Copies the lists. */
  public PlannedTest {
    instruments = List.copyOf(instruments);
    gauges = List.copyOf(gauges);
    loads = List.copyOf(loads);
  }

  /**
   * The measured flexibility as it would be if the nominal model were true.
   *
   * @param computed nominal coefficients, gauges × loads of this plan
   * @param findings takes what is missing
   * @return the flexibility; empty where the plan lacks something
   */
  Optional<MeasuredFlexibility> expected(double[][] computed, Findings findings) {
    if (repeatability.isEmpty()) {
      findings.add(
          UpdateFinding.PLAN_INCOMPLETE,
          org.flexbound.finding.Where.nowhere(),
          "the log of '" + configuration + "' states no repeatability in its options");
    }
    for (Load load : loads) {
      if (load.limit().isEmpty()) {
        findings.add(
            UpdateFinding.PLAN_INCOMPLETE,
            load.where(),
            "the load " + load.name() + " states no limit, up to which it would be used");
      }
    }
    if (findings.hasErrors()) {
      return Optional.empty();
    }
    Map<String, Instrument> byName = new TreeMap<>();
    instruments.forEach(i -> byName.put(i.name(), i));
    Map<String, Integer> known = new LinkedHashMap<>();
    List<Gain> gains = new ArrayList<>();
    List<AbsoluteCoefficient> absolute = new ArrayList<>();
    List<Coefficient> coefficients = new ArrayList<>();
    for (int g = 0; g < gauges.size(); g++) {
      if (gauges.get(g).base()) {
        continue;
      }
      for (int l = 0; l < loads.size(); l++) {
        Optional<Instrument> own = gauges.get(g).instrument().map(byName::get);
        Optional<Instrument> cell = loads.get(l).instrument().map(byName::get);
        List<Integer> acting = new ArrayList<>();
        own.ifPresent(i -> gain(i, known, gains).ifPresent(acting::add));
        cell.ifPresent(i -> gain(i, known, gains).ifPresent(acting::add));
        double value = computed[g][l];
        double range = loads.get(l).limit().orElse(1);
        double scatter =
            repeatability.orElse(0) * Math.abs(value) / Math.sqrt(Math.max(runs, 1));
        // A floor u₀ at both ends of the range gives a slope √2 u₀/ΔP.
        double floor =
            Math.sqrt(2)
                / range
                * Math.hypot(
                    own.map(i -> i.floorUncertainty().orElse(0)).orElse(0.0),
                    cell.map(i -> i.floorUncertainty().orElse(0)).orElse(0.0) * value);
        double resolution =
            own.map(i -> i.resolution().orElse(0)).orElse(0.0) / Math.sqrt(12) * Math.sqrt(2) / range;
        double fixed = Math.hypot(floor, resolution);
        absolute.add(
            new AbsoluteCoefficient(g, l, value, scatter, fixed, acting, Math.max(runs, 1)));
        coefficients.add(
            new Coefficient(g, l, value, Math.hypot(scatter, fixed), Double.POSITIVE_INFINITY));
      }
    }
    return Optional.of(
        new MeasuredFlexibility(
            configuration,
            gauges,
            loads,
            absolute,
            gains,
            Double.POSITIVE_INFINITY,
            LinearMap.identity(absolute.size()),
            coefficients));
  }

  private static Optional<Integer> gain(
      Instrument instrument, Map<String, Integer> known, List<Gain> gains) {
    if (instrument.gainUncertainty().isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        known.computeIfAbsent(
            instrument.gainKey(),
            key -> {
              gains.add(
                  new Gain(key, instrument.name(), instrument.gainUncertainty().getAsDouble()));
              return gains.size() - 1;
            }));
  }
}
