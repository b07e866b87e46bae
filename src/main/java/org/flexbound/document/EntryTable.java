package org.flexbound.document;

import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.quantity.NearestWord;

/**
 * A small sheet of entries under a header row, held in memory: the columns are known by their names
 * (upper and lower case alike, in any order), and a unit may stand in the header in brackets. A
 * number that the sheet shows in percent comes as the text {@code 1 %}, since the number behind it
 * (0.01) is not what its writer saw.
 *
 * <p>The header is the first row in which at least half of the required columns stand.
 */
public final class EntryTable {
  private final Where where;
  private final Map<String, Header> headers;
  private final List<Entry> entries;

  private EntryTable(Where where, Map<String, Header> headers, List<Entry> entries) {
    this.where = where;
    this.headers = headers;
    this.entries = List.copyOf(entries);
  }

  /**
   * A column's header.
   *
   * @param name the column's known name
   * @param unit the unit in brackets, or empty
   * @param where the header's cell
   */
  public record Header(String name, String unit, Where where) {}

  /**
   * One cell of a row.
   *
   * @param kind what it holds
   * @param text what it shows, empty if blank
   * @param number its number; NaN if it holds none
   * @param where its place
   */
  public record Value(CellKind kind, String text, double number, Where where) {
    /**
     * Whether nothing stands in the cell.
     *
     * @return true for a blank cell
     */
    public boolean isBlank() {
      return kind == CellKind.BLANK;
    }
  }

  /**
   * One row of entries.
   *
   * @param where the row's first cell
   * @param values the cells by the columns' known names; every known column is there
   */
  public record Entry(Where where, Map<String, Value> values) {
    /** Copies the map. */
    public Entry {
      values = Map.copyOf(values);
    }

    /**
     * A cell.
     *
     * @param column the column's known name
     * @return the cell; blank where the sheet has no such column
     */
    public Value get(String column) {
      Value value = values.get(column);
      if (value == null) {
        throw new IllegalArgumentException("the table has no column " + column);
      }
      return value;
    }
  }

  /**
   * Splits a header such as {@code X [mm]} into its name and its unit.
   *
   * @param text the header's text
   * @return name and unit; an empty unit where none stands
   */
  public static String[] nameAndUnit(String text) {
    int open = text.lastIndexOf('[');
    int close = text.lastIndexOf(']');
    if (open > 0 && close > open && text.substring(close + 1).isBlank()) {
      return new String[] {
        text.substring(0, open).strip(), text.substring(open + 1, close).strip()
      };
    }
    return new String[] {text.strip(), ""};
  }

  /**
   * Reads a sheet.
   *
   * @param sheet the sheet
   * @param required the columns that must be there
   * @param optional the columns that may be there
   * @param findings gets what is wrong with the header
   * @return the table; empty where no header row was found
   */
  public static Optional<EntryTable> read(
      Sheet sheet, List<String> required, List<String> optional, Findings findings) {
    Reader reader = new Reader(sheet, required, optional, findings);
    sheet.forEachRow(reader);
    return reader.table();
  }

  /**
   * A table that stands elsewhere than on a sheet: no header states a unit.
   *
   * @param where its place
   * @param columns the known columns
   * @param rows the cells of each row by column; a column that is left out is blank
   * @param places the place of each row
   * @return the table
   */
  public static EntryTable of(
      Where where, List<String> columns, List<Map<String, Value>> rows, List<Where> places) {
    Map<String, Header> headers = new LinkedHashMap<>();
    List<Entry> entries = new ArrayList<>();
    for (int r = 0; r < rows.size(); r++) {
      Map<String, Value> values = new LinkedHashMap<>();
      for (String column : columns) {
        Value value = rows.get(r).get(column);
        values.put(
            column,
            value == null ? new Value(CellKind.BLANK, "", Double.NaN, places.get(r)) : value);
        if (value != null) {
          headers.putIfAbsent(column, new Header(column, "", value.where()));
        }
      }
      entries.add(new Entry(places.get(r), values));
    }
    return new EntryTable(where, Collections.unmodifiableMap(headers), entries);
  }

  /**
   * The place of the sheet.
   *
   * @return file and sheet
   */
  public Where where() {
    return where;
  }

