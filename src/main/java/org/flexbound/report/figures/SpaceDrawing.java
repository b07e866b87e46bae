package org.flexbound.report.figures;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * Lines, dots and labels in space as an {@code svg} element. It stands as it is; each element also
 * carries its coordinates ({@code data-p}), so that the page's script can turn the view.
 */
final class SpaceDrawing {
  /** A dot reaches this far from its middle. */
  private static final double MARK = 5;

  /** A stroke to be kept clear is watched at its ends and so many points less one between. */
  private static final int CLEAR = 6;

  private final String id;
  private final int width;
  private final int height;
  private final Projection projection;
  private final List<Item> items = new ArrayList<>();
  private final List<double[]> extent = new ArrayList<>();
  private final List<double[]> boxes = new ArrayList<>();
  private final List<double[]> marks = new ArrayList<>();
  private final List<double[]> clear = new ArrayList<>();

  /** Something to draw: its points, and how. */
  private record Item(Kind kind, List<double[]> points, String style, String text) {}

  private enum Kind {
    LINE,
    AREA,
    DOT,
    LABEL
  }

  SpaceDrawing(String id, int width, int height, List<Double> up) {
    this.id = id;
    this.width = width;
    this.height = height;
    this.projection = new Projection(up);
  }

  void line(List<double[]> points, String style) {
    items.add(new Item(Kind.LINE, List.copyOf(points), style, ""));
    extent.addAll(points);
  }

  void area(List<double[]> points, String style) {
    items.add(new Item(Kind.AREA, List.copyOf(points), style, ""));
    extent.addAll(points);
  }

  void dot(double[] point, double radius, String style, String hover) {
    items.add(new Item(Kind.DOT, List.of(point), "r=\"" + radius + "\" " + style, hover));
    extent.add(point);
  }

  void label(double[] point, String text, String style) {
    items.add(new Item(Kind.LABEL, List.of(point), style, text));
  }

  /** Keeps labels off a stroke where that can be. */
  void keepClear(double[] from, double[] to) {
    for (int k = 0; k <= CLEAR; k++) {
      double share = (double) k / CLEAR;
      double[] point = new double[3];
      for (int c = 0; c < 3; c++) {
        point[c] = from[c] + share * (to[c] - from[c]);
      }
      clear.add(point);
    }
  }

  /** Makes the view large enough for a point that is drawn only in some figures. */
  void include(double[] point) {
    extent.add(point);
  }

  String svg(String title, String description) {
    projection.fit(extent, width, height, 48);
    StringBuilder svg = new StringBuilder(4096);
    svg.append("<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 ")
        .append(width)
        .append(' ')
        .append(height)
        .append("\" width=\"")
        .append(width)
        .append("\" height=\"")
        .append(height)
        .append("\" class=\"figure space\" role=\"img\" aria-labelledby=\"")
        .append(id)
        .append("-title ")
        .append(id)
        .append("-desc\" font-family=\"'")
        .append(Palette.FAMILY)
        .append("', Arial, sans-serif\" font-size=\"11\" data-view=\"")
        .append(numbers(Math.toDegrees(Projection.AZIMUTH), Math.toDegrees(Projection.ELEVATION)))
        .append(' ')
        .append(numbers(projection.scale(), projection.shiftX(), projection.shiftY()))
        .append("\"><title id=\"")
        .append(id)
        .append("-title\">")
        .append(escape(title))
        .append("</title><desc id=\"")
        .append(id)
        .append("-desc\">")
        .append(escape(description))
        .append("</desc>");
    clear.forEach(point -> marks.add(projection.at(point)));
    for (Item item : items) {
      if (item.kind() == Kind.DOT) {
        marks.add(projection.at(item.points().get(0)));
      }
    }
    for (Item item : items) {
      append(svg, item);
    }
    return svg.append("</svg>").toString();
  }

