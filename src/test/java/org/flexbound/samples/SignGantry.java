package org.flexbound.samples;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Random;
import java.util.TreeMap;
import org.flexbound.document.Json;
import org.flexbound.document.JsonFile;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.FrameReader;
import org.flexbound.setup.Vector;

/**
 * Makes the readings of samples/sign-gantry: an invented test of an invented structure, with a
 * hidden truth (truth.json) behind it.
 *
 * <p>What happens to the true motion on its way to the log: gains of the load cell and of every
 * gauge, drawn once from their calibration; a scatter of the slope from run to run; the noise and
 * the resolution of each reading; a toe while the joints seat themselves in the first steps; a
 * little friction on the way down; and a slow drift of the ground under the dial stands.
 */
final class SignGantry {
  static final Path FOLDER = Path.of("samples", "sign-gantry");
  static final List<String> CHAIN = List.of("post", "inner arm", "outer arm");
  static final String LOG = "load-test-log.xlsx";

  /**
   * An ordinary draw. Of the ten seeds about it, two put one identified parameter further than two
   * posterior standard deviations from the truth, about as many as chance would.
   */
  private static final long SEED = 20_260_206L;

  private static final double SCATTER = 0.004;
  private static final double DRIFT_PER_STEP = 1.5e-6;

  /** A gauge with what the log says of it. */
  record Dial(
      String name,
      String member,
      double at,
      String node,
      String direction,
      boolean rotation,
      String instrument,
      double x,
      double z) {}

  /** A load with what the log says of it. */
  record Pull(
      String name, String member, double at, String node, String direction, double peak, double x) {}

  static final List<Dial> DIALS =
      List.of(
          new Dial("tip down", "outer arm", 1, "tip", "-z", false, "D1", 4.6, 5.2),
          new Dial("tip side", "outer arm", 1, "tip", "+y", false, "D2", 4.6, 5.2),
          new Dial("splice down", "inner arm", 1, "splice", "-z", false, "D3", 2.4, 5.2),
          new Dial("splice side", "inner arm", 1, "splice", "+y", false, "D4", 2.4, 5.2),
          new Dial("knee forward", "post", 1, "knee", "+x", false, "D5", 0, 5.2),
          new Dial("knee side", "post", 1, "knee", "+y", false, "D6", 0, 5.2),
          new Dial("post forward", "post", 0.5, "", "+x", false, "D7", 0, 2.6),
          new Dial("post side", "post", 0.5, "", "+y", false, "D8", 0, 2.6),
          new Dial("foot tilt forward", "post", 0, "foot", "ry", true, "I1", 0, 0),
          new Dial("foot tilt side", "post", 0, "foot", "rx", true, "I2", 0, 0));

  static final List<Pull> PULLS =
      List.of(
          new Pull("pull arm down", "outer arm", 1, "tip", "-z", 6000, 4.6),
          new Pull("pull arm side", "outer arm", 1, "tip", "+y", 3000, 4.6),
          new Pull("pull knee side", "post", 1, "knee", "+y", 5000, 0));

  private final Random random;

  private SignGantry(long seed) {
    random = new Random(seed);
  }

  /**
   * Writes the log.
   *
   * @param file where to
   */
  static void write(Path file) {
    write(file, SEED);
  }

  static void write(Path file, long seed) {
    new SignGantry(seed).log().write(file);
  }

  /** Writes the log where the sample keeps it. */
  public static void main(String[] arguments) {
    write(FOLDER.resolve(LOG));
  }

  static FrameModel model() {
    return FrameReader.read(FOLDER.resolve("model.json"), "model.json").orRefuse();
  }

  /** The true factors on nominal stiffnesses, by path. */
  static Map<String, Double> truth() {
    Json json = JsonFile.read(FOLDER.resolve("truth.json"), "truth.json").orRefuse();
    Map<String, Double> result = new TreeMap<>();
    Json factors = ((Json.Members) json).get("factors").orElseThrow();
    ((Json.Members) factors)
        .members()
        .forEach((path, value) -> result.put(path, ((Json.Numeral) value).value()));
    return result;
  }

