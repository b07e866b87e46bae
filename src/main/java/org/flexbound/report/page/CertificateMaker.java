package org.flexbound.report.page;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import org.flexbound.report.Rounded;
import org.flexbound.report.results.Input;
import org.flexbound.report.results.Instrument;
import org.flexbound.report.results.Limit;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.Run;
import org.flexbound.report.results.Test;

/** Makes the content of a certificate: one page for the fixture's file. */
public final class CertificateMaker {
  private static final int MOST_LIMITS = 14;
  private static final int MOST_INSTRUMENTS = 10;
  private static final int MOST_ADVICE = 3;
  private static final int LONGEST = 60;
  private static final int MOST_LINES = 22;
  private static final List<String> GRAVITY = List.of("fail", "undecided", "pass");

  private CertificateMaker() {}

  /**
   * Words and rounds.
   *
   * @param results results with decisions on limits
   * @return the certificate's content
   */
  public static ReportPage make(Results results) {
    List<Section> sections = new ArrayList<>();
    sections.add(new Section("identification", "Identification", List.of(identification(results))));
    sections.add(new Section("decisions", "Limits, results and decisions", decisions(results)));
    sections.add(new Section("instruments", "Instruments", instruments(results)));
    sections.add(new Section("cautions", "Cautions", List.of(cautions())));
    sections.add(
        new Section(
            "signatures",
            "Signatures",
            List.of(new Block.Signatures(List.of("Tested by", "Checked by", "Released by")))));
    return new ReportPage(
        "Certificate of the check",
        brief(results.title()),
        results.program(),
        sections);
  }

  private static String brief(String text) {
    return LimitSection.cut(text, LONGEST);
  }

  private static Block identification(Results results) {
    Test test = results.test();
    TableMaker table = new TableMaker("").text("", "", "", "");
    long used = results.runs().stream().filter(Run::used).count();
    table.row("Article", brief(test.article()), "Date of the test", brief(test.date()));
    table.row("Fixture", brief(test.fixture()), "Place", brief(test.place()));
    table.row(
        "Tested by", brief(test.testedBy()), "Environment", brief(environment(results)));
    table.row(
        "Readings",
        brief(results.inputs().stream().map(Input::file).findFirst().orElse("")),
        "Runs used",
        used + " of " + results.runs().size());
    table.row(
        "Largest load", largestLoad(results), "Command", results.command());
    table.row(
        "Checksum (SHA-256, first half)",
        results.inputs().stream().map(i -> i.sha256().substring(0, 32)).findFirst().orElse(""),
        "Evaluated by",
        results.program());
    return table.make();
  }

  private static String largestLoad(Results results) {
    return results.runs().stream()
        .filter(r -> r.used() && r.peakLoad().isPresent())
        .max(Comparator.comparingDouble(r -> r.peakLoad().getAsDouble()))
        .map(
            r ->
                Rounded.significant(r.peakLoad().getAsDouble(), 4)
                    + " "
                    + r.loadUnit()
                    + ", "
                    + brief(String.join(", ", r.loads())))
        .orElse("");
  }

  private static String environment(Results results) {
    String ambient = results.test().ambientTemperature();
    double[] kelvin =
        results.runs().stream()
            .flatMap(r -> r.temperature().stream().boxed())
            .mapToDouble(Double::doubleValue)
            .sorted()
            .toArray();
    if (kelvin.length == 0) {
      return ambient.isEmpty() ? "not stated" : "ambient " + ambient;
    }
    String runs =
        String.format(
            java.util.Locale.ROOT,
            "runs at %.1f to %.1f °C",
            kelvin[0] - 273.15,
            kelvin[kelvin.length - 1] - 273.15);
    return ambient.isEmpty() ? runs : "ambient " + ambient + ", " + runs;
  }

  private static List<Block> decisions(Results results) {
    List<Limit> limits =
        results.limits().stream()
            .sorted(Comparator.comparingInt(l -> GRAVITY.indexOf(l.decision())))
            .toList();
    List<Limit> shown = limits.subList(0, shown(limits));
    List<Block> blocks = new ArrayList<>();
    List<String> details = new ArrayList<>();
    limits.stream()
        .filter(l -> !l.advice().isEmpty())
        .limit(MOST_ADVICE)
        .forEach(l -> details.add(brief(l.name()) + ": " + l.advice() + "."));
    blocks.add(
        new Block.Answers(
            List.of(
                new Block.Answer(
                    "Are the limits met?",
                    LimitSection.verdict(limits),
                    LimitSection.tone(limits),
                    details))));
    blocks.add(LimitSection.table(shown, LONGEST).make());
    if (shown.size() < limits.size()) {
      blocks.add(
          new Block.Text(
              (limits.size() - shown.size())
                  + " more limits stand in the report; the gravest are shown here."));
    }
    blocks.add(new Block.Text(rule(results)));
    return blocks;
  }

  /** How many limits there is room for. */
  private static int shown(List<Limit> limits) {
    int lines = 0;
    int count = 0;
    while (count < Math.min(MOST_LIMITS, limits.size())) {
      Limit next = limits.get(count);
      lines +=
          1 + Math.max(brief(next.name()).length() / 18, brief(next.subject()).length() / 40);
      if (lines > MOST_LINES) {
        break;
      }
      count++;
    }
    return count;
  }

  private static String rule(Results results) {
    boolean simple = results.limits().stream().anyMatch(l -> l.rule().equals("simple"));
    double largest =
        results.limits().stream().mapToDouble(Limit::largestProbability).max().orElse(0.05);
    return (simple
            ? "Decision rule: simple acceptance (JCGM 106:2012): the value alone decides, and may be"
                + " wrong with the probability shown."
            : "Decision rule: guarded acceptance and guarded rejection (JCGM 106:2012); a pass or a"
                + " fail is wrong with a probability of at most "
                + LimitSection.percent(java.util.OptionalDouble.of(largest))
                + ", for each limit by itself.")
        + " Results with standard uncertainties (k = 1) from scatter, calibration and the fixed part of"
        + " the instruments' uncertainty.";
  }

  private static List<Block> instruments(Results results) {
    TableMaker table =
        new TableMaker("")
            .text("Instrument", "Kind", "Serial", "Calibration reference", "Calibration date");
    List<Instrument> all = results.instruments();
    for (Instrument i : all.subList(0, Math.min(MOST_INSTRUMENTS, all.size()))) {
      table.row(
          brief(i.name()),
          brief(i.kind()),
          brief(i.serial()),
          i.calibrationReference().isEmpty() ? "none stated" : brief(i.calibrationReference()),
          brief(i.calibrationDate()));
    }
    List<Block> blocks = new ArrayList<>();
    blocks.add(table.make());
    if (all.size() > MOST_INSTRUMENTS) {
      blocks.add(
          new Block.Text(
              (all.size() - MOST_INSTRUMENTS) + " more instruments stand in the report."));
    }
    return blocks;
  }

  private static Block cautions() {
    return new Block.Bullets(
        List.of(
            "A stiffness, measured or fitted, is no proof of strength. This certificate states"
                + " compliance with the limits above and nothing else.",
            "It holds for the loads that were applied, at that temperature and with the clamps and"
                + " joints as they were; it ends with any change of them.",
            "Local codes, the rules of the site and licensed practice come first."));
  }
}
