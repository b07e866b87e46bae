package org.flexbound.solve;

import java.lang.management.ManagementFactory;
import java.lang.management.MemoryPoolMXBean;
import java.lang.management.MemoryType;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.SplittableRandom;
import java.util.function.Supplier;
import org.flexbound.document.JsonFile;
import org.flexbound.finding.Where;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.FrameReader;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.frame.StiffnessSetting;
import org.flexbound.setup.Direction;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.setup.LoadPoint;
import org.flexbound.setup.Part;
import org.flexbound.setup.Placing;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;
import org.flexbound.sparse.NumericFactor;
import org.flexbound.sparse.SymmetricMatrix;

/**
 * Times the frame solver on regular lattice frames read as a user's model: reading and preparing, assembly, factor, 50 right-hand sides, the
 * whole solution for 40 gauges and 10 loads, the sensitivities of all 400 coefficients to the bending stiffness of 1 000 members, and the 30
 * lowest modes; best of three, with the largest heap that each frame took. Goals are printed beside: sensitivities in half of the native
 * factor's time of n16 on two threads, which was 0.31 to 0.72 s; modes in half of SciPy's time.
 */
public final class FrameBenchmark {
  private static final int GAUGES = 40;
  private static final int LOADS = 10;
  private static final int PARAMETERS = 1000;
  private static final int RIGHT_HAND_SIDES = 50;
  private static final int MODES = 30;
  private static final int REPEATS = 3;

  private static final Map<String, Double> GOAL_MODES = Map.of("n12", 0.92, "n16", 3.95, "n20", 18.6);

  private final int[] nodes;
  private final List<String> members = new ArrayList<>();
  private final String name;

  private FrameBenchmark(String name) {
    this.name = name;
    int edge = name.equals("boom") ? 2 : Integer.parseInt(name.substring(1));
    nodes = new int[] {edge, edge, name.equals("boom") ? 4168 : edge};
  }

  /**
   * Prints a table.
   *
   * @param args the frames, such as {@code n12 n16 boom}; n8, n12, n16, n20 and the boom where left out
   */
  public static void main(String[] args) {
    System.out.println("| frame | unknowns | read | prepare | assembly | factor | 50 solves | solution of 40 × 10 | 400 × 1000 sensitivities"
        + " (n16: goal 0.15 to 0.36) | 30 modes (goal) | peak heap, MB |");
    System.out.println("| --- | --- | --- | --- | --- | --- | --- | --- | --- | --- | --- |");
    for (String frame : args.length > 0 ? List.of(args) : List.of("n8", "n12", "n16", "n20", "boom")) {
      System.out.println(new FrameBenchmark(frame).row());
    }
  }

  private static double seconds(Supplier<?> work) {
    double best = Double.POSITIVE_INFINITY;
    for (int k = 0; k < REPEATS; k++) {
      long start = System.nanoTime();
      Object result = work.get();
      best = Math.min(best, (System.nanoTime() - start) * 1e-9);
      if (result == null) {
        throw new IllegalStateException("nothing was worked out");
      }
    }
    return best;
  }

  private String row() {
    System.gc();
    heaps().forEach(MemoryPoolMXBean::resetPeakUsage);
    String text = text();
    double read = seconds(() -> FrameReader.read(JsonFile.parse(text, name + ".json").orRefuse()).orRefuse());
    FrameModel model = FrameReader.read(JsonFile.parse(text, name + ".json").orRefuse()).orRefuse();
    SplittableRandom random = new SplittableRandom(16);
    List<Gauge> gauges = new ArrayList<>();
    List<Load> loads = new ArrayList<>();
    for (int i = 0; i < GAUGES; i++) {
      gauges.add(gauge("g" + i, node(random), i));
    }
    for (int j = 0; j < LOADS; j++) {
      loads.add(load("p" + j, node(random), j));
    }
    List<StiffnessPath> paths = new ArrayList<>();
    for (int k = 0; k < PARAMETERS; k++) {
      int member = (int) ((long) k * members.size() / PARAMETERS);
      paths.add(StiffnessPath.parse("members." + members.get(member) + ".EIy").orElseThrow());
    }
    List<StiffnessPath> distinct = paths.stream().distinct().toList();
    double prepare = seconds(() -> FrameFlexibility.prepare(model, gauges, loads, distinct).orRefuse());
    FrameFlexibility ready = FrameFlexibility.prepare(model, gauges, loads, distinct).orRefuse();
    List<StiffnessSetting> settings = Collections.nCopies(distinct.size(), new StiffnessSetting.Factor(1.01));
    FlexibilitySolution solution = ready.solve(settings);
    Structure structure = solution.structure();
    State state = solution.state();
    Supplier<SymmetricMatrix> assembly =
        () -> structure.assemble((e, values) -> structure.elements().get(e).stiffness(state.basic(e), values));
    double assemble = seconds(assembly);
    SymmetricMatrix matrix = assembly.get();
    double factor = seconds(() -> structure.symbolic().cholesky(matrix));
    NumericFactor factored = structure.symbolic().cholesky(matrix);
    double[] rhs = new double[matrix.diagonal().length * RIGHT_HAND_SIDES];
    java.util.Arrays.setAll(rhs, k -> Math.sin(k));
    double solves = seconds(() -> {
      double[] x = rhs.clone();
      factored.solve(x, RIGHT_HAND_SIDES);
      return x;
    });
    double whole = seconds(() -> ready.solve(settings));
    double sensitivities = seconds(() -> {
      FlexibilitySolution at = ready.solve(settings);
      long start = System.nanoTime();
      double[][] last = new double[0][];
      for (int k = 0; k < distinct.size(); k++) {
        last = at.derivative(k, Derivative.LOGARITHM);
      }
      sensitivity = Math.min(sensitivity, (System.nanoTime() - start) * 1e-9);
      return last;
    });
    if (sensitivities < sensitivity) {
      throw new IllegalStateException("a part took longer than the whole");
    }
    String modes = "–";
    if (nodes[2] <= 20) {
      double time = seconds(() -> FrameModes.of(model, gauges, loads, new ModeSettings(MODES, OptionalInt.of(1))).orRefuse());
      modes = String.format(Locale.ROOT, "%.2f (%s)", time, GOAL_MODES.containsKey(name) ? GOAL_MODES.get(name) : "–");
    }
    long peak = heaps().stream().mapToLong(pool -> pool.getPeakUsage().getUsed()).sum();
    return String.format(Locale.ROOT, "| %s | %d | %.2f | %.2f | %.3f | %.3f | %.3f | %.3f | %.3f | %s | %d |", name, matrix.diagonal().length,
        read, prepare, assemble, factor, solves, whole, sensitivity, modes, peak >> 20);
  }

