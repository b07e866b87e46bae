package org.flexbound.acceptance;

import java.util.List;
import java.util.Optional;

/**
 * What a limit was resolved to in one configuration.
 *
 * @param quantities what was measured of it
 * @param missing why there is nothing, where there is nothing
 * @param doubt why it cannot be judged although it was measured
 */
record Resolved(List<Quantity> quantities, String missing, Optional<String> doubt) {
  Resolved {
    quantities = List.copyOf(quantities);
  }

  static Resolved of(List<Quantity> quantities, String missing) {
    return new Resolved(quantities, missing, Optional.empty());
  }

  static Resolved missing(String why) {
    return new Resolved(List.of(), why, Optional.empty());
  }
}
