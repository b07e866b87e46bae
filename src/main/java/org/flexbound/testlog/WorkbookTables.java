package org.flexbound.testlog;

import java.util.Optional;
import org.flexbound.document.EntryTable;
import org.flexbound.document.SheetFile;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Refusal;
import org.flexbound.finding.Where;

/** The sheets of entries of a workbook. */
final class WorkbookTables implements LogTables {
  private final SheetFile file;
  private final Findings findings;

  WorkbookTables(SheetFile file, Findings findings) {
    this.file = file;
    this.findings = findings;
  }

  @Override
  public Optional<EntryTable> table(SheetLayout layout) {
    try {
      return file.sheet(layout.name())
          .flatMap(
              sheet -> EntryTable.read(sheet, layout.required(), layout.optional(), findings));
    } catch (Refusal damaged) {
      findings.addAll(damaged.findings());
      return Optional.empty();
    }
  }

  @Override
  public boolean has(SheetLayout layout) {
    return file.sheet(layout.name()).isPresent();
  }

  @Override
  public SheetLayout runs() {
    return SheetLayout.RUNS;
  }

  @Override
  public String name(SheetLayout layout) {
    return "sheet " + layout.name();
  }

  @Override
  public Where where(SheetLayout layout) {
    return has(layout) ? Where.sheet(file.name(), layout.name()) : Where.file(file.name());
  }
}
