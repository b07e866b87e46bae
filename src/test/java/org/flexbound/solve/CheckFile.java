package org.flexbound.solve;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.net.URISyntaxException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Objects;
import java.util.stream.Stream;
import org.flexbound.document.Json;
import org.flexbound.document.JsonFile;

/** The check files of one kind: published values with their source beside them. */
final class CheckFile {
  private CheckFile() {}

  /**
   * One case of a file.
   *
   * @param file the file
   * @param values the case
   */
  record Case(String file, Json.Members values) {
    Json part(String key) {
      return values
          .get(key)
          .orElseThrow(() -> new IllegalArgumentException(file + " lacks '" + key + "'"));
    }

    double number(String key) {
      return ((Json.Numeral) part(key)).value();
    }

    String text(String key) {
      return ((Json.Text) part(key)).text();
    }

    double[] numbers(String key) {
      return ((Json.Items) part(key))
          .items().stream().mapToDouble(item -> ((Json.Numeral) item).value()).toArray();
    }

    Stream<String[]> pairs(String key) {
      return ((Json.Items) part(key))
          .items().stream()
              .map(
                  item ->
                      ((Json.Items) item)
                          .items().stream()
                              .map(text -> ((Json.Text) text).text())
                              .toArray(String[]::new));
    }

    @Override
    public String toString() {
      return file + ": " + text("name");
    }
  }

  static Stream<Case> cases(String kind) {
    List<Path> files;
    try (Stream<Path> all = Files.list(folder())) {
      files = all.filter(path -> path.toString().endsWith(".json")).sorted().toList();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return files.stream()
        .flatMap(
            path -> {
              String name = String.valueOf(path.getFileName());
              Json json = JsonFile.read(path, name).orRefuse();
              if (!(json instanceof Json.Members members)
                  || !members
                      .get("kind")
                      .filter(k -> k instanceof Json.Text text && text.text().equals(kind))
                      .isPresent()) {
                return Stream.empty();
              }
              if (!(members.get("source").orElseThrow() instanceof Json.Text)) {
                throw new IllegalArgumentException(name + " has no source");
              }
              return ((Json.Items) members.get("cases").orElseThrow())
                  .items().stream().map(item -> new Case(name, (Json.Members) item));
            });
  }

  private static Path folder() {
    try {
      return Path.of(
          Objects.requireNonNull(CheckFile.class.getResource("/checks/handbook-beams.json"))
              .toURI())
          .getParent();
    } catch (URISyntaxException e) {
      throw new IllegalStateException(e);
    }
  }
}
