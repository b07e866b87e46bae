package org.flexbound.document;

import java.util.List;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;

/**
 * What a reader of a sheet should know beside its values.
 *
 * @param hiddenSheet whether the whole sheet is hidden
 * @param hiddenRows how many hidden rows hold something
 * @param firstHiddenRow the first of them, from 1; 0 where there is none
 * @param hiddenColumns the hidden columns, as ranges such as {@code C:E}
 * @param mergedRanges the merged ranges in A1 notation
 */
public record SheetNotes(
    boolean hiddenSheet,
    int hiddenRows,
    int firstHiddenRow,
    List<String> hiddenColumns,
    List<String> mergedRanges) {

  /** Nothing to note. */
  public static final SheetNotes NONE = new SheetNotes(false, 0, 0, List.of(), List.of());

  /** Copies the lists. */
  public SheetNotes {
    hiddenColumns = List.copyOf(hiddenColumns);
    mergedRanges = List.copyOf(mergedRanges);
  }

  /**
   * Tells the user, with one finding for each kind of thing.
   *
   * @param sheet the place of the sheet
   * @param findings gets the findings
   */
  public void report(Where sheet, Findings findings) {
    if (hiddenSheet) {
      findings.add(DocumentFinding.HIDDEN, sheet, "the sheet is hidden; it was read all the same");
    }
    if (hiddenRows > 0) {
      findings.add(
          DocumentFinding.HIDDEN,
          sheet,
          hiddenRows
              + (hiddenRows == 1 ? " hidden row was" : " hidden rows were")
              + " read, the first of them row "
              + firstHiddenRow);
    }
    if (!hiddenColumns.isEmpty()) {
      findings.add(
          DocumentFinding.HIDDEN,
          sheet,
          "hidden columns were read: " + some(hiddenColumns));
    }
    if (!mergedRanges.isEmpty()) {
      findings.add(
          DocumentFinding.MERGED, sheet, "found merged cells: " + some(mergedRanges));
    }
  }

  private static String some(List<String> all) {
    int shown = Math.min(all.size(), 5);
    return String.join(", ", all.subList(0, shown))
        + (all.size() > shown ? " and " + (all.size() - shown) + " more" : "");
  }
}
