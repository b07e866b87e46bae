package org.flexbound.compare;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import org.flexbound.flexibility.OutsideFlexibility;

/**
 * A flexibility computed elsewhere, with the point at which it was computed.
 *
 * @param flexibility the coefficients with their sensitivities
 * @param at the factors on the nominal stiffnesses, by parameter; one not named was nominal
 */
public record OutsideTable(OutsideFlexibility flexibility, Map<String, Double> at) {
  /** Copies the map and keeps its order. */
  public OutsideTable {
    at = Collections.unmodifiableMap(new LinkedHashMap<>(at));
  }
}
