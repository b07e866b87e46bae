package org.flexbound.report.figures;

import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.List;
import org.jfree.chart.ChartRenderingInfo;
import org.jfree.chart.JFreeChart;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.ui.RectangleEdge;

/** A chart with texts for single places in its coordinates. */
final class XyFigure {
  private final String id;
  private final int width;
  private final int height;
  private final List<Note> notes = new ArrayList<>();

  private record Note(double x, double y, String text) {}

  XyFigure(String id, int width, int height) {
    this.id = id;
    this.width = width;
    this.height = height;
  }

  /** Gives the point (x, y) of the chart a text for the reader who rests the pointer on it. */
  void note(double x, double y, String text) {
    notes.add(new Note(x, y, text));
  }

  Figure draw(String heading, String caption, XYPlot plot, boolean legend) {
    JFreeChart chart = ChartStyle.chart(plot, legend);
    Drawing drawing = new Drawing(id, width, height);
    String svg =
        drawing.draw(
            heading,
            caption,
            (canvas, area) -> {
              ChartRenderingInfo info = ChartStyle.draw(chart, canvas, area);
              Rectangle2D data = info.getPlotInfo().getDataArea();
              for (Note note : notes) {
                double x = plot.getDomainAxis().valueToJava2D(note.x(), data, domainEdge(plot));
                double y = plot.getRangeAxis().valueToJava2D(note.y(), data, rangeEdge(plot));
                drawing.spot(new Rectangle2D.Double(x, y, 0, 0), note.text());
              }
            });
    return new Figure(id, heading, caption, width, height, svg);
  }

  private static RectangleEdge domainEdge(XYPlot plot) {
    return plot.getDomainAxisEdge();
  }

  private static RectangleEdge rangeEdge(XYPlot plot) {
    return plot.getRangeAxisEdge();
  }
}
