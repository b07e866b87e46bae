package org.flexbound.solve;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessSetting;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Two rigid components that hold the same motion, both of which may be set. */
class ParallelRigidPartsTest {
  private static final String ALL =
      "{\"x\": \"fixed\", \"y\": \"fixed\", \"z\": \"fixed\", \"rx\": \"fixed\", \"ry\": \"fixed\","
          + " \"rz\": \"fixed\"}";

  private static final FrameModel MODEL =
      Frames.model(
          """
          {"units": {"length": "m", "force": "N", "mass": "kg", "angle": "rad"},
           "nodes": {"a": [0, 0, 0], "b": [2, 0, 0], "g": [2, 0, 0], "h": [2, 0, 0]},
           "materials": {"steel": {"E": 210e9, "nu": 0.3}},
           "sections": {"s": {"A": 5e-3, "Iy": 8e-6, "Iz": 3e-6, "J": 1e-6}},
           "joints": {"first": {"z": "rigid", "x": "free", "y": "free", "rx": "free", "ry": "free", "rz": "free"},
                      "second": {"z": "rigid", "x": "free", "y": "free", "rx": "free", "ry": "free", "rz": "free"}},
           "members": {"beam": {"nodes": ["a", "b"], "section": "s", "material": "steel"}},
           "connections": {"p": {"nodes": ["b", "g"], "joint": "first"},
                           "q": {"nodes": ["b", "h"], "joint": "second"}},
           "supports": {"a": %s, "g": %s, "h": %s}}
          """
              .formatted(ALL, ALL, ALL));

  private static final double TIP = 8 / (3 * 210e9 * 8e-6);

  private static FrameFlexibility ready() {
    return FrameFlexibility.prepare(
            MODEL,
            List.of(Frames.gauge("beam@0.5", "z"), Frames.gauge("b", "z")),
            List.of(Frames.load("b", "z"), Frames.load("beam@0.5", "z")),
            List.of(
                StiffnessPath.parse("connections.p.z").orElseThrow(),
                StiffnessPath.parse("connections.q.z").orElseThrow()))
        .orRefuse();
  }

  @ParameterizedTest
  @CsvSource({"0, 0", "1e-7, 0", "0, 1e-7", "1e-7, 3e-7", "1e-9, 1e-3", "1e-12, 1e-12"})
  void valuesAreThoseOfTwoSpringsSideBySide(double first, double second) {
    FlexibilitySolution solution =
        ready().solve(
            List.of(new StiffnessSetting.Value(1 / first), new StiffnessSetting.Value(1 / second)));
    double together = first == 0 || second == 0 ? 0 : 1 / (1 / first + 1 / second);
    double expected = together == 0 ? 0 : 1 / (1 / TIP + 1 / together);
    assertThat(solution.value(1, 0)).isCloseTo(expected, within(1e-12 * TIP));
  }

  @Test
  void derivativesAreThoseOfDifferencesWhereBothAreSoft() {
    FrameFlexibility ready = ready();
    double c = 2e-7;
    double h = 1e-9;
    FlexibilitySolution solution =
        ready.solve(List.of(new StiffnessSetting.Value(1 / c), new StiffnessSetting.Value(0.5 / c)));
    double[][] up =
        ready
            .solve(
                List.of(
                    new StiffnessSetting.Value(1 / c), new StiffnessSetting.Value(1 / (2 * c + h))))
            .values();
    double[][] down =
        ready
            .solve(
                List.of(
                    new StiffnessSetting.Value(1 / c), new StiffnessSetting.Value(1 / (2 * c - h))))
            .values();
    double[][] exact = solution.derivative(1, Derivative.COMPLIANCE);
    for (int g = 0; g < 2; g++) {
      for (int l = 0; l < 2; l++) {
        double expected = (up[g][l] - down[g][l]) / (2 * h);
        assertThat(exact[g][l]).isCloseTo(expected, within(1e-4 * Math.abs(expected)));
      }
    }
    double sum =
        solution.contributions(1, 0).stream().mapToDouble(PartContribution::value).sum();
    assertThat(sum).isCloseTo(solution.value(1, 0), within(1e-10 * solution.value(1, 0)));
  }

  @Test
  void bothRigidTheyShareTheForceAlikeSoThatSofteningBothTogetherIsForetold() {
    FrameFlexibility ready = ready();
    FlexibilitySolution rigid = ready.solve(ready.nominal());
    double first = rigid.derivative(0, Derivative.COMPLIANCE)[0][1];
    double second = rigid.derivative(1, Derivative.COMPLIANCE)[0][1];
    assertThat(first).isCloseTo(second, within(1e-6 * Math.abs(first)));
    double c = 1e-10;
    double changed =
        ready
            .solve(List.of(new StiffnessSetting.Value(1 / c), new StiffnessSetting.Value(1 / c)))
            .value(0, 1);
    assertThat((first + second) * c)
        .isCloseTo(changed - rigid.value(0, 1), within(1e-3 * Math.abs(first) * c));
  }
}
