package org.flexbound.update;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SplittableRandom;
import org.flexbound.compare.ConfiguredFrame;
import org.flexbound.compare.OutsideTable;
import org.flexbound.document.JsonFile;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Where;
import org.flexbound.flexibility.AbsoluteCoefficient;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.flexibility.OutsideFlexibility;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.FrameReader;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.reduce.ReductionProblem;
import org.flexbound.reduce.TestPlanner;
import org.flexbound.study.Study;
import org.flexbound.study.StudyReader;
import org.flexbound.testlog.TestLog;
import org.junit.jupiter.api.Test;

class StudyUpdateTest {
  private static Study study(String text) {
    return StudyReader.read(JsonFile.parse(text, "study.json").orRefuse()).orRefuse();
  }

  private static FrameModel with(Twin twin, String what, String instead) {
    assertThat(twin.model()).contains(what);
    return FrameReader.read(
            JsonFile.parse(twin.model().replace(what, instead), "model.json").orRefuse())
        .orRefuse();
  }

  private static MeasuredFlexibility nominalTest(Twin twin, long seed) {
    return twin.test(
        twin.frame(),
        new double[twin.working().size()],
        twin.working(),
        new SplittableRandom(seed));
  }

  private static final String ELBOW =
      "{\"model\": \"m.json\", \"log\": \"l.xlsx\", \"parameters\": {\"elbow\": {"
          + "\"scales\": [\"joints.elbow.ry\"], \"lower\": \"1 MN·m/rad\", \"upper\": \"rigid\","
          + " \"referenceMember\": \"leg\", ";

  @Test
  void aJointThatIsRigidInTheModelIsFoundByItsCompliance() {
    Twin twin = Twin.bracket("");
    MeasuredFlexibility measured = nominalTest(twin, 4);
    FrameModel rigid = with(twin, "\"elbow\": {\"ry\": 6e6}", "\"elbow\": {\"ry\": \"rigid\"}");
    UpdateResult result =
        StudyUpdate.run(
                study(
                    ELBOW
                        + "\"working\": \"compliance\","
                        + " \"priorStandardDeviation\": \"2e-7 rad/(N·m)\"}}}"),
                rigid,
                List.of(measured))
            .orRefuse();
    ParameterResult elbow = result.parameters().get(0);
    assertThat(elbow.nominal()).isInfinite();
    assertThat(elbow.factor()).isNaN();
    assertThat(elbow.lower95()).isLessThan(6e6);
    assertThat(elbow.upper95()).isGreaterThan(6e6);
    assertThat(elbow.updated()).isCloseTo(6e6, within(6e5));
    assertThat(elbow.status()).isEqualTo(Status.IDENTIFIED);
    FrameModel updated = StudyUpdate.updatedModel(rigid, result);
    assertThat(
            updated
                .stiffness(StiffnessPath.parse("joints.elbow.ry").orElseThrow())
                .orElseThrow()
                .value())
        .isCloseTo(elbow.updated(), within(1e-6 * elbow.updated()));
    assertThat(elbow.classBefore().orElseThrow().en1993()).isEqualTo("rigid");
    assertThat(elbow.classAfter().orElseThrow().en1993()).isEqualTo("semi-rigid");
  }

  @Test
  void theFixityFactorFindsTheSameJoint() {
    Twin twin = Twin.bracket("");
    MeasuredFlexibility measured = nominalTest(twin, 4);
    FrameModel rigid = with(twin, "\"elbow\": {\"ry\": 6e6}", "\"elbow\": {\"ry\": \"rigid\"}");
    UpdateResult result =
        StudyUpdate.run(
                study(ELBOW + "\"working\": \"fixity\", \"priorStandardDeviation\": 0.8}}}"),
                rigid,
                List.of(measured))
            .orRefuse();
    assertThat(result.parameters().get(0).updated()).isCloseTo(6e6, within(6e5));
  }

  @Test
  void aRigidNominalHasNoLogarithm() {
    Twin twin = Twin.bracket("");
    FrameModel rigid = with(twin, "\"elbow\": {\"ry\": 6e6}", "\"elbow\": {\"ry\": \"rigid\"}");
    Outcome<UpdateResult> outcome =
        StudyUpdate.run(
            study(
                "{\"model\": \"m.json\", \"log\": \"l.xlsx\", \"parameters\": {\"elbow\":"
                    + " {\"scales\": \"joints.elbow.ry\", \"lower\": 0.5, \"upper\": 2}}}"),
            rigid,
            List.of(nominalTest(twin, 4)));
    assertThat(outcome.value()).isEmpty();
    assertThat(outcome.findings())
        .extracting(Finding::message)
        .anyMatch(m -> m.contains("is rigid in the model, which has no logarithm"));
  }

