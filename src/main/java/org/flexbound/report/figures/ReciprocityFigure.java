package org.flexbound.report.figures;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.report.Rounded;
import org.flexbound.report.results.Coefficient;
import org.flexbound.report.results.Reciprocity;
import org.jfree.chart.axis.NumberAxis;
import org.jfree.chart.plot.ValueMarker;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.renderer.xy.XYErrorRenderer;
import org.jfree.data.xy.XYIntervalSeries;
import org.jfree.data.xy.XYIntervalSeriesCollection;

/**
 * Pairs of coefficients that should be equal: their difference with its 95 % interval, in percent of the largest coefficient of the same unit.
 * (In percent of themselves, pairs near nought would fill the picture.)
 */
public final class ReciprocityFigure {
  private static final double TWO_SIDED_95 = 1.96;

  private ReciprocityFigure() {}

  /**
   * Draws the pairs.
   *
   * @param pairs the pairs
   * @param coefficients all coefficients
   * @return one figure, or several where there are very many pairs
   */
  public static List<Figure> draw(List<Reciprocity> pairs, List<Coefficient> coefficients) {
    List<Figure> figures = new ArrayList<>();
    if (pairs.isEmpty()) {
      return figures;
    }
    Map<String, Double> largest = new HashMap<>();
    coefficients.forEach(c -> largest.merge(c.unit(), Math.abs(c.value()), Math::max));
    pairs.forEach(p -> largest.merge(p.unit(), Math.max(Math.abs(p.firstValue()), Math.abs(p.secondValue())), Math::max));
    for (List<Reciprocity> part : CoefficientRows.split(pairs)) {
      figures.add(part("reciprocity-" + (figures.size() + 1), part, largest));
    }
    return figures;
  }

  private static Figure part(String id, List<Reciprocity> pairs, Map<String, Double> references) {
    XYIntervalSeries series = new XYIntervalSeries("difference", false, true);
    List<String> names = new ArrayList<>();
    XyFigure figure = new XyFigure(id, 760, CoefficientRows.height(pairs.size()));
    double least = 0;
    double largest = 0;
    for (Reciprocity pair : pairs) {
      double size = references.getOrDefault(pair.unit(), 0.0);
      double share = size > 0 ? 100 * pair.difference() / size : 0;
      double reach = size > 0 ? 100 * TWO_SIDED_95 * pair.standardUncertainty() / size : 0;
      double row = names.size();
      names.add(pair.first() + " = " + pair.second());
      series.add(share, share - reach, share + reach, row, row, row);
      least = Math.min(least, share - reach);
      largest = Math.max(largest, share + reach);
      figure.note(
          share,
          row,
          pair.first() + " and " + pair.second()
              + "\ndifference " + Rounded.significant(share, 2) + " %, z "
              + (pair.z().isPresent() ? Rounded.fixed(pair.z().getAsDouble(), 1) : "not known"));
    }
    XYIntervalSeriesCollection data = new XYIntervalSeriesCollection();
    data.addSeries(series);
    NumberAxis axis = ChartStyle.numbers("difference, % of the largest coefficient of its unit (bar: 95 % interval)");
    ChartStyle.range(axis, least, largest);
    XYErrorRenderer renderer = new XYErrorRenderer();
    renderer.setDrawYError(false);
    renderer.setCapLength(5);
    renderer.setErrorPaint(Palette.BLUE);
    renderer.setErrorStroke(Palette.LINE);
    renderer.setSeriesPaint(0, Palette.BLUE);
    renderer.setSeriesShape(0, Palette.marker(0, 7));
    XYPlot plot = new XYPlot(data, axis, CoefficientRows.pairs(names), renderer);
    ChartStyle.plot(plot);
    plot.addDomainMarker(new ValueMarker(0, Palette.INK, Palette.LINE));
    return figure.draw(
        "Reciprocity",
        "Each row is a pair of coefficients that should be equal (Maxwell–Betti). A bar that does"
            + " not reach nought is a pair that disagrees by more than its uncertainty.",
        plot,
        false);
  }
}
