package org.flexbound.update;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SplittableRandom;
import org.flexbound.document.JsonFile;
import org.flexbound.finding.Outcome;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.FrameReader;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessSetting;
import org.flexbound.reduce.Places;
import org.flexbound.reduce.Reducer;
import org.flexbound.reduce.ReductionProblem;
import org.flexbound.setup.BeddingIn;
import org.flexbound.setup.DecisionRule;
import org.flexbound.setup.Direction;
import org.flexbound.setup.FitRange;
import org.flexbound.setup.QualityLimits;
import org.flexbound.setup.ReductionOptions;
import org.flexbound.setup.SlopeFit;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;
import org.flexbound.solve.FlexibilitySolution;
import org.flexbound.solve.FrameFlexibility;
import org.flexbound.study.Study;
import org.flexbound.study.StudyReader;
import org.flexbound.testlog.TestLog;
import org.flexbound.testlog.TestLogMaker;

/**
 * An invented structure with its invented test: draws a truth from the truncated prior, writes raw
 * readings with all their errors, reduces them and updates the nominal model.
 *
 * <p>Errors of a test: one gain for the load cell (1 %) and one for each gauge (0.5 %), a floor of 2 µm
 * (or µrad) for each gauge and load point, 0.7 % scatter of slopes from run to run, 0.5 µm noise of
 * single readings; three runs of a load, five steps up and down.
 */
