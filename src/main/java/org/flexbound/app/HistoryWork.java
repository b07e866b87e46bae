package org.flexbound.app;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;
import org.flexbound.acceptance.AcceptanceFinding;
import org.flexbound.acceptance.KeptTest;
import org.flexbound.acceptance.Trend;
import org.flexbound.document.OutputFolder;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Refusal;
import org.flexbound.finding.Where;
import org.flexbound.report.ReportFiles;
import org.flexbound.report.ResultsJson;
import org.flexbound.report.Rounded;
import org.flexbound.report.gather.HistoryPart;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.TrendPoint;
import org.flexbound.report.results.TrendResults;
import org.flexbound.report.results.TrendSeries;

/** The steps of the commands that read results back. */
final class HistoryWork {
  private final Terminal terminal;
  private final OutputOptions output;

  HistoryWork(Terminal terminal, OutputOptions output) {
    this.terminal = terminal;
    this.output = output;
  }

  /** Reads the results that a later test is held against. */
  static Results baseline(Path file) {
    String name = String.valueOf(file.getFileName());
    Findings findings = new Findings();
    if (!Files.isRegularFile(file)) {
      findings.add(
          AcceptanceFinding.BASELINE, Where.file(name), "the file is not there: " + file);
      throw new Refusal(findings.list());
    }
    try {
      return ResultsJson.parse(Files.readAllBytes(file));
    } catch (IllegalArgumentException notResults) {
      findings.add(
          AcceptanceFinding.BASELINE, Where.file(name), String.valueOf(notResults.getMessage()));
      throw new Refusal(findings.list());
    } catch (IOException unreadable) {
      throw new UncheckedIOException(unreadable);
    }
  }

  ExitCode trend(Path folder, int baseline) {
    Findings findings = new Findings();
    List<KeptTest> tests = new ArrayList<>();
    String title = "";
    String latest = "";
    for (Path file : files(folder)) {
      String name = folder.relativize(file).toString().replace('\\', '/');
      try {
        Results results = ResultsJson.parse(Files.readAllBytes(file));
        tests.add(HistoryPart.kept(name, results));
        if (results.test().date().compareTo(latest) >= 0) {
          latest = results.test().date();
          title = results.title();
        }
      } catch (IllegalArgumentException notResults) {
        findings.add(
            AcceptanceFinding.HISTORY_FILE,
            Where.file(name),
            String.valueOf(notResults.getMessage()));
      } catch (IOException unreadable) {
        throw new UncheckedIOException(unreadable);
      }
    }
    Outcome<Trend> made = Trend.of(tests, baseline);
    findings.addAll(made.findings());
    findings.refuseIfErrors();
    Trend trend = made.value().orElseThrow(() -> new Refusal(findings.list()));
    TrendResults results = HistoryPart.trend(trend, title, findings.list());
    OutputFolder out = new OutputFolder(output.folder);
    ReportFiles.addTrend(out, results, output.units);
    List<Path> written = out.write();
    print(results, findings, written);
    return ExitCode.DONE;
  }

  /** The results in a folder: its own .json files and the results.json of its folders, by name. */
  private static List<Path> files(Path folder) {
    if (!Files.isDirectory(folder)) {
      Findings findings = new Findings();
      findings.add(
          AcceptanceFinding.BASELINE, Where.file(folder.toString()), "the folder is not there");
      throw new Refusal(findings.list());
    }
    try (Stream<Path> inside = Files.list(folder)) {
      List<Path> files = new ArrayList<>();
      for (Path path : inside.sorted().toList()) {
        String name = String.valueOf(path.getFileName()).toLowerCase(Locale.ROOT);
        if (Files.isDirectory(path)) {
          if (Files.isRegularFile(path.resolve("results.json"))) {
            files.add(path.resolve("results.json"));
          }
        } else if (name.endsWith(".json") && !name.equals("trend.json")) {
          files.add(path);
        }
      }
      return files;
    } catch (IOException unreadable) {
      throw new UncheckedIOException(unreadable);
    }
  }

  private void print(TrendResults results, Findings findings, List<Path> written) {
    PrintWriter out = terminal.out();
    out.println(terminal.bold(PlainText.of(results.title())));
    out.println(
        "  "
            + results.tests().size()
            + " tests from "
            + results.tests().get(0).date()
            + " to "
            + results.tests().get(results.tests().size() - 1).date()
            + ", baseline the first "
            + results.baseline());
    out.println();
    out.println(terminal.bold("Outside of the limits"));
    TextTable table =
        new TextTable().text("coefficient or parameter").text("date").number("value")
            .number("lower").number("upper").text("unit").text("");
    for (TrendSeries s : results.series()) {
      double reach = (s.upper() - s.lower()) / 6;
      for (TrendPoint p : s.outside()) {
        table.row(
            s.name(),
            p.date(),
            number(s, p.value(), reach),
            number(s, s.lower(), reach),
            number(s, s.upper(), reach),
            factor(s) ? "× nominal" : output.units.symbol(s.unit()),
            p.outside() ? "outside" : "jumped");
      }
    }
    if (table.isEmpty()) {
      out.println(terminal.good("  none: every value lies within its limits"));
    } else {
      table.print(out);
    }
    if (!findings.list().isEmpty()) {
      out.println();
      out.println(terminal.bold("Findings"));
      new FindingList(terminal).print(findings.list(), out);
    }
    out.println();
    out.println(terminal.bold("Written"));
    written.forEach(file -> out.println("  " + PlainText.of(file.toString())));
  }

  private static boolean factor(TrendSeries s) {
    return s.kind().equals("parameter") && s.unit().equals("1");
  }

  private String number(TrendSeries s, double si, double reach) {
    return factor(s)
        ? Rounded.value(si, reach)
        : Rounded.value(
            output.units.shown(si, s.unit()), output.units.shown(reach, s.unit()));
  }
}
