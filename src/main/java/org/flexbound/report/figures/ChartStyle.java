package org.flexbound.report.figures;

import java.awt.Color;
import java.awt.geom.Rectangle2D;
import java.text.DecimalFormat;
import java.text.DecimalFormatSymbols;
import java.util.Locale;
import org.jfree.chart.ChartRenderingInfo;
import org.jfree.chart.JFreeChart;
import org.jfree.chart.axis.Axis;
import org.jfree.chart.axis.LogAxis;
import org.jfree.chart.axis.NumberAxis;
import org.jfree.chart.axis.ValueAxis;
import org.jfree.chart.block.BlockBorder;
import org.jfree.chart.plot.CategoryPlot;
import org.jfree.chart.plot.Plot;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.text.TextUtils;
import org.jfree.chart.title.LegendTitle;
import org.jfree.chart.ui.HorizontalAlignment;
import org.jfree.chart.ui.RectangleEdge;
import org.jfree.chart.ui.RectangleInsets;

/** The look that all charts share. */
final class ChartStyle {
  private static final float LABEL = 12f;
  private static final float TICK = 11f;

  static {
    // Turned lettering stays text, which can be searched and read aloud, instead of outlines of its letters.
    TextUtils.setUseDrawRotatedStringWorkaround(false);
  }

  private ChartStyle() {}

  static JFreeChart chart(Plot plot, boolean legend) {
    JFreeChart chart = new JFreeChart(null, Palette.font(LABEL), plot, false);
    chart.setBackgroundPaint(null);
    chart.setPadding(new RectangleInsets(2, 2, 2, 6));
    chart.setAntiAlias(true);
    plot.setBackgroundPaint(Color.WHITE);
    plot.setOutlinePaint(Palette.GREY);
    plot.setOutlineStroke(Palette.THIN);
    if (legend) {
      LegendTitle title = new LegendTitle(plot);
      title.setPosition(RectangleEdge.BOTTOM);
      title.setItemFont(Palette.font(TICK));
      title.setItemPaint(Palette.INK);
      title.setFrame(BlockBorder.NONE);
      title.setBackgroundPaint(null);
      title.setHorizontalAlignment(HorizontalAlignment.LEFT);
      chart.addSubtitle(title);
    }
    return chart;
  }

  static void axis(Axis axis) {
    axis.setLabelFont(Palette.font(LABEL));
    axis.setTickLabelFont(Palette.font(TICK));
    axis.setLabelPaint(Palette.INK);
    axis.setTickLabelPaint(Palette.INK);
    axis.setAxisLinePaint(Palette.GREY);
    axis.setTickMarkPaint(Palette.GREY);
  }

  static NumberAxis numbers(String label) {
    NumberAxis axis = new NumberAxis(label);
    axis(axis);
    axis.setAutoRangeIncludesZero(false);
    DecimalFormatSymbols symbols = DecimalFormatSymbols.getInstance(Locale.ROOT);
    symbols.setMinusSign('\u2212');
    axis.setNumberFormatOverride(new DecimalFormat("0.########", symbols));
    return axis;
  }

  static LogAxis logarithms(String label) {
    LogAxis axis = new LogAxis(label);
    axis(axis);
    axis.setNumberFormatOverride(
        new DecimalFormat("0.######", DecimalFormatSymbols.getInstance(Locale.ROOT)));
    return axis;
  }

  static void plot(XYPlot plot) {
    plot.setDomainGridlinePaint(Palette.FAINT);
    plot.setRangeGridlinePaint(Palette.FAINT);
    plot.setDomainGridlineStroke(Palette.THIN);
    plot.setRangeGridlineStroke(Palette.THIN);
    plot.setAxisOffset(RectangleInsets.ZERO_INSETS);
    plot.setBackgroundPaint(Color.WHITE);
    plot.setOutlinePaint(Palette.GREY);
  }

  static void plot(CategoryPlot plot) {
    plot.setRangeGridlinePaint(Palette.FAINT);
    plot.setRangeGridlineStroke(Palette.THIN);
    plot.setAxisOffset(RectangleInsets.ZERO_INSETS);
    plot.setBackgroundPaint(Color.WHITE);
    plot.setOutlinePaint(Palette.GREY);
  }

  /** A range with some room about it, never of no width. */
  static void range(ValueAxis axis, double low, double high) {
    double span = high - low;
    if (!(span > 0)) {
      span = Math.max(Math.abs(high), 1e-12);
    }
    axis.setRange(low - 0.06 * span, high + 0.06 * span);
  }

  /** Draws a chart and returns what lies where in it. */
  static ChartRenderingInfo draw(
      JFreeChart chart, org.apache.batik.svggen.SVGGraphics2D canvas, Rectangle2D area) {
    ChartRenderingInfo info = new ChartRenderingInfo();
    chart.draw(canvas, area, info);
    return info;
  }
}
