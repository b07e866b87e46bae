package org.flexbound.report.workbook;

import org.apache.poi.ss.usermodel.BorderStyle;
import org.apache.poi.ss.usermodel.FillPatternType;
import org.apache.poi.ss.usermodel.IndexedColors;
import org.apache.poi.ss.usermodel.VerticalAlignment;
import org.apache.poi.xssf.usermodel.XSSFCellStyle;
import org.apache.poi.xssf.usermodel.XSSFFont;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;

/** The cell styles of the workbook, and its texts. */
final class Styles {
  private final XSSFCellStyle header;
  private final XSSFCellStyle text;
  private final XSSFCellStyle count;
  private final XSSFCellStyle plain;
  private final XSSFCellStyle power;
  private final SharedTexts texts;

  Styles(XSSFWorkbook workbook) {
    texts = new SharedTexts(workbook);
    XSSFFont bold = workbook.createFont();
    bold.setBold(true);
    header = workbook.createCellStyle();
    header.setFont(bold);
    header.setWrapText(true);
    header.setVerticalAlignment(VerticalAlignment.BOTTOM);
    header.setFillForegroundColor(IndexedColors.GREY_25_PERCENT.getIndex());
    header.setFillPattern(FillPatternType.SOLID_FOREGROUND);
    header.setBorderBottom(BorderStyle.MEDIUM);
    text = workbook.createCellStyle();
    // A text that begins with =, +, - or @ stays a text also when somebody edits the cell.
    text.setQuotePrefixed(true);
    text.setDataFormat(workbook.createDataFormat().getFormat("@"));
    text.setVerticalAlignment(VerticalAlignment.TOP);
    count = workbook.createCellStyle();
    count.setDataFormat(workbook.createDataFormat().getFormat("0"));
    plain = workbook.createCellStyle();
    plain.setDataFormat(workbook.createDataFormat().getFormat("0.00000"));
    power = workbook.createCellStyle();
    power.setDataFormat(workbook.createDataFormat().getFormat("0.0000E+00"));
  }

  SharedTexts texts() {
    return texts;
  }

  XSSFCellStyle header() {
    return header;
  }

  XSSFCellStyle text() {
    return text;
  }

  XSSFCellStyle count() {
    return count;
  }

  /** Decimals where they show the number well, a power of ten where not. */
  XSSFCellStyle number(double value) {
    double size = Math.abs(value);
    return size == 0 || (size >= 1e-2 && size < 1e6) ? plain : power;
  }
}
