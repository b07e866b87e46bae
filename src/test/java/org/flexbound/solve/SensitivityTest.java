package org.flexbound.solve;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import org.flexbound.frame.Stiffness;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessSetting;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Derivatives and contributions of random frames with every kind of part and gauge. */
class SensitivityTest {
  /** Of the sum of the sizes of all contributions to a coefficient. */
  private static final double AGREES = 1e-7;

  private static FrameFlexibility ready(RandomFrame frame, List<StiffnessPath> paths) {
    return FrameFlexibility.prepare(frame.model(), frame.gauges(), frame.loads(), paths)
        .orRefuse();
  }

  private static double[][] sizes(FlexibilitySolution solution, RandomFrame frame) {
    double[][] result = new double[frame.gauges().size()][frame.loads().size()];
    for (int g = 0; g < result.length; g++) {
      for (int l = 0; l < result[g].length; l++) {
        for (PartContribution part : solution.contributions(g, l)) {
          result[g][l] += Math.abs(part.value());
        }
      }
    }
    return result;
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4})
  void contributionsOfAllPartsSumToTheCoefficient(long seed) {
    RandomFrame frame = new RandomFrame(seed);
    FrameFlexibility ready = ready(frame, List.of());
    FlexibilitySolution solution = ready.solve(ready.nominal());
    double[][] sizes = sizes(solution, frame);
    for (int g = 0; g < frame.gauges().size(); g++) {
      for (int l = 0; l < frame.loads().size(); l++) {
        double sum =
            solution.contributions(g, l).stream().mapToDouble(PartContribution::value).sum();
        assertThat(sum)
            .as("gauge %s, load %s", frame.gauges().get(g).name(), l)
            .isCloseTo(solution.value(g, l), within(1e-11 * sizes[g][l]));
      }
    }
  }

  private static List<StiffnessPath> numericPaths(RandomFrame frame) {
    List<StiffnessPath> paths = new ArrayList<>();
    for (StiffnessPath path : frame.model().stiffnesses()) {
      Stiffness stiffness = frame.model().stiffness(path).orElseThrow();
      if (!stiffness.isFree() && !stiffness.isRigid()) {
        paths.add(path);
      }
    }
    paths.add(StiffnessPath.parse("materials.steel.E").orElseThrow());
    paths.add(StiffnessPath.parse("materials.alloy.E").orElseThrow());
    return paths;
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2})
  void derivativesByLogarithmAgreeWithCentralDifferences(long seed) {
    RandomFrame frame = new RandomFrame(seed);
    List<StiffnessPath> paths = numericPaths(frame);
    FrameFlexibility ready = ready(frame, paths);
    FlexibilitySolution solution = ready.solve(ready.nominal());
    double[][] sizes = sizes(solution, frame);
    double h = 1e-4;
    for (int k = 0; k < paths.size(); k++) {
      // Richardson's extrapolation of two central differences: error of the order h⁴.
      double[][] wide = difference(ready, k, 2 * h);
      double[][] narrow = difference(ready, k, h);
      double[][] exact = solution.derivative(k, Derivative.LOGARITHM);
      for (int g = 0; g < exact.length; g++) {
        for (int l = 0; l < exact[g].length; l++) {
          double expected = (4 * narrow[g][l] - wide[g][l]) / 3;
          assertThat(exact[g][l])
              .as("%s, gauge %s, load %s", paths.get(k), frame.gauges().get(g).name(), l)
              .isCloseTo(expected, within(AGREES * sizes[g][l]));
        }
      }
    }
  }

  private static double[][] difference(FrameFlexibility ready, int k, double h) {
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

  private static List<StiffnessSetting> set(
      FrameFlexibility ready, int k, StiffnessSetting setting) {
    List<StiffnessSetting> settings = new ArrayList<>(ready.nominal());
    settings.set(k, setting);
    return settings;
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "joints.knee.x", "joints.knee.rx", "supports.A.rx", "supports.A.z", "supports.B.z",
        "supports.C.x", "connections.tie.y", "joints.half.rz", "members.bf.GAy", "members.cg.GAz"
      })
  void derivativesByComplianceOfRigidPartsAgreeWithDifferences(String text) {
    RandomFrame frame = new RandomFrame(7);
    StiffnessPath path = StiffnessPath.parse(text).orElseThrow();
    FrameFlexibility ready = ready(frame, List.of(path));
    double nominal = frame.model().stiffness(path).orElseThrow().value();
    double[][] sizes = sizes(ready.solve(ready.nominal()), frame);
    double c0 = path.component().startsWith("r") ? 1e-8 : 1e-10;
    for (double at : new double[] {0, 1, 100}) {
      double c = Double.isInfinite(nominal) ? at * c0 : (1 + at / 100) / nominal;
      double h = Double.isInfinite(nominal) ? c0 : 1e-3 / nominal;
      double[][] exact =
          ready.solve(List.of(compliance(c))).derivative(0, Derivative.COMPLIANCE);
      double[][] expected = forward(ready, c, h);
      for (int g = 0; g < exact.length; g++) {
        for (int l = 0; l < exact[g].length; l++) {
          assertThat(exact[g][l] * h)
              .as("at compliance %s, gauge %s, load %s", c, frame.gauges().get(g).name(), l)
              .isCloseTo(expected[g][l] * h, within(1e-8 * sizes[g][l]));
        }
      }
    }
  }

  private static StiffnessSetting compliance(double c) {
    return new StiffnessSetting.Value(1 / c);
  }

  /** One-sided differences of fourth order: compliances below zero do not exist. */
  private static double[][] forward(FrameFlexibility ready, double c, double h) {
    double[] weights = {-25.0 / 12, 4, -3, 4.0 / 3, -0.25};
    double[][] sum = new double[ready.gauges().size()][ready.loads().size()];
    for (int n = 0; n < weights.length; n++) {
      double[][] values = ready.solve(List.of(compliance(c + n * h))).values();
      for (int g = 0; g < sum.length; g++) {
        for (int l = 0; l < sum[g].length; l++) {
          sum[g][l] += weights[n] * values[g][l] / h;
        }
      }
    }
    return sum;
  }

  @ParameterizedTest
  @ValueSource(
      strings = {"joints.pinned.ry", "joints.pinned.rz", "joints.pin.ry", "joints.pin.rx",
        "supports.D.z", "supports.D.rz"})
  void derivativesByStiffnessOfFreePartsAgreeWithDifferences(String text) {
    RandomFrame frame = new RandomFrame(5);
    StiffnessPath path = StiffnessPath.parse(text).orElseThrow();
    FrameFlexibility ready = ready(frame, List.of(path));
    double start = frame.model().stiffness(path).orElseThrow().value();
    FlexibilitySolution solution = ready.solve(ready.nominal());
    double[][] sizes = sizes(solution, frame);
    double[][] exact = solution.derivative(0, Derivative.STIFFNESS);
    double h = path.component().startsWith("r") ? 2e3 : 2e4;
    double[] weights = {-25.0 / 12, 4, -3, 4.0 / 3, -0.25};
    double[][] sum = new double[exact.length][exact[0].length];
    for (int n = 0; n < weights.length; n++) {
      double[][] values =
          ready.solve(List.of(new StiffnessSetting.Value(start + n * h))).values();
      for (int g = 0; g < sum.length; g++) {
        for (int l = 0; l < sum[g].length; l++) {
          sum[g][l] += weights[n] * values[g][l];
        }
      }
    }
    for (int g = 0; g < exact.length; g++) {
      for (int l = 0; l < exact[g].length; l++) {
        assertThat(exact[g][l] * h)
            .as("gauge %s, load %s", frame.gauges().get(g).name(), l)
            .isCloseTo(sum[g][l], within(1e-8 * sizes[g][l]));
      }
    }
  }
}
