package org.flexbound.document;

import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** A workbook or a CSV file: named sheets in order. Close it to give its file back. */
public interface SheetFile extends AutoCloseable {
  /**
   * The file's name as the user gave it.
   *
   * @return the name
   */
  String name();

  /**
   * The sheets, in the order of the file, hidden ones included.
   *
   * @return the sheets
   */
  List<Sheet> sheets();

  /**
   * A sheet by its name, upper and lower case alike.
   *
   * @param name the name
   * @return the sheet, if there is one
   */
  default Optional<Sheet> sheet(String name) {
    String wanted = name.strip().toLowerCase(Locale.ROOT);
    return sheets().stream()
        .filter(sheet -> sheet.name().strip().toLowerCase(Locale.ROOT).equals(wanted))
        .findFirst();
  }

  @Override
  void close();
}
