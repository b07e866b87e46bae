package org.flexbound.solve;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Outcome;
import org.flexbound.frame.FrameModel;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Load;
import org.junit.jupiter.api.Test;

/** What can move freely is refused, in words that name it. */
class MechanismTest {
  private static final String FIXED =
      "{\"x\": \"fixed\", \"y\": \"fixed\", \"z\": \"fixed\", \"rx\": \"fixed\", \"ry\": \"fixed\","
          + " \"rz\": \"fixed\"}";

  private static List<String> refused(FrameModel model, Gauge gauge, Load load) {
    Outcome<FrameFlexibility> outcome =
        FrameFlexibility.prepare(model, List.of(gauge), List.of(load), List.of());
    assertThat(outcome.value()).isEmpty();
    return outcome.findings().stream()
        .filter(f -> f.kind() == SolveFinding.MECHANISM)
        .map(Finding::message)
        .toList();
  }

  private static FrameModel portal(String joints, String brace, String supports) {
    return Frames.model(
        """
        {"units": {"length": "m", "force": "N", "mass": "kg", "angle": "rad"},
         "nodes": {"A": [0, 0, 0], "B": [0, 0, 3], "C": [4, 0, 3], "D": [4, 0, 0], "N7": [2, 2, 1]},
         "materials": {"steel": {"E": 210e9, "nu": 0.3}},
         "sections": {"s": {"A": 5e-3, "Iy": 8e-6, "Iz": 3e-6, "J": 1e-6}},
         "joints": {"pin": {"ry": "free"}, "all": {"rx": "free", "ry": "free", "rz": "free"},
                    "turn": {"rx": "free"} %s},
         "members": {
           "left": {"nodes": ["A", "B"], "section": "s", "material": "steel", "reference": [1, 0, 0]},
           "beam": {"nodes": ["B", "C"], "section": "s", "material": "steel"},
           "right": {"nodes": ["C", "D"], "section": "s", "material": "steel", "reference": [1, 0, 0]}
           %s},
         "supports": {%s}}
        """
            .formatted(joints, brace, supports));
  }

  @Test
  void aMemberThatCanSpinAboutItsOwnAxisIsNamedWithItsNode() {
    FrameModel model =
        portal(
            "",
            ", \"brace2\": {\"nodes\": [\"A\", \"N7\"], \"section\": \"s\", \"material\": \"steel\","
                + " \"joints\": {\"start\": \"turn\"}}",
            "\"A\": " + FIXED + ", \"D\": " + FIXED);
    assertThat(refused(model, Frames.gauge("N7", "rx"), Frames.load("C", "y")))
        .containsExactly("the member 'brace2' can spin about its own axis at node N7");
  }

  @Test
  void aStructureOnRollersShiftsAsOneRigidBody() {
    FrameModel model =
        portal(
            "",
            ", \"brace\": {\"nodes\": [\"B\", \"N7\"], \"section\": \"s\", \"material\": \"steel\"}",
            "\"A\": {\"y\": \"fixed\", \"z\": \"fixed\", \"rx\": \"fixed\", \"rz\": \"fixed\"},"
                + " \"D\": {\"y\": \"fixed\", \"z\": \"fixed\"}");
    assertThat(refused(model, Frames.gauge("C", "x"), Frames.load("C", "x")))
        .singleElement()
        .asString()
        .startsWith(
            "the whole structure can move without resistance as one rigid body: it can shift along x");
  }

  @Test
  void aStructureOnOneHingeTurnsAsOneRigidBody() {
    FrameModel model =
        portal(
            "",
            ", \"brace\": {\"nodes\": [\"B\", \"N7\"], \"section\": \"s\", \"material\": \"steel\"}",
            "\"A\": {\"x\": \"fixed\", \"y\": \"fixed\", \"z\": \"fixed\", \"rx\": \"fixed\","
                + " \"rz\": \"fixed\"}");
    assertThat(refused(model, Frames.gauge("C", "x"), Frames.load("C", "x")))
        .singleElement()
        .asString()
        .startsWith(
            "the whole structure can move without resistance as one rigid body: it can turn about y");
  }

  @Test
  void aPortalWithFourHingesSwaysAndItsNodesAreNamed() {
    FrameModel model =
        Frames.model(
            """
            {"units": {"length": "m", "force": "N", "mass": "kg", "angle": "rad"},
             "nodes": {"A": [0, 0, 0], "B": [0, 0, 3], "C": [4, 0, 3], "D": [4, 0, 0]},
             "materials": {"steel": {"E": 210e9, "nu": 0.3}},
             "sections": {"s": {"A": 5e-3, "Iy": 8e-6, "Iz": 3e-6, "J": 1e-6}},
             "joints": {"pin": {"ry": "free"}},
             "members": {
               "left": {"nodes": ["A", "B"], "section": "s", "material": "steel", "reference": [1, 0, 0],
                        "joints": {"start": "pin"}},
               "beam": {"nodes": ["B", "C"], "section": "s", "material": "steel",
                        "joints": {"start": "pin", "end": "pin"}},
               "right": {"nodes": ["C", "D"], "section": "s", "material": "steel",
                         "reference": [1, 0, 0], "joints": {"end": "pin"}}},
             "supports": {"A": %s, "D": %s}}
            """
                .formatted(FIXED, FIXED));
    assertThat(refused(model, Frames.gauge("B", "x"), Frames.load("C", "x")))
        .singleElement()
        .asString()
        .matches("node [BC] can move along x without resistance, and 1 other points? with it");
  }

  @Test
  void aLooseNodeIsNamed() {
    FrameModel model = portal("", "", "\"A\": " + FIXED + ", \"D\": " + FIXED);
    assertThat(refused(model, Frames.gauge("C", "y"), Frames.load("C", "x")))
        .singleElement()
        .asString()
        .startsWith("node N7 can move along ");
  }

  @Test
  void aStructureFreedByASettingIsRefusedWithTheSettingAndTheMotion() {
    FrameModel model =
        Frames.model(
            """
            {"units": {"length": "m", "force": "N", "mass": "kg", "angle": "rad"},
             "nodes": {"A": [0, 0, 0], "B": [0, 0, 3]},
             "materials": {"steel": {"E": 210e9, "nu": 0.3}},
             "sections": {"s": {"A": 5e-3, "Iy": 8e-6, "Iz": 3e-6, "J": 1e-6}},
             "joints": {"foot": {"rz": 1e6}},
             "members": {"post": {"nodes": ["A", "B"], "section": "s", "material": "steel",
                                  "reference": [1, 0, 0], "joints": {"start": "foot"}}},
             "supports": {"A": %s}}
            """
                .formatted(FIXED));
    FrameFlexibility ready =
        FrameFlexibility.prepare(
                model,
                List.of(Frames.gauge("B", "x"), Frames.gauge("B", "y")),
                List.of(Frames.load("B", "x"), Frames.load("B", "y")),
                List.of(org.flexbound.frame.StiffnessPath.parse("joints.foot.rz").orElseThrow()))
            .orRefuse();
    org.assertj.core.api.Assertions.assertThatThrownBy(
            () -> ready.solve(List.of(new org.flexbound.frame.StiffnessSetting.Value(0))))
        .isExactlyInstanceOf(org.flexbound.finding.Refusal.class)
        .hasMessageContaining("with joints.foot.rz set free: ")
        .hasMessageContaining("node B can move along y without resistance");
  }
}
