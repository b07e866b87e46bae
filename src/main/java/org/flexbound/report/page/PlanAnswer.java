package org.flexbound.report.page;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.report.results.Group;
import org.flexbound.report.results.Parameter;
import org.flexbound.report.results.Plan;
import org.flexbound.report.results.PlannedLoad;
import org.flexbound.report.results.Results;

/** The first page of a forecast: what a planned test would tell. */
final class PlanAnswer {
  private static final String IDENTIFIED = "identified";
  private static final String NOTHING = "not identifiable from this test";

  private final Results results;
  private final Plan plan;
  private final Shown shown;

  PlanAnswer(Results results, Plan plan, Shown shown) {
    this.results = results;
    this.plan = plan;
    this.shown = shown;
  }

  Section make() {
    return new Section(
        "answer",
        "Before the test",
        List.of(
            new Block.Answers(List.of(planned(), told(), missed(), assumed())),
            new Block.Text(
                "This is a forecast: nothing has been measured. It holds if the nominal model is"
                    + " about right and the instruments do what is stated of them. It says nothing"
                    + " of whether the load may be applied: that is for a competent person to decide,"
                    + " under the local code.")));
  }

  private Block.Answer planned() {
    List<String> details = new ArrayList<>();
    for (PlannedLoad load : plan.loads()) {
      details.add(
          load.load()
              + ": up to "
              + shown.withUnit(load.largest(), load.unit())
              + ", "
              + Shown.count(load.runs(), "run", "runs")
              + " ("
              + load.basis()
              + ").");
    }
    return new Block.Answer(
        "What is planned?",
        Shown.count(results.gauges().size(), "gauge", "gauges")
            + " under "
            + Shown.count(plan.loads().size(), "load", "loads")
            + ".",
        Tone.PLAIN,
        details);
  }

  private Block.Answer told() {
    Map<String, List<String>> byStatus = new LinkedHashMap<>();
    for (Parameter p : results.parameters()) {
      byStatus
          .computeIfAbsent(p.status(), unused -> new ArrayList<>())
          .add(
              p.name()
                  + (p.status().equals(NOTHING)
                      ? ""
                      : " ("
                          + (p.factor().isPresent() && !p.status().endsWith("limit only")
                              ? "factor " + shown.factorInterval(p)
                              : shown.interval(p))
                          + ")"));
    }
    long identified =
        results.parameters().stream().filter(p -> p.status().equals(IDENTIFIED)).count();
    List<String> details = new ArrayList<>();
    byStatus.forEach((status, names) -> details.add(status + ": " + String.join(", ", names) + "."));
    return new Block.Answer(
        "What would the test tell?",
        "It would identify "
            + identified
            + " of "
            + Shown.count(results.parameters().size(), "parameter", "parameters")
            + " (95 % intervals about nominal):",
        identified == results.parameters().size() ? Tone.GOOD : Tone.WARN,
        details);
  }

  private Block.Answer missed() {
    List<String> details = new ArrayList<>();
    for (Parameter p : results.parameters()) {
      if (p.status().equals(NOTHING)) {
        details.add(p.name() + " does not show: load or measure where it deforms, if it matters.");
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
    return new Block.Answer(
        "What would remain unknown?",
        details.isEmpty() ? "Nothing of what is asked." : "This:",
        details.isEmpty() ? Tone.GOOD : Tone.WARN,
        details);
  }

  private Block.Answer assumed() {
    List<String> details =
        results.findings().stream()
            .filter(f -> f.severity().equals("warning"))
            .map(f -> f.message() + ".")
            .toList();
    return new Block.Answer(
        "What was assumed or needs attention?",
        details.isEmpty() ? "Nothing beyond what is stated." : "This:",
        details.isEmpty() ? Tone.GOOD : Tone.WARN,
        details);
  }
}
