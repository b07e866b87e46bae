package org.flexbound.testlog;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.flexbound.document.Sheet;
import org.flexbound.finding.Where;

/** A sheet of readings whose header is known. */
final class ReadingsSheet {
  private final ReadingsSource source;
  private final Map<String, HeaderCell> columns;
  private final int firstDataRow;

  ReadingsSheet(ReadingsSource source, Map<String, HeaderCell> columns, int firstDataRow) {
    this.source = source;
    this.columns = Collections.unmodifiableMap(new LinkedHashMap<>(columns));
    this.firstDataRow = Math.max(firstDataRow, source.layout().firstRow().orElse(1));
  }

  /**
   * One header cell.
   *
   * @param text the header without its unit
   * @param index the column, from 0
   * @param unit the unit in brackets or in the units row, or empty
   * @param where the header's cell
   * @param unitWhere the cell in which the unit stands
   */
  record HeaderCell(String text, int index, String unit, Where where, Where unitWhere) {
    HeaderCell withUnit(String other, Where place) {
      return new HeaderCell(text, index, other, where, place);
    }
  }

  Sheet sheet() {
    return source.sheet();
  }

  ReadingsSource source() {
    return source;
  }

  ReadingsLayout layout() {
    return source.layout();
  }

  /** The first row below header and units. */
  int firstDataRow() {
    return firstDataRow;
  }

  /** The last row that may hold readings. */
  int lastRow() {
    return layout().lastRow().orElse(Integer.MAX_VALUE);
  }

  /** A column by its header, with or without its unit. */
  Optional<HeaderCell> column(String text) {
    return Optional.ofNullable(columns.get(HeaderText.claimedKey(text)))
        .or(() -> Optional.ofNullable(columns.get(HeaderText.key(text))));
  }

  /** One of the columns Time, Step, Use and Remark, under whatever header it has here. */
  Optional<HeaderCell> extra(String word) {
    return column(layout().extra(word));
  }

  List<HeaderCell> columns() {
    return List.copyOf(columns.values());
  }
}
