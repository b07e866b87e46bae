package org.flexbound.testlog;

import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import org.flexbound.document.CellKind;
import org.flexbound.document.Row;
import org.flexbound.document.StatedNumber;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.quantity.NearestWord;
import org.flexbound.quantity.Unit;
import org.flexbound.testlog.ReadingsSheet.HeaderCell;

/**
 * Finds the header of a sheet of readings: the row that names at least one load column and one gauge
 * column, and more of them than any other row; then the units row that may follow it. Where two rows
 * name equally many, nothing is guessed.
 */
final class HeaderSearch {
  /** The header stands among so many first rows that are not blank. */
  private static final int SEARCHED = 200;

  /** Rows without numbers below the header: units, serial numbers, channel numbers. */
  private static final int HEADER_ROWS = 10;

  private final Set<String> loads;
  private final Set<String> gauges;
  private final Set<String> known = new HashSet<>();
  private final Findings findings;

  /**
   * A search.
   *
   * @param loads the headers that loads claim
   * @param gauges the headers that gauges claim
   * @param findings gets what stands in the way
   */
  HeaderSearch(Collection<String> loads, Collection<String> gauges, Findings findings) {
    this.loads = keys(loads);
    this.gauges = keys(gauges);
    this.findings = findings;
    this.known.addAll(this.loads);
    this.known.addAll(this.gauges);
  }

  private static Set<String> keys(Collection<String> texts) {
    return texts.stream().map(HeaderText::claimedKey).collect(Collectors.toSet());
  }

  /** A row that may be the header. */
  private record Candidate(int row, int named) {}

  /** What was seen on the way, for the message where there is no header. */
  private static final class Seen {
    private int width;
    private String nearest = "";
    private int nearestNamed;
  }

  /**
   * Looks for the header.
   *
   * @return the sheet with its header; empty where there is none, or more than one
   */
  Optional<ReadingsSheet> find(ReadingsSource source) {
    ReadingsLayout layout = source.layout();
    if (!layout.columnNames().isEmpty()) {
      return named(source);
    }
    List<Candidate> candidates = new ArrayList<>();
    Seen seen = new Seen();
    int[] rows = {0};
    source
        .sheet()
        .forEachRow(
            row -> {
              if (layout.headerRow().isEmpty() || layout.headerRow().getAsInt() == row.number()) {
                look(row, candidates, seen);
              }
              return ++rows[0] < SEARCHED
                  || row.number() < layout.headerRow().orElse(0);
            });
    Optional<Candidate> best =
        candidates.stream().max(Comparator.comparingInt(Candidate::named));
    if (best.isEmpty()) {
      if (source.expected()) {
        missing(source, seen);
      }
      return Optional.empty();
    }
    List<Candidate> equal =
        candidates.stream().filter(c -> c.named() == best.get().named()).toList();
    if (equal.size() > 1) {
      findings.add(
          TestlogFinding.HEADER_UNCERTAIN,
          source.sheet().where(),
          "rows "
              + equal.get(0).row()
              + " and "
              + equal.get(1).row()
              + " both name "
              + best.get().named()
              + " of the columns asked for");
      return Optional.empty();
    }
    return Optional.of(checked(below(source, equal.get(0).row())));
  }

  /** Names what is said of columns that are not there. */
  private ReadingsSheet checked(ReadingsSheet sheet) {
    ReadingsLayout layout = sheet.layout();
    List<String> texts = sheet.columns().stream().map(HeaderCell::text).toList();
    layout
        .columns()
        .values()
        .forEach(stated -> refuseMissing(sheet, stated.name(), stated.where(), texts));
    layout
        .extras()
        .values()
        .forEach(text -> refuseMissing(sheet, text, layout.where(), texts));
    return sheet;
  }