  @Test
  void everyProblemOfModelAndStudyComesInOneAnswer() {
    Twin twin = Twin.bracket("");
    Outcome<UpdateResult> outcome =
        StudyUpdate.run(
            study(
                "{\"model\": \"m.json\", \"log\": \"l.xlsx\", \"heldOut\": [\"nothing\"],"
                    + " \"parameters\": {\"elbow\": {\"scales\": \"joints.elbo.ry\", \"lower\": 0.5,"
                    + " \"upper\": 2}}}"),
            renamed(twin),
            List.of(nominalTest(twin, 4)));
    assertThat(outcome.value()).isEmpty();
    List<String> messages = outcome.findings().stream().map(Finding::message).toList();
    assertThat(messages).anyMatch(m -> m.contains("joints.elbo.ry"));
    assertThat(messages).anyMatch(m -> m.contains("tip"));
    assertThat(messages).anyMatch(m -> m.contains("held-out load 'nothing'"));
  }

  /** The bracket with its tip called toe. */
  private static FrameModel renamed(Twin twin) {
    return FrameReader.read(
            JsonFile.parse(twin.model().replace("\"tip\"", "\"toe\""), "model.json").orRefuse())
        .orRefuse();
  }

  @Test
  void aTableOfAModelHeldElsewhereGivesWhatTheFrameGives() {
    Twin twin = Twin.bracket("");
    SplittableRandom random = new SplittableRandom(21);
    List<WorkingParameter> parameters = twin.working();
    MeasuredFlexibility measured =
        twin.test(twin.frame(), twin.truth(parameters, random), parameters, random);
    UpdateProblem problem =
        StudyUpdate.problem(twin.study(), twin.frame(), List.of(measured)).orRefuse();
    FlexibilityFunction.Computed nominal = problem.function().at(new double[parameters.size()]);
    List<OutsideFlexibility.Entry> entries = new ArrayList<>();
    for (int i = 0; i < measured.absolute().size(); i++) {
      AbsoluteCoefficient a = measured.absolute().get(i);
      Map<String, Double> by = new LinkedHashMap<>();
      for (int k = 0; k < parameters.size(); k++) {
        by.put(parameters.get(k).name(), nominal.jacobian()[i][k]);
      }
      entries.add(
          new OutsideFlexibility.Entry(
              Optional.empty(),
              measured.gauges().get(a.gauge()).name(),
              measured.loads().get(a.load()).name(),
              nominal.coefficients()[i],
              by,
              Where.nowhere()));
    }
    UpdateResult frame = twin.update(measured, UpdateSettings.FULL).orRefuse();
    UpdateResult outside =
        OutsideUpdate.run(
                twin.study(),
                List.of(
                    new OutsideTable(
                        new OutsideFlexibility(entries, Where.nowhere()), Map.of())),
                List.of(measured),
                UpdateSettings.FULL)
            .orRefuse();
    for (int k = 0; k < parameters.size(); k++) {
      // The bracket is determinate: its flexibility is exactly linear in every compliance.
      assertThat(outside.parameters().get(k).factor())
          .isCloseTo(frame.parameters().get(k).factor(), within(1e-6));
    }
    assertThat(outside.findings()).extracting(Finding::code).contains("UPDATE-LINEAR-STEP");
  }

  @Test
  void aForecastBeforeTheTestTellsWhichParametersItWouldSee() {
    Map<String, Status> statuses = new LinkedHashMap<>();
    UpdateResult forecast = forecast(Twin.gantry());
    forecast.parameters().forEach(p -> statuses.put(p.name(), p.status()));
    assertThat(statuses.get("foot sideways")).isEqualTo(Status.IDENTIFIED);
    assertThat(statuses.get("foot down")).isEqualTo(Status.NOT_IDENTIFIABLE);
    assertThat(forecast.parameters())
        .allSatisfy(p -> assertThat(p.factor()).isCloseTo(1, within(1e-9)));
  }

  @Test
  void aForecastPromisesWhatATestOfTheNominalStructureThenKeeps() {
    for (Twin twin : Twin.all()) {
      UpdateResult forecast = forecast(twin);
      UpdateResult kept =
          twin.update(nominalTest(twin, 12), UpdateSettings.ESTIMATES).orRefuse();
      for (int k = 0; k < forecast.parameters().size(); k++) {
        // the test's scatter is itself estimated: 20 to 30 % with its few degrees of freedom
        assertThat(
                forecast.parameters().get(k).posteriorStandardDeviation()
                    / kept.parameters().get(k).posteriorStandardDeviation())
            .as(twin.name() + ": " + forecast.parameters().get(k).name())
            .isBetween(0.6, 1.6);
      }
    }
  }

