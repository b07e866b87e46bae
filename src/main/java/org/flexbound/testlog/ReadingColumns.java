package org.flexbound.testlog;

import java.util.List;
import org.flexbound.quantity.Unit;
import org.flexbound.testlog.ReadingsSheet.HeaderCell;

/**
 * The columns of a run and what they mean.
 *
 * @param loads the load columns
 * @param gauges the gauge columns
 * @param time the column Time; −1 where there is none
 * @param timeUnit its unit
 * @param step the column Step; −1 where there is none
 * @param use the column Use; −1 where there is none
 * @param remark the column Remark; −1 where there is none
 */
record ReadingColumns(
    List<Column> loads, List<Column> gauges, int time, Unit timeUnit, int step, int use, int remark) {
  ReadingColumns {
    loads = List.copyOf(loads);
    gauges = List.copyOf(gauges);
  }

  /**
   * A column of numbers.
   *
   * @param header its header
   * @param unit the unit of its numbers, scale included
   */
  record Column(HeaderCell header, Unit unit) {}
}