  private void refuseMissing(ReadingsSheet sheet, String text, Where where, List<String> texts) {
    if (sheet.column(text).isEmpty()) {
      findings.add(
          TestlogFinding.MISSING_COLUMN,
          where,
          "found no column '"
              + text
              + "' in "
              + sheet.sheet().where()
              + NearestWord.question(text, texts));
    }
  }

  private void look(Row row, List<Candidate> candidates, Seen seen) {
    seen.width = Math.max(seen.width, row.width());
    Set<String> load = new HashSet<>();
    Set<String> gauge = new HashSet<>();
    List<String> texts = new ArrayList<>();
    for (int column = 0; column < row.width(); column++) {
      if (row.kind(column) == CellKind.TEXT) {
        String key = HeaderText.key(HeaderText.of(row.text(column), known).name());
        texts.add(key);
        if (loads.contains(key)) {
          load.add(key);
        }
        if (gauges.contains(key)) {
          gauge.add(key);
        }
      }
    }
    int named = load.size() + gauge.size();
    if (!load.isEmpty() && !gauge.isEmpty()) {
      candidates.add(new Candidate(row.number(), named));
    } else if (texts.size() > 1 && (named > seen.nearestNamed || seen.nearest.isEmpty())) {
      Set<String> wanted = load.isEmpty() ? loads : gauges;
      seen.nearestNamed = named;
      seen.nearest =
          "; row "
              + row.number()
              + " names "
              + texts.stream().limit(8).map(text -> "'" + text + "'").collect(Collectors.joining(", "))
              + (texts.size() > 8 ? ", …" : "")
              + wanted.stream()
                  .sorted()
                  .map(text -> NearestWord.of(text, texts))
                  .filter(near -> !near.isEmpty())
                  .findFirst()
                  .map(near -> " (is '" + near.get(0) + "' one of them?)")
                  .orElse("");
    }
  }

  private void missing(ReadingsSource source, Seen seen) {
    boolean oneCell = seen.width == 1;
    findings.add(
        TestlogFinding.MISSING_COLUMN,
        source.sheet().where(),
        "found no row"
            + (source.layout().headerRow().isPresent()
                ? " " + source.layout().headerRow().getAsInt()
                : "")
            + " that names a load column ("
            + listed(loads)
            + ") and a gauge column ("
            + listed(gauges)
            + ")"
            + (oneCell
                ? "; every row holds a single cell, as if the separator were another sign"
                : seen.nearest));
  }

  private static String listed(Set<String> keys) {
    return keys.stream().sorted().limit(6).map(key -> "'" + key + "'").collect(Collectors.joining(", "))
        + (keys.size() > 6 ? ", …" : "");
  }

  /** The columns by the names that the layout gives them. */
  private Optional<ReadingsSheet> named(ReadingsSource source) {
    Map<String, HeaderCell> header = new LinkedHashMap<>();
    Where where = source.layout().where();
    List<String> names = source.layout().columnNames();
    for (int column = 0; column < names.size(); column++) {
      if (!names.get(column).isBlank()) {
        HeaderText text = HeaderText.of(names.get(column), known);
        put(header, new HeaderCell(text.name(), column, text.unit(), where, where));
      }
    }
    if (header.keySet().stream().noneMatch(loads::contains)
        || header.keySet().stream().noneMatch(gauges::contains)) {
      Seen seen = new Seen();
      missing(source, seen);
      return Optional.empty();
    }
    return Optional.of(checked(new ReadingsSheet(source, header, 1)));
  }

  private void put(Map<String, HeaderCell> header, HeaderCell cell) {
    String key = HeaderText.key(cell.text());
    HeaderCell first = header.putIfAbsent(key, cell);
    if (first != null && known.contains(key)) {
      findings.add(
          TestlogFinding.TWICE,
          cell.where(),
          "found the column '" + cell.text() + "' again, first at " + first.where());
    }
  }

