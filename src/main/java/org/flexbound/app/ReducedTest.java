package org.flexbound.app;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.flexbound.acceptance.CheckedConfiguration;
import org.flexbound.compare.Comparison;
import org.flexbound.compare.ConfigurationComparison;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.reduce.Places;
import org.flexbound.reduce.Reduction;
import org.flexbound.report.gather.Gathering;
import org.flexbound.testlog.TestLog;

/**
 * A test that was read and reduced, all its configurations, and compared where there is a model.
 *
 * @param gathering what was collected for the results so far
 * @param configurations its configurations
 * @param comparison measured against computed, where there is a model
 */
record ReducedTest(
    Gathering gathering, List<Reduced> configurations, Optional<Comparison> comparison) {
  ReducedTest {
    configurations = List.copyOf(configurations);
  }

  /**
   * One configuration.
   *
   * @param log its log
   * @param reduction what came of it
   * @param places where stations are
   */
  record Reduced(TestLog log, Reduction reduction, Places places) {}

  List<MeasuredFlexibility> measured() {
    return configurations.stream().map(c -> c.reduction().flexibility()).toList();
  }

  /** The configurations as they are held against their limits. */
  List<CheckedConfiguration> checked() {
    List<CheckedConfiguration> result = new ArrayList<>();
    for (Reduced c : configurations) {
      Optional<ConfigurationComparison> own =
          comparison.flatMap(
              all ->
                  all.configurations().stream()
                      .filter(
                          one ->
                              one.configuration()
                                  .equals(c.reduction().flexibility().configuration()))
                      .findFirst());
      result.add(
          new CheckedConfiguration(
              c.log().limits(),
              c.log().options().decisionRule(),
              c.reduction(),
              c.log().instruments(),
              c.places(),
              own));
    }
    return result;
  }

  /** The largest share of base or fixture that passes without a warning, of all logs. */
  double largestShare() {
    return configurations.stream()
        .mapToDouble(c -> c.log().options().qualityLimits().baseMotionShare())
        .min()
        .orElse(1);
  }
}
