package org.flexbound.acceptance;

import java.util.List;
import java.util.Optional;
import org.flexbound.compare.ConfigurationComparison;
import org.flexbound.reduce.Places;
import org.flexbound.reduce.Reduction;
import org.flexbound.setup.DecisionRule;
import org.flexbound.setup.Instrument;
import org.flexbound.setup.LimitSpec;

/**
 * One configuration with the limits that it is held against.
 *
 * @param limits the limits
 * @param rule how they are judged
 * @param reduction what was measured
 * @param instruments the instruments of its log
 * @param places where stations are
 * @param comparison measured against computed, where there is a model
 */
public record CheckedConfiguration(
    List<LimitSpec> limits,
    DecisionRule rule,
    Reduction reduction,
    List<Instrument> instruments,
    Places places,
    Optional<ConfigurationComparison> comparison) {
  /** Copies the lists. */
  public CheckedConfiguration {
    limits = List.copyOf(limits);
    instruments = List.copyOf(instruments);
  }

  /**
   * The configuration's name.
   *
   * @return as the flexibility has it
   */
  public String name() {
    return reduction.flexibility().configuration();
  }
}
