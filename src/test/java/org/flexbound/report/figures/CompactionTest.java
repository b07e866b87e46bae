package org.flexbound.report.figures;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.StringReader;
import java.io.StringWriter;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.transform.OutputKeys;
import javax.xml.transform.Transformer;
import javax.xml.transform.TransformerFactory;
import javax.xml.transform.dom.DOMSource;
import javax.xml.transform.stream.StreamResult;
import org.junit.jupiter.api.Test;
import org.w3c.dom.Document;
import org.xml.sax.InputSource;

/** Fewer characters, the same picture. */
class CompactionTest {
  private static String compact(String inner) throws Exception {
    DocumentBuilderFactory factory = DocumentBuilderFactory.newInstance();
    factory.setNamespaceAware(true);
    Document document = factory.newDocumentBuilder().parse(new InputSource(new StringReader("<svg>" + inner + "</svg>")));
    Compaction.compact(document.getDocumentElement());
    Transformer writer = TransformerFactory.newInstance().newTransformer();
    writer.setOutputProperty(OutputKeys.OMIT_XML_DECLARATION, "yes");
    StringWriter text = new StringWriter();
    writer.transform(new DOMSource(document), new StreamResult(text));
    return text.toString();
  }

  @Test
  void anAreaAndItsOutlineBecomeOnePath() throws Exception {
    assertThat(compact("<path d=\"M0 0 L2 0 L2 2 Z\" fill=\"rgb(0,114,178)\" stroke=\"none\"/>"
        + "<path d=\"M0 0 L2 0 L2 2 Z\" fill=\"none\" stroke=\"rgb(0,0,0)\" stroke-width=\"0.8\"/>"))
        .isEqualTo("<svg><path d=\"M0 0H2V2z\" fill=\"#0072b2\" stroke=\"#000000\" stroke-width=\"0.8\"/></svg>");
  }

  @Test
  void anOutlineOfSomethingElseStaysApart() throws Exception {
    assertThat(compact("<path d=\"M0 0 L2 0\" fill=\"red\" stroke=\"none\"/><path d=\"M0 0 L3 0\" fill=\"none\" stroke=\"blue\"/>"))
        .isEqualTo("<svg><path d=\"M0 0H2\" fill=\"red\" stroke=\"none\"/><path d=\"M0 0H3\" fill=\"none\" stroke=\"blue\"/></svg>");
  }

  @Test
  void ticksOfOneLookBecomeOnePathAcrossTheirLetters() throws Exception {
    assertThat(compact("<line stroke=\"red\" x1=\"1\" x2=\"1\" y1=\"5\" y2=\"7.25\"/><text>1</text>"
        + "<line stroke=\"red\" x1=\"2\" x2=\"3\" y1=\"5\" y2=\"7\"/><rect/><line stroke=\"red\" x1=\"9\" x2=\"9\" y1=\"5\" y2=\"7\"/>"))
        .isEqualTo("<svg><path d=\"M1 5V7.3M2 5L3 7\" stroke=\"red\"/><text>1</text><rect/><path d=\"M9 5V7\" stroke=\"red\"/></svg>");
  }

  @Test
  void aCircleOfFourCurvesBecomesTwoArcsAndAnythingElseStays() throws Exception {
    String circle = "M4 2 C4 3.1 3.1 4 2 4 C0.9 4 0 3.1 0 2 C0 0.9 0.9 0 2 0 C3.1 0 4 0.9 4 2 Z";
    String ellipse = "M4 2 C4 3.1 3.1 9 2 9 C0.9 9 0 3.1 0 2 C0 0.9 0.9 0 2 0 C3.1 0 4 0.9 4 2 Z";
    assertThat(compact("<path d=\"" + circle + "\"/>")).contains("d=\"M4 2a2 2 0 1 0-4 0a2 2 0 1 0 4 0z\"");
    assertThat(compact("<path d=\"" + ellipse + "\"/>")).contains("C4 3.1 3.1 9 2 9");
  }
}
