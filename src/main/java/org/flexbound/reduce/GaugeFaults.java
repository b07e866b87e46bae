package org.flexbound.reduce;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.flexbound.finding.Findings;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Instrument;
import org.flexbound.setup.Load;
import org.flexbound.testlog.TestLog;

/**
 * All faults of gauges and load columns that the readings of a test show. A flat gauge is not looked
 * at for lost readings or steps as well: one fault, one finding.
 */
final class GaugeFaults {
  private final List<GaugeFault> faults = new ArrayList<>();

  GaugeFaults(TestLog log, List<RunRecord> records, GaugeNoise noise) {
    Map<String, Load> loads = new LinkedHashMap<>();
    log.loads().forEach(load -> loads.put(load.name(), load));
    Map<String, Gauge> gauges = new LinkedHashMap<>();
    log.gauges().forEach(gauge -> gauges.put(gauge.name(), gauge));
    Map<String, Instrument> instruments = new LinkedHashMap<>();
    log.instruments().forEach(instrument -> instruments.put(instrument.name(), instrument));
    LoadColumn column = new LoadColumn(loads, noise);
    LostReadings lost = new LostReadings(noise);
    SteppedReadings stepped = new SteppedReadings(noise);
    add(new FlatReadings(records, noise).find());
    for (RunRecord record : records) {
      add(column.find(record));
      add(lost.find(record));
      add(stepped.find(record));
    }
    add(new CoarseGauges(instruments, noise, log.options().qualityLimits().resolution())
        .find(records));
    add(new OffLineRuns(loads, gauges, noise).find(records));
  }

  /** Adds what is not a symptom of a fault of the same column and run that is there already. */
  private void add(List<GaugeFault> found) {
    Set<List<String>> explained = new LinkedHashSet<>();
    for (GaugeFault fault : faults) {
      if (fault.explainsDepartures()) {
        explained.add(List.of(fault.run(), fault.column()));
      }
    }
    for (GaugeFault fault : found) {
      if (!fault.explainsDepartures()
          || !explained.contains(List.of(fault.run(), fault.column()))) {
        faults.add(fault);
      }
    }
  }

  void tell(Findings findings) {
    for (GaugeFault fault : faults) {
      findings.add(fault.kind(), fault.where(), fault.sentence());
    }
  }

  /** The faults of one run. */
  List<GaugeFault> of(String run) {
    return faults.stream().filter(fault -> fault.run().equals(run)).toList();
  }
}
