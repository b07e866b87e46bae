package org.flexbound.finding;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.net.URISyntaxException;
import java.nio.file.FileSystem;
import java.nio.file.FileSystems;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;

/**
 * Every kind of finding of every room, for the documentation and for the test that keeps the codes
 * unique.
 *
 * <p>A room takes part by its enum: one whose name ends in {@code Finding} and which implements
 * {@link FindingKind}.
 *
 * @param rooms the rooms in alphabetical order
 */
public record Catalogue(List<Room> rooms) {
  private static final String ROOT = "org/flexbound";

  /** Copies the list. */
  public Catalogue {
    rooms = List.copyOf(rooms);
  }

  /**
   * The kinds of one room.
   *
   * @param name the room's name
   * @param kinds its kinds, in the order of its enum
   */
  public record Room(String name, List<FindingKind> kinds) {
    /** Copies the list. */
    public Room {
      kinds = List.copyOf(kinds);
    }
  }

  /**
   * Looks through the program's own classes.
   *
   * @return all rooms that have kinds of findings
   */
  public static Catalogue ofTheProgram() {
    try {
      Path source =
          Path.of(Catalogue.class.getProtectionDomain().getCodeSource().getLocation().toURI());
      if (Files.isDirectory(source)) {
        return new Catalogue(rooms(source));
      }
      try (FileSystem jar = FileSystems.newFileSystem(source)) {
        return new Catalogue(rooms(jar.getPath("/")));
      }
    } catch (IOException refused) {
      throw new UncheckedIOException(refused);
    } catch (URISyntaxException impossible) {
      throw new IllegalStateException("the program's own place is a file", impossible);
    }
  }

  private static List<Room> rooms(Path top) throws IOException {
    List<Room> rooms = new ArrayList<>();
    try (Stream<Path> files = Files.walk(top.resolve(ROOT))) {
      for (Path file : files.filter(f -> f.toString().endsWith("Finding.class")).sorted().toList()) {
        String name =
            top.relativize(file).toString().replace('\\', '/').replace('/', '.');
        List<FindingKind> kinds = kinds(name.substring(0, name.length() - ".class".length()));
        if (!kinds.isEmpty()) {
          String[] parts = name.split("\\.", -1);
          rooms.add(new Room(parts[parts.length - 3], kinds));
        }
      }
    }
    return rooms;
  }

  private static List<FindingKind> kinds(String className) {
    List<FindingKind> kinds = new ArrayList<>();
    try {
      Object[] constants = Class.forName(className).getEnumConstants();
      for (Object constant : constants == null ? new Object[0] : constants) {
        if (constant instanceof FindingKind kind) {
          kinds.add(kind);
        }
      }
    } catch (ClassNotFoundException impossible) {
      throw new IllegalStateException("a class that lies here is not found", impossible);
    }
    return kinds;
  }

  /**
   * The page of the documentation that lists all kinds, as Markdown.
   *
   * @return a heading and a table for each room
   */
  public String page() {
    StringBuilder page = new StringBuilder("# Findings\n");
    for (Room room : rooms) {
      page.append("\n## ").append(room.name()).append("\n\n");
      page.append("| code | weight | meaning | what to do |\n| --- | --- | --- | --- |\n");
      for (FindingKind kind : room.kinds()) {
        page.append("| ")
            .append(kind.code())
            .append(" | ")
            .append(kind.severity().name().toLowerCase(java.util.Locale.ROOT))
            .append(" | ")
            .append(kind.meaning().replace("|", "\\|"))
            .append(" | ")
            .append(kind.remedy().replace("|", "\\|"))
            .append(" |\n");
      }
    }
    return page.toString();
  }
}
