package org.flexbound.report.figures;

import java.awt.Color;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.report.results.Contribution;
import org.jfree.chart.axis.NumberAxis;
import org.jfree.chart.axis.SymbolAxis;
import org.jfree.chart.plot.ValueMarker;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.renderer.xy.XYBarRenderer;
import org.jfree.data.xy.XYIntervalSeries;
import org.jfree.data.xy.XYIntervalSeriesCollection;

/** What each part adds to each computed coefficient, as stacked shares. */
public final class ContributionFigure {
  /** Parts told apart by colour; what is left is drawn as one. */
  private static final int PARTS = 6;

  private static final String OTHERS = "all others";

  private ContributionFigure() {}

  /**
   * Draws the contributions.
   *
   * @param contributions what each part adds
   * @return one figure, or several where there are very many coefficients
   */
  public static List<Figure> draw(List<Contribution> contributions) {
    boolean several = contributions.stream().map(Contribution::configuration).distinct().count() > 1;
    Map<String, Map<String, Double>> byCoefficient = new LinkedHashMap<>();
    for (Contribution c : contributions) {
      byCoefficient
          .computeIfAbsent(
              Labels.coefficient(several, c.configuration(), c.gauge(), c.load()),
              unused -> new LinkedHashMap<>())
          .merge(c.part(), c.value(), Double::sum);
    }
    List<Figure> figures = new ArrayList<>();
    if (byCoefficient.isEmpty()) {
      return figures;
    }
    List<String> parts = largest(byCoefficient);
    for (List<String> rows : CoefficientRows.split(new ArrayList<>(byCoefficient.keySet()))) {
      figures.add(part("contribution-" + (figures.size() + 1), rows, parts, byCoefficient));
    }
    return figures;
  }

  private static List<String> largest(Map<String, Map<String, Double>> byCoefficient) {
    Map<String, Double> weight = new LinkedHashMap<>();
    for (Map<String, Double> parts : byCoefficient.values()) {
      double total = parts.values().stream().mapToDouble(Math::abs).sum();
      parts.forEach(
          (part, value) -> weight.merge(part, total > 0 ? Math.abs(value) / total : 0, Double::sum));
    }
    return weight.entrySet().stream()
        .sorted(Map.Entry.<String, Double>comparingByValue(Comparator.reverseOrder()))
        .limit(PARTS)
        .map(Map.Entry::getKey)
        .toList();
  }

  private static Figure part(
      String id,
      List<String> rows,
      List<String> parts,
      Map<String, Map<String, Double>> byCoefficient) {
    List<String> shown = new ArrayList<>(parts);
    shown.add(OTHERS);
    List<XYIntervalSeries> series =
        shown.stream().map(name -> new XYIntervalSeries(Labels.brief(name), false, true)).toList();
    double least = 0;
    double largest = 0;
    for (int row = 0; row < rows.size(); row++) {
      Map<String, Double> values = byCoefficient.getOrDefault(rows.get(row), Map.of());
      double total = values.values().stream().mapToDouble(Math::abs).sum();
      double positive = 0;
      double negative = 0;
      for (int k = 0; k < shown.size(); k++) {
        double share = total > 0 ? 100 * share(values, shown.get(k), parts) / total : 0;
        double start = share >= 0 ? positive : negative;
        double end = start + share;
        if (share >= 0) {
          positive = end;
        } else {
          negative = end;
        }
        series
            .get(k)
            .add(row, row - 0.36, row + 0.36, end, Math.min(start, end), Math.max(start, end));
      }
      least = Math.min(least, negative);
      largest = Math.max(largest, positive);
    }
    XYIntervalSeriesCollection data = new XYIntervalSeriesCollection();
    series.forEach(data::addSeries);
    XYBarRenderer renderer = new XYBarRenderer();
    renderer.setUseYInterval(true);
    renderer.setShadowVisible(false);
    renderer.setBarPainter(new org.jfree.chart.renderer.xy.StandardXYBarPainter());
    renderer.setDrawBarOutline(true);
    for (int k = 0; k < shown.size(); k++) {
      renderer.setSeriesPaint(k, k == PARTS || k >= parts.size() ? Palette.FAINT : Palette.series(k));
      renderer.setSeriesOutlinePaint(k, Color.WHITE);
    }
    SymbolAxis names = CoefficientRows.axis(rows);
    NumberAxis axis = ChartStyle.numbers("share of the computed coefficient, %");
    axis.setRange(least < 0 ? least - 3 : 0, Math.max(largest, 1) * 1.02);
    XYPlot plot = new XYPlot(data, names, axis, renderer);
    plot.setOrientation(org.jfree.chart.plot.PlotOrientation.HORIZONTAL);
    ChartStyle.plot(plot);
    plot.addRangeMarker(new ValueMarker(0, Palette.INK, Palette.LINE));
    return new XyFigure(id, 760, CoefficientRows.height(rows.size()) + 40)
        .draw(
            "What contributes to each deflection",
            "A row is a coefficient; the stretches show which parts of the structure it comes from,"
                + " in the order of the legend from nought outwards. To the left of nought: parts"
                + " that work against the deflection. A part that shows nowhere cannot be learnt"
                + " from this test.",
            plot,
            true);
  }

  private static double share(Map<String, Double> values, String name, List<String> parts) {
    if (!name.equals(OTHERS)) {
      return values.getOrDefault(name, 0.0);
    }
    return values.entrySet().stream()
        .filter(entry -> !parts.contains(entry.getKey()))
        .mapToDouble(Map.Entry::getValue)
        .sum();
  }
}