  private double sensitivity = Double.POSITIVE_INFINITY;

  private static List<MemoryPoolMXBean> heaps() {
    return ManagementFactory.getMemoryPoolMXBeans().stream().filter(pool -> pool.getType() == MemoryType.HEAP).toList();
  }

  private String node(SplittableRandom random) {
    return node(random.nextInt(nodes[0]), random.nextInt(nodes[1]), 1 + random.nextInt(nodes[2] - 1));
  }

  private static String node(int x, int y, int z) {
    return "n" + x + "_" + y + "_" + z;
  }

  private static Direction direction(int index) {
    return Direction.along(new Vector(index % 3 == 0 ? 1 : 0, index % 3 == 1 ? 1 : 0, index % 3 == 2 ? 1 : 0));
  }

  private static Gauge gauge(String name, String node, int index) {
    return new Gauge(name, GaugeKind.DISPLACEMENT, new Station.AtNode(node, Vector.ZERO), Optional.empty(), Optional.empty(), direction(index),
        Optional.empty(), Part.ARTICLE, Part.GROUND, false, Optional.empty(), Placing.UNSTATED, "", Where.nowhere());
  }

  private static Load load(String name, String node, int index) {
    return new Load(name,
        List.of(new LoadPoint(new Station.AtNode(node, Vector.ZERO), Optional.empty(), direction(index), 1, Placing.UNSTATED)),
        Optional.empty(), OptionalDouble.empty(), "", Where.nowhere());
  }

  private String text() {
    StringBuilder places = new StringBuilder();
    StringBuilder bars = new StringBuilder();
    StringBuilder supports = new StringBuilder();
    for (int z = 0; z < nodes[2]; z++) {
      for (int y = 0; y < nodes[1]; y++) {
        for (int x = 0; x < nodes[0]; x++) {
          String here = node(x, y, z);
          comma(places).append("\"" + here + "\":[" + x + "," + y + "," + z + "]");
          if (z == 0) {
            comma(supports).append("\"" + here + "\":{\"x\":\"fixed\",\"y\":\"fixed\",\"z\":\"fixed\","
                + "\"rx\":\"fixed\",\"ry\":\"fixed\",\"rz\":\"fixed\"}");
          }
          if (x > 0) {
            bar(bars, node(x - 1, y, z), here, "");
          }
          if (y > 0) {
            bar(bars, node(x, y - 1, z), here, "");
          }
          if (z > 0) {
            bar(bars, node(x, y, z - 1), here, ",\"reference\":[1,0,0]");
          }
        }
      }
    }
    return "{\"units\":{\"length\":\"m\",\"force\":\"N\",\"mass\":\"kg\",\"angle\":\"rad\"},"
        + "\"materials\":{\"steel\":{\"E\":2.1e11,\"G\":8.1e10,\"density\":7850}},"
        + "\"sections\":{\"bar\":{\"A\":5e-3,\"Iy\":2e-5,\"Iz\":2e-5,\"J\":3e-5}},"
        + "\"nodes\":{" + places + "},\"members\":{" + bars + "},\"supports\":{" + supports + "}}";
  }

  private static StringBuilder comma(StringBuilder text) {
    return text.length() > 0 ? text.append(",") : text;
  }

  private void bar(StringBuilder bars, String a, String b, String more) {
    String member = "m" + members.size();
    members.add(member);
    comma(bars).append("\"" + member + "\":{\"nodes\":[\"" + a + "\",\"" + b + "\"],\"section\":\"bar\",\"material\":\"steel\"" + more + "}");
  }
}
