package org.flexbound.report.figures;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.flexbound.report.Rounded;
import org.flexbound.report.UnitSystem;
import org.flexbound.report.results.Parameter;
import org.flexbound.report.results.Profile;
import org.flexbound.report.results.ProfilePoint;
import org.flexbound.report.results.TradeOff;
import org.flexbound.report.results.Update;
import org.jfree.chart.axis.NumberAxis;
import org.jfree.chart.plot.ValueMarker;
import org.jfree.chart.plot.XYPlot;
import org.jfree.chart.renderer.xy.XYLineAndShapeRenderer;
import org.jfree.data.xy.XYSeries;
import org.jfree.data.xy.XYSeriesCollection;

/** The curve of misfit against change, and the profiles of parameters. */
public final class UpdateFigures {
  private UpdateFigures() {}

  /**
   * Draws misfit against change.
   *
   * @param update how the update ended
   * @return the figure; none where the curve has fewer than three points
   */
  public static Optional<Figure> tradeOff(Update update) {
    List<TradeOff> points =
        update.tradeOff().stream().filter(point -> point.misfit() > 0).toList();
    if (points.size() < 3) {
      return Optional.empty();
    }
    XYSeries curve = new XYSeries("misfit", false, true);
    XyFigure figure = new XyFigure("trade-off", 560, 360);
    double least = update.shown().limit();
    double largest = least;
    double widest = 0;
    for (TradeOff point : points) {
      curve.add(point.change(), point.misfit());
      least = Math.min(least, point.misfit());
      largest = Math.max(largest, point.misfit());
      widest = Math.max(widest, point.change());
      figure.note(
          point.change(),
          point.misfit(),
          "weight " + Rounded.significant(point.weight(), 3)
              + "\nmisfit " + Rounded.significant(point.misfit(), 3)
              + "\nchange " + Rounded.significant(point.change(), 3));
    }
    XYSeries shown = new XYSeries("point shown", false, true);
    TradeOff nearest = points.get(0);
    for (TradeOff point : points) {
      if (Math.abs(Math.log(point.weight() / update.weight()))
          < Math.abs(Math.log(nearest.weight() / update.weight()))) {
        nearest = point;
      }
    }
    shown.add(nearest.change(), update.shown().value() > 0 ? update.shown().value() : nearest.misfit());
    XYSeriesCollection data = new XYSeriesCollection();
    data.addSeries(curve);
    data.addSeries(shown);
    XYLineAndShapeRenderer renderer = new XYLineAndShapeRenderer(true, true);
    renderer.setSeriesPaint(0, Palette.BLUE);
    renderer.setSeriesShape(0, Palette.marker(0, 5));
    renderer.setSeriesStroke(0, Palette.LINE);
    renderer.setSeriesPaint(1, Palette.VERMILION);
    renderer.setSeriesShape(1, Palette.marker(3, 12));
    NumberAxis change = ChartStyle.numbers("size of the change, in prior standard deviations");
    change.setRange(-0.03 * Math.max(widest, 1e-6), 1.06 * Math.max(widest, 1e-6));
    org.jfree.chart.axis.LogAxis misfit = ChartStyle.logarithms("misfit");
    misfit.setRange(least / 1.4, largest * 1.4);
    LogTicks.set(misfit, least, largest);
    XYPlot plot = new XYPlot(data, change, misfit, renderer);
    ChartStyle.plot(plot);
    plot.addRangeMarker(new ValueMarker(update.shown().limit(), Palette.INK, Palette.DASHED));
    return Optional.of(
        figure.draw(
            "Misfit against change",
            "From left to right the model may change more and agrees better. Below the dashed line"
                + " the misfit is no larger than the uncertainty of the test explains: change"
                + " beyond that fits noise. Diamond: the point shown in this report.",
            plot,
            true));
  }

  /**
   * Draws the profiles of the parameters that have one.
   *
   * @param parameters the parameters
   * @param units the units to show
   * @return one figure each
   */
  public static List<Figure> profiles(List<Parameter> parameters, UnitSystem units) {
    List<Figure> figures = new ArrayList<>();
    for (Parameter parameter : parameters) {
      if (parameter.profile().isPresent() && parameter.profile().get().points().size() > 2) {
        figures.add(
            profile(
                "profile-" + (figures.size() + 1), parameter, parameter.profile().get(), units));
      }
    }
    return figures;
  }

  private static Figure profile(String id, Parameter p, Profile profile, UnitSystem units) {
    XYSeries curve = new XYSeries("rise", false, true);
    XyFigure figure = new XyFigure(id, 460, 300);
    double ceiling = 2.5 * profile.threshold();
    for (ProfilePoint point : profile.points()) {
      if (point.rise() <= ceiling) {
        curve.add(point.working(), point.rise());
        figure.note(
            point.working(),
            point.rise(),
            (point.value().isPresent()
                    ? Rounded.significant(units.shown(point.value().getAsDouble(), p.unit()), 3)
                        + " "
                        + (p.unit().equals("1") ? "× nominal" : units.symbol(p.unit()))
                    : "rigid")
                + "\nrise "
                + Rounded.significant(point.rise(), 3));
      }
    }
    XYLineAndShapeRenderer renderer = new XYLineAndShapeRenderer(true, true);
    renderer.setSeriesPaint(0, Palette.BLUE);
    renderer.setSeriesShape(0, Palette.marker(0, 5));
    NumberAxis x = ChartStyle.numbers(axisName(p));
    NumberAxis y = ChartStyle.numbers("rise of the misfit (halved)");
    y.setRange(-0.03 * ceiling, ceiling);
    XYPlot plot = new XYPlot(new XYSeriesCollection(curve), x, y, renderer);
    ChartStyle.plot(plot);
    plot.addRangeMarker(new ValueMarker(profile.threshold(), Palette.INK, Palette.DASHED));
    return figure.draw(
        "Profile of " + p.name(),
        "How the misfit rises when this parameter is held and the others adapt. The 95 % interval"
            + " lies where the curve is below the dashed line; a side on which it stays below is"
            + " open: the test sets no limit there. Status: " + p.status() + ".",
        plot,
        false);
  }

  private static String axisName(Parameter p) {
    return switch (p.working()) {
      case "ln" -> "ln(" + Labels.brief(p.name()) + " / nominal)";
      case "fixity" -> "fixity factor of " + Labels.brief(p.name());
      default -> "compliance of " + Labels.brief(p.name()) + ", SI";
    };
  }
}
