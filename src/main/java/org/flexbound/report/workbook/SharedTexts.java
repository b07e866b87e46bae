package org.flexbound.report.workbook;

import java.util.HashMap;
import java.util.Map;
import org.apache.poi.xssf.model.SharedStringsTable;
import org.apache.poi.xssf.usermodel.XSSFCell;
import org.apache.poi.xssf.usermodel.XSSFRichTextString;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;
import org.openxmlformats.schemas.spreadsheetml.x2006.main.STCellType;

/**
 * Writes texts into cells, each distinct text once into the workbook's table. The library turns a text into XML every time it is used; with the
 * names of gauges and runs in every row of readings that took most of the time of a large workbook.
 */
final class SharedTexts {
  private final SharedStringsTable table;
  private final Map<String, String> places = new HashMap<>();

  SharedTexts(XSSFWorkbook workbook) {
    table = workbook.getSharedStringSource();
  }

  /** Fills a cell with a text that the format can hold. */
  void fill(XSSFCell cell, String text) {
    String place = places.computeIfAbsent(text, t -> Integer.toString(table.addSharedStringItem(new XSSFRichTextString(t))));
    cell.getCTCell().setT(STCellType.S);
    cell.getCTCell().setV(place);
  }
}
