package org.flexbound.report.figures;

import java.awt.Color;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.report.Rounded;
import org.flexbound.report.UnitSystem;
import org.flexbound.report.results.Curve;
import org.flexbound.report.results.CurvePoint;
import org.flexbound.report.results.Line;
import org.jfree.chart.ChartRenderingInfo;
import org.jfree.chart.JFreeChart;
import org.jfree.chart.axis.NumberAxis;
import org.jfree.chart.entity.ChartEntity;
import org.jfree.chart.entity.XYItemEntity;
import org.jfree.chart.plot.CombinedDomainXYPlot;
import org.jfree.chart.plot.IntervalMarker;
import org.jfree.chart.plot.ValueMarker;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.renderer.xy.XYLineAndShapeRenderer;
import org.jfree.chart.ui.Layer;
import org.jfree.data.xy.XYSeries;
import org.jfree.data.xy.XYSeriesCollection;

/**
 * Load-deflection plots, one for each gauge and load: loading filled, unloading hollow, left out
 * crossed, the fitted line, its range shaded, and below it a strip with what the line leaves.
 */
public final class LoadDeflectionFigures {
  private static final int WIDTH = 460;
  private static final int HEIGHT = 380;
  private static final double MARKER = 6.5;

  private final UnitSystem units;

  /**
   * Draws in some units.
   *
   * @param units the units to show
   */
  public LoadDeflectionFigures(UnitSystem units) {
    this.units = units;
  }

  /**
   * Draws all plots.
   *
   * @param curves the curves of all runs
   * @return one figure for each configuration, gauge and load, in the order of the curves
   */
  public List<Figure> draw(List<Curve> curves) {
    Map<String, List<Curve>> together = new LinkedHashMap<>();
    for (Curve curve : curves) {
      String key = curve.configuration() + "\u0000" + curve.gauge() + "\u0000" + curve.load();
      together.computeIfAbsent(key, unused -> new ArrayList<>()).add(curve);
    }
    // Loading and unloading of a run are thinned each by itself.
    Thinning thinning = new Thinning(2 * curves.size());
    List<Figure> figures = new ArrayList<>();
    for (List<Curve> group : together.values()) {
      figures.add(draw("curve-" + (figures.size() + 1), group, thinning));
    }
    return figures;
  }

  /** A series as it stands in the plot: the points behind it. */
  private record Plotted(Curve curve, List<CurvePoint> points) {}

  private Figure draw(String id, List<Curve> runs, Thinning thinning) {
    Curve first = runs.get(0);
    String loadUnit = first.loadUnit();
    String motionUnit = first.motionUnit();
    XYSeriesCollection points = new XYSeriesCollection();
    XYSeriesCollection residuals = new XYSeriesCollection();
    XYSeriesCollection lines = new XYSeriesCollection();
    List<Plotted> plotted = new ArrayList<>();
    XYLineAndShapeRenderer upper = new XYLineAndShapeRenderer(false, true);
    XYLineAndShapeRenderer lower = new XYLineAndShapeRenderer(false, true);
    XYLineAndShapeRenderer fits = new XYLineAndShapeRenderer(true, false);
    for (int run = 0; run < runs.size(); run++) {
      Curve curve = runs.get(run);
      for (Kind kind : Kind.values()) {
        List<CurvePoint> some =
            thinning.thin(curve.points().stream().filter(kind::holds).toList());
        if (some.isEmpty()) {
          continue;
        }
        int series = points.getSeriesCount();
        points.addSeries(series(curve, kind, some, false));
        residuals.addSeries(series(curve, kind, some, true));
        plotted.add(new Plotted(curve, some));
        look(upper, series, run, kind, MARKER);
        look(lower, series, run, kind, MARKER - 1.5);
      }
      for (Line line : curve.lines()) {
        XYSeries fit = new XYSeries(curve.run() + " fit " + lines.getSeriesCount(), false);
        for (double load : new double[] {curve.fitFrom(), curve.fitTo()}) {
          fit.add(
              units.shown(load, loadUnit),
              units.shown(line.intercept() + curve.slope() * load, motionUnit));
        }
        fits.setSeriesPaint(lines.getSeriesCount(), Palette.series(run));
        fits.setSeriesStroke(lines.getSeriesCount(), Palette.THIN);
        fits.setSeriesVisibleInLegend(lines.getSeriesCount(), false);
        lines.addSeries(fit);
      }
    }
    NumberAxis loads =
        ChartStyle.numbers("load " + first.load() + ", " + units.symbol(loadUnit));
    NumberAxis motions =
        ChartStyle.numbers("motion, " + units.symbol(motionUnit));
    NumberAxis left = ChartStyle.numbers("residual");
    XYPlot top = new XYPlot(points, null, motions, upper);
    top.setDataset(1, lines);
    top.setRenderer(1, fits);
    XYPlot strip = new XYPlot(residuals, null, left, lower);
    strip.addRangeMarker(new ValueMarker(0, Palette.INK, Palette.THIN));
    for (int series = 0; series < residuals.getSeriesCount(); series++) {
      lower.setSeriesVisibleInLegend(series, false);
    }
    ChartStyle.plot(top);
    ChartStyle.plot(strip);
    shadeFitRange(top, first, loadUnit);
    CombinedDomainXYPlot both = new CombinedDomainXYPlot(loads);
    both.setGap(8);
    both.add(top, 3);
    both.add(strip, 1);
    return figure(id, runs, both, top, plotted);
  }

