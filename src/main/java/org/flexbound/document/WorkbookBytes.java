package org.flexbound.document;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.time.Instant;
import java.time.LocalDateTime;
import java.util.Date;
import java.util.Optional;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;
import java.util.zip.ZipOutputStream;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;

/** The bytes of a workbook, free of the clock: the same content gives the same bytes. */
public final class WorkbookBytes {
  private static final LocalDateTime NO_TIME = LocalDateTime.of(1980, 1, 1, 0, 0);

  private WorkbookBytes() {}

  /**
   * Packs a workbook; its date of creation and those of its parts are fixed ones.
   *
   * @param workbook the workbook, not closed here
   * @return the bytes of the .xlsx file
   */
  public static byte[] of(XSSFWorkbook workbook) {
    workbook.getProperties().getCoreProperties().setCreated(Optional.of(Date.from(Instant.EPOCH)));
    ByteArrayOutputStream raw = new ByteArrayOutputStream();
    ByteArrayOutputStream steady = new ByteArrayOutputStream();
    try {
      workbook.write(raw);
      try (ZipInputStream in = new ZipInputStream(new ByteArrayInputStream(raw.toByteArray()));
          ZipOutputStream out = new ZipOutputStream(steady)) {
        for (ZipEntry part = in.getNextEntry(); part != null; part = in.getNextEntry()) {
          ZipEntry copy = new ZipEntry(part.getName());
          copy.setTimeLocal(NO_TIME);
          out.putNextEntry(copy);
          in.transferTo(out);
          out.closeEntry();
        }
      }
    } catch (IOException impossible) {
      throw new UncheckedIOException("the workbook could not be put together", impossible);
    }
    return steady.toByteArray();
  }
}
