package org.flexbound.report.figures;

import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Font;
import java.awt.FontFormatException;
import java.awt.GraphicsEnvironment;
import java.awt.Shape;
import java.awt.Stroke;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.List;

/** Colours, markers, lines and the font of all figures. */
final class Palette {
  /** Okabe and Ito (2008); yellow is left out, being too pale on white. */
  static final Color BLUE = new Color(0x0072B2);

  static final Color VERMILION = new Color(0xD55E00);
  static final Color GREEN = new Color(0x009E73);
  static final Color ORANGE = new Color(0xE69F00);
  static final Color SKY = new Color(0x56B4E9);
  static final Color PURPLE = new Color(0xCC79A7);
  static final Color INK = new Color(0x1B1F24);
  static final Color GREY = new Color(0x5A6470);
  static final Color FAINT = new Color(0xD5DAE0);

  static final List<Color> SERIES = List.of(BLUE, VERMILION, GREEN, ORANGE, SKY, PURPLE, GREY);

  static final Stroke THIN = new BasicStroke(0.8f);
  static final Stroke LINE = new BasicStroke(1.4f);
  static final Stroke THICK = new BasicStroke(5f, BasicStroke.CAP_BUTT, BasicStroke.JOIN_MITER);
  static final Stroke DASHED =
      new BasicStroke(
          1.2f, BasicStroke.CAP_BUTT, BasicStroke.JOIN_MITER, 10f, new float[] {5f, 3f}, 0f);

  /** Family that the page asks for as well; the jar brings it, so that widths are the same. */
  static final String FAMILY = "DejaVu Sans Condensed";

  private static final Font BASE = load();

  private Palette() {}

  private static Font load() {
    String path = "/net/sf/jasperreports/fonts/dejavu/DejaVuSansCondensed.ttf";
    try (InputStream stream = Palette.class.getResourceAsStream(path)) {
      if (stream == null) {
        return new Font(Font.SANS_SERIF, Font.PLAIN, 11);
      }
      Font font = Font.createFont(Font.TRUETYPE_FONT, stream);
      // Known by its name as well, for the PDF library draws the figures' texts by name.
      GraphicsEnvironment.getLocalGraphicsEnvironment().registerFont(font);
      return font;
    } catch (IOException | FontFormatException unreadable) {
      throw new UncheckedIOException(new IOException("the font of the figures", unreadable));
    }
  }

  static Font font(float size) {
    return BASE.deriveFont(size);
  }

  static Color series(int index) {
    return SERIES.get(index % SERIES.size());
  }

  /** A marker of its own for each index, about so large. */
  static Shape marker(int index, double size) {
    double r = size / 2;
    return switch (index % 4) {
      case 0 -> new Ellipse2D.Double(-r, -r, size, size);
      case 1 -> new Rectangle2D.Double(-0.9 * r, -0.9 * r, 1.8 * r, 1.8 * r);
      case 2 -> polygon(0, -1.15 * r, 1.1 * r, 0.85 * r, -1.1 * r, 0.85 * r);
      default -> polygon(0, -1.25 * r, 1.25 * r, 0, 0, 1.25 * r, -1.25 * r, 0);
    };
  }

  static Shape cross(double size) {
    double r = size / 2;
    Path2D path = new Path2D.Double();
    path.moveTo(-r, -r);
    path.lineTo(r, r);
    path.moveTo(-r, r);
    path.lineTo(r, -r);
    return path;
  }

  static Shape polygon(double... points) {
    Path2D path = new Path2D.Double();
    path.moveTo(points[0], points[1]);
    for (int k = 2; k < points.length; k += 2) {
      path.lineTo(points[k], points[k + 1]);
    }
    path.closePath();
    return path;
  }
}
