package org.flexbound.app;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.document.OutputFolder;
import org.flexbound.testlog.ExampleWorkbook;
import org.flexbound.testlog.TemplateWorkbook;

/** Writes the files to start from. */
final class Templates {
  private static final List<String> RESOURCES = List.of(
          "frame-model.json",
          "study.json",
          "log-description.json",
          "logger-mid.csv",
          "logger-tip.csv");

  private final Terminal terminal;

  Templates(Terminal terminal) {
    this.terminal = terminal;
  }

  ExitCode write(Path folder) {
    OutputFolder outputs = new OutputFolder(folder);
    boolean any = false;
    for (Map.Entry<String, byte[]> file : files().entrySet()) {
      Path target = folder.resolve(file.getKey());
      if (Files.exists(target)) {
        terminal.out().println("  " + PlainText.of(target + " is there already; left as it is"));
      } else {
        outputs.add(file.getKey(), file.getValue());
        any = true;
      }
    }
    if (any) {
      outputs.write().forEach(p -> terminal.out().println("  " + PlainText.of(p + " written")));
    }
    terminal
        .out()
        .println(
            "Fill in load-test-log.xlsx, or see how it works on the example:"
                + System.lineSeparator()
                + "  flexbound update "
                + PlainText.of(folder.resolve("study.json").toString()));
    return ExitCode.DONE;
  }

  private static Map<String, byte[]> files() {
    Map<String, byte[]> files = new LinkedHashMap<>();
    files.put("load-test-log.xlsx", bytes(TemplateWorkbook::write));
    files.put("example-log.xlsx", bytes(ExampleWorkbook::write));
    for (String name : RESOURCES) {
      files.put(name, resource("/templates/" + name));
    }
    return files;
  }

  /** Writes a workbook. */
  @FunctionalInterface
  private interface Writer {
    void write(OutputStream out) throws IOException;
  }

  private static byte[] bytes(Writer writer) {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try {
      writer.write(bytes);
    } catch (IOException impossible) {
      throw new UncheckedIOException(impossible);
    }
    return bytes.toByteArray();
  }

  private static byte[] resource(String path) {
    try (InputStream stream = Templates.class.getResourceAsStream(path);
        ByteArrayOutputStream bytes = new ByteArrayOutputStream()) {
      if (stream == null) {
        throw new IllegalStateException("the program's file " + path + " is missing");
      }
      stream.transferTo(bytes);
      return bytes.toByteArray();
    } catch (IOException unreadable) {
      throw new UncheckedIOException(unreadable);
    }
  }
}
