package org.flexbound.report.figures;

import java.awt.Color;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.flexbound.report.Rounded;
import org.flexbound.report.results.Limit;
import org.flexbound.statistics.Quantiles;
import org.jfree.chart.axis.NumberAxis;
import org.jfree.chart.plot.IntervalMarker;
import org.jfree.chart.plot.ValueMarker;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.renderer.xy.XYLineAndShapeRenderer;
import org.jfree.chart.ui.Layer;
import org.jfree.data.xy.XYSeries;
import org.jfree.data.xy.XYSeriesCollection;

/** How far every result lies within or beyond its limit, in widths of the guard band. */
public final class LimitFigure {
  /** Further than this says no more than "far". */
  private static final double FURTHEST = 4;

  private LimitFigure() {}

  /**
   * Draws the limits.
   *
   * @param limits the limits with their decisions
   * @return the figure; empty where nothing could be judged
   */
  public static Optional<Figure> draw(List<Limit> limits) {
    List<Limit> judged = limits.stream().filter(l -> l.probability().isPresent()).toList();
    if (judged.isEmpty()) {
      return Optional.empty();
    }
    List<Limit> drawn = judged.subList(0, Math.min(CoefficientRows.MOST, judged.size()));
    XYSeries pass = new XYSeries("pass");
    XYSeries open = new XYSeries("undecided");
    XYSeries fail = new XYSeries("fail");
    List<String> names = new ArrayList<>();
    XyFigure figure = new XyFigure("limit-bands", 760, CoefficientRows.height(drawn.size()) + 24);
    for (Limit limit : drawn) {
      double row = names.size();
      names.add(limit.name());
      double distance = distance(limit);
      (limit.decision().equals("pass") ? pass : limit.decision().equals("fail") ? fail : open)
          .add(distance, row);
      figure.note(
          distance,
          row,
          limit.name()
              + "\n"
              + limit.decision()
              + ", within the limit with a probability of "
              + Rounded.fixed(100 * limit.probability().orElse(0), 1)
              + " %");
    }
    XYSeriesCollection data = new XYSeriesCollection();
    data.addSeries(pass);
    data.addSeries(open);
    data.addSeries(fail);
    NumberAxis axis = ChartStyle.numbers("beyond  ←  distance from the limit, guard bands  →  within");
    axis.setRange(-FURTHEST - 0.3, FURTHEST + 0.3);
    XYLineAndShapeRenderer renderer = new XYLineAndShapeRenderer(false, true);
    Color[] colours = {Palette.GREEN, Palette.ORANGE, Palette.VERMILION};
    for (int series = 0; series < colours.length; series++) {
      renderer.setSeriesPaint(series, colours[series]);
      renderer.setSeriesShape(series, Palette.marker(series, 9));
    }
    renderer.setSeriesShapesFilled(1, false);
    XYPlot plot = new XYPlot(data, axis, CoefficientRows.axis(names), renderer);
    ChartStyle.plot(plot);
    IntervalMarker guard = new IntervalMarker(-1, 1, Palette.FAINT);
    guard.setAlpha(1);
    plot.addDomainMarker(guard, Layer.BACKGROUND);
    plot.addDomainMarker(new ValueMarker(0, Palette.INK, Palette.LINE));
    return Optional.of(
        figure.draw(
            "Limits",
            "Each row is a limit. Right of the shaded guard band it passes, left of it it fails, in it"
                + " this test cannot decide (with the simple rule the line at nought decides). Beyond"
                + " four widths a mark is drawn at the edge.",
            plot,
            true));
  }

  /** The probability as a distance: ±1 where the largest probability of being wrong is reached. */
  private static double distance(Limit limit) {
    double p = Math.min(1 - 1e-12, Math.max(1e-12, limit.probability().orElse(0.5)));
    double distance =
        Quantiles.normal(p) / Quantiles.normal(1 - limit.largestProbability());
    return Math.max(-FURTHEST, Math.min(FURTHEST, distance));
  }
}
