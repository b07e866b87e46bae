package org.flexbound.finding;

import java.util.Optional;
import java.util.OptionalInt;

/**
 * The place in the user's files that a finding speaks of.
 *
 * @param file the file's name as the user gave it (relative where the user's was)
 * @param sheet the sheet of a workbook
 * @param cells a cell or a range of cells, e.g. {@code C4} or {@code C4:C19}
 * @param path the JSON pointer (RFC 6901) of a value, e.g. {@code /joints/knee/rz}
 * @param line the line in a text file, from 1
 */
public record Where(
    Optional<String> file,
    Optional<String> sheet,
    Optional<String> cells,
    Optional<String> path,
    OptionalInt line) {

  private static final Where NOWHERE =
      new Where(
          Optional.empty(),
          Optional.empty(),
          Optional.empty(),
          Optional.empty(),
          OptionalInt.empty());

  /**
   * No place in any file: the finding is about the whole.
   *
   * @return the empty place
   */
  public static Where nowhere() {
    return NOWHERE;
  }

  /**
   * A whole file.
   *
   * @param file the file's name
   * @return the place
   */
  public static Where file(String file) {
    return new Where(
        Optional.of(file),
        Optional.empty(),
        Optional.empty(),
        Optional.empty(),
        OptionalInt.empty());
  }

  /**
   * A whole sheet.
   *
   * @param file the workbook's name
   * @param sheet the sheet's name
   * @return the place
   */
  public static Where sheet(String file, String sheet) {
    return new Where(
        Optional.of(file),
        Optional.of(sheet),
        Optional.empty(),
        Optional.empty(),
        OptionalInt.empty());
  }

  /**
   * A cell or a range of cells.
   *
   * @param file the workbook's name
   * @param sheet the sheet's name
   * @param cells the cell or range in A1 notation
   * @return the place
   */
  public static Where cells(String file, String sheet, String cells) {
    return new Where(
        Optional.of(file),
        Optional.of(sheet),
        Optional.of(cells),
        Optional.empty(),
        OptionalInt.empty());
  }

  /**
   * A value in a JSON file.
   *
   * @param file the file's name
   * @param path the JSON pointer of the value
   * @param line the line at which the value begins, from 1
   * @return the place
   */
  public static Where json(String file, String path, int line) {
    return new Where(
        Optional.of(file),
        Optional.empty(),
        Optional.empty(),
        Optional.of(path),
        OptionalInt.of(line));
  }

  /**
   * A line of a text file such as a CSV log.
   *
   * @param file the file's name
   * @param line the line, from 1
   * @return the place
   */
  public static Where line(String file, int line) {
    return new Where(
        Optional.of(file),
        Optional.empty(),
        Optional.empty(),
        Optional.empty(),
        OptionalInt.of(line));
  }

  /**
   * The same column over some rows, where this is a cell of a sheet or a line of a text file;
   * otherwise this place itself.
   *
   * @param first the first row, from 1
   * @param last the last row
   * @return e.g. {@code C4:C19}
   */
  public Where rows(int first, int last) {
    if (cells.isPresent()) {
      String column = cells.get().replaceFirst("[0-9:].*$", "");
      String range =
          column.isEmpty() ? cells.get() : column + first + (last > first ? ":" + column + last : "");
      return new Where(file, sheet, Optional.of(range), path, line);
    }
    return line.isPresent() ? new Where(file, sheet, cells, path, OptionalInt.of(first)) : this;
  }

  /**
   * The row of the cell, or the line.
   *
   * @return the first row named, from 1; empty where the place has none
   */
  public OptionalInt row() {
    String digits = cells.orElse("").replaceFirst("^[A-Z]+", "").replaceFirst(":.*$", "");
    return digits.matches("[0-9]{1,9}") ? OptionalInt.of(Integer.parseInt(digits)) : line;
  }

  /**
   * The place as a reader would say it, e.g. {@code log.xlsx, sheet Gauges, cell C4}; empty for no
   * place.
   */
  @Override
  public String toString() {
    StringBuilder text = new StringBuilder(file.orElse(""));
    sheet.ifPresent(name -> join(text, "sheet " + name));
    cells.ifPresent(name -> join(text, (name.indexOf(':') >= 0 ? "cells " : "cell ") + name));
    path.ifPresent(name -> join(text, name.isEmpty() ? "top level" : name));
    line.ifPresent(number -> join(text, "line " + number));
    return text.toString();
  }

  private static void join(StringBuilder text, String part) {
    if (text.length() > 0) {
      text.append(", ");
    }
    text.append(part);
  }
}
