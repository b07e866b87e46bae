package org.flexbound.reduce;

import org.flexbound.finding.Where;
import org.flexbound.testlog.Reading;
import org.flexbound.testlog.Run;

/** Watches all columns of a run; rows that the user left out count for the largest load only. */
final class RunWatch {
  private final ColumnWatch[] loads;
  private final ColumnWatch[] gauges;
  private final double[] largestLoad;
  private final Where[] loadPlace;

  RunWatch(Run run) {
    loads = new ColumnWatch[run.loads().size()];
    gauges = new ColumnWatch[run.gauges().size()];
    largestLoad = new double[loads.length];
    loadPlace = new Where[loads.length];
    for (int l = 0; l < loads.length; l++) {
      loads[l] = new ColumnWatch();
      loadPlace[l] = run.where();
    }
    for (int g = 0; g < gauges.length; g++) {
      gauges[g] = new ColumnWatch();
    }
  }

  void see(Reading reading) {
    double sum = 0;
    for (int l = 0; l < loads.length; l++) {
      double value = reading.load(l);
      if (Math.abs(value) > largestLoad[l]) {
        largestLoad[l] = Math.abs(value);
        loadPlace[l] = reading.whereLoad(l);
      }
      sum += value;
    }
    if (!reading.use() || Double.isNaN(sum)) {
      return;
    }
    for (int l = 0; l < loads.length; l++) {
      loads[l].see(
          reading.row(),
          reading.load(l),
          reading.load(l),
          loads[l].readings() == 0 ? reading.whereLoad(l) : loadPlace[l]);
    }
    for (int g = 0; g < gauges.length; g++) {
      // the place is asked for once: it is an object for every reading otherwise
      gauges[g].see(
          reading.row(),
          reading.gauge(g),
          // where one load varies the others are idle and next to nought
          sum,
          gauges[g].readings() == 0 ? reading.whereGauge(g) : loadPlace[0]);
    }
  }

  ColumnWatch load(int channel) {
    return loads[channel];
  }

  ColumnWatch gauge(int channel) {
    return gauges[channel];
  }

  /** The largest magnitude of a load in any row, used or not. */
  double largestLoad(int channel) {
    return largestLoad[channel];
  }

  Where largestLoadPlace(int channel) {
    return loadPlace[channel];
  }
}
