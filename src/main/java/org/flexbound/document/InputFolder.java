package org.flexbound.document;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.Optional;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;

/**
 * The folder of a file that names others: whatever it names must lie within, links followed, so that
 * a file from elsewhere cannot make the program read what was not handed over with it.
 */
public final class InputFolder {
  private final Path folder;
  private final String shown;

  private InputFolder(Path folder, String shown) {
    this.folder = folder;
    this.shown = shown;
  }

  /**
   * The folder in which a file lies.
   *
   * @param file the file that names others
   * @param shownName its name in messages
   * @return its folder
   */
  public static InputFolder of(Path file, String shownName) {
    Path parent = file.toAbsolutePath().getParent();
    int slash = Math.max(shownName.lastIndexOf('/'), shownName.lastIndexOf('\\'));
    return new InputFolder(
        parent == null ? file.toAbsolutePath() : parent,
        slash < 0 ? "" : shownName.substring(0, slash + 1));
  }

  /**
   * A file's name in messages and results: as the naming file's own, with what it says.
   *
   * @param name the name that was found
   * @return the shown name
   */
  public String shown(String name) {
    return shown + name;
  }

  /**
   * Finds a file by the name that another file gives it. Whether it exists is left to its reader.
   *
   * @param name the name that was found, relative to the folder
   * @param where the place of the name
   * @param findings gets what is wrong with the name
   * @return the path; empty where it is not one within the folder
   */
  public Optional<Path> resolve(String name, Where where, Findings findings) {
    Path path;
    try {
      path = Path.of(name);
    } catch (InvalidPathException impossible) {
      findings.add(
          DocumentFinding.OUTSIDE_FOLDER, where, "found '" + name + "', which names no file");
      return Optional.empty();
    }
    if (name.isBlank() || path.isAbsolute()) {
      findings.add(
          DocumentFinding.OUTSIDE_FOLDER,
          where,
          "found '" + name + "'; expected a name relative to the folder of this file");
      return Optional.empty();
    }
    Path file = folder.resolve(path).normalize();
    if (!file.startsWith(folder.normalize()) || leavesByLink(file)) {
      findings.add(
          DocumentFinding.OUTSIDE_FOLDER,
          where,
          "found '" + name + "', which lies outside the folder of this file");
      return Optional.empty();
    }
    return Optional.of(file);
  }

  private boolean leavesByLink(Path file) {
    try {
      return Files.exists(file) && !file.toRealPath().startsWith(folder.toRealPath());
    } catch (IOException refused) {
      throw new UncheckedIOException(refused);
    }
  }
}
