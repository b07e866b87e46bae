package org.flexbound.report.figures;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.w3c.dom.Element;
import org.w3c.dom.NamedNodeMap;
import org.w3c.dom.Node;

/**
 * Says in fewer characters what a drawing shows: a page may hold hundreds of figures. A marker's area and outline become one path, marks and
 * ticks of one look become one path, circles become arcs, and coordinates keep a tenth of a pixel.
 */
final class Compaction {
  private static final Pattern CIRCLE = Pattern.compile("M([-0-9.]+) ([-0-9.]+)((?: C[-0-9.]+(?: [-0-9.]+){5}){4}) Z");
  private static final Pattern NUMBER = Pattern.compile("-?[0-9]+\\.[0-9]+");
  private static final Pattern COLOUR = Pattern.compile("rgb\\(([0-9]+),([0-9]+),([0-9]+)\\)");
  private static final Pattern STEP = Pattern.compile("([MLz])(?:([-0-9.]+) ([-0-9.]+))?");
  private static final double SAME = 0.03;

  private Compaction() {}

  /** Compacts an element and all in it. */
  static void compact(Element parent) {
    List<Element> children = children(parent);
    for (Element child : children) {
      compact(child);
      colours(child);
      if (child.getTagName().equals("line")) {
        asPath(child);
      } else if (child.getTagName().equals("text")) {
        letters(child);
      } else if (child.getTagName().equals("path")) {
        child.setAttribute("d", straight(tenths(circles(child.getAttribute("d")))));
      }
    }
    if (!parent.getTagName().equals("clipPath")) {
      areasWithOutlines(parent);
      marksOfOneLook(parent);
    }
  }

  private static List<Element> children(Element parent) {
    List<Element> children = new ArrayList<>();
    for (Node node = parent.getFirstChild(); node != null; node = node.getNextSibling()) {
      if (node instanceof Element element) {
        children.add(element);
      }
    }
    return children;
  }

  private static void colours(Element element) {
    for (String name : List.of("fill", "stroke")) {
      Matcher colour = COLOUR.matcher(element.getAttribute(name));
      if (colour.matches()) {
        element.setAttribute(name, String.format(Locale.ROOT, "#%02x%02x%02x", Integer.valueOf(colour.group(1)),
            Integer.valueOf(colour.group(2)), Integer.valueOf(colour.group(3))));
      }
    }
  }

  /** Letters without outline need no width of one; charts keep their letters inside by themselves. */
  private static void letters(Element text) {
    if (text.getAttribute("stroke").equals("none")) {
      text.removeAttribute("stroke-width");
    }
    text.removeAttribute("clip-path");
  }

  private static void asPath(Element line) {
    Element path = line.getOwnerDocument().createElementNS(line.getNamespaceURI(), "path");
    look(line).forEach((name, value) -> {
      if (!List.of("x1", "y1", "x2", "y2").contains(name)) {
        path.setAttribute(name, value);
      }
    });
    path.setAttribute("d", straight(tenths("M" + line.getAttribute("x1") + " " + line.getAttribute("y1") + "L" + line.getAttribute("x2") + " "
        + line.getAttribute("y2"))));
    line.getParentNode().replaceChild(path, line);
  }

  /** An area without outline, followed by the outline of the same area, is one path. */
  private static void areasWithOutlines(Element parent) {
    Element area = null;
    for (Element child : children(parent)) {
      if (area != null && isOutlineOf(area, child)) {
        if (area.hasAttribute("fill")) {
          child.setAttribute("fill", area.getAttribute("fill"));
        } else {
          child.removeAttribute("fill");
        }
        parent.removeChild(area);
        area = null;
      } else {
        area = child.getTagName().equals("path") && child.getAttribute("stroke").equals("none") ? child : null;
      }
    }
  }

  private static boolean isOutlineOf(Element area, Element other) {
    if (!other.getTagName().equals("path") || !other.getAttribute("fill").equals("none")
        || !other.getAttribute("d").equals(area.getAttribute("d"))) {
      return false;
    }
    Map<String, String> first = look(area);
    Map<String, String> second = look(other);
    first.keySet().removeIf(name -> name.startsWith("stroke") || name.equals("fill"));
    second.keySet().removeIf(name -> name.startsWith("stroke") || name.equals("fill"));
    return first.equals(second);
  }

