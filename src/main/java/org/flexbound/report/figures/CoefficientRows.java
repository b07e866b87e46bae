package org.flexbound.report.figures;

import java.util.List;
import org.jfree.chart.axis.SymbolAxis;

/** A vertical axis with one named row for each coefficient or parameter, the first on top. */
final class CoefficientRows {
  /** Rows a figure can hold before it grows too tall to print; longer lists are split. */
  static final int MOST = 40;

  private CoefficientRows() {}

  static SymbolAxis axis(List<String> names) {
    SymbolAxis axis = new SymbolAxis(null, names.stream().map(Labels::brief).toArray(String[]::new));
    ChartStyle.axis(axis);
    axis.setGridBandsVisible(false);
    axis.setInverted(true);
    axis.setRange(-0.6, names.size() - 0.4);
    return axis;
  }

  static int height(int rows) {
    return 90 + 20 * rows;
  }

  /** The range of rows of each part when a long list is split evenly. */
  static <T> List<List<T>> split(List<T> all) {
    int parts = Math.max(1, (all.size() + MOST - 1) / MOST);
    java.util.ArrayList<List<T>> result = new java.util.ArrayList<>();
    for (int part = 0; part < parts; part++) {
      result.add(all.subList(part * all.size() / parts, (part + 1) * all.size() / parts));
    }
    return result;
  }
}
