package org.flexbound.report.page;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.flexbound.report.Rounded;
import org.flexbound.report.results.Comparison;
import org.flexbound.report.results.Finding;
import org.flexbound.report.results.Group;
import org.flexbound.report.results.JointTest;
import org.flexbound.report.results.Parameter;
import org.flexbound.report.results.Reciprocity;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.Run;
import org.flexbound.report.results.Update;
import org.flexbound.report.results.Validation;

/** The first page: what a reader wants to know, answered. */
final class AnswerSection {
  private static final double FAR = 1.96;
  private static final String IDENTIFIED = "identified";

  private final Results results;
  private final Shown shown;

  AnswerSection(Results results, Shown shown) {
    this.results = results;
    this.shown = shown;
  }

  Section make() {
    List<Block.Answer> answers = new ArrayList<>();
    answers.add(tested());
    answers.add(good());
    LimitSection.answer(results).ifPresent(answers::add);
    RecheckSection.answer(results).ifPresent(answers::add);
    if (!results.comparison().isEmpty()) {
      answers.add(agrees());
    }
    results.update().ifPresent(update -> answers.add(changed(update)));
    answers.add(unknown());
    answers.add(needed());
    return new Section(
        "answer",
        "The answer",
        List.of(
            new Block.Answers(answers),
            new Block.Text(
                "A fitted stiffness is no proof of strength. Values hold for the loads, the"
                    + " temperature and the state of the joints of this test.")));
  }

  private Block.Answer tested() {
    String article = results.test().article();
    String fixture = results.test().fixture();
    String what = article.isEmpty() ? results.title() : article;
    long used = results.runs().stream().filter(Run::used).count();
    List<String> details = new ArrayList<>();
    details.add(
        Shown.count(results.gauges().size(), "gauge", "gauges")
            + ", "
            + Shown.count(results.loads().size(), "load", "loads")
            + ", "
            + Shown.count(results.runs().size(), "run", "runs")
            + " ("
            + used
            + " used), "
            + Shown.count(results.coefficients().size(), "coefficient", "coefficients")
            + (results.configurations().size() > 1
                ? ", " + results.configurations().size() + " configurations"
                : "")
            + ".");
    if (!results.test().place().isEmpty() || !results.test().testedBy().isEmpty()) {
      details.add(
          String.join(
                  ", ",
                  List.of(results.test().place(), results.test().testedBy()).stream()
                      .filter(s -> !s.isEmpty())
                      .toList())
              + ".");
    }
    return new Block.Answer(
        "What was tested?",
        what
            + (fixture.isEmpty() ? "" : ", held by " + fixture)
            + (results.test().date().isEmpty() ? "" : ", on " + results.test().date())
            + ".",
        Tone.PLAIN,
        details);
  }

  private Block.Answer good() {
    long bad = results.runs().stream().filter(r -> r.verdict().equals("repeat")).count();
    long doubtful = results.runs().stream().filter(r -> r.verdict().equals("doubtful")).count();
    List<JointTest> failed = results.jointTests().stream().filter(t -> !t.passed()).toList();
    long pairs = results.reciprocity().stream().filter(p -> Math.abs(p.z().orElse(0)) > FAR).count();
    List<String> details = new ArrayList<>();
    details.add(
        Shown.count(results.runs().size() - bad - doubtful, "run is", "runs are")
            + " accepted, "
            + doubtful
            + " doubtful, "
            + bad
            + " to be repeated.");
    if (!results.reciprocity().isEmpty()) {
      details.add(
          pairs
              + " of "
              + Shown.count(results.reciprocity().size(), "reciprocal pair differs", "reciprocal pairs differ")
              + " by more than twice the uncertainty"
              + worst(results.reciprocity())
              + ".");
    }
    for (JointTest test : results.jointTests()) {
      details.add(
          test.name()
              + ": "
              + (test.passed() ? "passed" : "failed")
              + " ("
              + Rounded.significant(test.statistic(), 3)
              + (test.limit().isPresent()
                  ? ", limit " + Rounded.significant(test.limit().getAsDouble(), 3)
                  : "")
              + ").");
    }
    if (!failed.isEmpty() || bad > 0) {
      return new Block.Answer(
          "Is the test good?",
          bad > 0 && failed.isEmpty()
              ? "In part: some runs are to be repeated; the others can be used."
              : "Not wholly: it contradicts itself. See the findings before using it.",
          failed.isEmpty() ? Tone.WARN : Tone.BAD,
          details);
    }
    boolean warned = doubtful > 0 || worstIs("warning");
    return new Block.Answer(
        "Is the test good?",
        warned
            ? "Usable, with reservations that the findings name."
            : "Yes: no run is in doubt and nothing contradicts itself.",
        warned ? Tone.WARN : Tone.GOOD,
        details);
  }

