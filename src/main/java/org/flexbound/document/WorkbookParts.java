package org.flexbound.document;

import java.util.HashSet;
import java.util.Set;
import org.xml.sax.Attributes;
import org.xml.sax.helpers.DefaultHandler;

/** Reads off the workbook part which sheets are hidden, how days count, and links to other files. */
final class WorkbookParts extends DefaultHandler {
  private final Set<String> hidden = new HashSet<>();
  private boolean from1904;
  private boolean external;

  @Override
  public void startElement(String uri, String name, String qualified, Attributes attributes) {
    switch (SheetXml.local(qualified)) {
      case "sheet" -> {
        String state = attributes.getValue("state");
        if (state != null && !state.equals("visible")) {
          hidden.add(String.valueOf(attributes.getValue("name")));
        }
      }
      case "workbookPr" -> {
        String value = attributes.getValue("date1904");
        from1904 = value != null && (value.equals("1") || value.equals("true"));
      }
      case "externalReference" -> external = true;
      default -> {
        // views and the like
      }
    }
  }

  boolean isHidden(String sheet) {
    return hidden.contains(sheet);
  }

  boolean from1904() {
    return from1904;
  }

  boolean external() {
    return external;
  }
}
