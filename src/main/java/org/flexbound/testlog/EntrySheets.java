package org.flexbound.testlog;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.document.EntryTable;
import org.flexbound.document.SheetFile;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Dimension;
import org.flexbound.quantity.Unit;
import org.flexbound.setup.Instrument;

/** Reads the sheets Test and Instruments, and hands out the tables of the others. */
final class EntrySheets {
  private final SheetFile file;
  private final Findings findings;
  private final EntryCells cells;

  EntrySheets(SheetFile file, Findings findings) {
    this.file = file;
    this.findings = findings;
    this.cells = new EntryCells(findings);
  }

  /** The table of a sheet, if the workbook has it. */
  Optional<EntryTable> table(SheetLayout layout) {
    return file.sheet(layout.name())
        .flatMap(
            sheet -> EntryTable.read(sheet, layout.required(), layout.optional(), findings));
  }

  /** The table of a sheet that must be there and hold something. */
  Optional<EntryTable> need(SheetLayout layout) {
    if (file.sheet(layout.name()).isEmpty()) {
      findings.add(
          TestlogFinding.MISSING_SHEET,
          Where.file(file.name()),
          "found no sheet '" + layout.name() + "'; expected it: " + layout.help());
      return Optional.empty();
    }
    Optional<EntryTable> table = table(layout);
    if (table.isPresent() && table.get().entries().isEmpty()) {
      findings.add(
          TestlogFinding.EMPTY_SHEET,
          table.get().where(),
          "found nothing below the header; expected at least one row: " + layout.help());
    }
    return table;
  }

  TestInformation information() {
    Map<String, String> entries = new LinkedHashMap<>();
    table(SheetLayout.TEST)
        .ifPresent(
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
                                    + String.join(", ", SheetLayout.TEST_ITEMS));
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

  /** The length unit of the sheet Test; metres where none is stated. */
  Unit lengthUnit() {
    Optional<EntryTable> table = file.sheet("Test")
        .flatMap(
            sheet ->
                EntryTable.read(
                    sheet,
                    SheetLayout.TEST.required(),
                    SheetLayout.TEST.optional(),
                    new Findings()));
    return table.stream()
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
            List.of(
                Dimension.FORCE,
                Dimension.MOMENT,
                Dimension.MASS,
                Dimension.LENGTH,
                Dimension.ANGLE,
                Dimension.NUMBER),
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
    OptionalDouble share = cells.notNegative(entry, "Uncertainty of reading (%)");
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
            ? OptionalDouble.of(share.getAsDouble() / 100 / divisor)
            : OptionalDouble.empty(),
        fixed.isPresent()
            ? OptionalDouble.of(fixed.getAsDouble() / divisor)
            : OptionalDouble.empty(),
        si(entry, "Resolution", unit),
        si(entry, "Range", unit),
        where);
  }

  private OptionalDouble si(EntryTable.Entry entry, String column, Optional<Unit> unit) {
    OptionalDouble number = cells.notNegative(entry, column);
    if (number.isEmpty()) {
      return number;
    }
    if (unit.isEmpty()) {
      if (entry.get("Unit").isBlank()) {
        findings.add(
            TestlogFinding.NO_UNIT,
            entry.get(column).where(),
            "found " + number.getAsDouble() + " without a unit; expected one in the column Unit");
      }
      return OptionalDouble.empty();
    }
    return OptionalDouble.of(unit.get().toSi(number.getAsDouble()));
  }
}
