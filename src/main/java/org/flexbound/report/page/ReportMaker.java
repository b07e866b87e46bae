package org.flexbound.report.page;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import org.flexbound.report.UnitSystem;
import org.flexbound.report.figures.ContributionFigure;
import org.flexbound.report.figures.Figure;
import org.flexbound.report.figures.FlexibilityPicture;
import org.flexbound.report.figures.HeldOutFigure;
import org.flexbound.report.figures.LoadDeflectionFigures;
import org.flexbound.report.figures.ParameterFigure;
import org.flexbound.report.figures.RatioFigure;
import org.flexbound.report.figures.ReciprocityFigure;
import org.flexbound.report.figures.StructureFigures;
import org.flexbound.report.figures.UpdateFigures;
import org.flexbound.report.results.Finding;
import org.flexbound.report.results.Results;

/** Makes the content of a report. */
public final class ReportMaker {
  private static final List<String> SEVERITIES = List.of("error", "warning", "note");

  private ReportMaker() {}

  /**
   * Words, rounds and draws results.
   *
   * @param results the results
   * @param units the units to show
   * @return the report's content, in a reader's order
   */
  public static ReportPage make(Results results, UnitSystem units) {
    Shown shown = new Shown(units);
    List<Section> sections = new ArrayList<>();
    sections.add(
        results
            .plan()
            .map(plan -> new PlanAnswer(results, plan, shown).make())
            .orElseGet(() -> new AnswerSection(results, shown).make()));
    new RecheckSection(results, shown).make().ifPresent(sections::add);
    new LimitSection(results, shown).make().ifPresent(sections::add);
    sections.add(findings(results));
    sections.addAll(figures(results, units));
    sections.add(new TableSection(results, shown).make());
    sections.add(new MethodSection(results).make());
    sections.add(new CautionSection(results, shown).make());
    String title = results.title().isEmpty() ? "Static load test" : results.title();
    return new ReportPage(title, subtitle(results), results.program(), sections);
  }

  private static String subtitle(Results results) {
    return String.join(
        " · ",
        List.of(results.test().article(), results.test().place(), results.test().date()).stream()
            .filter(s -> !s.isEmpty())
            .toList());
  }

  private static Section findings(Results results) {
    List<Block.Noted> noted =
        results.findings().stream()
            .sorted(Comparator.comparingInt(f -> SEVERITIES.indexOf(f.severity())))
            .map(ReportMaker::noted)
            .toList();
    Block block =
        noted.isEmpty()
            ? new Block.Text("Nothing was found that needs attention.")
            : new Block.FindingList(noted);
    return new Section("findings", "Findings", List.of(block));
  }

  private static Block.Noted noted(Finding f) {
    Tone tone =
        switch (f.severity()) {
          case "error" -> Tone.BAD;
          case "warning" -> Tone.WARN;
          default -> Tone.PLAIN;
        };
    return new Block.Noted(f.severity(), tone, f.code(), f.message(), f.where(), f.remedy());
  }

  private static List<Section> figures(Results results, UnitSystem units) {
    List<Section> sections = new ArrayList<>();
    StructureFigures structure = new StructureFigures(results, units);
    List<Figure> space = new ArrayList<>();
    structure.overview().ifPresent(space::add);
    space.addAll(structure.loadCases());
    add(sections, "structure-section", "The structure", space, false);

    List<Figure> update = new ArrayList<>(ParameterFigure.draw(results.parameters()));
    results.update().flatMap(UpdateFigures::tradeOff).ifPresent(update::add);
    add(sections, "update-section", "Parameters", update, false);
    add(
        sections,
        "profiles-section",
        "Profiles",
        UpdateFigures.profiles(results.parameters(), units),
        true);

    List<Figure> agreement = new ArrayList<>(RatioFigure.draw(results.comparison()));
    agreement.addAll(ContributionFigure.draw(results.contributions()));
    agreement.addAll(HeldOutFigure.draw(results.validation()));
    add(sections, "agreement-section", "Measured and computed", agreement, false);

    List<Figure> matrix =
        new ArrayList<>(new FlexibilityPicture(units).draw(results.coefficients()));
    matrix.addAll(ReciprocityFigure.draw(results.reciprocity(), results.coefficients()));
    add(sections, "matrix-section", "Flexibility and reciprocity", matrix, false);
    List<Figure> curves = new LoadDeflectionFigures(units).draw(results.curves());
    if (!curves.isEmpty()) {
      sections.add(
          new Section(
              "curves-section",
              "Load and deflection",
              List.of(
                  new Block.Text(
                      "Each mark is a load step: filled while loading, hollow while unloading,"
                          + " crossed where it was left out of the fit. The range of the fit is"
                          + " shaded. The strip below each plot shows what the fitted lines leave:"
                          + " it should look like noise. Motions are counted from the opening"
                          + " zero."),
                  new Block.Figures(curves, true))));
    }
    return sections;
  }

  private static void add(
      List<Section> sections, String id, String heading, List<Figure> figures, boolean small) {
    if (!figures.isEmpty()) {
      sections.add(new Section(id, heading, List.of(new Block.Figures(figures, small))));
    }
  }
}
