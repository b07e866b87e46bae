package org.flexbound.samples;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Random;
import org.flexbound.compare.ConfiguredFrame;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.FrameReader;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessSetting;
import org.flexbound.setup.Direction;
import org.flexbound.setup.DirectionText;
import org.flexbound.setup.Vector;
import org.flexbound.testlog.TestLog;
import org.flexbound.testlog.TestLogMaker;

/**
 * Makes the twelve tests of samples/clamping-fixture: an invented angle-plate fixture on a granite
 * table, tested about once a month by a logger that writes decimal commas. Before the last test the
 * clamp at B came loose.
 *
 * <p>What happens to the true motion on its way to the log: each clamp is tightened a little
 * differently each time; the table moves on its mounts, which the gauges on it see; gains of the load
 * cell and of the probes, drawn anew at each calibration (the cell is calibrated again before the
 * seventh test); scatter of a slope from run to run; noise and resolution of every reading.
 */
final class ClampingFixture {
  static final Path FOLDER = Path.of("samples", "clamping-fixture");
  static final List<String> DATES =
      List.of(
          "2025-02-04", "2025-03-04", "2025-04-08", "2025-05-06", "2025-06-03", "2025-07-08",
          "2025-08-05", "2025-09-02", "2025-10-07", "2025-11-04", "2025-12-02", "2026-01-13");
  static final String LOOSE = "supports.B.z";

  private static final double LOOSE_FACTOR = 0.45;
  private static final long SEED = 20_260_115L;
  private static final Charset CODE = Charset.forName("windows-1252");
  private static final double PEAK = 2000;
  private static final double SCATTER = 0.004;
  private static final double RETIGHTENED = 0.02;
  private static final double[] SHARES = {0, 0.25, 0.5, 0.75, 1, 0.75, 0.5, 0.25, 0};
  private static final int FIRST_ROW = 7;

  /** A gauge; places in mm. */
  record Probe(
      String name, String node, String direction, double x, double y, double z, String measures) {}

  static final List<Probe> PROBES =
      List.of(
          new Probe("head x", "head", "+x", 0, 0, 350, "article"),
          new Probe("head y", "head", "+y", 0, 0, 350, "article"),
          new Probe("head z", "head", "-z", 0, 0, 350, "article"),
          new Probe("clamp A", "A", "-z", -200, -150, 0, "fixture"),
          new Probe("clamp B", "B", "-z", 200, -150, 0, "fixture"),
          new Probe("clamp C", "C", "-z", 200, 150, 0, "fixture"),
          new Probe("clamp D", "D", "-z", -200, 150, 0, "fixture"),
          new Probe("plate x", "A", "+x", -200, -150, 0, "fixture"),
          new Probe("plate y left", "A", "+y", -200, -150, 0, "fixture"),
          new Probe("plate y right", "B", "+y", 200, -150, 0, "fixture"),
          new Probe("table z1", "T1", "-z", -400, -300, -50, "ground"),
          new Probe("table z2", "T2", "-z", 400, -300, -50, "ground"),
          new Probe("table z3", "T3", "-z", 0, 300, -50, "ground"),
          new Probe("table x", "T1", "+x", -400, -300, -50, "ground"),
          new Probe("table y1", "T1", "+y", -400, -300, -50, "ground"),
          new Probe("table y2", "T2", "+y", 400, -300, -50, "ground"));

  static final Map<String, String> PUSHES =
      Map.of("push x", "+x", "push y", "+y", "push z", "-z");
  static final List<String> PUSH_NAMES = List.of("push x", "push y", "push z");

  private final Random random;
  private final double[] cellGains = new double[2];
  private final double[] probeGains = new double[PROBES.size()];

  private ClampingFixture(long seed) {
    random = new Random(seed);
    for (int k = 0; k < 2; k++) {
      cellGains[k] = 0.0025 * random.nextGaussian();
    }
    for (int k = 0; k < probeGains.length; k++) {
      probeGains[k] = 0.002 * random.nextGaussian();
    }
  }

  /**
   * Writes all tests.
   *
   * @param folder gets a folder for each date
   */
  static void write(Path folder) {
    ClampingFixture fixture = new ClampingFixture(SEED);
    try {
      for (int test = 0; test < DATES.size(); test++) {
        Path own = Files.createDirectories(folder.resolve(DATES.get(test)));
        Files.writeString(own.resolve("log.json"), description(test), StandardCharsets.UTF_8);
        Files.write(own.resolve("readings.csv"), fixture.readings(test).getBytes(CODE));
      }
    } catch (IOException refused) {
      throw new UncheckedIOException(refused);
    }
  }

  /** Writes the tests where the sample keeps them. */
  public static void main(String[] arguments) {
    write(FOLDER.resolve("tests"));
  }

