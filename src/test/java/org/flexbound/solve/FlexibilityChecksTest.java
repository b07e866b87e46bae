package org.flexbound.solve;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.stream.Stream;
import org.flexbound.document.Json;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.FrameReader;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Load;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Published flexibility coefficients of beams and frames. */
class FlexibilityChecksTest {
  static Stream<CheckFile.Case> cases() {
    return CheckFile.cases("frame-flexibility");
  }

  @ParameterizedTest
  @MethodSource("cases")
  void coefficientsMatchThePublishedOnes(CheckFile.Case check) {
    FrameModel model = FrameReader.read(check.part("model")).orRefuse();
    List<Gauge> gauges = check.pairs("gauges").map(p -> Frames.gauge(p[0], p[1])).toList();
    List<Load> loads = check.pairs("loads").map(p -> Frames.load(p[0], p[1])).toList();
    FlexibilitySolution solution = Frames.solve(model, gauges, loads);
    double tolerance = check.number("tolerance");
    List<Json> rows = ((Json.Items) check.part("expected")).items();
    assertThat(rows).hasSameSizeAs(gauges);
    for (int g = 0; g < gauges.size(); g++) {
      List<Json> row = ((Json.Items) rows.get(g)).items();
      assertThat(row).hasSameSizeAs(loads);
      for (int l = 0; l < loads.size(); l++) {
        double expected = ((Json.Numeral) row.get(l)).value();
        double scale =
            Math.max(
                Math.abs(expected), 1e-9 * Math.abs(solution.value(Math.min(g, l), Math.min(g, l))));
        assertThat(solution.value(g, l))
            .as("%s: gauge %s, load %s", check, gauges.get(g).name(), loads.get(l).name())
            .isCloseTo(expected, within(tolerance * scale));
      }
    }
  }
}