  static Vector vector(String direction) {
    double sign = direction.startsWith("-") ? -1 : 1;
    return switch (direction.charAt(direction.length() - 1)) {
      case 'x' -> new Vector(sign, 0, 0);
      case 'y' -> new Vector(0, sign, 0);
      default -> new Vector(0, 0, sign);
    };
  }

  static CantileverTruth.Action action(Dial dial) {
    Vector along = vector(dial.direction());
    return new CantileverTruth.Action(
        dial.member(),
        dial.at(),
        dial.rotation() ? Vector.ZERO : along,
        dial.rotation() ? along : Vector.ZERO);
  }

  static CantileverTruth.Action action(Pull pull) {
    return new CantileverTruth.Action(
        pull.member(), pull.at(), vector(pull.direction()), Vector.ZERO);
  }

  private SampleWorkbook log() {
    SampleWorkbook book = new SampleWorkbook();
    entries(book);
    CantileverTruth truth = new CantileverTruth(model(), CHAIN, truth());
    double cellGain = 0.0025 * random.nextGaussian();
    double[] gains = new double[DIALS.size()];
    for (int k = 0; k < gains.length; k++) {
      gains[k] = (DIALS.get(k).rotation() ? 0.005 : 0.003) * random.nextGaussian();
    }
    int day = 3;
    for (Pull pull : PULLS) {
      for (int run = 1; run <= 3; run++) {
        String name = pull.name() + " " + run;
        String remark = name.equals("pull arm side 2") ? "gusty while unloading" : null;
        book.row(
            "Runs", name, name, "Jack", pull.name(), "2026-02-0" + day, 7.5 + 0.5 * run, "yes",
            remark);
        run(book, name, pull, truth, cellGain, gains);
      }
      day++;
    }
    return book;
  }

  private static void entries(SampleWorkbook book) {
    book.row("Test", "Item", "Entry");
    book.row("Test", "Title", "Load test of a cantilever sign gantry (invented sample)");
    book.row("Test", "Article", "bolted steel cantilever sign gantry");
    book.row("Test", "Fixture", "its own footing in the ground");
    book.row("Test", "Date", "2026-02-03");
    book.row("Test", "Place", "invented test yard");
    book.row("Test", "Tested by", "nobody: the readings are made by a program");
    book.row("Test", "Ambient temperature", "8 °C");
    book.row("Test", "Length unit", "m");
    book.row("Test", "Notes", "Joints tightened before the first run. One jack and cell, moved.");
    book.row(
        "Instruments", "Instrument", "Kind", "Serial", "Calibration reference", "Calibration date",
        "Uncertainty of reading (%)", "Uncertainty fixed", "Unit", "As stated", "Resolution",
        "Range");
    book.row(
        "Instruments", "C1", "load cell", "17", "LC-17/25", "2025-11-10", 0.5, 5, "N", "k=2", 1,
        10000);
    for (Dial dial : DIALS) {
      if (dial.rotation()) {
        book.row(
            "Instruments", dial.instrument(), "inclinometer", "9" + dial.instrument().charAt(1),
            "IN-" + dial.instrument() + "/25", "2025-10-02", 1.0, 0.004, "mrad", "k=2", 0.001, 50);
      } else {
        book.row(
            "Instruments", dial.instrument(), "dial gauge", "4" + dial.instrument().charAt(1),
            "DG-" + dial.instrument() + "/25", "2025-09-15", 0.6, 0.02, "mm", "k=2", 0.01, 100);
      }
    }
    book.row(
        "Load points", "Load", "Node", "Direction", "Column", "Unit", "Instrument", "Limit", "X",
        "Y", "Z", "Remark");
    for (Pull pull : PULLS) {
      book.row(
          "Load points", pull.name(), pull.node(), pull.direction(), "Jack", "N", "C1",
          1.2 * pull.peak(), pull.x(), 0, 5.2, null);
    }
    book.row(
        "Gauges", "Gauge", "Kind", "Node", "Direction", "Column", "Unit", "Instrument", "Measures",
        "Stands on", "Member", "At", "X", "Y", "Z", "Remark");
    for (Dial dial : DIALS) {
      boolean onMember = dial.node().isEmpty();
      book.row(
          "Gauges", dial.name(), dial.rotation() ? "rotation" : "displacement",
          onMember ? null : dial.node(), dial.direction(), dial.instrument(),
          dial.rotation() ? "mrad" : "mm", dial.instrument(), "article", "ground",
          onMember ? dial.member() : null, onMember ? dial.at() : null, dial.x(), 0, dial.z(),
          null);
    }
    book.row(
        "Runs", "Run", "Sheet", "Column", "Load or gauge", "Date", "Temperature [°C]", "Use",
        "Remark");
  }

