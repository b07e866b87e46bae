package org.flexbound.solve;

import java.util.Collections;
import java.util.List;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessSetting;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Load;

/**
 * A frame with its gauges and loads, made ready once and solved for any setting of the stiffnesses
 * that may be set. Not for use by several threads at a time.
 */
public sealed interface PreparedFlexibility permits FrameFlexibility, TruncatedFlexibility {
  /** The gauges, the rows. */
  List<Gauge> gauges();

  /** The loads, the columns. */
  List<Load> loads();

  /** The stiffnesses that may be set. */
  List<StiffnessPath> parameters();

  /** The settings that change nothing. */
  default List<StiffnessSetting> nominal() {
    return List.copyOf(Collections.nCopies(parameters().size(), StiffnessSetting.nominal()));
  }

  /**
   * Solves for settings of the parameters.
   *
   * @param settings one for each parameter, in their order
   * @return the solution
   * @throws org.flexbound.finding.Refusal where a setting (a joint set free) lets the structure move
   *     freely; its finding describes the motion
   */
  ComputedFlexibility solve(List<StiffnessSetting> settings);
}
