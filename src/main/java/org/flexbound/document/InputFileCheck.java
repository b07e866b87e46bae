package org.flexbound.document;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;

/** Looks at a file before it is read: is it there, is it a file, what do its first bytes say. */
final class InputFileCheck {
  private InputFileCheck() {}

  /** What the first bytes of a file say it is. */
  enum Kind {
    /** A zip archive, as an .xlsx workbook is. */
    ZIP("a zip archive"),
    /** An OLE2 compound file: an .xls workbook, or an encrypted .xlsx. */
    COMPOUND("a compound file"),
    /** A PDF. */
    PDF("a PDF"),
    /** A picture. */
    PICTURE("a picture"),
    /** Text: printable bytes only. */
    TEXT("text"),
    /** None of these. */
    OTHER("bytes that are neither text nor a workbook");

    private final String words;

    Kind(String words) {
      this.words = words;
    }

    String words() {
      return words;
    }
  }

  /**
   * The kind of a file that is there and not empty.
   *
   * @param expected what is expected, with its article, for the message
   * @return the kind; empty, with a finding, where there is nothing to read
   * @throws UncheckedIOException where the system does not let it be read
   */
  static Optional<Kind> kind(Path file, String shownName, String expected, Findings findings) {
    Where whole = Where.file(shownName);
    if (!Files.exists(file)) {
      findings.add(DocumentFinding.MISSING, whole, "there is no such file; expected " + expected);
      return Optional.empty();
    }
    if (Files.isDirectory(file)) {
      findings.add(DocumentFinding.UNREADABLE, whole, "found a folder; expected " + expected);
      return Optional.empty();
    }
    if (!Files.isRegularFile(file)) {
      findings.add(
          DocumentFinding.UNREADABLE,
          whole,
          "found a device or a pipe, not a file; expected " + expected);
      return Optional.empty();
    }
    if (!Files.isReadable(file)) {
      throw new UncheckedIOException(new AccessDeniedException(file.toString()));
    }
    byte[] head;
    try (InputStream in = Files.newInputStream(file)) {
      head = in.readNBytes(4096);
    } catch (IOException refused) {
      throw new UncheckedIOException(refused);
    }
    if (head.length == 0) {
      findings.add(
          DocumentFinding.UNREADABLE, whole, "the file is empty (0 bytes); expected " + expected);
      return Optional.empty();
    }
    return Optional.of(kind(head));
  }

  private static Kind kind(byte[] head) {
    if (begins(head, 'P', 'K', 3, 4) || begins(head, 'P', 'K', 5, 6)) {
      return Kind.ZIP;
    }
    if (begins(head, 0xD0, 0xCF, 0x11, 0xE0)) {
      return Kind.COMPOUND;
    }
    if (begins(head, '%', 'P', 'D', 'F')) {
      return Kind.PDF;
    }
    if (begins(head, 0x89, 'P', 'N', 'G') || begins(head, 0xFF, 0xD8, 0xFF)) {
      return Kind.PICTURE;
    }
    boolean wide = begins(head, 0xFF, 0xFE) || begins(head, 0xFE, 0xFF);
    for (byte b : head) {
      if (!wide && b >= 0 && b < 32 && b != '\t' && b != '\n' && b != '\r' && b != '\f') {
        return Kind.OTHER;
      }
    }
    return Kind.TEXT;
  }

  private static boolean begins(byte[] head, int... bytes) {
    if (head.length < bytes.length) {
      return false;
    }
    for (int i = 0; i < bytes.length; i++) {
      if ((head[i] & 0xFF) != bytes[i]) {
        return false;
      }
    }
    return true;
  }
}