  private void run(
      SampleWorkbook book,
      String sheet,
      Pull pull,
      CantileverTruth truth,
      double cellGain,
      double[] gains) {
    List<Object> header = new ArrayList<>(List.of("Time [s]", "Step", "Jack [N]"));
    DIALS.forEach(
        dial -> header.add(dial.instrument() + (dial.rotation() ? " [mrad]" : " [mm]")));
    header.add("Use");
    header.add("Remark");
    book.row(sheet, header.toArray());
    double[] slopes = new double[DIALS.size()];
    double[] zeros = new double[DIALS.size()];
    for (int k = 0; k < slopes.length; k++) {
      slopes[k] =
          truth.flexibility(action(DIALS.get(k)), action(pull))
              * (1 + gains[k])
              * (1 + SCATTER * random.nextGaussian());
      zeros[k] = (DIALS.get(k).rotation() ? 1e-3 : 1e-2) * (1 + random.nextDouble());
    }
    double[] targets = {0, 0.2, 0.4, 0.6, 0.8, 1, 0.8, 0.6, 0.4, 0.2, 0};
    int time = 0;
    for (int step = 0; step < targets.length; step++) {
      double held =
          targets[step] == 0
              ? 0
              : pull.peak() * (targets[step] + 0.006 * random.nextGaussian());
      for (int reading = 0; reading < 2; reading++) {
        time += 45;
        List<Object> row = new ArrayList<>();
        row.add(time);
        row.add(step);
        row.add(round((held + 2 * random.nextGaussian()) / (1 + cellGain), 1));
        boolean slipped = sheet.equals("pull arm down 1") && step == 3 && reading == 1;
        for (int k = 0; k < slopes.length; k++) {
          Dial dial = DIALS.get(k);
          double share = Math.abs(held) / pull.peak();
          double friction = step > 5 ? 0.003 * 4 * share * (1 - share) * pull.peak() : 0;
          double toe = held == 0 || step > 5 ? 0 : 0.002 * pull.peak() * (1 - Math.exp(-share / 0.08));
          double motion = slopes[k] * (held + friction + toe);
          motion += dial.rotation() ? 0 : DRIFT_PER_STEP * step;
          motion += (dial.rotation() ? 0.4e-6 : 4e-6) * random.nextGaussian();
          if (slipped && k == 0) {
            motion += 0.0021;
          }
          double unit = 1e-3;
          row.add(round((zeros[k] + motion) / unit, dial.rotation() ? 0.001 : 0.01));
        }
        row.add(slipped ? "no" : null);
        row.add(slipped ? "somebody touched the dial stand at D1" : null);
        book.row(sheet, row.toArray());
      }
    }
  }

  /** A value as an instrument of that resolution shows it, free of binary crumbs. */
  private static double round(double value, double resolution) {
    double steps = Math.rint(value / resolution);
    return Double.parseDouble(
        String.format(Locale.ROOT, "%.3f", steps * resolution));
  }

  static boolean exists() {
    return Files.exists(FOLDER.resolve(LOG));
  }
}
