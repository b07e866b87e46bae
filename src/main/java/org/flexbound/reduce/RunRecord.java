package org.flexbound.reduce;

import java.util.List;
import org.flexbound.testlog.Run;

/**
 * A run as it was reduced, with what was kept of its readings.
 *
 * @param run the run
 * @param watch what was kept of its readings
 * @param slopes its slopes
 */
record RunRecord(Run run, RunWatch watch, List<RunSlope> slopes) {
  RunRecord {
    slopes = List.copyOf(slopes);
  }

  /** Whether a single load varied: only then a gauge's steps follow one line. */
  boolean single() {
    return slopes.stream().map(RunSlope::load).distinct().count() == 1;
  }

  ColumnWatch gauge(String name) {
    for (int g = 0; g < run.gauges().size(); g++) {
      if (run.gauges().get(g).name().equals(name)) {
        return watch.gauge(g);
      }
    }
    throw new IllegalArgumentException("run " + run.name() + " has no gauge " + name);
  }
}
