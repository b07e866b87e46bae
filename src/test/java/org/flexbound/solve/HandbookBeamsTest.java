package org.flexbound.solve;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.flexbound.frame.FrameModel;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Load;
import org.junit.jupiter.api.Test;

class HandbookBeamsTest {
  private static final double EI = 210e9 * 8e-6;

  private static FrameModel beam(String supports) {
    return Frames.model(
        """
        {"units": {"length": "m", "force": "N", "mass": "kg", "angle": "rad"},
         "nodes": {"a": [0, 0, 0], "b": [3, 0, 0]},
         "materials": {"steel": {"E": 210e9, "nu": 0.3}},
         "sections": {"s": {"A": 5e-3, "Iy": 8e-6, "Iz": 3e-6, "J": 1e-6}},
         "joints": {"hinge": {"ry": "free"}, "soft": {"ry": 1e6}},
         "members": {"beam": {"nodes": ["a", "b"], "section": "s", "material": "steel"}},
         "supports": %s}
        """
            .formatted(supports));
  }

  private static final String WALL =
      "{\"x\": \"fixed\", \"y\": \"fixed\", \"z\": \"fixed\","
          + " \"rx\": \"fixed\", \"ry\": \"fixed\", \"rz\": \"fixed\"}";

  @Test
  void cantileverTipMatchesTheHandbook() {
    FrameModel model = beam("{\"a\": " + WALL + "}");
    FlexibilitySolution solution =
        Frames.solve(
            model,
            List.of(
                Frames.gauge("b", "z"),
                Frames.gauge("b", "ry"),
                Frames.gauge("b", "x"),
                Frames.gauge("b", "rx"),
                Frames.gauge("b", "y")),
            List.of(
                Frames.load("b", "z"),
                Frames.load("b", "ry"),
                Frames.load("b", "x"),
                Frames.load("b", "rx"),
                Frames.load("b", "y")));
    close(solution.value(0, 0), 27 / (3 * EI));
    close(solution.value(1, 0), -9 / (2 * EI));
    close(solution.value(0, 1), -9 / (2 * EI));
    close(solution.value(1, 1), 3 / EI);
    close(solution.value(2, 2), 3 / (210e9 * 5e-3));
    close(solution.value(3, 3), 3 / (210e9 / 2.6 * 1e-6));
    close(solution.value(4, 4), 27 / (3 * 210e9 * 3e-6));
  }

  private static void close(double value, double expected) {
    assertThat(value).isCloseTo(expected, within(1e-9 * Math.abs(expected)));
  }

  @Test
  void builtInBeamBendsAsTheHandbookSaysUnderAMidSpanLoad() {
    FrameModel model = beam("{\"a\": " + WALL + ", \"b\": " + WALL + "}");
    Gauge middle = Frames.gauge("beam@0.5", "z");
    Load load = Frames.load("beam@0.5", "z");
    close(Frames.coefficient(model, middle, load), 27 / (192 * EI));
  }
}
