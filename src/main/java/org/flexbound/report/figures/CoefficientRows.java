package org.flexbound.report.figures;

import java.util.ArrayList;
import java.util.List;
import org.jfree.chart.axis.SymbolAxis;

/** A vertical axis with one named row for each coefficient or parameter, the first on top. */
final class CoefficientRows {
  /** Rows a figure can hold before it grows too tall to print; longer lists are split. */
  static final int MOST = 40;

  private static final int LONGEST_PAIR = 72;

  private CoefficientRows() {}

  static SymbolAxis axis(List<String> names) {
    return shown(names.stream().map(Labels::brief).toArray(String[]::new));
  }

  /** The same for rows that name two coefficients each, which takes more room. */
  static SymbolAxis pairs(List<String> names) {
    return shown(names.stream().map(name -> Labels.brief(name, LONGEST_PAIR)).toArray(String[]::new));
  }

  private static SymbolAxis shown(String[] names) {
    SymbolAxis axis = new SymbolAxis(null, names);
    ChartStyle.axis(axis);
    axis.setGridBandsVisible(false);
    axis.setInverted(true);
    axis.setRange(-0.6, names.length - 0.4);
    return axis;
  }

  static int height(int rows) {
    return 90 + 20 * rows;
  }

  /** The range of rows of each part when a long list is split evenly. */
  static <T> List<List<T>> split(List<T> all) {
    int parts = Math.max(1, (all.size() + MOST - 1) / MOST);
    List<List<T>> result = new ArrayList<>();
    for (int part = 0; part < parts; part++) {
      result.add(all.subList(part * all.size() / parts, (part + 1) * all.size() / parts));
    }
    return result;
  }
}
