package org.flexbound.update;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import org.flexbound.document.JsonFile;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.FrameReader;
import org.flexbound.frame.FrameWriter;
import org.flexbound.compare.Comparison;
import org.flexbound.compare.CoefficientComparison;
import org.flexbound.compare.FlexibilityComparator;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/** Twins: simulated tests of invented structures, the whole way from raw readings. */
class TwinsTest {
  private static final int LONG = 1000;
  private static final int SHORT = 4;

  @Test
  void theJacobianOfEveryTwinAgreesWithDifferences() {
    for (Twin twin : Twin.all()) {
      List<WorkingParameter> parameters = twin.working();
      MeasuredFlexibility measured =
          twin.test(
              twin.frame(), new double[parameters.size()], parameters, new SplittableRandom(1));
      UpdateProblem problem =
          StudyUpdate.problem(twin.study(), twin.frame(), List.of(measured)).orRefuse();
      double[] x = twin.truth(parameters, new SplittableRandom(2));
      FlexibilityFunction.Computed at = problem.function().at(x);
      for (int k = 0; k < x.length; k++) {
        double h = 1e-5;
        double[] up = x.clone();
        double[] down = x.clone();
        up[k] += h;
        down[k] -= h;
        double[] a = problem.function().coefficients(up);
        double[] b = problem.function().coefficients(down);
        for (int i = 0; i < a.length; i++) {
          double largest = Arrays.stream(at.coefficients()).map(Math::abs).max().orElseThrow();
          assertThat(at.jacobian()[i][k])
              .isCloseTo((a[i] - b[i]) / (2 * h), within(1e-6 * largest));
        }
      }
    }
  }

  @Test
  void theUpdatedModelReadBackGivesTheSameFlexibility() {
    Twin twin = Twin.gantry();
    List<WorkingParameter> parameters = twin.working();
    SplittableRandom random = new SplittableRandom(8);
    MeasuredFlexibility measured =
        twin.test(twin.frame(), twin.truth(parameters, random), parameters, random);
    UpdateResult result = twin.update(measured, UpdateSettings.FULL).orRefuse();
    FrameModel updated = StudyUpdate.updatedModel(twin.frame(), result);
    FrameModel back =
        FrameReader.read(JsonFile.parse(FrameWriter.write(updated), "updated.json").orRefuse())
            .orRefuse();
    Comparison comparison =
        FlexibilityComparator.compare(twin.study(), back, List.of(measured)).orRefuse();
    List<CoefficientComparison> compared = comparison.coefficients();
    assertThat(compared).hasSameSizeAs(result.coefficients());
    for (int i = 0; i < compared.size(); i++) {
      double expected = result.coefficients().get(i).updatedModel();
      assertThat(compared.get(i).computed())
          .isCloseTo(expected, within(1e-9 * Math.abs(expected) + 1e-18));
    }
  }

  @Test
  void everyTwinIsFoundWithinItsIntervalsAboutAsOftenAsStated() {
    Coverage all = new Coverage();
    long seed = 100;
    for (Twin twin : Twin.all()) {
      all.merge(Coverage.of(twin, SHORT, seed++));
    }
    double hits = 0;
    double intervals = 0;
    for (String status : all.statuses()) {
      hits += all.share(status) * all.intervals(status);
      intervals += all.intervals(status);
    }
    assertThat(hits / intervals).isBetween(0.85, 1.0);
    assertThat(all.misfitShare()).isLessThan(0.15);
  }

  @Test
  void twinsMadeOutsideTheModelEndAsMisfits() {
    int misfits = 0;
    for (int t = 0; t < 5; t++) {
      misfits += endsAsMisfit(Twin.bracket(""), Twin.bracket(PROP), 40 + t) ? 1 : 0;
      misfits += endsAsMisfit(Twin.portal(""), Twin.portal(HINGE), 60 + t) ? 1 : 0;
    }
    assertThat(misfits).isGreaterThanOrEqualTo(9);
  }

  private static final String PROP = "\"tip\": {\"z\": 1.5e7, \"x\": 3e6}, ";
  private static final String HINGE = ", \"end\": \"hinge\"";

  private static boolean endsAsMisfit(Twin twin, Twin outside, long seed) {
    List<WorkingParameter> parameters = twin.working();
    SplittableRandom random = new SplittableRandom(seed);
    MeasuredFlexibility measured =
        twin.test(outside.frame(), twin.truth(parameters, random), parameters, random);
    return twin.update(measured, UpdateSettings.ESTIMATES).orRefuse().verdict()
        == Verdict.MISFITS_EVEN_AT_BEST;
  }

  private static int misfits(Twin twin, Twin outside, int tests, long seed) {
    return (int)
        IntStream.range(0, tests)
            .parallel()
            .filter(t -> endsAsMisfit(twin, outside, Coverage.stream(seed, t)))
            .count();
  }

  @Test
  @Tag("long")
  void intervalsCoverAsStatedOverAThousandTestsOfEachTwin() throws IOException {
    StringBuilder text =
        new StringBuilder("| structure | status | tests with it | intervals | hold the truth |\n");
    text.append("| --- | --- | --- | --- | --- |\n");
    Coverage all = new Coverage();
    long seed = 1000;
    int tests = Integer.getInteger("twins", LONG);
    String only = System.getProperty("twins.only", "");
    for (Twin twin : Twin.all()) {
      seed++;
      if (!twin.name().contains(only)) {
        continue;
      }
      Coverage own = Coverage.of(twin, tests, seed);
      text.append(own.table(twin.name()));
      all.merge(own);
    }
    text.append(all.table("all"));
    int bracket = misfits(Twin.bracket(""), Twin.bracket(PROP), tests, 5);
    int portal = misfits(Twin.portal(""), Twin.portal(HINGE), tests, 9);
    text.append("| bracket with a prop that the model lacks | ended as misfits | ")
        .append(tests + " | | " + 100.0 * bracket / tests + " % |\n")
        .append("| portal with a hinge that the model lacks | ended as misfits | ")
        .append(tests + " | | " + 100.0 * portal / tests + " % |\n");
    Files.writeString(Path.of("target", "twins-coverage.md"), text);
    for (String status : all.statuses()) {
      double slack = 2 * all.error(status);
      assertThat(all.share(status)).as(status).isGreaterThanOrEqualTo(0.93 - slack);
    }
    for (String status : List.of(Status.IDENTIFIED.words(), Coverage.combination())) {
      double slack = 2 * all.error(status);
      assertThat(all.share(status)).as(status).isBetween(0.93 - slack, 0.97 + slack);
    }
    assertThat(bracket).isGreaterThan((int) (0.95 * tests));
    assertThat(portal).isGreaterThan((int) (0.95 * tests));
  }
}
