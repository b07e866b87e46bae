package org.flexbound.reduce;

import java.util.Optional;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;

/** Knows where stations are in space, where a model or the log says so. */
@FunctionalInterface
public interface Places {
  /** Knows only points stated as such. */
  Places STATED =
      station ->
          station instanceof Station.AtPoint point
              ? Optional.of(point.point())
              : Optional.empty();

  /**
   * Where a station is.
   *
   * @param station the station
   * @return its place, m, global axes; empty where not known
   */
  Optional<Vector> of(Station station);
}
