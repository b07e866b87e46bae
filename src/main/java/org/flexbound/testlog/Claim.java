package org.flexbound.testlog;

import java.util.Optional;
import org.flexbound.document.EntryTable;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Unit;

/**
 * A load's or a gauge's claim on a column of the readings sheets.
 *
 * @param name the load's or the gauge's name
 * @param isLoad whether it is a load
 * @param column the header text it claims, as written
 * @param unit the unit stated with the claim
 * @param instrument the instrument stated with the claim
 * @param where the cell of the unit, or of the column where there is none
 */
record Claim(
    String name,
    boolean isLoad,
    String column,
    Optional<Unit> unit,
    Optional<String> instrument,
    Where where) {

  /** The claim that a row of the table of load points or gauges makes. */
  static Claim of(
      EntryTable.Entry entry, String name, boolean isLoad, String column, Optional<Unit> unit) {
    EntryTable.Value place = entry.get(entry.get("Unit").isBlank() ? "Column" : "Unit");
    return new Claim(
        name, isLoad, column, unit, EntryCells.name(entry, "Instrument"), place.where());
  }

  /** The column as headers are compared. */
  String key() {
    return HeaderText.claimedKey(column);
  }
}
