package org.flexbound.report.figures;

import org.jfree.chart.axis.LogAxis;
import org.jfree.chart.axis.NumberTickUnit;

/** Ticks of a logarithmic axis that spans little or much. */
final class LogTicks {
  private LogTicks() {}

  /** Base 2 where the axis spans less than two decades, so that several ticks are labelled. */
  static void set(LogAxis axis, double least, double largest) {
    double decades = Math.log10(largest / least);
    if (decades < 0.75) {
      axis.setBase(Math.pow(2, 0.25));
      axis.setNumberFormatOverride(
          new java.text.DecimalFormat(
              "0.00", java.text.DecimalFormatSymbols.getInstance(java.util.Locale.ROOT)));
    } else if (decades < 2.2) {
      axis.setBase(2);
    } else {
      axis.setBase(10);
    }
    axis.setTickUnit(new NumberTickUnit(1));
    axis.setMinorTickMarksVisible(false);
  }
}
