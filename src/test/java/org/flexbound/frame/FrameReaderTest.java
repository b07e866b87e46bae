package org.flexbound.frame;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.flexbound.document.JsonFile;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Outcome;
import org.junit.jupiter.api.Test;

class FrameReaderTest {
  private static Outcome<FrameModel> read(String json) {
    return FrameReader.read(JsonFile.parse(json, "model.json").orRefuse());
  }

  private static final String SOUND =
      """
      {"units": {"length": "mm", "force": "kN", "mass": "kg", "angle": "rad"},
       "nodes": {"base": [0, 0, 0], "top": [0, 0, "3 m"]},
       "materials": {"steel": {"E": "210 GPa", "nu": 0.3, "density": "7850 kg/m³"}},
       "sections": {"post": {"shape": "tube", "diameter": 114.3, "wall": 5}},
       "joints": {"foot": {"ry": "2 MN·m/rad", "rx": 2e6}},
       "members": {"post": {"nodes": ["base", "top"], "section": "post", "material": "steel",
                            "joints": {"start": "foot"}}},
       "supports": {"base": {"x": "fixed", "y": "fixed", "z": 100, "rx": "fixed", "ry": "fixed",
                             "rz": "fixed"}}}
      """;

  @Test
  void numbersAreTakenInTheDeclaredUnitsAndTextsInTheirOwn() {
    Outcome<FrameModel> outcome = read(SOUND);
    FrameModel model = outcome.orRefuse();
    assertThat(outcome.findings()).isEmpty();
    assertThat(model.place("top").z()).isEqualTo(3);
    assertThat(model.joint("foot").springs().stiffness(Spring.RY).value()).isEqualTo(2e6);
    assertThat(model.joint("foot").springs().stiffness(Spring.RX).value())
        .isCloseTo(2e6, org.assertj.core.api.Assertions.within(1e-6));
    assertThat(model.joint("foot").springs().stiffness(Spring.X).isRigid()).isTrue();
    StiffnessPath support = StiffnessPath.parse("supports.base.z").orElseThrow();
    assertThat(model.stiffness(support).orElseThrow().value())
        .isCloseTo(1e8, org.assertj.core.api.Assertions.within(1e-4));
    StiffnessPath bending = StiffnessPath.parse("members.post.EIy").orElseThrow();
    double i = Math.PI * (Math.pow(0.1143, 4) - Math.pow(0.1043, 4)) / 64;
    assertThat(model.stiffness(bending).orElseThrow().value())
        .isCloseTo(210e9 * i, org.assertj.core.api.Assertions.within(1e-3));
  }

  @Test
  void allProblemsComeInOneAnswerEachWithItsPlace() {
    Outcome<FrameModel> outcome =
        read(
            """
            {"units": {"length": "mm", "force": "kN", "mass": "kg", "angle": "rad"},
             "nodes": {"base": [0, 0, 0], "top": [0, 0, 3000]},
             "materials": {"steel": {"E": "210 GPa/s", "nu": 0.3}},
             "sections": {"post": {"shape": "tub", "diameter": 114.3, "wall": 5},
                          "plate": {"shape": "rectangle", "depth": -3, "width": 5}},
             "jonits": {},
             "members": {"post": {"nodes": ["base", "topp"], "section": "post",
                                  "material": "steel"},
                         "none": {"nodes": ["base", "base"], "section": "post",
                                  "material": "steel"}},
             "supports": {"bse": {"x": "fixed"}, "base": {"z": "stiff"}}}
            """);
    List<String> found = outcome.findings().stream().map(Finding::toString).toList();
    assertThat(found)
        .anySatisfy(f -> assertThat(f).contains("/materials/steel/E", "line 3", "210 GPa/s"))
        .anySatisfy(f -> assertThat(f).contains("/sections/post/shape", "did you mean 'tube'?"))
        .anySatisfy(f -> assertThat(f).contains("/sections/plate/depth", "-3"))
        .anySatisfy(f -> assertThat(f).contains("/jonits", "did you mean 'joints'?"))
        .anySatisfy(f -> assertThat(f).contains("/members/post/nodes/1", "did you mean 'top'?"))
        .anySatisfy(f -> assertThat(f).contains("/members/none/nodes", "to itself"))
        .anySatisfy(f -> assertThat(f).contains("/supports/bse", "did you mean 'base'?"))
        .anySatisfy(f -> assertThat(f).contains("/supports/base/z", "\"fixed\" or \"free\""));
    assertThat(found).hasSize(8);
    assertThat(outcome.hasErrors()).isTrue();
  }

