package org.flexbound.flexibility;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.flexbound.finding.Where;

/**
 * Flexibility coefficients computed elsewhere, with their sensitivities to named parameters.
 *
 * @param entries one for each coefficient
 * @param where the table
 */
public record OutsideFlexibility(List<Entry> entries, Where where) {
  /** Copies the list. */
  public OutsideFlexibility {
    entries = List.copyOf(entries);
  }

  /**
   * One coefficient.
   *
   * @param configuration the configuration; empty for every one
   * @param gauge the gauge's name
   * @param load the load's name
   * @param value the absolute coefficient (base motion not taken out), SI
   * @param byLogarithm its derivatives by the logarithm of each parameter's stiffness, SI, by name
   * @param where its row
   */
  public record Entry(
      Optional<String> configuration,
      String gauge,
      String load,
      double value,
      Map<String, Double> byLogarithm,
      Where where) {
    /** Copies the map and keeps its order. */
    public Entry {
      byLogarithm = java.util.Collections.unmodifiableMap(new LinkedHashMap<>(byLogarithm));
    }
  }

  /**
   * A coefficient's entry.
   *
   * @param configuration the configuration
   * @param gauge the gauge
   * @param load the load
   * @return the entry for just that configuration, or the one for every configuration
   */
  public Optional<Entry> find(String configuration, String gauge, String load) {
    Optional<Entry> general = Optional.empty();
    for (Entry entry : entries) {
      if (entry.gauge().equals(gauge) && entry.load().equals(load)) {
        if (entry.configuration().isEmpty()) {
          general = Optional.of(entry);
        } else if (entry.configuration().get().equals(configuration)) {
          return Optional.of(entry);
        }
      }
    }
    return general;
  }
}
