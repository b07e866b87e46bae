package org.flexbound.report.figures;

import java.util.Locale;

/**
 * A figure ready to stand in a page.
 *
 * @param id a name unique in the report, of letters, digits and hyphens
 * @param heading what is drawn
 * @param caption what to see in it
 * @param width its width, in CSS pixels
 * @param height its height, in CSS pixels
 * @param svg the graphic: one {@code svg} element with its title and description
 */
public record Figure(
    String id, String heading, String caption, int width, int height, String svg) {
  /**
   * The graphic, drawn no wider than so much.
   *
   * @param widest the width that there is, in CSS pixels
   * @return the {@code svg} element with the size at which it is to be drawn as its style
   */
  public String within(int widest) {
    double factor = Math.min(1.0, (double) widest / width);
    String style =
        String.format(
            Locale.ROOT, "style=\"width: %.1fpx; height: %.1fpx\"", factor * width, factor * height);
    return svg.replaceFirst("<svg ", "<svg " + style + " ");
  }
}
