package org.flexbound.report.figures;

import java.util.ArrayList;
import java.util.List;
import org.flexbound.report.Rounded;
import org.flexbound.report.results.Validation;
import org.jfree.chart.axis.NumberAxis;
import org.jfree.chart.plot.ValueMarker;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.renderer.xy.XYErrorRenderer;
import org.jfree.data.xy.XYIntervalSeries;
import org.jfree.data.xy.XYIntervalSeriesCollection;

/** Held-out coefficients against what the fitted model predicts of them. */
public final class HeldOutFigure {
  private HeldOutFigure() {}

  /**
   * Draws the held-out coefficients.
   *
   * @param validation the held-out coefficients
   * @return one figure, or several where there are very many
   */
  public static List<Figure> draw(List<Validation> validation) {
    List<Figure> figures = new ArrayList<>();
    if (validation.isEmpty()) {
      return figures;
    }
    for (List<Validation> part : CoefficientRows.split(validation)) {
      figures.add(part("held-out-" + (figures.size() + 1), part));
    }
    return figures;
  }

  private static Figure part(String id, List<Validation> validation) {
    XYIntervalSeries predicted = new XYIntervalSeries("measured", false, true);
    List<String> names = new ArrayList<>();
    XyFigure figure = new XyFigure(id, 760, CoefficientRows.height(validation.size()));
    double least = -3;
    double largest = 3;
    for (Validation v : validation) {
      double row = names.size();
      names.add(Labels.coefficient(false, v.configuration(), v.gauge(), v.load()));
      double u = v.standardUncertainty();
      double low = u > 0 ? (v.lower95() - v.predicted()) / u : 0;
      double high = u > 0 ? (v.upper95() - v.predicted()) / u : 0;
      predicted.add(v.z(), low, high, row, row, row);
      least = Math.min(least, Math.min(low, v.z()));
      largest = Math.max(largest, Math.max(high, v.z()));
      figure.note(
          v.z(), row, names.get(names.size() - 1) + "\nz " + Rounded.fixed(v.z(), 2));
    }
    XYIntervalSeriesCollection data = new XYIntervalSeriesCollection();
    data.addSeries(predicted);
    NumberAxis axis =
        ChartStyle.numbers("measured less predicted, in standard uncertainties (bar: 95 %)");
    ChartStyle.range(axis, least, largest);
    XYErrorRenderer renderer = new XYErrorRenderer();
    renderer.setDrawYError(false);
    renderer.setErrorPaint(Palette.GREY);
    renderer.setErrorStroke(Palette.LINE);
    renderer.setSeriesPaint(0, Palette.BLUE);
    renderer.setSeriesShape(0, Palette.marker(0, 7));
    XYPlot plot = new XYPlot(data, axis, CoefficientRows.axis(names), renderer);
    ChartStyle.plot(plot);
    plot.addDomainMarker(new ValueMarker(0, Palette.INK, Palette.LINE));
    return figure.draw(
        "Held-out load cases",
        "Coefficients that were not used in the fit. Dot: what was measured, less what the updated"
            + " model predicts; bar: where it should lie in 95 of 100 cases. A dot outside its bar"
            + " is a prediction that failed.",
        plot,
        false);
  }
}