  private void append(StringBuilder svg, Item item) {
    StringBuilder places = new StringBuilder();
    StringBuilder page = new StringBuilder();
    for (double[] point : item.points()) {
      double[] level = projection.level(point);
      places.append(places.length() > 0 ? ";" : "").append(precise(level));
      double[] at = projection.at(point);
      page.append(page.length() > 0 ? " " : "").append(numbers(at[0], at[1]).replace(' ', ','));
    }
    String data = " data-p=\"" + places + "\" ";
    double[] at = projection.at(item.points().get(0));
    switch (item.kind()) {
      case LINE ->
          svg.append("<polyline fill=\"none\" points=\"")
              .append(page)
              .append('"')
              .append(data)
              .append(item.style())
              .append("/>");
      case AREA ->
          svg.append("<polygon points=\"")
              .append(page)
              .append('"')
              .append(data)
              .append(item.style())
              .append("/>");
      case DOT ->
          svg.append("<circle cx=\"")
              .append(Drawing.number(at[0]))
              .append("\" cy=\"")
              .append(Drawing.number(at[1]))
              .append('"')
              .append(data)
              .append(item.style())
              .append("><title>")
              .append(escape(item.text()))
              .append("</title></circle>");
      case LABEL -> label(svg, item, at, data);
    }
  }

  /** Puts a label beside its point where it covers no other label and, where that can be, no dot. */
  private void label(StringBuilder svg, Item item, double[] at, String data) {
    String text = Labels.brief(item.text());
    double wide = 6.2 * text.codePointCount(0, text.length());
    double[][] offsets = {
      {8, -6}, {8, 14}, {-8 - wide, -6}, {-8 - wide, 14}, {10, 26}, {10, -20},
      {-10 - wide, 26}, {-10 - wide, -20}, {14, 40}, {14, -34}
    };
    double[] chosen = offsets[0];
    int leastCovered = Integer.MAX_VALUE;
    for (double[] offset : offsets) {
      double x = at[0] + offset[0];
      double y = at[1] + offset[1];
      int covered = free(x, y, wide) ? covered(x, y, wide) : Integer.MAX_VALUE;
      if (covered < leastCovered) {
        leastCovered = covered;
        chosen = offset;
      }
    }
    boxes.add(new double[] {at[0] + chosen[0], at[1] + chosen[1], wide});
    svg.append("<text x=\"")
        .append(Drawing.number(at[0] + chosen[0]))
        .append("\" y=\"")
        .append(Drawing.number(at[1] + chosen[1]))
        .append("\" data-o=\"")
        .append(numbers(chosen[0], chosen[1]))
        .append('"')
        .append(data)
        .append("paint-order=\"stroke\" stroke=\"#fff\" stroke-width=\"3\" ")
        .append(item.style())
        .append('>')
        .append(escape(text))
        .append("</text>");
  }

  private boolean free(double x, double y, double wide) {
    if (x < 2 || x + wide > width - 2 || y < 12 || y > height - 4) {
      return false;
    }
    for (double[] box : boxes) {
      if (x < box[0] + box[2] + 3 && box[0] < x + wide + 3 && Math.abs(y - box[1]) < 12) {
        return false;
      }
    }
    return true;
  }

  /** How many dots a label would touch. */
  private int covered(double x, double y, double wide) {
    int count = 0;
    for (double[] mark : marks) {
      if (mark[0] > x - MARK && mark[0] < x + wide + MARK && mark[1] > y - 9 - MARK && mark[1] < y + 2 + MARK) {
        count++;
      }
    }
    return count;
  }

  private static String numbers(double... values) {
    StringBuilder text = new StringBuilder();
    for (double value : values) {
      text.append(text.length() > 0 ? " " : "").append(String.format(Locale.ROOT, "%.2f", value));
    }
    return text.toString();
  }

  private static String precise(double[] point) {
    return String.format(Locale.ROOT, "%.4f %.4f %.4f", point[0], point[1], point[2]);
  }

  static String escape(String text) {
    return XmlText.clean(text)
        .replace("&", "&amp;")
        .replace("<", "&lt;")
        .replace(">", "&gt;")
        .replace("\"", "&quot;");
  }
}
