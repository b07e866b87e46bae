package org.flexbound.testlog;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;
import org.flexbound.document.Row;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Unit;

/**
 * How the readings lie on a sheet, as far as somebody says so; what is left open is found from the
 * names of the columns.
 *
 * @param headerRow the row that names the columns, from 1
 * @param unitsRow the row that states units, from 1
 * @param firstRow the first row that may hold readings, from 1
 * @param lastRow the last one
 * @param columnNames the names of the columns in order, where no row names them; empty otherwise
 * @param columns what is said of a column, by its key
 * @param extras the headers of the columns Time, Step, Use and Remark, where they are called
 *     otherwise, by those words
 * @param noReading texts that stand for a missing reading, in lower case; numbers in their
 *     shortest form
 * @param where the place that says all this
 */
record ReadingsLayout(
    OptionalInt headerRow,
    OptionalInt unitsRow,
    OptionalInt firstRow,
    OptionalInt lastRow,
    List<String> columnNames,
    Map<String, StatedColumn> columns,
    Map<String, String> extras,
    Set<String> noReading,
    Where where) {

  /** Everything is left open. */
  static final ReadingsLayout OPEN =
      new ReadingsLayout(
          OptionalInt.empty(),
          OptionalInt.empty(),
          OptionalInt.empty(),
          OptionalInt.empty(),
          List.of(),
          Map.of(),
          Map.of(),
          Set.of(),
          Where.nowhere());

  ReadingsLayout {
    columnNames = List.copyOf(columnNames);
    columns = Collections.unmodifiableMap(new LinkedHashMap<>(columns));
    extras = Collections.unmodifiableMap(new LinkedHashMap<>(extras));
    noReading = Set.copyOf(noReading);
  }

  /**
   * What is said of a column.
   *
   * @param name its header
   * @param unit the unit of its numbers once they are scaled
   * @param scale what each number is multiplied by, not 0
   * @param where the place that says so
   */
  record StatedColumn(String name, Optional<Unit> unit, double scale, Where where) {
    /** Whether the numbers change, so that a unit in the file is not the unit of what is read. */
    boolean isScaled() {
      return scale != 1;
    }
  }

  /** Whether a cell stands for a missing reading. */
  boolean isNoReading(Row row, int column) {
    return !noReading.isEmpty() && noReading.contains(HeaderText.key(row.text(column)));
  }

  /** The header of one of the columns Time, Step, Use and Remark. */
  String extra(String word) {
    return extras.getOrDefault(word, word);
  }
}
