package org.flexbound.report.figures;

import java.awt.Dimension;
import java.awt.Shape;
import java.awt.geom.Rectangle2D;
import java.io.StringWriter;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.parsers.ParserConfigurationException;
import javax.xml.transform.OutputKeys;
import javax.xml.transform.Transformer;
import javax.xml.transform.TransformerException;
import javax.xml.transform.TransformerFactory;
import javax.xml.transform.dom.DOMSource;
import javax.xml.transform.stream.StreamResult;
import org.apache.batik.svggen.SVGGeneratorContext;
import org.apache.batik.svggen.SVGGraphics2D;
import org.apache.batik.svggen.SVGIDGenerator;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.Node;
import org.w3c.dom.NodeList;
import org.w3c.dom.Text;

/**
 * Turns what is drawn with Java 2D into one {@code svg} element that can stand in a page beside
 * others: its ids begin with the figure's, and it carries a title, a description and titles for
 * single points.
 */
final class Drawing {
  private static final String SVG = "http://www.w3.org/2000/svg";

  private static final List<String> DEFAULTS =
      List.of(
          "color-interpolation", "color-rendering", "image-rendering", "shape-rendering",
          "text-rendering", "stroke-dashoffset", "xml:space", "font-style");

  private final String id;
  private final int width;
  private final int height;
  private final List<Spot> spots = new ArrayList<>();

  /** A place with a text of its own. */
  private record Spot(double x, double y, String text) {}

  Drawing(String id, int width, int height) {
    this.id = id;
    this.width = width;
    this.height = height;
  }

  /** Draws on a canvas. */
  @FunctionalInterface
  interface Painter {
    void paint(SVGGraphics2D canvas, Rectangle2D area);
  }

  /** Gives a place a text that a reader sees when the pointer rests on it. */
  void spot(Shape shape, String text) {
    Rectangle2D box = shape.getBounds2D();
    spots.add(new Spot(box.getCenterX(), box.getCenterY(), text));
  }

  String draw(String title, String description, Painter painter) {
    SVGGeneratorContext context = SVGGeneratorContext.createDefault(document());
    context.setComment(null);
    context.setPrecision(2);
    context.setIDGenerator(
        new SVGIDGenerator() {
          @Override
          public String generateID(String prefix) {
            return id + "-" + super.generateID(prefix);
          }
        });
    SVGGraphics2D canvas = new SVGGraphics2D(context, false);
    canvas.setSVGCanvasSize(new Dimension(width, height));
    painter.paint(canvas, new Rectangle2D.Double(0, 0, width, height));
    Element root = canvas.getRoot();
    describe(root, title, description);
    trim(root);
    Compaction.compact(root);
    dropUnusedClips(root);
    TextWidths.fix(root);
    return write(root);
  }

  /** Takes out what says the same twice: a page may hold hundreds of figures. */
  private void trim(Element element) {
    if (element.getAttribute("clip-path").equals("url(#" + id + "-clipPath1)")) {
      // The first clip is the whole canvas, which the svg element clips to by itself.
      element.removeAttribute("clip-path");
    }
    for (String name : DEFAULTS) {
      element.removeAttribute(name);
    }
    if (element.getAttribute("font-family").equals("'" + Palette.FAMILY + "'")) {
      element.removeAttribute("font-family");
    }
    if (element.getAttribute("id").equals("genericDefs")) {
      element.removeAttribute("id");
    }
    Node child = element.getFirstChild();
    while (child != null) {
      Node next = child.getNextSibling();
      if (child instanceof Element inner) {
        trim(inner);
      } else if (child instanceof Text text) {
        text.setData(XmlText.clean(text.getData()));
      }
      child = next;
    }
  }

  private static void dropUnusedClips(Element root) {
    NodeList clips = root.getElementsByTagNameNS(SVG, "clipPath");
    Set<String> used = new HashSet<>();
    NodeList all = root.getElementsByTagNameNS(SVG, "*");
    for (int k = 0; k < all.getLength(); k++) {
      used.add(((Element) all.item(k)).getAttribute("clip-path"));
    }
    for (int k = clips.getLength() - 1; k >= 0; k--) {
      Element clip = (Element) clips.item(k);
      if (!used.contains("url(#" + clip.getAttribute("id") + ")")) {
        clip.getParentNode().removeChild(clip);
      }
    }
  }

  private static String write(Element root) {
    try {
      Transformer transformer = TransformerFactory.newInstance().newTransformer();
      transformer.setOutputProperty(OutputKeys.OMIT_XML_DECLARATION, "yes");
      StringWriter text = new StringWriter();
      transformer.transform(new DOMSource(root), new StreamResult(text));
      return text.toString().replace("\r\n", "\n");
    } catch (TransformerException impossible) {
      throw new IllegalStateException("a figure could not be written", impossible);
    }
  }

  private void describe(Element root, String title, String description) {
    Document document = root.getOwnerDocument();
    root.setAttribute("viewBox", "0 0 " + width + " " + height);
    root.setAttribute("role", "img");
    root.setAttribute("aria-labelledby", id + "-title " + id + "-desc");
    root.setAttribute("class", "figure");
    root.setAttribute("font-family", "'" + Palette.FAMILY + "', Arial, sans-serif");
    Element desc = element(document, "desc", description);
    desc.setAttribute("id", id + "-desc");
    root.insertBefore(desc, root.getFirstChild());
    Element heading = element(document, "title", title);
    heading.setAttribute("id", id + "-title");
    root.insertBefore(heading, root.getFirstChild());
    if (spots.isEmpty()) {
      return;
    }
    Element group = document.createElementNS(SVG, "g");
    group.setAttribute("class", "spots");
    group.setAttribute("fill", "#000");
    group.setAttribute("fill-opacity", "0");
    group.setAttribute("stroke", "none");
    for (Spot spot : spots) {
      Element circle = document.createElementNS(SVG, "circle");
      circle.setAttribute("cx", number(spot.x()));
      circle.setAttribute("cy", number(spot.y()));
      circle.setAttribute("r", "6");
      circle.appendChild(element(document, "title", spot.text()));
      group.appendChild(circle);
    }
    root.appendChild(group);
  }

  static String number(double value) {
    return String.format(Locale.ROOT, "%.1f", value);
  }

  private static Element element(Document document, String name, String text) {
    Element element = document.createElementNS(SVG, name);
    element.appendChild(document.createTextNode(XmlText.clean(text)));
    return element;
  }

  private static Document document() {
    try {
      return DocumentBuilderFactory.newInstance()
          .newDocumentBuilder()
          .getDOMImplementation()
          .createDocument(SVG, "svg", null);
    } catch (ParserConfigurationException impossible) {
      throw new IllegalStateException("the Java library has no XML documents", impossible);
    }
  }
}
