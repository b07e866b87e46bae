package org.flexbound.app;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.FileSystemException;
import java.nio.file.NotDirectoryException;

/** Says in plain words why the system would not read or write. */
final class SystemMessage {
  private SystemMessage() {}

  static String of(Exception problem) {
    if (problem instanceof UncheckedIOException && problem.getCause() instanceof IOException cause) {
      String stated = problem.getMessage();
      boolean saysMore = stated != null && !stated.equals(cause.toString());
      return saysMore ? stated + " (" + of(cause) + ")" : of(cause);
    }
    if (problem instanceof AccessDeniedException denied) {
      return denied.getFile() + ": the system allows no access; check the permissions";
    }
    if (problem instanceof NotDirectoryException notDirectory) {
      return notDirectory.getFile() + " is not a folder";
    }
    if (problem instanceof FileSystemException file) {
      String reason = file.getReason() == null ? "the system refused" : file.getReason();
      return file.getFile() + ": " + reason;
    }
    String message = problem.getMessage();
    return message == null ? "the system would not read or write" : message;
  }
}
