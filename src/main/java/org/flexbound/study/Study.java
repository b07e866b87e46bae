package org.flexbound.study;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.flexbound.document.Json;
import org.flexbound.finding.Where;

/**
 * A study: one set of parameters held against one or several tests.
 *
 * @param title the title, or empty
 * @param model the frame model's file, as the study names it; empty where the computed flexibility
 *     comes from outside
 * @param configurations the arrangements that were tested, at least one
 * @param flexibility what kind of computed flexibility is used
 * @param parameters what may change, in the order of the file
 * @param rule how much change is shown
 * @param heldOut load cases kept for validation
 * @param reduction the entries of the sheet Options that the study overrides
 * @param limits the entries of the sheet Limits that the study overrides
 * @param measuredModes the table of measured modes
 * @param outsideFlexibility tables of flexibility coefficients and sensitivities that take the
 *     place of the frame solver, in the order in which they were computed; none where it is used
 * @param starts how many starting points the solver is sent from, at least 1
 * @param where the study file
 */
public record Study(
    String title,
    Optional<String> model,
    List<Configuration> configurations,
    FlexibilityChoice flexibility,
    List<Parameter> parameters,
    Rule rule,
    List<HeldOutCase> heldOut,
    Optional<Json> reduction,
    Optional<Json> limits,
    Optional<Table> measuredModes,
    List<OutsideTable> outsideFlexibility,
    int starts,
    Where where) {
  /** The name of the only configuration of a study that does not name any. */
  public static final String ONLY_CONFIGURATION = "as tested";

  /** Copies the lists. */
  public Study {
    configurations = List.copyOf(configurations);
    parameters = List.copyOf(parameters);
    heldOut = List.copyOf(heldOut);
    outsideFlexibility = List.copyOf(outsideFlexibility);
    if (configurations.isEmpty() || starts < 1) {
      throw new IllegalArgumentException("a study has a configuration and a start");
    }
  }

  /**
   * A table computed elsewhere.
   *
   * @param file its name, as the study has it
   * @param at the factors on the nominal stiffnesses at which it was computed, by parameter; one that
   *     is not named was nominal
   * @param where where the study names it
   */
  public record OutsideTable(String file, Map<String, Double> at, Where where) {
    /** Copies the map and keeps its order. */
    public OutsideTable {
      at = Collections.unmodifiableMap(new LinkedHashMap<>(at));
    }
  }

  /**
   * A file that the study names.
   *
   * @param file its name, as the study has it
   * @param where where the study names it
   */
  public record Table(String file, Where where) {}
}