  /** Paths of one look that follow each other, letters between them not counted, are one path. */
  private static void marksOfOneLook(Element parent) {
    Element last = null;
    for (Element child : children(parent)) {
      if (child.getTagName().equals("text")) {
        continue;
      }
      if (!child.getTagName().equals("path")) {
        last = null;
        continue;
      }
      if (last != null && look(last, "d").equals(look(child, "d"))) {
        last.setAttribute("d", last.getAttribute("d") + child.getAttribute("d"));
        parent.removeChild(child);
      } else {
        last = child;
      }
    }
  }

  private static Map<String, String> look(Element element, String... without) {
    Map<String, String> look = new TreeMap<>();
    NamedNodeMap attributes = element.getAttributes();
    for (int k = 0; k < attributes.getLength(); k++) {
      look.put(attributes.item(k).getNodeName(), attributes.item(k).getNodeValue());
    }
    for (String name : without) {
      look.remove(name);
    }
    return look;
  }

  /** Circles drawn as four Bézier curves become two arcs. */
  private static String circles(String path) {
    Matcher circle = CIRCLE.matcher(path);
    StringBuilder result = new StringBuilder();
    while (circle.find()) {
      double x = Double.parseDouble(circle.group(1));
      double y = Double.parseDouble(circle.group(2));
      String[] numbers = circle.group(3).replace("C", " ").strip().split("\\s+", -1);
      double quarterX = Double.parseDouble(numbers[4]);
      double quarterY = Double.parseDouble(numbers[5]);
      double oppositeX = Double.parseDouble(numbers[10]);
      double oppositeY = Double.parseDouble(numbers[11]);
      double radius = (x - oppositeX) / 2;
      boolean round = radius > 0 && Math.abs(oppositeY - y) < SAME && Math.abs(x - radius - quarterX) < SAME
          && Math.abs(Math.abs(quarterY - y) - radius) < SAME;
      String arcs = String.format(Locale.ROOT, "M%s %sa%.2f %.2f 0 1 0%.2f 0a%.2f %.2f 0 1 0 %.2f 0z", circle.group(1), circle.group(2),
          radius, radius, -2 * radius, radius, radius, 2 * radius);
      circle.appendReplacement(result, Matcher.quoteReplacement(round ? arcs : circle.group()));
    }
    return circle.appendTail(result).toString();
  }

  /** Level and upright strokes by their length; a stroke back to the start of a closed figure is what closing draws. */
  private static String straight(String path) {
    if (path.indexOf('C') >= 0 || path.indexOf('Q') >= 0 || path.indexOf('a') >= 0) {
      return path;
    }
    StringBuilder result = new StringBuilder();
    String startX = "";
    String startY = "";
    String x = "";
    String y = "";
    Matcher step = STEP.matcher(path);
    int end = 0;
    while (step.find()) {
      if (step.start() != end) {
        return path;
      }
      end = step.end();
      if (step.group(1).equals("z")) {
        result.append('z');
        continue;
      }
      String nextX = step.group(2);
      String nextY = step.group(3);
      if (nextX == null || nextY == null) {
        return path;
      }
      boolean closes = nextX.equals(startX) && nextY.equals(startY) && path.startsWith("z", end);
      if (step.group(1).equals("M")) {
        result.append('M').append(nextX).append(' ').append(nextY);
        startX = nextX;
        startY = nextY;
      } else if (!closes) {
        if (nextY.equals(y)) {
          result.append('H').append(nextX);
        } else if (nextX.equals(x)) {
          result.append('V').append(nextY);
        } else {
          result.append('L').append(nextX).append(' ').append(nextY);
        }
      }
      x = nextX;
      y = nextY;
    }
    return end == path.length() ? result.toString() : path;
  }

  private static String tenths(String path) {
    Matcher number = NUMBER.matcher(path.replace(" L", "L").replace(" Z", "z").replace(" M", "M"));
    StringBuilder result = new StringBuilder();
    while (number.find()) {
      String rounded = String.format(Locale.ROOT, "%.1f", Double.parseDouble(number.group()));
      number.appendReplacement(result, rounded.endsWith(".0") ? rounded.substring(0, rounded.length() - 2) : rounded);
    }
    return number.appendTail(result).toString();
  }
}
