package org.flexbound.compare;

import java.util.List;
import org.flexbound.finding.Finding;

/**
 * Measured against computed flexibility, all configurations of a study.
 *
 * @param configurations one for each configuration, in the order of the study
 * @param findings what was noticed on the way
 */
public record Comparison(List<ConfigurationComparison> configurations, List<Finding> findings) {
  /** Copies the lists. */
  public Comparison {
    configurations = List.copyOf(configurations);
    findings = List.copyOf(findings);
  }

  /**
   * The coefficients of all configurations.
   *
   * @return all of them, in the order of the configurations
   */
  public List<CoefficientComparison> coefficients() {
    return configurations.stream().flatMap(c -> c.coefficients().stream()).toList();
  }
}
