package org.flexbound.testlog;

import org.flexbound.document.Sheet;

/**
 * A sheet that may hold readings.
 *
 * @param sheet the sheet
 * @param file the name of its file, as the log names it
 * @param runName what its readings are called where nothing names their run
 * @param layout how they lie
 * @param expected whether it must hold readings
 */
record ReadingsSource(
    Sheet sheet, String file, String runName, ReadingsLayout layout, boolean expected) {
  /** The same, where somebody says that it holds readings. */
  ReadingsSource whereExpected() {
    return expected ? this : new ReadingsSource(sheet, file, runName, layout, true);
  }
}
