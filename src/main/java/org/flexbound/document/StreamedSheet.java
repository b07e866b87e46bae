package org.flexbound.document;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.zip.ZipEntry;
import java.util.zip.ZipException;
import java.util.zip.ZipFile;
import org.apache.poi.xssf.model.SharedStrings;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Refusal;
import org.flexbound.finding.Where;
import org.jspecify.annotations.Nullable;

/** A sheet of an .xlsx workbook, read from the file anew for each visit. */
final class StreamedSheet implements Sheet {
  private final Path path;
  private final String file;
  private final String name;
  private final String part;
  private final boolean hidden;
  private final Shared shared;
  private final String stamp;
  private @Nullable SheetNotes notes;
  private @Nullable LimitedStream reading;
  private long size;

  /**
   * What the sheets of one workbook share.
   *
   * @param strings the shared texts
   * @param looks what each cell style makes of a number
   * @param from1904 whether days count from 1904
   * @param limits how much is read at most
   */
  record Shared(
      SharedStrings strings, List<CellFormats.Look> looks, boolean from1904, ReadLimits limits) {}

  StreamedSheet(Path path, String file, String name, String part, boolean hidden, Shared shared)
      throws IOException {
    this.path = path;
    this.file = file;
    this.name = name;
    this.part = part;
    this.hidden = hidden;
    this.shared = shared;
    this.stamp = stamp(path);
  }

  private static String stamp(Path path) throws IOException {
    return Files.size(path) + " bytes of " + Files.getLastModifiedTime(path);
  }

  @Override
  public String name() {
    return name;
  }

  @Override
  public Where where() {
    return Where.sheet(file, name);
  }

  @Override
  public Where cell(int row, int column) {
    return CellRow.place(file, name, row, column);
  }

  @Override
  public double shareRead() {
    LimitedStream stream = reading;
    return stream == null || size <= 0 ? 0 : (double) stream.count() / size;
  }

  @Override
  public SheetNotes notes() {
    SheetNotes known = notes;
    if (known != null) {
      return known;
    }
    forEachRow(row -> true);
    return notes == null ? SheetNotes.NONE : notes;
  }

  @Override
  public void forEachRow(RowVisitor visitor) {
    CellRow row = new CellRow(file, name, shared.from1904());
    SheetHandler handler =
        new SheetHandler(row, shared.strings(), shared.looks(), shared.limits(), visitor);
    try (ZipFile zip = zip();
        LimitedStream in =
            new LimitedStream(
                zip.getInputStream(entry(zip)),
                shared.limits().inflatedBytes(),
                "inflated-bytes")) {
      reading = in;
      size = entry(zip).getSize();
      if (SheetXml.parse(in, handler)) {
        notes = handler.notes(hidden);
      }
    } catch (SheetXml.Damaged damaged) {
      throw refusal(DocumentFinding.UNREADABLE, "the sheet is damaged: " + damaged.getMessage());
    } catch (LimitedStream.Passed passed) {
      throw refusal(DocumentFinding.LIMIT, WorkbookFile.words(passed));
    } catch (ZipException
        | java.io.EOFException
        | java.io.UnsupportedEncodingException
        | java.io.UTFDataFormatException damaged) {
      throw refusal(
          DocumentFinding.UNREADABLE,
          "the sheet is damaged or cut short (" + WorkbookFile.words(damaged) + ")");
    } catch (java.io.CharConversionException damaged) {
      throw refusal(DocumentFinding.UNREADABLE, "the sheet holds bytes that are not text");
    } catch (IOException refused) {
      throw new UncheckedIOException(refused);
    } catch (RuntimeException fault) {
      if (handler.isVisiting() || fault instanceof Refusal) {
        throw fault;
      }
      throw refusal(DocumentFinding.UNREADABLE, "the sheet is damaged: its XML cannot be read");
    }
  }

  private ZipFile zip() throws IOException {
    if (!stamp(path).equals(stamp)) {
      throw refusal(
          DocumentFinding.UNREADABLE, "the file was saved anew while it was being read");
    }
    return new ZipFile(path.toFile());
  }

  private ZipEntry entry(ZipFile zip) {
    ZipEntry entry = zip.getEntry(part);
    if (entry != null) {
      return entry;
    }
    return zip.stream()
        .map(ZipEntry.class::cast)
        .filter(other -> other.getName().replace('\\', '/').equalsIgnoreCase(part))
        .findFirst()
        .orElseThrow(
            () -> refusal(DocumentFinding.UNREADABLE, "the sheet's part is not in the file"));
  }

  private Refusal refusal(DocumentFinding kind, String message) {
    return new Refusal(List.of(new Finding(kind, where(), message)));
  }
}