  private static UpdateResult forecast(Twin twin) {
    TestLog log = twin.planned();
    FrameModel frame = twin.frame();
    double[][] computed =
        ConfiguredFrame.nominal(frame, log.gauges(), log.loads()).orRefuse();
    MeasuredFlexibility expected =
        TestPlanner.plan(
                new ReductionProblem(Study.ONLY_CONFIGURATION, log, Twin.places(frame)), computed)
            .orRefuse()
            .flexibility();
    return StudyUpdate.beforeTest(twin.study(), frame, List.of(expected)).orRefuse();
  }

  @Test
  void oneParameterSetServesSeveralConfigurationsAndTheOneThatDisagreesIsNamed() {
    Twin twin = Twin.portal("");
    List<WorkingParameter> parameters = twin.working();
    double[] x = {-0.4, 0.3, -0.5, 0.02};
    MeasuredFlexibility first =
        twin.test(twin.frame(), x, parameters, new SplittableRandom(31));
    String held =
        "{\"x\": \"fixed\", \"y\": \"fixed\", \"z\": \"fixed\", \"rx\": \"fixed\", \"rz\": \"fixed\","
            + " \"ry\": \"free\"}";
    String configurations =
        "\"configurations\": [{\"name\": \"as tested\", \"log\": \"a.xlsx\"}, {\"name\": \"pinned\","
            + " \"log\": \"b.xlsx\", \"changes\": {\"replace\": {\"supports\": {\"d\": " + held
            + "}}}}]";
    Study study =
        study("{\"model\": \"m.json\", " + configurations + ", \"parameters\": {"
            + twin.parameters() + "}}");
    FrameModel pinned =
        with(
            twin,
            "\"d\": {\"x\": \"fixed\", \"y\": \"fixed\", \"z\": \"fixed\", \"rx\": \"fixed\","
                + " \"rz\": \"fixed\", \"ry\": 6e6}",
            "\"d\": " + held);
    MeasuredFlexibility second =
        named(twin.test(pinned, x, parameters, new SplittableRandom(32)), "pinned");
    UpdateResult result =
        StudyUpdate.run(study, twin.frame(), List.of(first, second)).orRefuse();
    assertThat(result.verdict()).isEqualTo(Verdict.UPDATED);
    assertThat(result.configurations()).allSatisfy(c -> assertThat(c.agrees()).isTrue());
    for (int k = 0; k < x.length; k++) {
      ParameterResult p = result.parameters().get(k);
      assertThat(Math.abs(p.workingValue() - x[k]))
          .isLessThan(4 * p.posteriorStandardDeviation());
    }
    MeasuredFlexibility wrong =
        named(twin.test(twin.frame(), x, parameters, new SplittableRandom(33)), "pinned");
    UpdateResult misfit =
        StudyUpdate.run(study, twin.frame(), List.of(first, wrong)).orRefuse();
    assertThat(misfit.verdict()).isEqualTo(Verdict.MISFITS_EVEN_AT_BEST);
  }

  private static MeasuredFlexibility named(MeasuredFlexibility m, String name) {
    return new MeasuredFlexibility(
        name,
        m.gauges(),
        m.loads(),
        m.absolute(),
        m.gains(),
        m.scatterDegreesOfFreedom(),
        m.map(),
        m.coefficients());
  }

  @Test
  void theComparisonPointsAtThePartThatDiffers() {
    Twin twin = Twin.bracket("");
    List<WorkingParameter> parameters = twin.working();
    MeasuredFlexibility measured =
        twin.test(
            twin.frame(),
            new double[] {0, Math.log(0.5), 0},
            parameters,
            new SplittableRandom(14));
    var comparison =
        org.flexbound.compare.FlexibilityComparator.compare(
                twin.study(), twin.frame(), List.of(measured))
            .orRefuse()
            .configurations()
            .get(0);
    assertThat(comparison.misfit()).isGreaterThan(comparison.limit());
    // The leg bends where the elbow turns, so both may stand at the top.
    assertThat(comparison.parts().subList(0, 3))
        .anySatisfy(
            part -> {
              assertThat(part.part()).isEqualTo("joints.elbow.ry");
              assertThat(part.complianceFactor()).isCloseTo(2, within(0.15));
            });
    comparison
        .coefficients()
        .forEach(
            c -> {
              double sum = c.contributions().stream().mapToDouble(p -> p.value()).sum();
              assertThat(sum).isCloseTo(c.computed(), within(1e-6 * Math.abs(c.computed()) + 1e-15));
            });
  }
}