  private static String worst(List<Reciprocity> pairs) {
    return pairs.stream()
        .filter(p -> p.z().isPresent())
        .max(Comparator.comparingDouble(p -> Math.abs(p.z().orElse(0))))
        .map(
            p ->
                " (largest: "
                    + p.first()
                    + " against "
                    + p.second()
                    + ", z "
                    + Rounded.fixed(p.z().orElse(0), 1)
                    + ")")
        .orElse("");
  }

  private boolean worstIs(String severity) {
    return results.findings().stream().anyMatch(f -> f.severity().equals(severity));
  }

  private Block.Answer agrees() {
    List<Comparison> all = results.comparison();
    long before = all.stream().filter(c -> Math.abs(c.z()) > FAR).count();
    List<String> details = new ArrayList<>();
    details.add(
        before
            + " of "
            + Shown.count(all.size(), "coefficient lies", "coefficients lie")
            + " further from the nominal model than twice the uncertainty; ratios measured to"
            + " computed "
            + ratios(all.stream().flatMap(c -> c.ratio().stream().boxed()).toList())
            + ".");
    Optional<Update> update = results.update();
    if (update.isEmpty()) {
      boolean far = results.modelTests().stream().anyMatch(t -> !t.passed());
      for (JointTest test : results.modelTests()) {
        details.add(
            "Misfit "
                + Rounded.significant(test.statistic(), 3)
                + "; up to "
                + Shown.optional(test.limit(), 3)
                + " is explained by the uncertainty of the test"
                + (results.modelTests().size() > 1 ? " (" + test.configuration() + ")" : "")
                + ".");
      }
      return new Block.Answer(
          "Does the model agree?",
          far
              ? "No: more coefficients are off than chance explains."
              : "Yes, within the uncertainty of the test.",
          far ? Tone.WARN : Tone.GOOD,
          details);
    }
    long after = all.stream().filter(c -> Math.abs(c.updatedZ().orElse(0)) > FAR).count();
    details.add(
        after
            + " of "
            + all.size()
            + " lie so far from the updated model; ratios "
            + ratios(all.stream().flatMap(c -> c.updatedRatio().stream().boxed()).toList())
            + ".");
    details.add(
        "Misfit "
            + Rounded.significant(update.get().nominal().value(), 3)
            + " before, "
            + Rounded.significant(update.get().shown().value(), 3)
            + " after; up to "
            + Rounded.significant(update.get().shown().limit(), 3)
            + " is explained by the uncertainty of the test.");
    validation(details);
    return switch (update.get().verdict()) {
      case "misfits even at best" ->
          new Block.Answer(
              "Does the model agree?",
              "No: even the best fit within the bounds misfits. The model lacks something, or the"
                  + " test is at fault.",
              Tone.BAD,
              details);
      case "not converged" ->
          new Block.Answer(
              "Does the model agree?", "Undecided: the update did not converge.", Tone.BAD, details);
      case "no change warranted" ->
          new Block.Answer(
              "Does the model agree?", "Yes, as it stands: no change is warranted.", Tone.GOOD, details);
      default ->
          new Block.Answer(
              "Does the model agree?",
              update.get().nominal().agrees()
                  ? "Yes: as it stands, and after the update."
                  : update.get().shown().agrees()
                      ? "Not as it stands; after the update it does."
                      : "Not as it stands; after the update it comes closer, but does not reach the"
                          + " test's uncertainty.",
              update.get().shown().agrees() ? Tone.GOOD : Tone.WARN,
              details);
    };
  }