  static FrameModel model() {
    return FrameReader.read(FOLDER.resolve("model.json"), "model.json").orRefuse();
  }

  private static Direction direction(String text) {
    return DirectionText.parse(text).orElseThrow();
  }

  /** The true flexibility of the fixture on a table that does not move: gauges by loads, m/N. */
  static double[][] flexibility(Map<String, Double> factors) {
    Map<StiffnessPath, StiffnessSetting> settings = new LinkedHashMap<>();
    factors.forEach(
        (path, factor) ->
            settings.put(
                StiffnessPath.parse(path).orElseThrow(), new StiffnessSetting.Factor(factor)));
    TestLogMaker maker = new TestLogMaker().instrument("any", 0.01, 0, 0);
    for (Probe probe : PROBES) {
      maker.gauge(probe.name(), probe.node(), direction(probe.direction()), "any", false);
    }
    for (String push : PUSH_NAMES) {
      maker.load(push, "head", direction(PUSHES.getOrDefault(push, "")), "any");
    }
    TestLog log = maker.log();
    return ConfiguredFrame.nominal(
            model().with(settings),
            log.gauges(),
            log.loads())
        .orRefuse();
  }

  /** What a probe sees of the table's motion on its mounts under a load at the head, m/N. */
  private static double table(Probe probe, String push) {
    Vector force = direction(PUSHES.getOrDefault(push, "")).vector();
    Vector moment = new Vector(0, 0, 0.85).cross(force);
    Vector shift = new Vector(1.2e-9 * force.x(), 1.2e-9 * force.y(), 0.9e-9 * force.z());
    Vector turn = new Vector(2e-9 * moment.x(), 1.5e-9 * moment.y(), 0);
    Vector place =
        new Vector(probe.x(), probe.y(), probe.z() + 500).times(1e-3);
    return shift.plus(turn.cross(place)).dot(direction(probe.direction()).vector());
  }

  private static String certificate(int test) {
    return test < 6 ? "LC-88/24" : "LC-31/25";
  }

  private static String text(String key, String value) {
    return "\"" + key + "\": \"" + value + "\"";
  }

  private static String description(int test) {
    StringBuilder json = new StringBuilder();
    json.append("{\n  \"test\": {\n    ")
        .append(
            String.join(
                ",\n    ",
                text("title", "Angle-plate fixture 7, monthly check (invented sample)"),
                text("article", "test bar in the seat of the fixture"),
                text("fixture", "angle-plate fixture 7 on a granite table, four clamps"),
                text("date", DATES.get(test)),
                text("place", "invented workshop"),
                text("testedBy", "nobody: the readings are made by a program"),
                text("ambientTemperature", "20 °C"),
                text("lengthUnit", "mm")))
        .append("\n  },\n  \"instruments\": [\n    {")
        .append(
            String.join(
                ", ",
                text("instrument", "cell"),
                text("kind", "load cell"),
                text("serial", "C7"),
                text("calibrationReference", certificate(test)),
                text("calibrationDate", test < 6 ? "2024-11-20" : "2025-07-21"),
                "\"uncertaintyOfReading\": 0.5",
                text("uncertaintyFixed", "1 N"),
                text("asStated", "k=2"),
                text("resolution", "0.1 N")))
        .append('}');
    for (int k = 0; k < PROBES.size(); k++) {
      json.append(",\n    {")
          .append(
              String.join(
                  ", ",
                  text("instrument", "probe " + (k + 1)),
                  text("kind", "inductive probe"),
                  text("serial", "P" + (41 + k)),
                  text("calibrationReference", "IP-" + (41 + k) + "/24"),
                  text("calibrationDate", "2024-12-03"),
                  "\"uncertaintyOfReading\": 0.4",
                  text("uncertaintyFixed", "0.02 µm"),
                  text("asStated", "k=2"),
                  text("resolution", "0.001 µm")))
          .append('}');
    }
    json.append("\n  ],\n  \"loadPoints\": [\n    ");
    List<String> entries = new ArrayList<>();
    for (String push : PUSH_NAMES) {
      entries.add(
          "{"
              + String.join(
                  ", ",
                  text("load", push),
                  text("node", "head"),
                  text("direction", PUSHES.getOrDefault(push, "")),
                  text("column", "Force"),
                  text("instrument", "cell"),
                  text("limit", "2.5 kN"),
                  "\"x\": 0, \"y\": 0, \"z\": 350")
              + "}");
    }
    json.append(String.join(",\n    ", entries)).append("\n  ],\n  \"gauges\": [\n    ");
    entries.clear();
    for (int k = 0; k < PROBES.size(); k++) {
      Probe probe = PROBES.get(k);
      entries.add(
          String.format(
              Locale.ROOT,
              "{%s, \"x\": %.0f, \"y\": %.0f, \"z\": %.0f%s}",
              String.join(
                  ", ",
                  text("gauge", probe.name()),
                  text("node", probe.node()),
                  text("direction", probe.direction()),
                  text("column", probe.name()),
                  text("instrument", "probe " + (k + 1)),
                  text("measures", probe.measures()),
                  text("standsOn", "ground")),
              probe.x(),
              probe.y(),
              probe.z(),
              probe.measures().equals("ground") ? ", \"base\": \"yes\"" : ""));
    }
    json.append(String.join(",\n    ", entries))
        .append("\n  ],\n  \"limits\": [\n    ")
        .append(String.join(",\n    ", LIMITS))
        .append(
            "\n  ],\n  \"readings\": [\n    {\"files\": [\"readings.csv\"], \"separator\": \";\","
                + " \"decimalSign\": \",\", \"encoding\": \"windows-1252\"}\n  ],\n  \"runs\": [\n    ");
    entries.clear();
    int row = FIRST_ROW;
    for (String push : PUSH_NAMES) {
      for (int run = 1; run <= 3; run++) {
        entries.add(
            String.format(
                Locale.ROOT,
                "{\"run\": \"%s %d\", \"file\": \"readings.csv\", \"firstRow\": %d, \"lastRow\": %d,"
                    + " \"columns\": {\"Force\": \"%s\"}}",
                push,
                run,
                row,
                row + SHARES.length - 1,
                push));
        row += SHARES.length;
      }
    }
    return json.append(String.join(",\n    ", entries)).append("\n  ]\n}\n").toString();
  }

