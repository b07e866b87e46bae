package org.flexbound.samples;

import java.nio.file.Path;

/**
 * Makes samples/load-cell-record: the load-deflection record of the calibration of a load cell that
 * the NIST Statistical Reference Datasets publish as Pontius (linear regression, lower level of
 * difficulty): two runs of twenty steps. The dataset states no units; newton and millimetre are assumed.
 */
final class LoadCellRecord {
  static final Path FOLDER = Path.of("samples", "load-cell-record");
  static final String LOG = "load-test-log.xlsx";
  static final double STEP = 150_000;

  static final double[][] DEFLECTION = {
    {
      .11019, .21956, .32949, .43899, .54803, .65694, .76562, .87487, .98292, 1.09146, 1.20001,
      1.30822, 1.41599, 1.52399, 1.63194, 1.73947, 1.84646, 1.95392, 2.06128, 2.16844
    },
    {
      .11052, .22018, .32939, .43886, .54798, .65739, .76596, .87474, .98300, 1.09150, 1.20004,
      1.30818, 1.41613, 1.52408, 1.63159, 1.73965, 1.84696, 1.95445, 2.06177, 2.16829
    }
  };

  private LoadCellRecord() {}

  static void write(Path file) {
    SampleWorkbook book = new SampleWorkbook();
    book.row("Test", "Item", "Entry");
    book.row("Test", "Title", "Load cell calibration record (NIST StRD Pontius)");
    book.row("Test", "Article", "load cell");
    book.row("Test", "Length unit", "m");
    book.row(
        "Test", "Notes",
        "Source: NIST Statistical Reference Datasets, linear regression, dataset Pontius. The dataset"
            + " states no units: newton and millimetre are assumed here.");
    book.row("Instruments", "Instrument", "Kind", "Resolution", "Unit");
    book.row("Instruments", "machine", "dead weights of the calibration machine", null, "N");
    book.row("Instruments", "deflectometer", "deflection reading of the cell", 0.00001, "mm");
    book.row(
        "Load points", "Load", "Direction", "Column", "Unit", "Instrument", "X", "Y", "Z");
    book.row("Load points", "axial", "-z", "Load", "N", "machine", 0, 0, 0);
    book.row(
        "Gauges", "Gauge", "Kind", "Direction", "Column", "Unit", "Instrument", "X", "Y", "Z");
    book.row(
        "Gauges", "deflection", "displacement", "-z", "Deflection", "mm", "deflectometer", 0, 0, 0);
    for (int run = 0; run < DEFLECTION.length; run++) {
      String sheet = "Run " + (run + 1);
      book.row(sheet, "Step", "Load [N]", "Deflection [mm]");
      for (int step = 0; step < DEFLECTION[run].length; step++) {
        book.row(sheet, step + 1, STEP * (step + 1), DEFLECTION[run][step]);
      }
    }
    book.write(file);
  }

  /** Writes the log where the sample keeps it. */
  public static void main(String[] arguments) {
    write(FOLDER.resolve(LOG));
  }
}
