package org.flexbound.document;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.apache.poi.ss.usermodel.BuiltinFormats;
import org.apache.poi.ss.usermodel.DateUtil;
import org.xml.sax.Attributes;
import org.xml.sax.helpers.DefaultHandler;

/** Reads off a workbook's styles which cell formats show dates and which percentages. */
final class CellFormats extends DefaultHandler {
  private final Map<Integer, String> ownFormats = new HashMap<>();
  private final List<Integer> formatOfStyle = new ArrayList<>();
  private boolean inCellStyles;

  /** What a format makes of a number. */
  enum Look {
    PLAIN,
    DATE,
    PERCENT
  }

  @Override
  public void startElement(String uri, String name, String qualified, Attributes attributes) {
    switch (SheetXml.local(qualified)) {
      case "numFmt" ->
          ownFormats.put(
              whole(attributes.getValue("numFmtId")),
              String.valueOf(attributes.getValue("formatCode")));
      case "cellXfs" -> inCellStyles = true;
      case "xf" -> {
        if (inCellStyles) {
          formatOfStyle.add(whole(attributes.getValue("numFmtId")));
        }
      }
      default -> {
        // fonts, borders and the like say nothing about numbers
      }
    }
  }

  @Override
  public void endElement(String uri, String name, String qualified) {
    if (SheetXml.local(qualified).equals("cellXfs")) {
      inCellStyles = false;
    }
  }

  /** The look of each style, by its index. */
  List<Look> looks() {
    return formatOfStyle.stream().map(this::look).toList();
  }

  private Look look(int format) {
    String code = ownFormats.get(format);
    if (code == null && format >= 0 && format < BuiltinFormats.FIRST_USER_DEFINED_FORMAT_INDEX) {
      code = BuiltinFormats.getBuiltinFormat(format);
    }
    if (code == null) {
      return Look.PLAIN;
    }
    if (DateUtil.isADateFormat(format, code)) {
      return Look.DATE;
    }
    return code.replaceAll("\"[^\"]*\"|\\\\.", "").indexOf('%') >= 0 ? Look.PERCENT : Look.PLAIN;
  }

  private static int whole(@org.jspecify.annotations.Nullable String text) {
    try {
      return text == null ? 0 : Integer.parseInt(text);
    } catch (NumberFormatException notWhole) {
      return 0;
    }
  }
}