  private static final List<String> LIMITS =
      List.of(
          "{\"limit\": \"head, softest direction\", \"on\": \"softest compliance\", \"node\": \"head\","
              + " \"upper\": 27, \"unit\": \"µm/kN\"}",
          "{\"limit\": \"head along the spindle\", \"on\": \"direct stiffness\", \"load\": \"push z\","
              + " \"lower\": 250, \"unit\": \"kN/mm\"}",
          "{\"limit\": \"clamp B seated\", \"on\": \"coefficient\", \"gauge\": \"clamp B\","
              + " \"load\": \"push z\", \"upper\": 2.0, \"unit\": \"µm/kN\"}",
          "{\"limit\": \"no play\", \"on\": \"hysteresis\", \"gauge\": \"head x\", \"load\": \"push x\","
              + " \"upper\": 3, \"unit\": \"%\"}");

  private static String comma(double value, int decimals) {
    return String.format(Locale.ROOT, "%." + decimals + "f", value + 0.0).replace('.', ',');
  }

  private String readings(int test) {
    Map<String, Double> factors = new LinkedHashMap<>();
    for (String corner : List.of("A", "B", "C", "D")) {
      factors.put("supports." + corner + ".z", Math.exp(RETIGHTENED * random.nextGaussian()));
    }
    if (test == DATES.size() - 1) {
      factors.put(LOOSE, LOOSE_FACTOR);
    }
    double[][] flexibility = flexibility(factors);
    StringBuilder csv = new StringBuilder();
    csv.append("Logger;L16-3;;\r\n");
    csv.append("Recorded;").append(DATES.get(test)).append(";;\r\n");
    csv.append("Remark;invented sample;;\r\n\r\n");
    csv.append("Step;Force");
    PROBES.forEach(probe -> csv.append(';').append(probe.name()));
    csv.append("\r\n;kN");
    PROBES.forEach(probe -> csv.append(";µm"));
    csv.append("\r\n");
    int number = 1;
    for (int load = 0; load < PUSH_NAMES.size(); load++) {
      for (int run = 0; run < 3; run++) {
        double[] slopes = new double[PROBES.size()];
        double[] zeros = new double[PROBES.size()];
        double common = SCATTER / 2 * random.nextGaussian();
        for (int k = 0; k < slopes.length; k++) {
          double truth =
              flexibility[k][load] + table(PROBES.get(k), PUSH_NAMES.get(load));
          slopes[k] =
              truth * (1 + probeGains[k]) * (1 + common + SCATTER * random.nextGaussian())
                  + 4e-12 * random.nextGaussian();
          zeros[k] = 20e-6 * random.nextDouble();
        }
        for (double share : SHARES) {
          double force = share == 0 ? 0 : PEAK * (share + 0.004 * random.nextGaussian());
          csv.append(number++)
              .append(';')
              .append(comma(force / (1 + cellGains[test < 6 ? 0 : 1]) / 1000, 4));
          for (int k = 0; k < slopes.length; k++) {
            double motion = zeros[k] + slopes[k] * force + 1e-8 * random.nextGaussian();
            csv.append(';').append(comma(motion * 1e6, 3));
          }
          csv.append("\r\n");
        }
      }
    }
    return csv.toString();
  }
}
