package org.flexbound.reduce;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;
import org.assertj.core.data.Percentage;
import org.flexbound.finding.Finding;
import org.flexbound.setup.Direction;
import org.flexbound.setup.FitRange;
import org.flexbound.setup.QualityLimits;
import org.flexbound.setup.ReductionOptions;
import org.flexbound.setup.Vector;
import org.flexbound.testlog.TestLogMaker;
import org.junit.jupiter.api.Test;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.ObjectMapper;

/** Published readings through the whole reduction; the sources stand in the check files. */
class PublishedReadingsTest {
  private static final Direction DOWN = Direction.along(new Vector(0, 0, -1));

  private static JsonNode check(String name) {
    return new ObjectMapper().readTree(Path.of("src/test/resources/checks", name).toFile());
  }

  private static double[] numbers(JsonNode node) {
    return IntStream.range(0, node.size()).mapToDouble(k -> node.get(k).asDouble()).toArray();
  }

  private static TestLogMaker wholeRange(double curvatureLimit) {
    ReductionOptions usual = ReductionOptions.USUAL;
    QualityLimits q = usual.qualityLimits();
    return new TestLogMaker()
        .instrument("cell", 0, 0, 0)
        .instrument("dial", 0, 0, 0)
        .options(
            new ReductionOptions(
                usual.statedRepeatability(), new FitRange(0, 1), Map.of(), usual.beddingIn(), usual.slopeFit(),
                usual.localGravity(), usual.takeOutBaseMotion(),
                new QualityLimits(
                    q.linearity(), q.hysteresis(), q.repeatability(), q.zeroReturn(), q.resolution(), curvatureLimit,
                    q.reciprocityZ(), q.baseMotionShare()),
                usual.decisionRule()));
  }

  private static Reduction reduce(TestLogMaker maker) {
    return Reducer.reduce(new ReductionProblem("as tested", maker.log(), station -> Optional.empty())).orRefuse();
  }

  private static double slope(Reduction reduction, String gauge, String load) {
    return reduction.slopes().stream()
        .filter(slope -> slope.gauge().equals(gauge) && slope.load().equals(load))
        .mapToDouble(RunSlope::slope)
        .findFirst()
        .orElseThrow();
  }

  @Test
  void theAngleSectionGivesItsSixSlopesAndBendsInItsFirstDirectionAlone() {
    JsonNode check = check("angle-section-cantilever.json");
    double[] load = numbers(check.get("load"));
    TestLogMaker maker = wholeRange(QualityLimits.USUAL.curvature());
    check.get("directions").forEach(direction -> maker.load(direction.get("name").asString(), "tip", DOWN, "cell"));
    // two dials at 45 degrees to either side; the published motions are their sum and difference over √2
    maker.gauge("L", "tip", DOWN, "dial", false).gauge("R", "tip", DOWN, "dial", false);
    for (JsonNode direction : check.get("directions")) {
      double[] left = numbers(direction.get("left"));
      double[] right = numbers(direction.get("right"));
      double[][] rows = new double[load.length][];
      for (int k = 0; k < rows.length; k++) {
        rows[k] = new double[] {load[k], 1e-3 * left[k], 1e-3 * right[k]};
      }
      maker.run(direction.get("name").asString(), direction.get("name").asString(), rows);
    }
    Reduction reduction = reduce(maker);
    for (JsonNode direction : check.get("directions")) {
      String name = direction.get("name").asString();
      double left = 1e3 * slope(reduction, "L", name);
      double right = 1e3 * slope(reduction, "R", name);
      double tolerance = check.get("tolerance").asDouble();
      assertThat((left + right) / Math.sqrt(2)).as(name).isCloseTo(direction.get("slopeU").asDouble(), within(tolerance));
      assertThat((left - right) / Math.sqrt(2)).as(name).isCloseTo(direction.get("slopeV").asDouble(), within(tolerance));
    }
    List<String> curved = new ArrayList<>();
    for (Finding finding : reduction.findings()) {
      if (finding.code().equals("RED-CURVED")) {
        curved.add(finding.message());
      }
    }
    assertThat(curved).isNotEmpty().allMatch(message -> message.contains("run '0 deg'"));
    assertThat(curved).anyMatch(message -> message.startsWith("'R' under '0 deg'"));
  }

  private static Reduction loadCell(double curvatureLimit) {
    JsonNode check = check("nist-pontius.json");
    double[] x = numbers(check.get("x"));
    double[] y = numbers(check.get("y"));
    // the dataset states no units: newtons and millimetres are assumed
    TestLogMaker maker =
        wholeRange(curvatureLimit).load("ram", "head", DOWN, "cell").gauge("deflection", "head", DOWN, "dial", false);
    int half = x.length / 2;
    for (int run = 0; run < 2; run++) {
      double[][] rows = new double[half][];
      for (int k = 0; k < half; k++) {
        rows[k] = new double[] {x[run * half + k], 1e-3 * y[run * half + k]};
      }
      maker.run("run " + (run + 1), "ram", rows);
    }
    return reduce(maker);
  }

  @Test
  void theCurvatureOfALoadCellIsFoundAndItsSizeStated() {
    double[] certified = numbers(check("nist-pontius.json").get("coefficients"));
    double loads = 3_000_000 - 150_000;
    for (RunSlope slope : loadCell(QualityLimits.USUAL.curvature()).slopes()) {
      SlopeQuality quality = slope.quality().orElseThrow();
      assertThat(quality.curvatureProbability()).isLessThan(1e-10);
      double departure = 1e-3 * certified[2] * loads * loads / 4;
      // each run has a quadratic of its own: both lie within some standard errors (1.5 %, √2 more for half the points) of the certified
      assertThat(quality.curvature() * quality.span()).isCloseTo(departure, Percentage.withPercentage(6));
    }
  }

  @Test
  void itIsTheStatedSizeNotTheSignificanceAloneThatSpeaksAgainstARun() {
    Reduction usual = loadCell(QualityLimits.USUAL.curvature());
    assertThat(usual.findings()).extracting(Finding::code).doesNotContain("RED-CURVED");
    assertThat(usual.runs()).allMatch(run -> run.verdict() == RunVerdict.ACCEPT);
    Reduction strict = loadCell(0.002);
    assertThat(strict.findings()).filteredOn(finding -> finding.code().equals("RED-CURVED")).hasSize(2)
        .allSatisfy(finding -> assertThat(finding.message()).contains("curvature 0.3 % of span, limit 0.2 %"));
    assertThat(strict.runs()).allMatch(run -> run.verdict() == RunVerdict.DOUBTFUL);
  }
}
