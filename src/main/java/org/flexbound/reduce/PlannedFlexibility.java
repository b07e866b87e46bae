package org.flexbound.reduce;

import java.util.List;
import org.flexbound.flexibility.MeasuredFlexibility;

/**
 * What a planned test would measure.
 *
 * @param loads the loads as they would be applied, in the order of the log
 * @param flexibility the flexibility, its values those of the model it is expected of
 */
public record PlannedFlexibility(List<PlannedLoad> loads, MeasuredFlexibility flexibility) {
  /** Copies the list. */
  public PlannedFlexibility {
    loads = List.copyOf(loads);
  }
}
