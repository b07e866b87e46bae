package org.flexbound.testlog;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.UnaryOperator;
import org.flexbound.document.EntryTable;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Dimension;
import org.flexbound.quantity.NearestWord;
import org.flexbound.quantity.Unit;
import org.flexbound.setup.Instrument;

/** Reads the tables Test and Instruments, and hands out the others. */
final class EntrySheets {
  /** What an instrument may read. */
  private static final List<Dimension> READ =
      List.of(
          Dimension.FORCE,
          Dimension.MOMENT,
          Dimension.MASS,
          Dimension.LENGTH,
          Dimension.ANGLE,
          Dimension.NUMBER);

  private final LogTables tables;
  private final Findings findings;
  private final EntryCells cells;
  private final Optional<EntryTable> test;

  EntrySheets(LogTables tables, Findings findings) {
    this.tables = tables;
    this.findings = findings;
    this.cells = new EntryCells(findings);
    this.test = tables.table(SheetLayout.TEST);
  }

  /** A table, if the log has it. */
  Optional<EntryTable> table(SheetLayout layout) {
    return tables.table(layout);
  }

  /** A table that must be there and hold something. */
  Optional<EntryTable> need(SheetLayout layout) {
    if (!tables.has(layout)) {
      findings.add(
          TestlogFinding.MISSING_SHEET,
          tables.where(layout),
          "found no " + tables.name(layout) + "; expected it: " + layout.help());
      return Optional.empty();
    }
    Optional<EntryTable> table = table(layout);
    if (table.isPresent() && table.get().entries().isEmpty()) {
      findings.add(
          TestlogFinding.EMPTY_SHEET,
          table.get().where(),
          "found no row; expected at least one: " + layout.help());
    }
    return table;
  }

  TestInformation information() {
    Map<String, String> entries = new LinkedHashMap<>();
    test.ifPresent(
            table ->
                table
                    .entries()
                    .forEach(
                        entry -> {
                          String item = EntryCells.text(entry, "Item");
                          Optional<String> known =
                              SheetLayout.TEST_ITEMS.stream()
                                  .filter(item::equalsIgnoreCase)
                                  .findFirst();
                          if (known.isEmpty()) {
                            findings.add(
                                TestlogFinding.OPTION,
                                entry.get("Item").where(),
                                "found '"
                                    + item
                                    + "'; expected one of "
                                    + String.join(", ", SheetLayout.TEST_ITEMS)
                                    + NearestWord.question(item, SheetLayout.TEST_ITEMS));
                          } else {
                            entries.put(known.get(), EntryCells.text(entry, "Entry"));
                          }
                        }));
    return new TestInformation(
        entries.getOrDefault("Title", ""),
        entries.getOrDefault("Article", ""),
        entries.getOrDefault("Fixture", ""),
        day(entries.getOrDefault("Date", "")),
        entries.getOrDefault("Place", ""),
        entries.getOrDefault("Tested by", ""),
        entries.getOrDefault("Ambient temperature", ""),
        entries.getOrDefault("Notes", ""));
  }

  /** The length unit of the table Test; metres where none is stated. */
  Unit lengthUnit() {
    return test.stream()
        .flatMap(found -> found.entries().stream())
        .filter(entry -> EntryCells.text(entry, "Item").equalsIgnoreCase("Length unit"))
        .filter(entry -> !entry.get("Entry").isBlank())
        .findFirst()
        .flatMap(
            entry -> cells.unit(entry.get("Entry"), List.of(Dimension.LENGTH), "length"))
        .orElse(Unit.METRE);
  }

  /** A date cell without its midnight. */
  private static String day(String text) {
    return text.endsWith("T00:00") ? text.substring(0, text.length() - 6) : text;
  }

  List<Instrument> instruments() {
    List<Instrument> instruments = new ArrayList<>();
    Map<String, Where> seen = new LinkedHashMap<>();
    table(SheetLayout.INSTRUMENTS)
        .ifPresent(
            table ->
                table
                    .entries()
                    .forEach(
                        entry -> {
                          Optional<String> name = cells.need(entry, "Instrument");
                          if (name.isPresent()) {
                            Where where = entry.get("Instrument").where();
                            Where first = seen.putIfAbsent(name.get(), where);
                            if (first != null) {
                              findings.add(
                                  TestlogFinding.TWICE,
                                  where,
                                  "found the instrument '" + name.get() + "' again, first at "
                                      + first);
                            }
                            instruments.add(instrument(entry, name.get(), where));
                          }
                        }));
    return instruments;
  }

  private Instrument instrument(EntryTable.Entry entry, String name, Where where) {
    Optional<Unit> unit =
        cells.unit(
            entry.get("Unit"),
            READ,
            "what the instrument reads");
    int statedAs =
        cells.choice(
            entry, "As stated", List.of("k=1", "k=2", "limits ±", "limits +-", "limits"), 0);
    double divisor =
        switch (statedAs) {
          case 0 -> 1;
          case 1 -> 2;
          // limits without a distribution: rectangular (JCGM 100:2008, 4.3.7)
          default -> Math.sqrt(3);
        };
    OptionalDouble share = cells.percent(entry, "Uncertainty of reading (%)");
    OptionalDouble fixed = si(entry, "Uncertainty fixed", unit);
    if (share.isEmpty() && fixed.isEmpty()) {
      findings.add(
          TestlogFinding.NO_CALIBRATION,
          where,
          "found no uncertainty for the instrument '" + name + "'");
    }
    return new Instrument(
        name,
        EntryCells.text(entry, "Kind"),
        EntryCells.text(entry, "Serial"),
        EntryCells.text(entry, "Calibration reference"),
        day(EntryCells.text(entry, "Calibration date")),
        share.isPresent()
            ? OptionalDouble.of(share.getAsDouble() / divisor)
            : OptionalDouble.empty(),
        fixed.isPresent()
            ? OptionalDouble.of(fixed.getAsDouble() / divisor)
            : OptionalDouble.empty(),
        si(entry, "Resolution", unit),
        si(entry, "Range", unit),
        where);
  }

  private OptionalDouble si(EntryTable.Entry entry, String column, Optional<Unit> unit) {
    return cells.notNegative(
        entry.get(column),
        column,
        cells.si(entry, column, unit, READ, UnaryOperator.identity()));
  }
}
