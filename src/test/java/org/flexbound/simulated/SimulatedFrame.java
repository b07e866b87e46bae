package org.flexbound.simulated;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.SplittableRandom;
import org.flexbound.document.JsonFile;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.FrameReader;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessSetting;
import org.flexbound.setup.Vector;

/**
 * An invented structure drawn at random: a post with an arm on a base block, the block on springs or
 * held. Nodes {@code p1 …} up the post, {@code a1 …} along the arm, {@code b1 … b4} on the block.
 */
final class SimulatedFrame {
  private final boolean movingBase;
  private final Map<String, double[]> nodes = new LinkedHashMap<>();
  private final String json;
  private final FrameModel model;

  SimulatedFrame(SplittableRandom random, boolean movingBase) {
    this.movingBase = movingBase;
    int post = 2 + random.nextInt(3);
    int arm = 2 + random.nextInt(3);
    double height = 0.8 + 3 * random.nextDouble();
    double reach = 0.6 + 2.5 * random.nextDouble();
    double slope = 0.4 * random.nextDouble();
    nodes.put("base", new double[] {0, 0, 0});
    nodes.put("b1", new double[] {-0.4, -0.3, 0});
    nodes.put("b2", new double[] {0.4, -0.3, 0});
    nodes.put("b3", new double[] {0.4, 0.3, 0});
    nodes.put("b4", new double[] {-0.4, 0.3, 0.1});
    for (int k = 1; k <= post; k++) {
      nodes.put("p" + k, new double[] {0, 0, height * k / post});
    }
    for (int k = 1; k <= arm; k++) {
      nodes.put(
          "a" + k, new double[] {reach * k / arm, slope * reach * k / arm, height});
    }
    json = write(random, post, arm);
    model = FrameReader.read(JsonFile.parse(json, "simulated.json").orRefuse()).orRefuse();
  }

  private String write(SplittableRandom random, int post, int arm) {
    List<String> members = new ArrayList<>();
    String below = "base";
    for (int k = 1; k <= post; k++) {
      members.add(member("post " + k, below, "p" + k, k == 1 ? "foot" : "", true));
      below = "p" + k;
    }
    for (int k = 1; k <= arm; k++) {
      members.add(member("arm " + k, below, "a" + k, k == 1 ? "knee" : "", false));
      below = "a" + k;
    }
    StringBuilder places = new StringBuilder();
    nodes.forEach(
        (name, at) ->
            places.append(places.length() > 0 ? ", " : "")
                .append(
                    String.format(
                        Locale.ROOT, "\"%s\": [%.4f, %.4f, %.4f]", name, at[0], at[1], at[2])));
    String support =
        movingBase
            ? String.format(
                Locale.ROOT,
                "{\"x\": %.4g, \"y\": %.4g, \"z\": %.4g, \"rx\": %.4g, \"ry\": %.4g, \"rz\": %.4g}",
                1e8 * (1 + random.nextDouble()),
                1e8 * (1 + random.nextDouble()),
                2e8 * (1 + random.nextDouble()),
                5e7 * (1 + random.nextDouble()),
                5e7 * (1 + random.nextDouble()),
                5e7 * (1 + random.nextDouble()))
            : "{\"x\": \"fixed\", \"y\": \"fixed\", \"z\": \"fixed\", \"rx\": \"fixed\","
                + " \"ry\": \"fixed\", \"rz\": \"fixed\"}";
    return "{\"units\": {\"length\": \"m\", \"force\": \"N\", \"mass\": \"kg\", \"angle\": \"rad\"},"
        + "\"materials\": {\"steel\": {\"E\": 2.1e11, \"nu\": 0.3, \"density\": 7850}},"
        + String.format(
            Locale.ROOT,
            "\"sections\": {\"box\": {\"A\": 4e-3, \"Iy\": %.4g, \"Iz\": %.4g, \"J\": %.4g}},",
            1.5e-5 * (1 + random.nextDouble()),
            1e-5 * (1 + random.nextDouble()),
            1.5e-5 * (1 + random.nextDouble()))
        + "\"nodes\": {" + places + "},"
        + String.format(
            Locale.ROOT,
            "\"joints\": {\"foot\": {\"ry\": %.4g, \"rx\": %.4g}, \"knee\": {\"ry\": %.4g,"
                + " \"rz\": %.4g}},",
            4e6 * (0.5 + random.nextDouble()),
            4e6 * (0.5 + random.nextDouble()),
            4e6 * (0.5 + random.nextDouble()),
            4e6 * (0.5 + random.nextDouble()))
        + "\"members\": {" + String.join(", ", members) + "},"
        + "\"rigidLinks\": [{\"from\": \"base\", \"to\": \"b1\"}, {\"from\": \"base\", \"to\": \"b2\"},"
        + " {\"from\": \"base\", \"to\": \"b3\"}, {\"from\": \"base\", \"to\": \"b4\"}],"
        + "\"supports\": {\"base\": " + support + "}}";
  }

  private static String member(String name, String a, String b, String joint, boolean upright) {
    return "\"" + name + "\": {\"nodes\": [\"" + a + "\", \"" + b
        + "\"], \"section\": \"box\", \"material\": \"steel\""
        + (upright ? ", \"reference\": [1, 0, 0]" : "")
        // the foot's joint turns about the frame's x and y: the post's y and z
        + (joint.isEmpty() ? "" : ", \"joints\": {\"start\": \"" + joint + "\"}")
        + "}";
  }

  boolean movingBase() {
    return movingBase;
  }

  FrameModel model() {
    return model;
  }

  /** A model of it that is wrong as models are: its joints and its base half again as stiff. */
  FrameModel wrongModel() {
    Map<StiffnessPath, StiffnessSetting> settings = new LinkedHashMap<>();
    for (StiffnessPath path : model.stiffnesses()) {
      if (path.toString().startsWith("joints") || path.toString().startsWith("supports")) {
        settings.put(path, new StiffnessSetting.Factor(1.5));
      }
    }
    return model.with(settings);
  }

  Vector place(String node) {
    return model.place(node);
  }

  /** The nodes of the post and the arm. */
  List<String> structure() {
    return nodes.keySet().stream().filter(n -> !n.startsWith("b")).toList();
  }
}
