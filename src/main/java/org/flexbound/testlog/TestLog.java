package org.flexbound.testlog;

import java.util.List;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Instrument;
import org.flexbound.setup.LimitSpec;
import org.flexbound.setup.Load;
import org.flexbound.setup.ReductionOptions;
import org.flexbound.setup.StatedCoefficient;

/**
 * All that a load-test log says.
 *
 * @param information what the sheet Test says
 * @param instruments the instruments
 * @param loads the loads, in the order of the log
 * @param gauges the gauges, in the order of the log
 * @param runs the runs, in the order of the log
 * @param options how to reduce
 * @param limits the acceptance limits
 * @param coefficients coefficients stated in place of readings; empty where there are runs
 * @param inputs the files that were read
 */
public record TestLog(
    TestInformation information,
    List<Instrument> instruments,
    List<Load> loads,
    List<Gauge> gauges,
    List<Run> runs,
    ReductionOptions options,
    List<LimitSpec> limits,
    List<StatedCoefficient> coefficients,
    List<InputFile> inputs) {
  /** Copies the lists. */
  public TestLog {
    instruments = List.copyOf(instruments);
    loads = List.copyOf(loads);
    gauges = List.copyOf(gauges);
    runs = List.copyOf(runs);
    limits = List.copyOf(limits);
    coefficients = List.copyOf(coefficients);
    inputs = List.copyOf(inputs);
  }

  /**
   * A log of readings.
   *
   * @param information what the sheet Test says
   * @param instruments the instruments
   * @param loads the loads, in the order of the log
   * @param gauges the gauges, in the order of the log
   * @param runs the runs, in the order of the log
   * @param options how to reduce
   * @param limits the acceptance limits
   * @param inputs the files that were read
   */
  public TestLog(
      TestInformation information,
      List<Instrument> instruments,
      List<Load> loads,
      List<Gauge> gauges,
      List<Run> runs,
      ReductionOptions options,
      List<LimitSpec> limits,
      List<InputFile> inputs) {
    this(information, instruments, loads, gauges, runs, options, limits, List.of(), inputs);
  }
}
