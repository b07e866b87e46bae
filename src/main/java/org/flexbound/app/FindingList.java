package org.flexbound.app;

import java.io.PrintWriter;
import java.util.Comparator;
import java.util.List;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Severity;

/** Prints findings, worst first, each with its place and what to do. */
final class FindingList {
  private final Terminal terminal;

  FindingList(Terminal terminal) {
    this.terminal = terminal;
  }

  /** Prints why input was refused, with everything else that was found. */
  void refusal(List<Finding> findings) {
    PrintWriter err = terminal.err();
    long errors = findings.stream().filter(f -> f.severity() == Severity.ERROR).count();
    err.println(
        terminal.bad("Refused: ")
            + (errors == 1 ? "1 error" : errors + " errors")
            + ". Nothing was written.");
    print(findings, err);
  }

  /** Prints findings, worst first, otherwise in their order. */
  void print(List<Finding> findings, PrintWriter out) {
    findings.stream()
        .sorted(Comparator.comparing(Finding::severity))
        .forEach(finding -> print(finding, out));
  }

  private void print(Finding finding, PrintWriter out) {
    String place = finding.where().toString();
    out.println(
        "  "
            + word(finding.severity())
            + (place.isEmpty() ? "" : "  " + PlainText.of(place))
            + "  ["
            + finding.code()
            + "]");
    out.println("           " + PlainText.of(finding.message()));
    out.println("           " + PlainText.of(finding.kind().remedy()));
  }

  private String word(Severity severity) {
    return switch (severity) {
      case ERROR -> terminal.bad("error  ");
      case WARNING -> terminal.warn("warning");
      case NOTE -> "note   ";
    };
  }
}