  private void validation(List<String> details) {
    if (results.validation().isEmpty()) {
      return;
    }
    long within = results.validation().stream().filter(Validation::within).count();
    details.add(
        "Held-out load cases: "
            + within
            + " of "
            + results.validation().size()
            + " coefficients lie within their 95 % prediction interval.");
  }

  private static String ratios(List<Double> ratios) {
    if (ratios.isEmpty()) {
      return "–";
    }
    double least = ratios.stream().mapToDouble(Double::doubleValue).min().orElse(1);
    double largest = ratios.stream().mapToDouble(Double::doubleValue).max().orElse(1);
    return Rounded.fixed(least, 2) + " to " + Rounded.fixed(largest, 2);
  }

  private Block.Answer changed(Update update) {
    List<String> details = new ArrayList<>();
    for (Parameter p : results.parameters()) {
      if (p.status().equals(IDENTIFIED) || p.status().equals("weakly identified")) {
        details.add(
            p.name()
                + ": "
                + shown.stiffness(p, p.nominal(), "rigid")
                + " → "
                + shown.stiffness(p, p.updated(), "rigid")
                + (p.factor().isPresent() ? ", factor " + Shown.optional(p.factor(), 3) : "")
                + " (95 %: "
                + (p.factor().isPresent() ? shown.factorInterval(p) : shown.interval(p))
                + "), "
                + p.status()
                + (p.onBound() ? ", on its bound" : "")
                + ".");
      }
    }
    if (update.verdict().equals("no change warranted")) {
      return new Block.Answer(
          "What changed?", "Nothing: the nominal model agrees with the test.", Tone.GOOD, details);
    }
    long identified =
        results.parameters().stream().filter(p -> p.status().equals(IDENTIFIED)).count();
    return new Block.Answer(
        "What changed?",
        "The test determines "
            + identified
            + " of "
            + Shown.count(results.parameters().size(), "parameter", "parameters")
            + (details.isEmpty() ? "." : ":"),
        Tone.PLAIN,
        details);
  }

  private Block.Answer unknown() {
    List<String> details = new ArrayList<>();
    for (Parameter p : results.parameters()) {
      if (!p.status().equals(IDENTIFIED) && !p.status().equals("weakly identified")) {
        details.add(
            p.name()
                + ": "
                + p.status()
                + (p.status().endsWith("limit only") ? " (" + shown.interval(p) + ")" : "")
                + ".");
      }
    }
    results
        .update()
        .ifPresent(
            update -> {
              for (Group group : update.groups()) {
                details.add("Only together: " + group.inWords() + ".");
              }
            });
    details.add(
        "A scale error common to everything, such as a load cell that is out by one per cent,"
            + " cannot be seen by reciprocity.");
    String answer =
        results.parameters().isEmpty()
            ? "What this test alone cannot show."
            : details.size() > 1
                ? "These stiffnesses stay as they were assumed, or are known in part:"
                : "Nothing of what was asked.";
    return new Block.Answer("What remains unknown?", answer, Tone.PLAIN, details);
  }

  private Block.Answer needed() {
    List<String> details = new ArrayList<>();
    for (Parameter p : results.parameters()) {
      if (p.needsReason()) {
        details.add(p.name() + " moved far or ended on a bound: state the reason in the study.");
      }
    }
    for (Run run : results.runs()) {
      if (run.verdict().equals("repeat")) {
        details.add(
            "Repeat run " + run.name() + ": " + String.join("; ", run.reasons()) + ".");
      }
    }
    long warnings =
        results.findings().stream().filter(f -> f.severity().equals("warning")).count();
    if (warnings > 0) {
      details.add(
          Shown.count(warnings, "warning stands", "warnings stand") + " in the findings below.");
    }
    Optional<Finding> error =
        results.findings().stream().filter(f -> f.severity().equals("error")).findFirst();
    error.ifPresent(f -> details.add(f.message()));
    return new Block.Answer(
        "What needs a reason or a repeat?",
        details.isEmpty() ? "Nothing." : "These:",
        details.isEmpty() ? Tone.GOOD : Tone.WARN,
        details);
  }
}