  private ReadingsSheet below(ReadingsSource source, int headerRow) {
    Below below = new Below(source, headerRow);
    source.sheet().forEachRow(below::visit);
    below.skipped.forEach(
        where ->
            findings.add(
                TestlogFinding.ROW_NOT_USED,
                where,
                "the row below the header holds neither numbers nor units"));
    return new ReadingsSheet(source, below.header, below.firstDataRow);
  }

  /** Reads the header and the rows without numbers below it. */
  private final class Below {
    private final int headerRow;
    private final int unitsRow;
    private final ReadingsLayout layout;
    private final List<Where> skipped = new ArrayList<>();
    private Map<String, HeaderCell> header = new LinkedHashMap<>();
    private int firstDataRow;
    private boolean unitsKnown;

    Below(ReadingsSource source, int headerRow) {
      this.layout = source.layout();
      this.headerRow = headerRow;
      this.unitsRow = layout.unitsRow().orElse(0);
    }

    boolean visit(Row row) {
      if (row.number() == unitsRow) {
        units(row);
        firstDataRow = Math.max(firstDataRow, row.number() + 1);
      }
      if (row.number() < headerRow) {
        return true;
      }
      if (row.number() == headerRow) {
        for (int column = 0; column < row.width(); column++) {
          if (row.kind(column) == CellKind.TEXT) {
            HeaderText text = HeaderText.of(row.text(column), known);
            put(
                header,
                new HeaderCell(
                    text.name(), column, text.unit(), row.where(column), row.where(column)));
          }
        }
        firstDataRow = Math.max(firstDataRow, row.number() + 1);
        return true;
      }
      if (row.number() > headerRow + HEADER_ROWS || holdsReadings(row)) {
        return row.number() < unitsRow;
      }
      if (row.number() != unitsRow && unitsRow == 0) {
        textRow(row);
      }
      return true;
    }

    private List<HeaderCell> claimed() {
      return header.entrySet().stream()
          .filter(entry -> known.contains(entry.getKey()))
          .map(Map.Entry::getValue)
          .toList();
    }

    private boolean holdsReadings(Row row) {
      for (HeaderCell cell : claimed()) {
        CellKind kind = row.kind(cell.index());
        String text = row.text(cell.index());
        if (kind == CellKind.NUMBER
            || kind == CellKind.ERROR
            || StatedNumber.plain(text).isPresent()
            || layout.isNoReading(row, cell.index())) {
          return true;
        }
      }
      return false;
    }

    private void textRow(Row row) {
      List<HeaderCell> texts =
          claimed().stream().filter(cell -> row.kind(cell.index()) == CellKind.TEXT).toList();
      if (texts.isEmpty()) {
        return;
      }
      boolean anyUnit =
          texts.stream().anyMatch(cell -> HeaderText.unit(row.text(cell.index())).isPresent());
      if (anyUnit && !unitsKnown) {
        units(row);
      } else {
        skipped.add(row.where(texts.get(0).index()));
      }
      firstDataRow = row.number() + 1;
    }

    private void units(Row row) {
      unitsKnown = true;
      header.replaceAll(
          (key, cell) -> {
            String unit = HeaderText.bare(row.text(cell.index()));
            Where where = row.where(cell.index());
            if (known.contains(key)) {
              refuseContradiction(cell, unit, where);
            }
            return unit.isEmpty() ? cell : cell.withUnit(unit, where);
          });
    }

    private void refuseContradiction(HeaderCell cell, String unit, Where where) {
      Optional<Unit> above = HeaderText.unit(cell.unit());
      Optional<Unit> below = HeaderText.unit(unit);
      if (above.isPresent()
          && below.isPresent()
          && (above.get().siFactor() != below.get().siFactor()
              || !above.get().dimension().equals(below.get().dimension()))) {
        findings.add(
            TestlogFinding.UNITS_DISAGREE,
            where,
            "found '" + unit + "' here but '" + cell.unit() + "' at " + cell.where()
                + " for the column '" + cell.text() + "'; expected one unit");
      }
    }
  }
}
