package org.flexbound.solve;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.OptionalInt;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.FrameReader;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Load;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Published natural frequencies, and what truncation leaves out. */
class ModeChecksTest {
  static Stream<CheckFile.Case> cases() {
    return CheckFile.cases("frame-modes");
  }

  @ParameterizedTest
  @MethodSource("cases")
  void frequenciesMatchThePublishedOnes(CheckFile.Case check) {
    FrameModel model = FrameReader.read(check.part("model")).orRefuse();
    double[] expected = check.numbers("frequencies");
    int[] modes =
        check.values().get("modes").isPresent()
            ? java.util.Arrays.stream(check.numbers("modes")).mapToInt(d -> (int) d).toArray()
            : IntStream.range(0, expected.length).toArray();
    ModeSettings settings =
        ModeSettings.of(modes[modes.length - 1] + 1).withPieces((int) check.number("pieces"));
    FrameModes found = FrameModes.of(model, List.of(), List.of(), settings).orRefuse();
    double tolerance = check.number("tolerance");
    for (int i = 0; i < expected.length; i++) {
      assertThat(found.frequencies()[modes[i]])
          .as("%s: mode %s of %s", check, modes[i] + 1, java.util.Arrays.toString(found.frequencies()))
          .isCloseTo(expected[i], within(tolerance * expected[i]));
    }
    assertThat(java.util.Arrays.stream(found.residuals()).max().orElse(1)).isLessThan(1e-6);
    assertThat(found.orthogonality()).isLessThan(1e-8);
  }

  private static final FrameModel CANTILEVER =
      Frames.model(
          """
          {"units": {"length": "m", "force": "N", "mass": "kg", "angle": "rad"},
           "nodes": {"a": [0, 0, 0], "b": [10, 0, 0]},
           "materials": {"steel": {"E": 200e9, "nu": 0.3, "density": 1e-6}},
           "sections": {"s": {"A": 1e-4, "Iy": 1e-8, "Iz": 1e-2, "J": 1e-2}},
           "members": {"m": {"nodes": ["a", "b"], "section": "s", "material": "steel",
                             "massPerLength": 10}},
           "supports": {"a": {"x": "fixed", "z": "fixed", "ry": "fixed"}}}
          """);

  /** Shares of the tip flexibility in the first bending modes, Σ 12/z⁴, cos z cosh z = −1. */
  private static final double[] SHARES = {
    0.970688, 0.995404, 0.998556, 0.999377, 0.999678, 0.999812, 0.999881, 0.999920
  };

  @Test
  void shareOfTheTipFlexibilityInTheFirstModesIsThatOfTheUniformCantilever() {
    Gauge tip = Frames.gauge("b", "z");
    Load load = Frames.load("b", "z");
    FrameModes modes =
        FrameModes.of(
                CANTILEVER, List.of(tip), List.of(load), ModeSettings.of(8).withPieces(40))
            .orRefuse();
    assertThat(modes.full()[0][0]).isCloseTo(1000 / (3 * 2000.0), within(1e-9));
    for (int n = 1; n <= 8; n++) {
      assertThat(modes.truncated(n)[0][0] / modes.full()[0][0])
          .as("first %s modes", n)
          .isCloseTo(SHARES[n - 1], within(1e-5));
    }
    assertThat(modes.enough(0, 0, 0.10)).isEqualTo(OptionalInt.of(1));
    assertThat(modes.enough(0, 0, 0.01)).isEqualTo(OptionalInt.of(2));
    assertThat(modes.enough(0, 0, 1e-6)).isEmpty();
    assertThat(modes.remainder(8)[0][0]).isPositive();
  }

  @Test
  void dividingByTheProgramGivesFourDigitsOfTheFirstFrequencies() {
    FrameModes modes =
        FrameModes.of(CANTILEVER, List.of(), List.of(), ModeSettings.of(4)).orRefuse();
    double[] roots = {1.875104069, 4.694091133, 7.854757438, 10.995540735};
    for (int k = 0; k < 4; k++) {
      double exact =
          roots[k] * roots[k] / 100 * Math.sqrt(2000.0 / 10) / (2 * Math.PI);
      assertThat(modes.frequencies()[k]).isCloseTo(exact, within(2e-4 * exact));
    }
  }

  @Test
  void aFreeBeamHasSixRigidModesAndItsElasticFrequenciesAreThoseOfTheFreeBeam() {
    FrameModel beam =
        Frames.model(
            """
            {"units": {"length": "m", "force": "N", "mass": "kg", "angle": "rad"},
             "nodes": {"a": [0, 0, 0], "b": [10, 0, 0]},
             "materials": {"steel": {"E": 200e9, "nu": 0.3, "density": 1e-3}},
             "sections": {"s": {"A": 1e-2, "Iy": 1e-6, "Iz": 4e-6, "J": 1e-5}},
             "members": {"m": {"nodes": ["a", "b"], "section": "s", "material": "steel",
                               "massPerLength": 10}}}
            """);
    Load pair =
        Frames.load(
            List.of(
                Frames.point(Frames.at("a"), Frames.direction("z"), 0.5),
                Frames.point(Frames.at("m@0.5"), Frames.direction("z"), -1),
                Frames.point(Frames.at("b"), Frames.direction("z"), 0.5)));
    FrameModes modes =
        FrameModes.of(
                beam,
                List.of(Frames.relative("a", "m@0.5", "z")),
                List.of(pair),
                ModeSettings.of(12).withPieces(20))
            .orRefuse();
    assertThat(modes.rigidBodyModes()).isEqualTo(6);
    double first = 4.730040745 * 4.730040745 / 100 * Math.sqrt(200e9 * 1e-6 / 10) / (2 * Math.PI);
    assertThat(modes.frequencies()[0]).isCloseTo(first, within(1e-4 * first));
    // Half the load at each end against the middle: that of a beam on two supports, turned over.
    double expected = -1000 / (48 * 200e9 * 1e-6);
    assertThat(modes.full()[0][0]).isCloseTo(expected, within(1e-8 * Math.abs(expected)));
    assertThat(modes.truncated(12)[0][0]).isCloseTo(expected, within(5e-3 * Math.abs(expected)));
  }
}