record Twin(
    String name,
    String model,
    String parameters,
    List<String> gauges,
    List<String> loads,
    List<String> hidden) {
  private static final double CELL = 0.01;
  private static final double DIAL = 0.005;
  private static final double FLOOR = 2e-6;
  private static final double SCATTER = 0.007;
  private static final double NOISE = 5e-7;
  private static final int RUNS = 3;

  FrameModel frame() {
    return FrameReader.read(JsonFile.parse(model, name + ".json").orRefuse()).orRefuse();
  }

  Study study() {
    String text =
        "{\"model\": \"m.json\", \"log\": \"l.xlsx\", \"parameters\": {" + parameters + "}}";
    return StudyReader.read(JsonFile.parse(text, name + " study.json").orRefuse()).orRefuse();
  }

  private static Direction direction(String text) {
    boolean rotation = text.startsWith("r");
    return switch (text.substring(text.length() - 1)) {
      case "x" -> new Direction(rotation, new Vector(1, 0, 0));
      case "y" -> new Direction(rotation, new Vector(0, 1, 0));
      default -> new Direction(rotation, new Vector(0, 0, 1));
    };
  }

  /** Gauges are {@code node direction}, with a * after base gauges; loads {@code node direction N}. */
  private TestLogMaker maker() {
    TestLogMaker maker = new TestLogMaker().instrument("cell", CELL, 0, 0);
    for (String gauge : gauges) {
      String[] part = gauge.split(" ", -1);
      String plain = part[0] + " " + part[1];
      maker.instrument("dial " + plain, DIAL, FLOOR, 0);
      maker.gauge(
          plain, part[0], direction(part[1]), "dial " + plain, part.length > 2);
    }
    for (String load : loads) {
      String[] part = load.split(" ", -1);
      maker.load(part[0] + " " + part[1], part[0], direction(part[1]), "cell");
    }
    return maker;
  }

  /** A truth for every parameter, as x, drawn from its truncated prior. */
  double[] truth(List<WorkingParameter> of, SplittableRandom random) {
    double[] x = new double[of.size()];
    for (int k = 0; k < x.length; k++) {
      WorkingParameter p = of.get(k);
      do {
        x[k] = p.nominal() + p.priorStandardDeviation() * random.nextGaussian();
      } while (x[k] < p.lower() || x[k] > p.upper());
    }
    return x;
  }

  List<WorkingParameter> working() {
    return new ParameterMaker(frame(), new org.flexbound.finding.Findings()).of(study());
  }

  /** The measured flexibility of one simulated test of a true frame. */
  MeasuredFlexibility test(
      FrameModel trueFrame, double[] x, List<WorkingParameter> of, SplittableRandom random) {
    Map<StiffnessPath, StiffnessSetting> settings = new LinkedHashMap<>(FrameFunction.settings(of, x));
    for (String path : hidden) {
      settings.put(
          StiffnessPath.parse(path).orElseThrow(),
          new StiffnessSetting.Factor(Math.exp(0.4 * random.nextGaussian())));
    }
    TestLogMaker maker = maker();
    TestLog empty = maker.log();
    List<StiffnessPath> paths = List.copyOf(settings.keySet());
    FlexibilitySolution solution =
        FrameFlexibility.prepare(trueFrame, empty.gauges(), empty.loads(), paths)
            .orRefuse()
            .solve(paths.stream().map(settings::get).toList());
    double cell = CELL * random.nextGaussian();
    double[] dial = new double[gauges.size()];
    for (int i = 0; i < dial.length; i++) {
      dial[i] = DIAL * random.nextGaussian();
    }
    double[] levels = {0, 0.2, 0.4, 0.6, 0.8, 1, 0.8, 0.6, 0.4, 0.2, 0};
    for (int j = 0; j < loads.size(); j++) {
      double peak = Double.parseDouble(loads.get(j).split(" ", -1)[2]);
      double[] slope = new double[dial.length];
      for (int i = 0; i < dial.length; i++) {
        slope[i] =
            (1 + dial[i]) * (1 + cell) * solution.value(i, j)
                + Math.sqrt(2) * FLOOR / peak * random.nextGaussian();
      }
      for (int run = 0; run < RUNS; run++) {
        double[][] rows = new double[levels.length][1 + dial.length];
        double[] own = new double[dial.length];
        double[] tare = new double[dial.length];
        for (int i = 0; i < dial.length; i++) {
          own[i] = slope[i] * (1 + SCATTER * random.nextGaussian());
          tare[i] = 1e-4 * random.nextGaussian();
        }
        for (int r = 0; r < levels.length; r++) {
          rows[r][0] = peak * levels[r];
          for (int i = 0; i < dial.length; i++) {
            rows[r][1 + i] = tare[i] + own[i] * rows[r][0] + NOISE * random.nextGaussian();
          }
        }
        String load = loads.get(j);
        maker.run(load + " run " + run, load.substring(0, load.lastIndexOf(' ')), rows);
      }
    }
    return Reducer.reduce(
            new ReductionProblem(
                Study.ONLY_CONFIGURATION, maker.log(), places(trueFrame)))
        .orRefuse()
        .flexibility();
  }

  static Places places(FrameModel frame) {
    return station ->
        station instanceof Station.AtNode at
            ? Optional.of(frame.place(at.node()).plus(at.offset()))
            : Optional.empty();
  }

  /** The log of the test before it is run: load steps, and no reading of any gauge. */
  TestLog planned() {
    TestLogMaker maker = maker();
    maker.options(
        new ReductionOptions(
            OptionalDouble.of(SCATTER),
            FitRange.USUAL,
            Map.of(),
            BeddingIn.KEEP,
            SlopeFit.AUTOMATIC,
            ReductionOptions.STANDARD_GRAVITY,
            true,
            QualityLimits.USUAL,
            DecisionRule.GUARD_BAND));
    for (String load : loads) {
      double[] row = new double[1 + gauges.size()];
      Arrays.fill(row, Double.NaN);
      row[0] = Double.parseDouble(load.split(" ", -1)[2]);
      for (int run = 0; run < RUNS; run++) {
        maker.run(
            load + " run " + run, load.substring(0, load.lastIndexOf(' ')), new double[][] {row});
      }
    }
    return maker.log();
  }

  Outcome<UpdateResult> update(MeasuredFlexibility measured, UpdateSettings settings) {
    return StudyUpdate.run(study(), frame(), List.of(measured), settings);
  }

  // ---- the invented structures ----

  private static final String HEAD =
      """
      {"units": {"length": "m", "force": "N", "mass": "kg", "angle": "rad"},
       "materials": {"steel": {"E": 2.1e11, "nu": 0.3, "density": 7850}},
       "sections": {"box": {"A": 6e-3, "Iy": 4e-5, "Iz": 3e-5, "J": 5e-5},
                    "rod": {"A": 1e-3, "Iy": 1e-7, "Iz": 1e-7, "J": 2e-7}},
      """;

  private static String member(String name, String a, String b, String more) {
    return "\"" + name + "\": {\"nodes\": [\"" + a + "\", \"" + b
        + "\"], \"section\": \"box\", \"material\": \"steel\"" + more + "}";
  }

  private static String parameter(String name, String path, double lower, double upper, double sd) {
    return "\"" + name + "\": {\"scales\": [\"" + path + "\"], \"lower\": " + lower
        + ", \"upper\": " + upper + ", \"priorStandardDeviation\": " + sd + "}";
  }

  private static String held(String rest) {
    return "{\"x\": \"fixed\", \"y\": \"fixed\", \"z\": \"fixed\", \"rx\": \"fixed\", \"rz\": \"fixed\", "
        + rest + "}";
  }

  static Twin bracket(String extra) {
    return new Twin(
        "bracket",
        HEAD
            + "\"nodes\": {\"wall\": [0,0,0], \"elbow\": [1.2,0,0], \"tip\": [1.2,0,-0.8]},"
            + "\"joints\": {\"elbow\": {\"ry\": 6e6}},"
            + "\"members\": {" + member("arm", "wall", "elbow", "") + ","
            + member("leg", "elbow", "tip",
                ", \"reference\": [1,0,0], \"joints\": {\"start\": \"elbow\"}") + "},"
            + "\"supports\": {" + extra + "\"wall\": " + held("\"ry\": 5e6") + "}}",
        String.join(",",
            parameter("wall", "supports.wall.ry", 0.1, 10, 0.6),
            parameter("elbow", "joints.elbow.ry", 0.1, 10, 0.6),
            parameter("arm", "members.arm.EIy", 0.7, 1.4, 0.1)),
        List.of("elbow z", "tip x", "tip z", "elbow ry"),
        List.of("elbow z 20000", "tip x 15000"),
        List.of());
  }

  static Twin portal(String beamJoint) {
    return new Twin(
        "portal",
        HEAD
            + "\"nodes\": {\"a\": [0,0,0], \"b\": [0,0,3], \"m\": [3,0,3], \"c\": [6,0,3], \"d\": [6,0,0]},"
            + "\"joints\": {\"end\": {\"ry\": 1.2e7}, \"hinge\": {\"ry\": 1.5e6}},"
            + "\"members\": {" + member("left", "a", "b", ", \"reference\": [1,0,0]") + ","
            + member("right", "d", "c", ", \"reference\": [1,0,0]") + ","
            + member("beam 1", "b", "m", ", \"joints\": {\"start\": \"end\"" + beamJoint + "}") + ","
            + member("beam 2", "m", "c", ", \"joints\": {\"end\": \"end\"}") + "},"
            + "\"supports\": {\"a\": " + held("\"ry\": 6e6") + ", \"d\": " + held("\"ry\": 6e6") + "}}",
        String.join(",",
            parameter("foot a", "supports.a.ry", 0.1, 10, 0.6),
            parameter("foot d", "supports.d.ry", 0.1, 10, 0.6),
            parameter("beam ends", "joints.end.ry", 0.1, 10, 0.6),
            "\"beam\": {\"scales\": [\"members.beam 1.EIy\", \"members.beam 2.EIy\"], \"lower\": 0.7,"
                + " \"upper\": 1.4, \"priorStandardDeviation\": 0.1}"),
        List.of("b x", "m z", "b ry", "c ry", "c x"),
        List.of("b x 12000", "m z 30000"),
        List.of());
  }

  static Twin gantry() {
    return new Twin(
        "gantry",
        HEAD
            + "\"nodes\": {\"foot\": [0,0,0], \"knee\": [0,0,5], \"splice\": [2.4,0,5], \"tip\": [4.6,0,5]},"
            + "\"joints\": {\"knee\": {\"ry\": 1.5e7, \"rz\": 9e6}, \"splice\": {\"ry\": 1.2e7, \"rz\": 8e6}},"
            + "\"members\": {" + member("post", "foot", "knee", ", \"reference\": [1,0,0]") + ","
            + member("inner", "knee", "splice", ", \"joints\": {\"start\": \"knee\"}") + ","
            + member("outer", "splice", "tip", ", \"joints\": {\"start\": \"splice\"}") + "},"
            + "\"supports\": {\"foot\": {\"x\": \"fixed\", \"y\": \"fixed\", \"z\": 2e8, \"rx\": 7e6,"
            + " \"ry\": 7e6, \"rz\": \"fixed\"}}}",
        String.join(",",
            parameter("foot in plane", "supports.foot.ry", 0.1, 10, 0.6),
            parameter("foot sideways", "supports.foot.rx", 0.1, 10, 0.6),
            parameter("knee in plane", "joints.knee.ry", 0.1, 10, 0.5),
            parameter("knee sideways", "joints.knee.rz", 0.1, 10, 0.5),
            parameter("splice in plane", "joints.splice.ry", 0.1, 10, 0.5),
            parameter("foot down", "supports.foot.z", 0.1, 10, 0.5)),
        List.of("tip z", "tip y", "knee y", "knee x", "splice z", "splice y", "knee ry"),
        List.of("tip z 4000", "tip y 3000", "knee y 5000"),
        List.of());
  }

  static Twin tower() {
    String pin = ", \"joints\": {\"start\": \"gusset\", \"end\": \"gusset\"}";
    String up = ", \"reference\": [1,0,0]";
    return new Twin(
        "braced tower",
        HEAD
            + "\"nodes\": {\"a0\": [0,0,0], \"b0\": [2,0,0], \"a1\": [0,0,3], \"b1\": [2,0,3],"
            + " \"a2\": [0,0,6], \"b2\": [2,0,6]},"
            + "\"joints\": {\"gusset\": {\"x\": 1.5e8, \"ry\": 1e5}},"
            + "\"members\": {" + member("leg a0", "a0", "a1", up) + "," + member("leg a1", "a1", "a2", up)
            + "," + member("leg b0", "b0", "b1", up) + "," + member("leg b1", "b1", "b2", up) + ","
            + member("beam 1", "a1", "b1", "") + "," + member("beam 2", "a2", "b2", "") + ","
            + member("brace 1", "a0", "b1", pin).replace("box", "rod") + ","
            + member("brace 2", "a1", "b2", pin).replace("box", "rod") + "},"
            + "\"supports\": {\"a0\": {\"x\": \"fixed\", \"y\": \"fixed\", \"z\": 2e8, \"rx\": \"fixed\","
            + " \"ry\": 1e5, \"rz\": \"fixed\"}, \"b0\": {\"x\": \"fixed\", \"y\": \"fixed\", \"z\": 2e8,"
            + " \"rx\": \"fixed\", \"ry\": 1e5, \"rz\": \"fixed\"}}}",
        String.join(",",
            parameter("gussets", "joints.gusset.x", 0.1, 10, 0.6),
            parameter("footing a", "supports.a0.z", 0.1, 10, 0.6),
            parameter("footing b", "supports.b0.z", 0.1, 10, 0.6),
            parameter("leg", "members.leg a0.EIy", 0.7, 1.4, 0.1)),
        List.of("a1 x", "a2 x", "b2 x", "b1 z", "a1 z"),
        List.of("a2 x 20000", "a1 x 30000"),
        List.of());
  }

  static Twin grillage() {
    StringBuilder nodes = new StringBuilder();
    StringBuilder members = new StringBuilder();
    StringBuilder supports = new StringBuilder();
    for (int i = 0; i < 3; i++) {
      for (int k = 0; k < 4; k++) {
        nodes.append(nodes.length() > 0 ? "," : "")
            .append("\"n" + i + k + "\": [" + 2 * k + "," + 1.5 * i + ",0]");
        if (k > 0) {
          members.append(members.length() > 0 ? "," : "")
              .append(member("long " + i + k, "n" + i + (k - 1), "n" + i + k, ""));
        }
        if (i > 0 && (k == 1 || k == 2)) {
          members.append(",").append(member("cross " + i + k, "n" + (i - 1) + k, "n" + i + k,
              ", \"joints\": {\"start\": \"cleat\", \"end\": \"cleat\"}"));
        }
      }
      supports.append(supports.length() > 0 ? "," : "")
          .append("\"n" + i + "0\": {\"x\": \"fixed\", \"y\": \"fixed\", \"z\": 4e7, \"rz\": \"fixed\"},"
              + "\"n" + i + "3\": {\"z\": 4e7, \"y\": \"fixed\"}");
    }
    return new Twin(
        "grillage",
        HEAD + "\"nodes\": {" + nodes + "}, \"joints\": {\"cleat\": {\"ry\": 4e6}},"
            + "\"members\": {" + members + "}, \"supports\": {" + supports + "}}",
        String.join(",",
            parameter("cleats", "joints.cleat.ry", 0.05, 20, 0.7),
            "\"bearings\": {\"scales\": [\"supports.n00.z\",\"supports.n10.z\",\"supports.n20.z\","
                + "\"supports.n03.z\",\"supports.n13.z\",\"supports.n23.z\"], \"lower\": 0.1,"
                + " \"upper\": 10, \"priorStandardDeviation\": 0.6}",
            "\"edge\": {\"scales\": [\"members.long 01.EIy\",\"members.long 02.EIy\","
                + "\"members.long 03.EIy\"], \"lower\": 0.6, \"upper\": 1.6,"
                + " \"priorStandardDeviation\": 0.15}",
            parameter("twist", "members.long 12.GJ", 0.3, 3, 0.4)),
        List.of("n01 z", "n12 z", "n22 z", "n11 z", "n10 z"),
        List.of("n11 z 20000", "n02 z 15000"),
        List.of());
  }

  static Twin onFixture() {
    return new Twin(
        "on a moving fixture",
        HEAD
            + "\"nodes\": {\"base\": [0,0,0], \"left\": [-0.5,0,0], \"right\": [0.5,0,0],"
            + " \"foot\": [0,0,0.1], \"knee\": [0,0,1.6], \"tip\": [1.1,0,1.6]},"
            + "\"joints\": {\"mount\": {\"ry\": 6e6}, \"knee\": {\"ry\": 8e6}},"
            + "\"connections\": {\"mount\": {\"nodes\": [\"base\", \"foot\"], \"joint\": \"mount\"}},"
            + "\"rigidLinks\": [{\"from\": \"base\", \"to\": \"left\"}, {\"from\": \"base\", \"to\": \"right\"}],"
            + "\"members\": {" + member("post", "foot", "knee", ", \"reference\": [1,0,0]") + ","
            + member("arm", "knee", "tip", ", \"joints\": {\"start\": \"knee\"}") + "},"
            + "\"supports\": {\"base\": {\"x\": 4e7, \"y\": \"fixed\", \"z\": 6e7, \"rx\": \"fixed\","
            + " \"ry\": 8e6, \"rz\": \"fixed\"}}}",
        String.join(",",
            parameter("mount", "connections.mount.ry", 0.1, 10, 0.6),
            parameter("knee", "joints.knee.ry", 0.1, 10, 0.6),
            parameter("post", "members.post.EIy", 0.7, 1.4, 0.1)),
        List.of("left z *", "right z *", "left x *", "tip z", "knee x", "tip x"),
        List.of("tip z 9000", "knee x 9000"),
        List.of("supports.base.x", "supports.base.z", "supports.base.ry"));
  }

  static List<Twin> all() {
    List<Twin> result = new ArrayList<>();
    result.add(bracket(""));
    result.add(portal(""));
    result.add(gantry());
    result.add(tower());
    result.add(grillage());
    result.add(onFixture());
    return result;
  }
}
