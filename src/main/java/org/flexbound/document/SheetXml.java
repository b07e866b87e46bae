package org.flexbound.document;

import java.io.IOException;
import java.io.InputStream;
import javax.xml.XMLConstants;
import javax.xml.parsers.ParserConfigurationException;
import javax.xml.parsers.SAXParser;
import javax.xml.parsers.SAXParserFactory;
import org.xml.sax.SAXException;
import org.xml.sax.SAXParseException;
import org.xml.sax.helpers.DefaultHandler;

/** Parses one XML part of a workbook with everything that reaches outside it switched off. */
final class SheetXml {
  private SheetXml() {}

  /** Stops a parse that has seen enough; never leaves this room. */
  static final class Enough extends SAXException {
    private static final long serialVersionUID = 1L;

    @Override
    public synchronized Throwable fillInStackTrace() {
      return this;
    }
  }

  /** The XML is not what it must be; the message says how. */
  static final class Damaged extends SAXException {
    private static final long serialVersionUID = 1L;

    Damaged(String message) {
      super(message);
    }
  }

  /**
   * Parses to the end, or until the handler has seen enough.
   *
   * @return true if the end was reached
   * @throws Damaged where it is not well-formed or declares a document type
   */
  static boolean parse(InputStream in, DefaultHandler handler) throws IOException, Damaged {
    try {
      SAXParserFactory factory = SAXParserFactory.newDefaultInstance();
      factory.setFeature(XMLConstants.FEATURE_SECURE_PROCESSING, true);
      factory.setFeature("http://apache.org/xml/features/disallow-doctype-decl", true);
      factory.setFeature("http://xml.org/sax/features/external-general-entities", false);
      factory.setFeature("http://xml.org/sax/features/external-parameter-entities", false);
      SAXParser parser = factory.newSAXParser();
      parser.parse(in, handler);
      return true;
    } catch (Enough enough) {
      return false;
    } catch (Damaged damaged) {
      throw damaged;
    } catch (SheetHandler.LimitPassed passed) {
      throw new LimitedStream.Passed(String.valueOf(passed.getMessage()));
    } catch (SAXParseException broken) {
      throw new Damaged(
          String.valueOf(broken.getMessage()).contains("DOCTYPE")
              ? "its XML declares a document type, which a workbook never does"
              : "its XML breaks off or is not well-formed at line "
                  + broken.getLineNumber()
                  + ", column "
                  + broken.getColumnNumber());
    } catch (SAXException broken) {
      throw new Damaged("its XML cannot be read (" + broken.getMessage() + ")");
    } catch (ParserConfigurationException impossible) {
      throw new IllegalStateException("every Java platform has a SAX parser", impossible);
    }
  }

  /** An element's name without its prefix. */
  static String local(String qualified) {
    int colon = qualified.indexOf(':');
    return colon < 0 ? qualified : qualified.substring(colon + 1);
  }
}