  private void shadeFitRange(XYPlot plot, Curve curve, String loadUnit) {
    double from = units.shown(curve.fitFrom(), loadUnit);
    double to = units.shown(curve.fitTo(), loadUnit);
    if (from != to) {
      IntervalMarker range =
          new IntervalMarker(Math.min(from, to), Math.max(from, to), new Color(0xEEF3F8));
      range.setAlpha(1f);
      plot.addDomainMarker(range, Layer.BACKGROUND);
    }
  }

  private Figure figure(
      String id,
      List<Curve> runs,
      CombinedDomainXYPlot both,
      XYPlot top,
      List<Plotted> plotted) {
    Curve first = runs.get(0);
    JFreeChart chart = ChartStyle.chart(both, true);
    Drawing drawing = new Drawing(id, WIDTH, HEIGHT);
    String heading = "Gauge " + first.gauge() + ", load " + first.load();
    String caption = caption(runs);
    String svg =
        drawing.draw(
            heading,
            caption,
            (canvas, area) -> {
              ChartRenderingInfo info = ChartStyle.draw(chart, canvas, area);
              for (Object entity : info.getEntityCollection().getEntities()) {
                if (entity instanceof XYItemEntity item && item.getDataset() == top.getDataset()) {
                  Plotted series = plotted.get(item.getSeriesIndex());
                  CurvePoint point = series.points().get(item.getItem());
                  drawing.spot(((ChartEntity) entity).getArea(), words(series.curve(), point));
                }
              }
            });
    return new Figure(id, heading, caption, WIDTH, HEIGHT, svg);
  }

  private String caption(List<Curve> runs) {
    Curve first = runs.get(0);
    String slopeUnit = UnitSystem.per(first.motionUnit(), first.loadUnit());
    List<String> slopes = new ArrayList<>();
    for (Curve curve : runs) {
      slopes.add(
          curve.run()
              + " "
              + Rounded.pair(
                  units.shown(curve.slope(), slopeUnit),
                  units.shown(curve.slopeUncertainty(), slopeUnit)));
    }
    return "Slopes: "
        + String.join("; ", slopes)
        + " "
        + units.symbol(slopeUnit)
        + ".";
  }

  private String words(Curve curve, CurvePoint point) {
    return curve.run()
        + ", "
        + point.branch()
        + (point.used() ? "" : ", left out")
        + "\nload "
        + shown(point.load(), curve.loadUnit())
        + "\nmotion "
        + shown(point.motion(), curve.motionUnit())
        + "\nresidual "
        + shown(point.residual(), curve.motionUnit())
        + (point.where().isEmpty() ? "" : "\n" + point.where());
  }

  private String shown(double si, String unit) {
    return Rounded.significant(units.shown(si, unit), 5) + " " + units.symbol(unit);
  }

  private XYSeries series(Curve curve, Kind kind, List<CurvePoint> points, boolean residual) {
    XYSeries series = new XYSeries(curve.run() + ", " + kind.words, false, true);
    for (CurvePoint point : points) {
      series.add(
          units.shown(point.load(), curve.loadUnit()),
          units.shown(residual ? point.residual() : point.motion(), curve.motionUnit()));
    }
    return series;
  }

  private static void look(
      XYLineAndShapeRenderer renderer, int series, int run, Kind kind, double size) {
    renderer.setSeriesPaint(series, Palette.series(run));
    renderer.setSeriesOutlinePaint(series, Palette.series(run));
    renderer.setSeriesShape(
        series, kind == Kind.LEFT_OUT ? Palette.cross(size) : Palette.marker(run, size));
    renderer.setSeriesShapesFilled(series, kind == Kind.LOADING);
    renderer.setUseOutlinePaint(true);
    renderer.setSeriesOutlineStroke(series, Palette.THIN);
  }

  /** What is told apart in a plot. */
  private enum Kind {
    LOADING("loading"),
    UNLOADING("unloading"),
    LEFT_OUT("left out");

    private final String words;

    Kind(String words) {
      this.words = words;
    }

    boolean holds(CurvePoint point) {
      return switch (this) {
        case LOADING -> point.used() && !point.branch().equals("unloading");
        case UNLOADING -> point.used() && point.branch().equals("unloading");
        case LEFT_OUT -> !point.used();
      };
    }
  }
}
