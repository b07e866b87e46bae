package org.flexbound.solve;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.flexbound.finding.Outcome;
import org.flexbound.frame.FrameModel;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Load;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** A plane model held by the program is the space model that a user would have held. */
class PlaneFrameTest {
  private static String model(String normal, String held) {
    // A portal in the x-z plane, or the same turned into x-y.
    String top = normal.equals("y") ? "[0, 0, 3]" : "[0, 3, 0]";
    String far = normal.equals("y") ? "[4, 0, 3.5]" : "[4, 3.5, 0]";
    String up = normal.equals("y") ? "z" : "y";
    String turn = "r" + normal;
    return """
        {"units": {"length": "m", "force": "N", "mass": "kg", "angle": "rad"}, "up": "+%s",
         "nodes": {"A": [0, 0, 0], "B": %s, "C": %s, "D": [4, 0, 0]},
         "materials": {"steel": {"E": 210e9, "nu": 0.3}},
         "sections": {"s": {"shape": "I", "depth": 0.2, "width": 0.1, "web": 0.006, "flange": 0.009}},
         "joints": {"knee": {"ry": 2e6}},
         "members": {
           "left": {"nodes": ["A", "B"], "section": "s", "material": "steel", "reference": [1, 0, 0]},
           "beam": {"nodes": ["B", "C"], "section": "s", "material": "steel",
                    "joints": {"start": "knee"}},
           "right": {"nodes": ["C", "D"], "section": "s", "material": "steel",
                     "reference": [1, 0, 0]}},
         "supports": {"A": {"x": "fixed", "%s": "fixed", "%s": 4e6},
                      "D": {"x": "fixed", "%s": "fixed"} %s}}
        """
        .formatted(up, top, far, up, turn, up, held);
  }

  @ParameterizedTest
  @ValueSource(strings = {"y", "z"})
  void aPlaneModelEqualsTheOneHeldOutOfItsPlaneByHand(String normal) {
    String up = normal.equals("y") ? "z" : "y";
    FrameModel plane = Frames.model(model(normal, ""));
    // In the held model every node is kept from leaving the plane.
    StringBuilder held = new StringBuilder();
    for (String node : List.of("B", "C")) {
      held.append(
          ", \"%s\": {\"%s\": \"fixed\", \"rx\": \"fixed\", \"r%s\": \"fixed\"}"
              .formatted(node, normal, up));
    }
    String space =
        model(normal, held.toString())
            .replace(
                "\"A\": {\"x\": \"fixed\"",
                "\"A\": {\"%s\": \"fixed\", \"rx\": \"fixed\", \"r%s\": \"fixed\", \"x\": \"fixed\""
                    .formatted(normal, up))
            .replace(
                "\"D\": {\"x\": \"fixed\"",
                "\"D\": {\"%s\": \"fixed\", \"rx\": \"fixed\", \"r%s\": \"fixed\", \"x\": \"fixed\""
                    .formatted(normal, up));
    List<Gauge> gauges =
        List.of(
            Frames.gauge("C", "x"), Frames.gauge("beam@0.4", up), Frames.gauge("B", "r" + normal));
    List<Load> loads = List.of(Frames.load("B", "x"), Frames.load("beam@0.7", "-" + up));
    Outcome<FrameFlexibility> ready = FrameFlexibility.prepare(plane, gauges, loads, List.of());
    assertThat(ready.findings()).extracting(f -> f.kind()).contains(SolveFinding.HELD_IN_PLANE);
    double[][] inPlane = ready.orRefuse().solve(List.of()).values();
    FrameModel model = Frames.model(space);
    assertThat(
            FrameFlexibility.prepare(
                    model, List.of(Frames.gauge("C", normal)), loads, List.of())
                .findings())
        .extracting(f -> f.kind())
        .doesNotContain(SolveFinding.HELD_IN_PLANE);
    // One more gauge out of the plane makes the program work it in space.
    double[][] inSpace =
        Frames.solve(
                model,
                List.of(gauges.get(0), gauges.get(1), gauges.get(2), Frames.gauge("beam@0.4", normal)),
                loads)
            .values();
    for (int g = 0; g < 3; g++) {
      for (int l = 0; l < 2; l++) {
        assertThat(inPlane[g][l])
            .isCloseTo(inSpace[g][l], within(1e-10 * Math.abs(inSpace[g][l])));
      }
    }
    assertThat(inSpace[3][0]).isCloseTo(0, within(1e-20));
  }
}
