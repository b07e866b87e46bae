package org.flexbound.report.figures;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.flexbound.report.Rounded;
import org.flexbound.report.results.Parameter;
import org.jfree.chart.annotations.XYLineAnnotation;
import org.jfree.chart.axis.LogAxis;
import org.jfree.chart.plot.ValueMarker;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.renderer.xy.XYLineAndShapeRenderer;
import org.jfree.data.xy.XYSeries;
import org.jfree.data.xy.XYSeriesCollection;

/** Parameters as factors on their nominal stiffness: bounds, prior, interval and the point shown. */
public final class ParameterFigure {
  private static final double TWO_SIDED_95 = 1.96;

  private ParameterFigure() {}

  /**
   * Draws the parameters that have a factor (not those whose nominal is rigid or free).
   *
   * @param parameters the parameters
   * @return one figure, or several where there are very many; none where none has a factor
   */
  public static List<Figure> draw(List<Parameter> parameters) {
    List<Parameter> shown = parameters.stream().filter(p -> p.factor().isPresent()).toList();
    List<Figure> figures = new ArrayList<>();
    if (shown.isEmpty()) {
      return figures;
    }
    for (List<Parameter> part : CoefficientRows.split(shown)) {
      figures.add(part("parameters-" + (figures.size() + 1), part));
    }
    return figures;
  }

  private static double factor(Parameter p, OptionalDouble value, double open) {
    double nominal = p.unit().equals("1") ? 1 : p.nominal().orElse(1);
    return value.isPresent() && value.getAsDouble() > 0 ? value.getAsDouble() / nominal : open;
  }

  private static Figure part(String id, List<Parameter> parameters) {
    double least = 0.9;
    double largest = 1.1;
    for (Parameter p : parameters) {
      least = Math.min(least, factor(p, p.lowerBound(), least));
      largest = Math.max(largest, factor(p, p.upperBound(), largest));
    }
    least /= 1.15;
    largest *= 1.15;
    XYSeries bounds = new XYSeries("bounds", false, true);
    XYSeries prior = new XYSeries("prior, 95 %", false, true);
    XYSeries interval = new XYSeries("95 % interval", false, true);
    XYSeries updated = new XYSeries("updated", false, true);
    List<String> names = new ArrayList<>();
    XyFigure figure = new XyFigure(id, 760, 40 + 34 * parameters.size() + 80);
    for (Parameter p : parameters) {
      double row = names.size();
      names.add(p.name() + " (" + p.status() + ")");
      double low = factor(p, p.lowerBound(), least);
      double high = factor(p, p.upperBound(), largest);
      segment(bounds, low, high, row);
      if (p.working().equals("ln")) {
        double reach = TWO_SIDED_95 * p.priorStandardDeviation();
        segment(
            prior,
            Math.max(low, Math.exp(p.priorMean() - reach)),
            Math.min(high, Math.exp(p.priorMean() + reach)),
            row + 0.2);
      }
      segment(interval, factor(p, p.lower95(), low), factor(p, p.upper95(), high), row);
      double factor = p.factor().orElse(1);
      updated.add(factor, row);
      figure.note(
          factor, row, p.name() + "\nfactor " + Rounded.significant(factor, 3) + "\n" + p.status());
    }
    XYSeriesCollection data = new XYSeriesCollection();
    data.addSeries(updated);
    data.addSeries(interval);
    data.addSeries(prior);
    data.addSeries(bounds);
    XYLineAndShapeRenderer renderer = new XYLineAndShapeRenderer(true, false);
    renderer.setDrawSeriesLineAsPath(true);
    look(renderer, 0, Palette.INK, Palette.LINE);
    renderer.setSeriesLinesVisible(0, false);
    renderer.setSeriesShapesVisible(0, true);
    renderer.setSeriesShape(0, Palette.marker(3, 10));
    look(renderer, 1, Palette.BLUE, Palette.THICK);
    look(renderer, 2, Palette.VERMILION, Palette.DASHED);
    look(renderer, 3, Palette.GREY, Palette.THIN);
    LogAxis axis = ChartStyle.logarithms("factor on the nominal stiffness");
    axis.setRange(least, largest);
    LogTicks.set(axis, least, largest);
    XYPlot plot = new XYPlot(data, axis, CoefficientRows.axis(names), renderer);
    ChartStyle.plot(plot);
    plot.addDomainMarker(new ValueMarker(1, Palette.INK, Palette.DASHED));
    for (int row = 0; row < parameters.size(); row++) {
      Parameter p = parameters.get(row);
      endMark(plot, factor(p, p.lowerBound(), least), row);
      endMark(plot, factor(p, p.upperBound(), largest), row);
    }
    return figure.draw(
        "Parameters: nominal to updated",
        "A row is a stiffness that the update may change. Diamond: updated; thick bar: its 95 %"
            + " interval; dashed: what was expected before the test (prior); thin line with ends:"
            + " the bounds. At 1 the stiffness is nominal. A bar as long as the dashed line has"
            + " learnt nothing from this test.",
        plot,
        true);
  }

  private static void endMark(XYPlot plot, double factor, double row) {
    plot.addAnnotation(
        new XYLineAnnotation(factor, row - 0.18, factor, row + 0.18, Palette.LINE, Palette.GREY));
  }

  private static void look(
      XYLineAndShapeRenderer renderer, int series, java.awt.Color paint, java.awt.Stroke stroke) {
    renderer.setSeriesPaint(series, paint);
    renderer.setSeriesStroke(series, stroke);
  }

  /** A stretch in a row; a gap follows, so that rows are not joined. */
  private static void segment(XYSeries series, double from, double to, double row) {
    series.add(from, row);
    series.add(to, row);
    series.add(Double.NaN, row);
  }
}
