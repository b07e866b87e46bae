package org.flexbound.solve;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Refusal;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessSetting;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The flexibility of the lowest modes, its derivatives by differences, and where the cut may lie. */
class TruncatedFlexibilityTest {
  private static StiffnessPath path(String text) {
    return StiffnessPath.parse(text).orElseThrow();
  }

  private static List<StiffnessSetting> set(
      TruncatedFlexibility ready, int k, StiffnessSetting setting) {
    List<StiffnessSetting> settings = new ArrayList<>(ready.nominal());
    settings.set(k, setting);
    return settings;
  }

  @Test
  void derivativesByLogarithmAgreeWithCentralDifferences() {
    agreeWithDifferences(
        4,
        List.of(
            "members.ae.EIy", "members.ae.GAz", "members.dh.EIy", "members.fg.EIz", "members.eg.EA",
            "joints.soft.x", "joints.full.rz", "supports.B.x"));
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 3, 9, 15})
  @Tag("long")
  void derivativesByLogarithmAgreeWithCentralDifferencesForAnyCut(int count) {
    agreeWithDifferences(
        count,
        List.of(
            "members.ae.EA", "members.ae.EIy", "members.ae.GAz", "members.bf.EIz", "members.dh.EIy",
            "members.dh.GAy", "members.fg.EIz", "members.gh.GJ", "members.eg.EA", "joints.knee.ry",
            "joints.soft.x", "joints.full.rz", "connections.tie.x", "supports.B.x", "supports.D.ry",
            "materials.steel.E"));
  }

  private static void agreeWithDifferences(int count, List<String> texts) {
    RandomFrame frame = new RandomFrame(3);
    List<StiffnessPath> paths = texts.stream().map(text -> path(text)).toList();
    TruncatedFlexibility ready =
        TruncatedFlexibility.prepare(frame.model(), frame.gauges(), frame.loads(), paths, count)
            .orRefuse();
    TruncatedSolution solution = ready.solve(ready.nominal());
    double[][][] exact =
        solution.byLogarithms(paths.stream().map(p -> List.of(p)).toList());
    double h = 1e-3;
    for (int k = 0; k < paths.size(); k++) {
      double[][] narrow = difference(ready, k, h);
      double[][] wide = difference(ready, k, 2 * h);
      for (int g = 0; g < narrow.length; g++) {
        double scale = 0;
        for (int l = 0; l < narrow[g].length; l++) {
          for (PartContribution part : solution.contributions(g, l)) {
            scale = Math.max(scale, Math.abs(part.value()));
          }
        }
        for (int l = 0; l < narrow[g].length; l++) {
          double expected = (4 * narrow[g][l] - wide[g][l]) / 3;
          assertThat(exact[k][g][l])
              .as("%s, gauge %s, load %s", paths.get(k), g, l)
              .isCloseTo(expected, within(2e-7 * scale));
        }
      }
    }
  }

  private static double[][] difference(TruncatedFlexibility ready, int k, double h) {
    double[][] up = ready.solve(set(ready, k, new StiffnessSetting.Factor(Math.exp(h)))).values();
    double[][] down =
        ready.solve(set(ready, k, new StiffnessSetting.Factor(Math.exp(-h)))).values();
    for (int g = 0; g < up.length; g++) {
      for (int l = 0; l < up[g].length; l++) {
        up[g][l] = (up[g][l] - down[g][l]) / (2 * h);
      }
    }
    return up;
  }

  @Test
  void contributionsSumToTheCoefficient() {
    RandomFrame frame = new RandomFrame(4);
    TruncatedFlexibility ready =
        TruncatedFlexibility.prepare(frame.model(), frame.gauges(), frame.loads(), List.of(), 7)
            .orRefuse();
    TruncatedSolution solution = ready.solve(List.of());
    for (int g = 0; g < frame.gauges().size(); g++) {
      for (int l = 0; l < frame.loads().size(); l++) {
        double sum = 0;
        double size = 0;
        for (PartContribution part : solution.contributions(g, l)) {
          sum += part.value();
          size += Math.abs(part.value());
        }
        assertThat(solution.value(g, l)).as("%s, %s", g, l).isCloseTo(sum, within(1e-9 * size));
      }
    }
  }

  /** A square tube standing up: its bending modes come in pairs, whatever its end is fastened to. */
  private static final FrameModel MAST =
      Frames.model(
          """
          {"units": {"length": "m", "force": "N", "mass": "kg", "angle": "rad"},
           "nodes": {"a": [0, 0, 0], "b": [0, 0, 4], "c": [0, 0, 6]},
           "materials": {"steel": {"E": 210e9, "nu": 0.3, "density": 7850}},
           "sections": {"s": {"shape": "rectangular hollow", "depth": 0.1, "width": 0.1, "wall": 0.006}},
           "joints": {"base": {"rx": 1e6, "ry": 4e5, "rz": 4e5}, "open": {"ry": 1e5}},
           "members": {"low": {"nodes": ["a", "b"], "section": "s", "material": "steel",
                               "reference": [1, 0, 0], "joints": {"start": "base"}},
                       "high": {"nodes": ["b", "c"], "section": "s", "material": "steel",
                                "reference": [1, 0, 0]}},
           "supports": {"a": {"x": "fixed", "y": "fixed", "z": "fixed", "rx": "fixed", "ry": "fixed",
                              "rz": "fixed"}}}
          """);

  @Test
  void theCutIsMovedAboveAPairOfEqualModesWithAFinding() {
    Outcome<TruncatedFlexibility> outcome =
        TruncatedFlexibility.prepare(
            MAST, List.of(Frames.gauge("c", "x")), List.of(Frames.load("c", "x")), List.of(), 1);
    assertThat(outcome.findings())
        .filteredOn(f -> f.kind() == SolveFinding.CUT_MOVED)
        .extracting(Finding::message)
        .singleElement()
        .asString()
        .startsWith("the modes 1 and 2 lie within 0.0 % of each other (")
        .endsWith("the lowest 2 modes are taken in place of 1");
    assertThat(outcome.orRefuse().modeCount()).isEqualTo(2);
  }

  @Test
  void derivativesWithinAPairOfEqualModesAreFiniteAndThoseOfDifferences() {
    // ry alone softens one of the two planes: the pair splits as soon as it is changed.
    List<StiffnessPath> paths = List.of(path("joints.base.ry"), path("members.high.EIz"));
    TruncatedFlexibility ready =
        TruncatedFlexibility.prepare(
                MAST,
                List.of(Frames.gauge("c", "x"), Frames.gauge("c", "y"), Frames.gauge("b", "rx")),
                List.of(Frames.load("c", "x"), Frames.load("b", "y")),
                paths,
                2)
            .orRefuse();
    TruncatedSolution solution = ready.solve(ready.nominal());
    double size = Math.abs(solution.value(0, 0));
    for (int k = 0; k < 2; k++) {
      double[][] exact = solution.derivative(k, Derivative.LOGARITHM);
      double[][] narrow = difference(ready, k, 1e-3);
      double[][] wide = difference(ready, k, 2e-3);
      for (int g = 0; g < 3; g++) {
        for (int l = 0; l < 2; l++) {
          assertThat(exact[g][l])
              .isCloseTo((4 * narrow[g][l] - wide[g][l]) / 3, within(1e-8 * size));
        }
      }
    }
    assertThat(Math.abs(solution.derivative(0, Derivative.LOGARITHM)[0][0])
            + Math.abs(solution.derivative(0, Derivative.LOGARITHM)[1][1]))
        .isGreaterThan(0.05 * size);
  }

  @Test
  void moreModesComeNearerToTheWholeFlexibilityFromBelow() {
    double full = Frames.coefficient(MAST, Frames.gauge("c", "x"), Frames.load("c", "x"));
    double before = 0;
    for (int count : new int[] {2, 8, 30}) {
      TruncatedFlexibility ready =
          TruncatedFlexibility.prepare(
                  MAST,
                  List.of(Frames.gauge("c", "x")),
                  List.of(Frames.load("c", "x")),
                  List.of(),
                  count)
              .orRefuse();
      double value = ready.solve(List.of()).value(0, 0);
      assertThat(value).isGreaterThan(before).isLessThan(full);
      before = value;
    }
    assertThat(before).isCloseTo(full, within(1e-3 * full));
  }

  @Test
  void aRigidPartThatMayBeSetHasADerivativeByItsCompliance() {
    FrameModel rigid =
        MAST.with(
            java.util.Map.of(
                path("joints.base.ry"), new StiffnessSetting.Value(Double.POSITIVE_INFINITY)));
    List<StiffnessPath> paths = List.of(path("joints.base.ry"));
    TruncatedFlexibility ready =
        TruncatedFlexibility.prepare(
                rigid,
                List.of(Frames.gauge("c", "x"), Frames.gauge("c", "y")),
                List.of(Frames.load("c", "x"), Frames.load("c", "y")),
                paths,
                4)
            .orRefuse();
    double[][] exact = ready.solve(ready.nominal()).derivative(0, Derivative.COMPLIANCE);
    double c = 1e-8;
    double[][] at0 = ready.solve(ready.nominal()).values();
    double[][] at1 = ready.solve(List.of(new StiffnessSetting.Value(1 / c))).values();
    double[][] at2 = ready.solve(List.of(new StiffnessSetting.Value(0.5 / c))).values();
    for (int i = 0; i < 2; i++) {
      double expected = (4 * at1[i][i] - 3 * at0[i][i] - at2[i][i]) / (2 * c);
      assertThat(exact[i][i]).isCloseTo(expected, within(1e-4 * Math.abs(expected) + 1e-6));
    }
    assertThat(exact[0][0] + exact[1][1]).isGreaterThan(30);
  }

  @Test
  void aSettingThatFreesTheStructureIsRefusedByName() {
    TruncatedFlexibility ready =
        TruncatedFlexibility.prepare(
                MAST,
                List.of(Frames.gauge("c", "x")),
                List.of(Frames.load("c", "x")),
                List.of(path("joints.base.ry")),
                2)
            .orRefuse();
    assertThatThrownBy(() -> ready.solve(List.of(new StiffnessSetting.Value(0))))
        .isExactlyInstanceOf(Refusal.class)
        .hasMessageContaining("with joints.base.ry set free: ");
  }
}
