package org.flexbound.report.figures;

import java.awt.Color;
import java.awt.Font;
import java.awt.FontMetrics;
import java.awt.Graphics2D;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Line2D;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.report.Rounded;
import org.flexbound.report.UnitSystem;
import org.flexbound.report.results.Coefficient;

/**
 * The measured flexibility matrix as a picture: a disc for each coefficient, its area in proportion
 * to its size among those of the same unit, filled where positive and hollow where negative.
 */
public final class FlexibilityPicture {
  private static final int CELL = 46;
  private static final int HEAD = 64;
  private static final int SIDE = 150;
  private static final double LARGEST_RADIUS = 20;

  private final UnitSystem units;

  /**
   * Draws in some units.
   *
   * @param units the units to show
   */
  public FlexibilityPicture(UnitSystem units) {
    this.units = units;
  }

  /**
   * Draws the matrices.
   *
   * @param coefficients the measured coefficients
   * @return one figure for each configuration
   */
  public List<Figure> draw(List<Coefficient> coefficients) {
    Map<String, List<Coefficient>> byConfiguration = new LinkedHashMap<>();
    for (Coefficient c : coefficients) {
      byConfiguration.computeIfAbsent(c.configuration(), unused -> new ArrayList<>()).add(c);
    }
    List<Figure> figures = new ArrayList<>();
    byConfiguration.forEach(
        (name, some) ->
            figures.add(draw("matrix-" + (figures.size() + 1), name, some)));
    return figures;
  }

  private Figure draw(String id, String configuration, List<Coefficient> coefficients) {
    List<String> gauges = coefficients.stream().map(Coefficient::gauge).distinct().toList();
    List<String> loads = coefficients.stream().map(Coefficient::load).distinct().toList();
    Map<String, Double> largest = new LinkedHashMap<>();
    coefficients.forEach(c -> largest.merge(c.unit(), Math.abs(c.value()), Math::max));
    int width = Math.max(340, SIDE + CELL * loads.size() + 40);
    int height = HEAD + CELL * gauges.size() + 12;
    Drawing drawing = new Drawing(id, width, height);
    String heading = "Measured flexibility, " + configuration;
    String caption =
        "Rows are gauges, columns are loads. The area of a disc is the size of the coefficient"
            + " among those of the same unit; filled: positive, hollow: negative; no disc: not"
            + " measured. The figures stand in the table of coefficients.";
    String svg =
        drawing.draw(
            heading,
            caption,
            (canvas, area) -> {
              grid(canvas, gauges, loads);
              for (Coefficient c : coefficients) {
                disc(
                    canvas,
                    drawing,
                    c,
                    SIDE + CELL * (loads.indexOf(c.load()) + 0.5),
                    HEAD + CELL * (gauges.indexOf(c.gauge()) + 0.5),
                    largest.getOrDefault(c.unit(), 1.0));
              }
            });
    return new Figure(id, heading, caption, width, height, svg);
  }

  private static void grid(Graphics2D canvas, List<String> gauges, List<String> loads) {
    Font font = Palette.font(11f);
    canvas.setFont(font);
    FontMetrics metrics = canvas.getFontMetrics(font);
    canvas.setStroke(Palette.THIN);
    int right = SIDE + CELL * loads.size();
    int bottom = HEAD + CELL * gauges.size();
    canvas.setColor(Palette.FAINT);
    for (int row = 0; row <= gauges.size(); row++) {
      canvas.draw(new Line2D.Double(SIDE, HEAD + CELL * row, right, HEAD + CELL * row));
    }
    for (int column = 0; column <= loads.size(); column++) {
      canvas.draw(new Line2D.Double(SIDE + CELL * column, HEAD, SIDE + CELL * column, bottom));
    }
    canvas.setColor(Palette.INK);
    for (int row = 0; row < gauges.size(); row++) {
      String name = fit(gauges.get(row), metrics, SIDE - 10);
      canvas.drawString(
          name, SIDE - 6 - metrics.stringWidth(name), HEAD + CELL * row + CELL / 2 + 4);
    }
    for (int column = 0; column < loads.size(); column++) {
      // Names stand at a slant, so that long ones do not run into each other.
      String name = fit(loads.get(column), metrics, 84);
      java.awt.geom.AffineTransform before = canvas.getTransform();
      canvas.translate(SIDE + CELL * column + CELL / 2.0 - 4, HEAD - 6);
      canvas.rotate(-Math.PI / 5);
      canvas.drawString(name, 0, 0);
      canvas.setTransform(before);
    }
  }

  private static String fit(String name, FontMetrics metrics, int room) {
    String shown = Labels.brief(name);
    while (metrics.stringWidth(shown) > room && shown.length() > 2) {
      shown = shown.substring(0, shown.length() - 2) + "…";
    }
    return shown;
  }

  private void disc(
      Graphics2D canvas, Drawing drawing, Coefficient c, double x, double y, double largest) {
    double r =
        largest > 0 ? LARGEST_RADIUS * Math.sqrt(Math.abs(c.value()) / largest) : 0;
    Ellipse2D circle = new Ellipse2D.Double(x - r, y - r, 2 * r, 2 * r);
    canvas.setStroke(Palette.LINE);
    if (c.value() >= 0) {
      canvas.setColor(Palette.BLUE);
      canvas.fill(circle);
    } else {
      canvas.setColor(Color.WHITE);
      canvas.fill(circle);
      canvas.setColor(Palette.VERMILION);
      canvas.draw(circle);
    }
    drawing.spot(
        circle,
        c.gauge()
            + " / "
            + c.load()
            + "\n"
            + Rounded.pair(
                units.shown(c.value(), c.unit()), units.shown(c.standardUncertainty(), c.unit()))
            + " "
            + units.symbol(c.unit()));
  }
}
