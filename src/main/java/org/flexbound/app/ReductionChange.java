package org.flexbound.app;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.report.Rounded;
import org.flexbound.report.UnitSystem;
import org.flexbound.report.results.Coefficient;
import org.flexbound.report.results.Finding;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.Run;

/**
 * What changed from one reduction of a log to the next, in sentences: verdicts, coefficients that
 * moved by more than their uncertainty before, findings that came or went.
 */
final class ReductionChange {
  /** Comes and goes with the program in which the log is being edited. */
  private static final String OPEN_ELSEWHERE = "DOC-OPEN-ELSEWHERE";

  private final Results before;
  private final Results after;
  private final UnitSystem units;

  ReductionChange(Results before, Results after, UnitSystem units) {
    this.before = before;
    this.after = after;
    this.units = units;
  }

  /** The sentences: runs, coefficients, findings; none where nothing changed. */
  List<String> sentences() {
    List<String> sentences = new ArrayList<>();
    runs(sentences);
    coefficients(sentences);
    findings(sentences);
    return sentences;
  }

  private void runs(List<String> sentences) {
    Map<String, Run> old = new LinkedHashMap<>();
    before.runs().forEach(run -> old.put(run.name(), run));
    for (Run run : after.runs()) {
      Run was = old.remove(run.name());
      if (was == null) {
        sentences.add("run " + run.name() + " is new: " + run.verdict());
      } else if (!was.verdict().equals(run.verdict())) {
        sentences.add("run " + run.name() + ": " + was.verdict() + " → " + run.verdict());
      } else if (!was.reasons().equals(run.reasons())) {
        sentences.add("run " + run.name() + ": still " + run.verdict() + ", the reasons are others");
      }
    }
    old.values().forEach(run -> sentences.add("run " + run.name() + " is gone"));
  }

  private static String key(Coefficient c) {
    return c.gauge() + " under " + c.load();
  }

  private void coefficients(List<String> sentences) {
    Map<String, Coefficient> old = new LinkedHashMap<>();
    before.coefficients().forEach(c -> old.put(key(c), c));
    for (Coefficient now : after.coefficients()) {
      Coefficient was = old.remove(key(now));
      if (was == null) {
        sentences.add("coefficient " + key(now) + " is new: " + shown(now));
        continue;
      }
      double moved = Math.abs(now.value() - was.value());
      // a reading that spoils a run widens what comes after it: what it was before is the measure
      double u = was.standardUncertainty();
      if (moved > u) {
        sentences.add(
            "coefficient "
                + key(now)
                + ": "
                + shown(was)
                + " → "
                + shown(now)
                + " ("
                + Rounded.significant(moved / u, 2)
                + " standard uncertainties)");
      }
    }
    old.values().forEach(c -> sentences.add("coefficient " + key(c) + " is gone"));
  }

  private String shown(Coefficient c) {
    return Rounded.value(
            units.shown(c.value(), c.unit()), units.shown(c.standardUncertainty(), c.unit()))
        + " "
        + units.symbol(c.unit());
  }

  private void findings(List<String> sentences) {
    List<String> old = words(before);
    List<String> now = words(after);
    now.stream()
        .filter(text -> !old.contains(text))
        .forEach(text -> sentences.add("new: " + text));
    old.stream()
        .filter(text -> !now.contains(text))
        .forEach(text -> sentences.add("gone: " + text));
  }

  private static List<String> words(Results results) {
    return results.findings().stream()
        .filter(finding -> !finding.code().equals(OPEN_ELSEWHERE))
        .map(ReductionChange::words)
        .toList();
  }

  private static String words(Finding finding) {
    return finding.severity()
        + (finding.where().isEmpty() ? "" : " " + finding.where())
        + ": "
        + finding.message();
  }
}