  /**
   * The header of a column.
   *
   * @param column its known name
   * @return the header, where the sheet has the column
   */
  public Optional<Header> header(String column) {
    return Optional.ofNullable(headers.get(column));
  }

  /**
   * The rows below the header that are not blank.
   *
   * @return the rows in order
   */
  public List<Entry> entries() {
    return entries;
  }

  private static final class Reader implements RowVisitor {
    private final Sheet sheet;
    private final List<String> required;
    private final List<String> known = new ArrayList<>();
    private final Findings findings;
    private final Map<String, Integer> columns = new LinkedHashMap<>();
    private final Map<String, Header> headers = new LinkedHashMap<>();
    private final List<Entry> entries = new ArrayList<>();
    private boolean found;

    Reader(Sheet sheet, List<String> required, List<String> optional, Findings findings) {
      this.sheet = sheet;
      this.required = required;
      this.findings = findings;
      known.addAll(required);
      known.addAll(optional);
    }

    @Override
    public boolean visit(Row row) {
      if (found) {
        entries.add(entry(row));
      } else if (isHeader(row)) {
        found = true;
        readHeader(row);
      }
      return true;
    }

    private Optional<String> knownName(String text) {
      String wanted = nameAndUnit(text)[0].toLowerCase(Locale.ROOT).replace('_', ' ');
      return known.stream()
          .filter(name -> name.toLowerCase(Locale.ROOT).equals(wanted))
          .findFirst();
    }

    private boolean isHeader(Row row) {
      int hits = 0;
      for (int column = 0; column < row.width(); column++) {
        if (knownName(row.text(column)).filter(required::contains).isPresent()) {
          hits++;
        }
      }
      return 2 * hits >= required.size() && hits > 0;
    }

    private void readHeader(Row row) {
      for (int column = 0; column < row.width(); column++) {
        String text = row.text(column);
        if (text.isEmpty()) {
          continue;
        }
        Optional<String> name = knownName(text);
        if (name.isEmpty()) {
          findings.add(
              DocumentFinding.UNKNOWN_KEY,
              row.where(column),
              "found the column '"
                  + text
                  + "'; expected one of "
                  + String.join(", ", known)
                  + NearestWord.question(nameAndUnit(text)[0], known));
        } else if (columns.containsKey(name.get())) {
          findings.add(
              DocumentFinding.WRONG_KIND,
              row.where(column),
              "the column '" + name.get() + "' stands twice; expected it once");
        } else {
          columns.put(name.get(), column);
          headers.put(
              name.get(), new Header(name.get(), nameAndUnit(text)[1], row.where(column)));
        }
      }
      for (String name : required) {
        if (!columns.containsKey(name)) {
          findings.add(
              DocumentFinding.ABSENT,
              sheet.where(),
              "the header has no column '" + name + "'");
        }
      }
    }

    private Entry entry(Row row) {
      Map<String, Value> values = new LinkedHashMap<>();
      for (String name : known) {
        Integer column = columns.get(name);
        values.put(
            name,
            column == null
                ? new Value(CellKind.BLANK, "", Double.NaN, row.where(0))
                : value(row, column));
      }
      return new Entry(row.where(0), values);
    }

    /** A number shown in percent is what the user sees, so that 0.01 shown as 1 % reads "1 %". */
    private static Value value(Row row, int column) {
      if (row.kind(column) == CellKind.NUMBER && row.isPercent(column)) {
        String shown =
            new BigDecimal(Double.toString(row.number(column)))
                .movePointRight(2)
                .stripTrailingZeros()
                .toPlainString();
        return new Value(CellKind.TEXT, shown + " %", Double.NaN, row.where(column));
      }
      return new Value(
          row.kind(column), row.text(column), row.number(column), row.where(column));
    }

    Optional<EntryTable> table() {
      if (!found) {
        findings.add(
            DocumentFinding.ABSENT,
            sheet.where(),
            "found no header row; expected the columns " + String.join(", ", required));
        return Optional.empty();
      }
      return Optional.of(new EntryTable(sheet.where(), Map.copyOf(headers), entries));
    }
  }
}
