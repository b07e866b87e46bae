package org.flexbound.testlog;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;

/**
 * The keys of a description of a log: those of its tables are the workbook's own words, written as
 * keys ({@code Position uncertainty} is {@code positionUncertainty}), so that whoever knows the one
 * knows the other.
 */
final class DescriptionKeys {
  static final String SCHEMA = "$schema";
  static final String READINGS = "readings";
  static final String GAUGES = "gauges";
  static final String COLUMNS = "columns";

  /** The keys of an entry of {@code readings}, with what belongs in each. */
  static final Map<String, String> OF_READINGS = ofReadings();

  /** The tables that are lists of objects, one for each row. */
  static final List<SheetLayout> LISTS =
      List.of(
          SheetLayout.INSTRUMENTS,
          SheetLayout.LOAD_POINTS,
          SheetLayout.GAUGES,
          SheetLayout.COEFFICIENTS,
          SheetLayout.LIMITS);

  private DescriptionKeys() {}

  private static Map<String, String> ofReadings() {
    Map<String, String> keys = new LinkedHashMap<>();
    keys.put("file", "the file, relative to the folder of the description");
    keys.put("files", "several files that are written alike");
    keys.put("sheet", "the sheet of a workbook; left out: every sheet that names the columns");
    keys.put("sheets", "several sheets of a workbook that lie alike");
    keys.put("separator", "what stands between the fields of a text file: one sign, or tab");
    keys.put("decimalSign", "the decimal sign of a text file: . or ,");
    keys.put("encoding", "the encoding of a text file, such as utf-8, utf-16 or windows-1252");
    keys.put("headerRow", "the row that names the columns, from 1; left out: found by the names");
    keys.put("unitsRow", "the row that states units, from 1; left out: found below the header");
    keys.put("columnNames", "the names of the columns in order, where no row names them");
    keys.put("firstRow", "the first row that holds readings, from 1");
    keys.put("lastRow", "the last row that holds readings, from 1");
    keys.put(COLUMNS, "for columns by their header: unit, and scale (each number times scale is in unit)");
    keys.put("time", "the header of the column Time, where it is called otherwise");
    keys.put("step", "the header of the column Step, where it is called otherwise");
    keys.put("use", "the header of the column Use, where it is called otherwise");
    keys.put("remark", "the header of the column Remark, where it is called otherwise");
    keys.put("noReading", "texts or numbers that stand for a missing reading");
    return keys;
  }

  /** The key of a column's or an item's name. */
  static String of(String name) {
    StringBuilder key = new StringBuilder();
    for (String word : name.split("[^A-Za-z0-9]+", -1)) {
      if (word.isEmpty()) {
        continue;
      }
      String lower = word.toLowerCase(Locale.ROOT);
      key.append(
          key.length() == 0 ? lower : lower.substring(0, 1).toUpperCase(Locale.ROOT) + lower.substring(1));
    }
    return key.toString();
  }

  /** The names by their keys, in order. */
  static Map<String, String> byKey(Iterable<String> names) {
    Map<String, String> byKey = new LinkedHashMap<>();
    names.forEach(name -> byKey.put(of(name), name));
    return byKey;
  }

  /** The columns of a table by their keys. */
  static Map<String, String> columns(SheetLayout layout) {
    return byKey(layout.columns().stream().map(SheetLayout.Column::name).toList());
  }

  /** The keys of a whole description. */
  static List<String> top() {
    return List.of(
        SCHEMA,
        of(SheetLayout.TEST.name()),
        of(SheetLayout.INSTRUMENTS.name()),
        of(SheetLayout.LOAD_POINTS.name()),
        GAUGES,
        READINGS,
        of(SheetLayout.RUNS.name()),
        of(SheetLayout.COEFFICIENTS.name()),
        of(SheetLayout.OPTIONS.name()),
        of(SheetLayout.LIMITS.name()));
  }
}
