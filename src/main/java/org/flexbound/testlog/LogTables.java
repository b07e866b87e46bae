package org.flexbound.testlog;

import java.util.Optional;
import org.flexbound.document.EntryTable;
import org.flexbound.finding.Where;

/** The tables of entries of a log, wherever they stand: sheets of a workbook, or keys of JSON. */
interface LogTables {
  /** A table, where the log has it; what is wrong with its header or keys is a finding. */
  Optional<EntryTable> table(SheetLayout layout);

  /** Whether the log has a table, sound or not. */
  boolean has(SheetLayout layout);

  /** The layout of the table of runs: whether it names files as well as sheets. */
  SheetLayout runs();

  /** What a table is called there, e.g. {@code sheet Gauges}. */
  String name(SheetLayout layout);

  /** The place of a table, or of the whole log where it has none. */
  Where where(SheetLayout layout);
}
