package org.flexbound.report.figures;

import java.awt.Font;
import java.awt.font.FontRenderContext;
import java.util.Locale;
import org.w3c.dom.Element;
import org.w3c.dom.Node;

/**
 * Gives the longer texts of a drawing the width that they were laid out with, so that they do not run into their neighbours where the reader's
 * program draws them in another font.
 */
final class TextWidths {
  /** Shorter texts, such as the numbers at an axis, cannot go far wrong. */
  private static final int SHORT = 5;

  private static final float USUAL_SIZE = 12;
  private static final FontRenderContext PLAIN = new FontRenderContext(null, true, true);

  private TextWidths() {}

  static void fix(Element root) {
    fix(root, USUAL_SIZE, false);
  }

  private static void fix(Element element, float inheritedSize, boolean inheritedBold) {
    float size = element.hasAttribute("font-size") ? size(element.getAttribute("font-size"), inheritedSize) : inheritedSize;
    boolean bold = element.hasAttribute("font-weight") ? element.getAttribute("font-weight").equals("bold") : inheritedBold;
    if (element.getTagName().equals("text")) {
      String text = element.getTextContent();
      if (text.codePointCount(0, text.length()) >= SHORT) {
        Font font = bold ? Palette.font(size).deriveFont(Font.BOLD) : Palette.font(size);
        element.setAttribute("textLength", String.format(Locale.ROOT, "%.1f", font.getStringBounds(text, PLAIN).getWidth()));
        element.setAttribute("lengthAdjust", "spacingAndGlyphs");
      }
      return;
    }
    for (Node node = element.getFirstChild(); node != null; node = node.getNextSibling()) {
      if (node instanceof Element inner) {
        fix(inner, size, bold);
      }
    }
  }

  private static float size(String text, float otherwise) {
    try {
      return Float.parseFloat(text.endsWith("px") ? text.substring(0, text.length() - 2) : text);
    } catch (NumberFormatException other) {
      return otherwise;
    }
  }
}
