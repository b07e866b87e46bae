package org.flexbound.app;

import java.io.PrintWriter;
import java.io.UncheckedIOException;
import java.nio.file.Path;
import java.time.LocalTime;
import java.time.format.DateTimeFormatter;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.function.Supplier;
import java.util.stream.Collectors;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Refusal;
import org.flexbound.finding.Severity;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.Run;

/**
 * Reduces a log again whenever one of its files is saved, and says what changed.
 *
 * <p>A file that cannot be read right after a save may be only half written: it is tried again a few
 * times before anything is said.
 */
final class ReductionWatch {
  private static final int TRIES = 5;
  private static final DateTimeFormatter CLOCK =
      DateTimeFormatter.ofPattern("HH:mm:ss", Locale.ROOT);

  private final Terminal terminal;
  private final Work work;
  private final Path log;
  private final OutputOptions output;
  private final SaveEvents saves;
  private final Supplier<LocalTime> clock;
  private final Runnable pause;
  private Optional<Results> last = Optional.empty();
  private Set<Path> files;

  /**
   * A watch.
   *
   * @param clock the time of day, to tell one answer from the next
   * @param pause waits a moment before a file that could not be read is tried again
   */
  ReductionWatch(
      Terminal terminal,
      Work work,
      Path log,
      OutputOptions output,
      SaveEvents saves,
      Supplier<LocalTime> clock,
      Runnable pause) {
    this.terminal = terminal;
    this.work = work;
    this.log = log.toAbsolutePath().normalize();
    this.output = output;
    this.saves = saves;
    this.clock = clock;
    this.pause = pause;
    this.files = Set.of(this.log);
  }

  /** Goes on until the saves end. */
  ExitCode run() {
    ExitCode code = once();
    PrintWriter out = terminal.out();
    do {
      out.println();
      out.println(
          "Watching "
              + files.stream()
                  .map(file -> PlainText.of(String.valueOf(file.getFileName())))
                  .collect(Collectors.joining(", "))
              + "; Ctrl-C ends.");
      out.flush();
      if (!saves.await(files)) {
        return code;
      }
      code = once();
    } while (true);
  }

  private ExitCode once() {
    for (int attempt = 1; ; attempt++) {
      try {
        Results results = work.reduced(log);
        files = files(results);
        show(results);
        last = Optional.of(results);
        return ExitCode.DONE;
      } catch (Refusal refusal) {
        files = files(refusal.findings());
        if (attempt < TRIES && mayBeHalfWritten(refusal.findings())) {
          pause.run();
          continue;
        }
        heading();
        new FindingList(terminal).refusal(refusal.findings());
        terminal.err().flush();
        return ExitCode.REFUSED;
      } catch (UncheckedIOException refused) {
        if (attempt < TRIES) {
          pause.run();
          continue;
        }
        heading();
        terminal
            .err()
            .println(terminal.bad("flexbound: ") + PlainText.of(SystemMessage.of(refused)));
        terminal.err().flush();
        return ExitCode.SYSTEM;
      }
    }
  }

  /** Whether what stands in the way is of the kind that a save in progress leaves behind. */
  private static boolean mayBeHalfWritten(List<Finding> findings) {
    return findings.stream()
        .filter(finding -> finding.severity() == Severity.ERROR)
        .allMatch(
            finding ->
                finding.code().equals("DOC-UNREADABLE")
                    || finding.code().equals("DOC-MISSING")
                    || finding.code().equals("DOC-JSON-SYNTAX"));
  }

  /** The log and the files that it names. */
  private Set<Path> files(Results results) {
    Set<Path> found = new LinkedHashSet<>();
    found.add(log);
    results
        .inputs()
        .forEach(input -> found.add(log.resolveSibling(input.file()).normalize()));
    return found;
  }

  /** The files watched so far, and those that something is wrong with. */
  private Set<Path> files(List<Finding> findings) {
    Set<Path> found = new LinkedHashSet<>(files);
    findings.stream()
        .flatMap(finding -> finding.where().file().stream())
        .forEach(name -> found.add(log.resolveSibling(name).normalize()));
    return found;
  }

  private void heading() {
    terminal.out().println(terminal.bold("— " + CLOCK.format(clock.get()) + " —"));
  }

  private void show(Results results) {
    PrintWriter out = terminal.out();
    if (last.isEmpty()) {
      work.show(results);
      return;
    }
    List<Path> written = work.write(results);
    heading();
    for (Run run : results.runs()) {
      out.println(
          "  "
              + PlainText.of(run.name())
              + "  "
              + verdict(run)
              + (run.reasons().isEmpty()
                  ? ""
                  : "  " + PlainText.of(String.join("; ", run.reasons()))));
    }
    List<String> changes = new ReductionChange(last.get(), results, output.units).sentences();
    if (changes.isEmpty()) {
      out.println("  Nothing changed by more than its uncertainty.");
    } else {
      out.println(terminal.bold("Changed since the last time"));
      changes.forEach(text -> out.println("  " + PlainText.of(text)));
    }
    out.println("  " + written.size() + " files written to " + PlainText.of(output.folder.toString()));
  }

  private String verdict(Run run) {
    return switch (run.verdict()) {
      case "accept" -> terminal.good(run.verdict());
      case "doubtful" -> terminal.warn(run.verdict());
      default -> terminal.bad(run.verdict());
    };
  }
}
