package org.flexbound.study;

import java.util.Optional;
import org.flexbound.finding.Where;

/**
 * A load case kept for validation.
 *
 * @param configuration the configuration; empty for every one that has the load
 * @param load the load's name
 * @param where its place in the study
 */
public record HeldOutCase(Optional<String> configuration, String load, Where where) {
  /**
   * Whether a load case is meant.
   *
   * @param ofConfiguration the load case's configuration
   * @param ofLoad its load
   * @return true if it is held out
   */
  public boolean matches(String ofConfiguration, String ofLoad) {
    return load.equals(ofLoad) && configuration.map(ofConfiguration::equals).orElse(true);
  }
}
