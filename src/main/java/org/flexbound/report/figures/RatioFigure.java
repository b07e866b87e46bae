package org.flexbound.report.figures;

import java.util.ArrayList;
import java.util.List;
import org.flexbound.report.Rounded;
import org.flexbound.report.results.Comparison;
import org.jfree.chart.axis.NumberAxis;
import org.jfree.chart.plot.ValueMarker;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.renderer.xy.XYErrorRenderer;
import org.jfree.data.xy.XYIntervalSeries;
import org.jfree.data.xy.XYIntervalSeriesCollection;

/** Measured over computed for each coefficient, before and after the update. */
public final class RatioFigure {
  private static final double TWO_SIDED_95 = 1.96;
  /** A ratio beyond these says no more than "far off", and would squeeze all others together. */
  private static final double LEAST = 0.2;

  private static final double LARGEST = 4;

  private RatioFigure() {}

  /**
   * Draws the ratios.
   *
   * @param comparison measured against computed
   * @return one figure, or several where there are very many coefficients
   */
  public static List<Figure> draw(List<Comparison> comparison) {
    List<Comparison> shown = comparison.stream().filter(c -> c.ratio().isPresent()).toList();
    List<Figure> figures = new ArrayList<>();
    if (shown.isEmpty()) {
      return figures;
    }
    boolean several = comparison.stream().map(Comparison::configuration).distinct().count() > 1;
    for (List<Comparison> part : CoefficientRows.split(shown)) {
      figures.add(part("ratio-" + (figures.size() + 1), part, several));
    }
    return figures;
  }

  private static Figure part(String id, List<Comparison> comparison, boolean several) {
    XYIntervalSeries before = new XYIntervalSeries("nominal model", false, true);
    XYIntervalSeries after = new XYIntervalSeries("updated model", false, true);
    List<String> names = new ArrayList<>();
    XyFigure figure = new XyFigure(id, 760, CoefficientRows.height(comparison.size()) + 24);
    double[] ends = {0.95, 1.05};
    for (Comparison c : comparison) {
      double row = names.size();
      String name = Labels.coefficient(several, c.configuration(), c.gauge(), c.load());
      names.add(c.heldOut() ? name + " (held out)" : name);
      add(before, figure, ends, row - 0.16, c, c.ratio().getAsDouble(), name + ", nominal", c.z());
      if (c.updatedRatio().isPresent()) {
        add(
            after,
            figure,
            ends,
            row + 0.16,
            c,
            c.updatedRatio().getAsDouble(),
            name + ", updated",
            c.updatedZ().orElse(0));
      }
    }
    XYIntervalSeriesCollection data = new XYIntervalSeriesCollection();
    data.addSeries(before);
    if (after.getItemCount() > 0) {
      data.addSeries(after);
    }
    NumberAxis axis = ChartStyle.numbers("measured / computed (bar: 95 % interval)");
    ChartStyle.range(axis, ends[0], ends[1]);
    XYErrorRenderer renderer = new XYErrorRenderer();
    renderer.setDrawYError(false);
    renderer.setCapLength(4);
    renderer.setSeriesPaint(0, Palette.VERMILION);
    renderer.setSeriesShape(0, Palette.marker(1, 7));
    renderer.setSeriesFillPaint(0, java.awt.Color.WHITE);
    renderer.setSeriesShapesFilled(0, false);
    renderer.setSeriesPaint(1, Palette.BLUE);
    renderer.setSeriesShape(1, Palette.marker(0, 7));
    XYPlot plot = new XYPlot(data, axis, CoefficientRows.axis(names), renderer);
    ChartStyle.plot(plot);
    plot.addDomainMarker(new ValueMarker(1, Palette.INK, Palette.LINE));
    boolean updated = after.getItemCount() > 0;
    return figure.draw(
        "Measured over computed",
        "A row is a coefficient. At 1 measured and computed agree; above 1 the structure is softer"
            + " than the model. Hollow squares: nominal model"
            + (updated ? "; filled circles: updated model." : ".")
            + " Ratios beyond 0.2 and 4 are drawn at the edge.",
        plot,
        true);
  }

  private static void add(
      XYIntervalSeries series,
      XyFigure figure,
      double[] ends,
      double row,
      Comparison c,
      double ratio,
      String name,
      double z) {
    double computed = c.measured() / ratio;
    double reach = Math.abs(TWO_SIDED_95 * c.standardUncertainty() / computed);
    double shown = clip(ratio);
    double low = clip(ratio - reach);
    double high = clip(ratio + reach);
    series.add(shown, low, high, row, row, row);
    ends[0] = Math.min(ends[0], low);
    ends[1] = Math.max(ends[1], high);
    figure.note(
        shown, row, name + "\nratio " + Rounded.fixed(ratio, 3) + ", z " + Rounded.fixed(z, 1));
  }

  private static double clip(double ratio) {
    return Math.min(LARGEST, Math.max(LEAST, ratio));
  }
}
