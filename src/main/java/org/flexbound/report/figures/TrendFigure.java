package org.flexbound.report.figures;

import java.awt.Color;
import java.util.ArrayList;
import java.util.List;
import org.flexbound.report.Rounded;
import org.flexbound.report.UnitSystem;
import org.flexbound.report.results.TrendPoint;
import org.flexbound.report.results.TrendSeries;
import org.jfree.chart.annotations.XYTextAnnotation;
import org.jfree.chart.axis.AxisLocation;
import org.jfree.chart.axis.NumberAxis;
import org.jfree.chart.axis.SymbolAxis;
import org.jfree.chart.plot.IntervalMarker;
import org.jfree.chart.plot.ValueMarker;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.renderer.xy.XYErrorRenderer;
import org.jfree.chart.ui.Layer;
import org.jfree.chart.ui.TextAnchor;
import org.jfree.data.xy.XYIntervalSeries;
import org.jfree.data.xy.XYIntervalSeriesCollection;

/** One coefficient or parameter over its tests, with its control limits. */
public final class TrendFigure {
  private static final int MOST_DATES = 14;

  private TrendFigure() {}

  /**
   * Draws a series.
   *
   * @param id the figure's name in the page
   * @param series the series
   * @param units the units to show
   * @return the figure
   */
  public static Figure draw(String id, TrendSeries series, UnitSystem units) {
    boolean factor = series.kind().equals("parameter") && series.unit().equals("1");
    String symbol = factor ? "× nominal" : units.symbol(series.unit());
    XYIntervalSeries within = new XYIntervalSeries("within the limits", false, true);
    XYIntervalSeries outside = new XYIntervalSeries("outside", false, true);
    XyFigure figure = new XyFigure(id, 380, 250);
    List<String> dates = new ArrayList<>();
    double low = shown(series.lower(), series, units);
    double high = shown(series.upper(), series, units);
    double[] ends = {Math.min(low, high), Math.max(low, high)};
    List<XYTextAnnotation> names = new ArrayList<>();
    for (TrendPoint p : series.points()) {
      double x = dates.size();
      dates.add(p.date());
      double y = shown(p.value(), series, units);
      double u = Math.abs(shown(p.standardUncertainty().orElse(0), series, units));
      boolean out = p.outside() || p.jump();
      (out ? outside : within).add(x, x, x, y, y - u, y + u);
      ends[0] = Math.min(ends[0], y - u);
      ends[1] = Math.max(ends[1], y + u);
      figure.note(
          x,
          y,
          p.date()
              + "\n"
              + Rounded.value(y, u)
              + " "
              + symbol
              + (p.outside() ? "\noutside of the limits" : "")
              + (p.jump() ? "\njumped further than the moving range allows" : ""));
      if (out) {
        XYTextAnnotation name = new XYTextAnnotation(p.date() + " ", x - 0.1, y);
        name.setFont(Palette.font(11f));
        name.setPaint(Palette.VERMILION);
        name.setTextAnchor(TextAnchor.CENTER_RIGHT);
        names.add(name);
      }
    }
    XYIntervalSeriesCollection data = new XYIntervalSeriesCollection();
    data.addSeries(within);
    data.addSeries(outside);
    XYErrorRenderer renderer = new XYErrorRenderer();
    renderer.setDrawXError(false);
    renderer.setCapLength(3);
    renderer.setSeriesPaint(0, Palette.BLUE);
    renderer.setSeriesShape(0, Palette.marker(0, 6));
    renderer.setSeriesPaint(1, Palette.VERMILION);
    renderer.setSeriesShape(1, Palette.marker(3, 9));
    NumberAxis vertical = ChartStyle.numbers(symbol);
    ChartStyle.range(vertical, ends[0], ends[1]);
    XYPlot plot = new XYPlot(data, dates(dates), vertical, renderer);
    ChartStyle.plot(plot);
    plot.setRangeAxisLocation(AxisLocation.BOTTOM_OR_LEFT);
    IntervalMarker baseline =
        new IntervalMarker(-0.5, series.baseline() - 0.5, new Color(0xEEF3F8));
    baseline.setAlpha(1f);
    plot.addDomainMarker(baseline, Layer.BACKGROUND);
    plot.addRangeMarker(
        new ValueMarker(shown(series.centre(), series, units), Palette.GREY, Palette.THIN));
    plot.addRangeMarker(new ValueMarker(low, Palette.INK, Palette.DASHED));
    plot.addRangeMarker(new ValueMarker(high, Palette.INK, Palette.DASHED));
    names.forEach(plot::addAnnotation);
    return figure.draw(
        series.name(),
        "Shaded: the baseline of "
            + series.baseline()
            + " tests. Dashed: limits ("
            + series.method()
            + "). Bars: standard uncertainty of each test, shared calibration included.",
        plot,
        false);
  }

  private static double shown(double si, TrendSeries series, UnitSystem units) {
    return series.kind().equals("parameter") && series.unit().equals("1")
        ? si
        : units.shown(si, series.unit());
  }

  /** An axis of dates; of many, only some are written. */
  private static SymbolAxis dates(List<String> dates) {
    String[] labels = new String[dates.size()];
    int step = (dates.size() + MOST_DATES - 1) / MOST_DATES;
    for (int k = 0; k < labels.length; k++) {
      labels[k] = k % step == 0 ? dates.get(k) : "";
    }
    SymbolAxis axis = new SymbolAxis(null, labels);
    ChartStyle.axis(axis);
    axis.setGridBandsVisible(false);
    axis.setVerticalTickLabels(true);
    axis.setRange(-0.6, dates.size() - 0.4);
    return axis;
  }
}
