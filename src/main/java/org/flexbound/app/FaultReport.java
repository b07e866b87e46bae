package org.flexbound.app;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/** What is kept of a fault of the program, for whoever mends it. */
final class FaultReport {
  private FaultReport() {}

  /**
   * Writes a report to a new file in the folder for temporary files.
   *
   * @param fault what went wrong
   * @param arguments the words of the command line
   * @return the file; empty where it could not be written
   */
  static Optional<Path> write(Throwable fault, List<String> arguments) {
    StringWriter text = new StringWriter();
    PrintWriter writer = new PrintWriter(text);
    writer.println("flexbound " + Version.NUMBER + ": a fault of the program");
    writer.println("Command: flexbound " + String.join(" ", arguments));
    writer.println("Java: " + Runtime.version());
    writer.println();
    fault.printStackTrace(writer);
    writer.flush();
    try {
      Path file = Files.createTempFile("flexbound-fault-", ".txt");
      Files.writeString(file, text.toString(), StandardCharsets.UTF_8);
      return Optional.of(file);
    } catch (IOException notWritten) {
      return Optional.empty();
    }
  }
}
