package org.flexbound.report.results;

import java.util.List;

/**
 * An absolute coefficient: before base motion is taken out.
 *
 * @param configuration the configuration
 * @param gauge the gauge
 * @param load the load
 * @param value motion per unit load
 * @param unit the SI unit
 * @param scatter standard uncertainty from run-to-run scatter
 * @param floor standard uncertainty from the fixed floor of the gauge instrument
 * @param gains keys of the gains that act on it
 * @param runs how many runs it is the mean of
 */
public record Absolute(
    String configuration,
    String gauge,
    String load,
    double value,
    String unit,
    double scatter,
    double floor,
    List<String> gains,
    int runs) {
  /** Copies the lists. */
  public Absolute {
    gains = List.copyOf(gains);
  }
}
