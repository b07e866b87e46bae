package org.flexbound.simulated;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Severity;

/** How often each fault at each size is found, and named as what it is. */
final class FaultTable {
  /** One row: a fault at a size. */
  static final class Row {
    final String fault;
    final String size;
    int tests;
    int found;
    int named;
    final Map<String, Integer> codes = new TreeMap<>();

    Row(String fault, String size) {
      this.fault = fault;
      this.size = size;
    }

    double foundShare() {
      return tests == 0 ? Double.NaN : found / (double) tests;
    }

    double namedShare() {
      return tests == 0 ? Double.NaN : named / (double) tests;
    }
  }

  private final List<Row> rows = new ArrayList<>();
  private final Map<Long, Set<String>> sound = new TreeMap<>();

  /** Puts every fault, from one size up to the largest, into as many tests. */
  static FaultTable of(List<LogFault> faults, int firstSize, int tests) {
    FaultTable table = new FaultTable();
    for (LogFault fault : faults) {
      for (int size = firstSize; size < 3; size++) {
        Row row = new Row(fault.name(), fault.sizes().get(size));
        for (long seed = 100_000; row.tests < tests && seed < 100_000 + 20L * tests; seed++) {
          table.one(fault, size, seed, row);
        }
        table.rows.add(row);
      }
    }
    return table;
  }

  private void one(LogFault fault, int size, long seed, Row row) {
    SimulatedTest faulty = new SimulatedTest(seed);
    Optional<String> target = fault.injector().into(faulty, size);
    if (target.isEmpty()) {
      return;
    }
    Set<String> before = sound.computeIfAbsent(seed, FaultTable::soundFindings);
    row.tests++;
    boolean found = false;
    boolean named = false;
    for (Finding finding : faulty.reduce().findings()) {
      if (finding.severity() == Severity.NOTE || before.contains(finding.toString())) {
        continue;
      }
      found = true;
      row.codes.merge(finding.code(), 1, Integer::sum);
      named |=
          fault.codes().contains(finding.code())
              && List.of(target.get().split("\\|", -1)).stream()
                  .anyMatch(name -> finding.message().contains(name));
    }
    row.found += found ? 1 : 0;
    row.named += named ? 1 : 0;
  }

  /** What the test raises without any fault. */
  private static Set<String> soundFindings(long seed) {
    Set<String> findings = new LinkedHashSet<>();
    new SimulatedTest(seed).reduce().findings().forEach(f -> findings.add(f.toString()));
    return findings;
  }

  List<Row> rows() {
    return List.copyOf(rows);
  }

  String markdown() {
    StringBuilder text = new StringBuilder("| fault | size | tests | found | named |\n");
    text.append("| --- | --- | --- | --- | --- |\n");
    for (Row row : rows) {
      text.append(
          String.format(
              Locale.ROOT,
              "| %s | %s | %d | %.0f %% | %.0f %% |%n",
              row.fault,
              row.size,
              row.tests,
              100 * row.foundShare(),
              100 * row.namedShare()));
    }
    return text.toString();
  }
}