  @Test
  void aCircleOfRigidLinksIsRefused() {
    Outcome<FrameModel> outcome =
        read(
            SOUND.replace(
                "\"supports\"",
                "\"rigidLinks\": [{\"from\": \"base\", \"to\": \"top\"},"
                    + " {\"from\": \"top\", \"to\": \"base\"}], \"supports\""));
    assertThat(outcome.findings())
        .anySatisfy(f -> assertThat(f.code()).isEqualTo("FRAME-RIGID-CIRCLE"));
  }

  @Test
  void aMatrixThatPushesIsRefused() {
    Outcome<FrameModel> outcome =
        read(
            SOUND.replace(
                "{\"ry\": \"2 MN·m/rad\", \"rx\": 2e6}",
                "{\"matrix\": [[1,2,0,0,0,0],[2,1,0,0,0,0],[0,0,1,0,0,0],[0,0,0,1,0,0],"
                    + "[0,0,0,0,1,0],[0,0,0,0,0,1]]}"));
    assertThat(outcome.findings())
        .anySatisfy(
            f -> assertThat(f.message()).contains("not positive semidefinite"));
  }

  @Test
  void factorsComeBackAndTheUsersEntriesStay() {
    FrameModel model = read(SOUND).orRefuse();
    StiffnessPath foot = StiffnessPath.parse("joints.foot.ry").orElseThrow();
    StiffnessPath rigid = StiffnessPath.parse("joints.foot.rz").orElseThrow();
    StiffnessPath fixed = StiffnessPath.parse("supports.base.x").orElseThrow();
    StiffnessPath bending = StiffnessPath.parse("members.post.EIy").orElseThrow();
    StiffnessPath steel = StiffnessPath.parse("materials.steel.E").orElseThrow();
    FrameModel changed =
        model.with(
            java.util.Map.of(
                foot, new StiffnessSetting.Factor(0.487),
                rigid, new StiffnessSetting.Value(7.25e5),
                fixed, new StiffnessSetting.Value(3e8),
                bending, new StiffnessSetting.Factor(1.1),
                steel, new StiffnessSetting.Factor(0.97)));
    String text = FrameWriter.write(changed);
    assertThat(text).contains("\"2 MN·m/rad\"", "\"210 GPa\"", "\"length\": \"mm\"");
    FrameModel again = read(text).orRefuse();
    for (StiffnessPath path : changed.stiffnesses()) {
      assertThat(again.stiffness(path)).as(path.toString()).isEqualTo(changed.stiffness(path));
    }
    assertThat(again.stiffness(foot).orElseThrow().value()).isEqualTo(2e6 * 0.487);
    assertThat(again.stiffness(rigid).orElseThrow().value()).isEqualTo(7.25e5);
    assertThat(FrameWriter.write(again)).isEqualTo(text);
  }

  @Test
  void changesOfAConfigurationRemoveAddAndReplace() {
    FrameModel model = read(SOUND).orRefuse();
    FrameModel changed =
        FrameChanges.apply(
                model,
                JsonFile.parse(
                        "{\"remove\": {\"supports\": [\"base\"]}, \"add\": {\"supports\":"
                            + " {\"top\": {\"x\": \"fixed\"}}}, \"replace\": {\"joints\":"
                            + " {\"foot\": {\"ry\": 5}}}}",
                        "study.json")
                    .orRefuse())
            .orRefuse();
    assertThat(changed.supports()).containsOnlyKeys("top");
    assertThat(changed.joint("foot").springs().stiffness(Spring.RY).value())
        .isCloseTo(5, org.assertj.core.api.Assertions.within(1e-12));
  }

  @Test
  void aChangeOfWhatIsNotThereIsRefusedAtItsPlaceInTheStudy() {
    FrameModel model = read(SOUND).orRefuse();
    Outcome<FrameModel> outcome =
        FrameChanges.apply(
            model,
            JsonFile.parse("{\"remove\": {\"members\": [\"pots\"]}}", "study.json").orRefuse());
    assertThat(outcome.findings()).hasSize(1);
    assertThat(outcome.findings().get(0).toString())
        .contains("study.json", "/remove/members/0", "did you mean 'post'?");
  }
}
