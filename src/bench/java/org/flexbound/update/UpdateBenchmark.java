package org.flexbound.update;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SplittableRandom;
import java.util.concurrent.TimeUnit;
import org.ejml.data.DMatrixRMaj;
import org.flexbound.document.JsonFile;
import org.flexbound.finding.Where;
import org.flexbound.flexibility.AbsoluteCoefficient;
import org.flexbound.flexibility.Coefficient;
import org.flexbound.flexibility.Gain;
import org.flexbound.flexibility.LinearMap;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.FrameReader;
import org.flexbound.setup.Direction;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.setup.LoadPoint;
import org.flexbound.setup.Part;
import org.flexbound.setup.Placing;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;
import org.flexbound.solve.FrameFlexibility;
import org.flexbound.study.Study;
import org.flexbound.study.StudyReader;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/**
 * One update of a lattice frame (a × a × a nodes on a 1 m grid, base fixed, 6 unknowns a node): 40
 * gauges × 10 loads, 1 000 parameters, each EIy, EIz and GJ of one group of members. By part: the
 * coefficients alone (factor and solves), with their Jacobian (and sensitivities), one bounded step,
 * and the whole μ = 1 estimate.
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.SECONDS)
@Fork(value = 1, jvmArgsAppend = "-Xmx4g")
@Warmup(iterations = 1)
@Measurement(iterations = 3)
public class UpdateBenchmark {
  private static final int GAUGES = 40;
  private static final int LOADS = 10;
  private static final int PARAMETERS = 1000;

  /** Nodes along each edge; 16 gives the lattice of 23 040 unknowns. */
  @Param({"16"})
  public int edge;

  private UpdateProblem problem;
  private FittedModel model;
  private WhitenedModel.Linear linear;
  private double[] at;

  /** Builds the lattice, its study and an invented measurement. */
  @Setup
  public void build() {
    SplittableRandom random = new SplittableRandom(16);
    List<String> members = new ArrayList<>();
    FrameModel frame =
        FrameReader.read(JsonFile.parse(lattice(members), "lattice.json").orRefuse()).orRefuse();
    Study study =
        StudyReader.read(JsonFile.parse(study(members), "study.json").orRefuse()).orRefuse();
    List<Gauge> gauges = new ArrayList<>();
    List<Load> loads = new ArrayList<>();
    for (int i = 0; i < GAUGES; i++) {
      gauges.add(gauge("g" + i, node(random), i));
    }
    for (int j = 0; j < LOADS; j++) {
      loads.add(load("p" + j, node(random), j));
    }
    double[][] values =
        FrameFlexibility.prepare(frame, gauges, loads, List.of())
            .orRefuse()
            .solve(List.of())
            .values();
    List<AbsoluteCoefficient> absolute = new ArrayList<>();
    List<Coefficient> coefficients = new ArrayList<>();
    for (int i = 0; i < GAUGES; i++) {
      for (int j = 0; j < LOADS; j++) {
        double u = 0.005 * Math.abs(values[i][j]) + 1e-12;
        double value = 1.02 * values[i][j] + u * random.nextGaussian();
        absolute.add(new AbsoluteCoefficient(i, j, value, u, 0, List.of(0), 3));
        coefficients.add(new Coefficient(i, j, value, u, Double.POSITIVE_INFINITY));
      }
    }
    MeasuredFlexibility measured =
        new MeasuredFlexibility(
            Study.ONLY_CONFIGURATION,
            gauges,
            loads,
            absolute,
            List.of(new Gain("cell", "load cell", 0.01)),
            Double.POSITIVE_INFINITY,
            LinearMap.identity(absolute.size()),
            coefficients);
    problem = StudyUpdate.problem(study, frame, List.of(measured)).orRefuse();
    Observations observations = new Observations(problem.measured(), List.of(), 1);
    int[] rows = java.util.stream.IntStream.range(0, coefficients.size()).toArray();
    model = new FittedModel(observations, problem.parameters(), problem.function(), rows);
    at = new double[model.unknowns()];
    linear = model.linearise(at);
  }

  private String node(SplittableRandom random) {
    return "n" + random.nextInt(edge) + "_" + random.nextInt(edge) + "_" + (1 + random.nextInt(edge - 1));
  }

  private static Direction direction(int index) {
    return Direction.along(
        new Vector(index % 3 == 0 ? 1 : 0, index % 3 == 1 ? 1 : 0, index % 3 == 2 ? 1 : 0));
  }

  private static Gauge gauge(String name, String node, int index) {
    return new Gauge(
        name,
        GaugeKind.DISPLACEMENT,
        new Station.AtNode(node, Vector.ZERO),
        Optional.empty(),
        Optional.empty(),
        direction(index),
        Optional.empty(),
        Part.ARTICLE,
        Part.GROUND,
        false,
        Optional.empty(),
        Placing.UNSTATED,
        "",
        Where.nowhere());
  }

  private static Load load(String name, String node, int index) {
    return new Load(
        name,
        List.of(
            new LoadPoint(
                new Station.AtNode(node, Vector.ZERO),
                Optional.empty(),
                direction(index),
                1,
                Placing.UNSTATED)),
        Optional.empty(),
        OptionalDouble.empty(),
        "",
        Where.nowhere());
  }

  private String lattice(List<String> members) {
    StringBuilder nodes = new StringBuilder();
    StringBuilder bars = new StringBuilder();
    StringBuilder supports = new StringBuilder();
    for (int z = 0; z < edge; z++) {
      for (int y = 0; y < edge; y++) {
        for (int x = 0; x < edge; x++) {
          String name = "n" + x + "_" + y + "_" + z;
          comma(nodes).append("\"" + name + "\":[" + x + "," + y + "," + z + "]");
          if (z == 0) {
            comma(supports)
                .append("\"" + name + "\":{\"x\":\"fixed\",\"y\":\"fixed\",\"z\":\"fixed\","
                    + "\"rx\":\"fixed\",\"ry\":\"fixed\",\"rz\":\"fixed\"}");
          }
          if (x > 0) {
            bar(bars, members, "n" + (x - 1) + "_" + y + "_" + z, name, "");
          }
          if (y > 0) {
            bar(bars, members, "n" + x + "_" + (y - 1) + "_" + z, name, "");
          }
          if (z > 0) {
            bar(bars, members, "n" + x + "_" + y + "_" + (z - 1), name, ",\"reference\":[1,0,0]");
          }
        }
      }
    }
    return "{\"units\":{\"length\":\"m\",\"force\":\"N\",\"mass\":\"kg\",\"angle\":\"rad\"},"
        + "\"materials\":{\"steel\":{\"E\":2.1e11,\"G\":8.1e10,\"density\":7850}},"
        + "\"sections\":{\"bar\":{\"A\":5e-3,\"Iy\":2e-5,\"Iz\":2e-5,\"J\":3e-5}},"
        + "\"nodes\":{" + nodes + "},\"members\":{" + bars + "},\"supports\":{" + supports + "}}";
  }

  private static StringBuilder comma(StringBuilder text) {
    return text.length() > 0 ? text.append(",") : text;
  }

  private static void bar(
      StringBuilder bars, List<String> members, String a, String b, String more) {
    String name = "m" + members.size();
    members.add(name);
    comma(bars)
        .append("\"" + name + "\":{\"nodes\":[\"" + a + "\",\"" + b
            + "\"],\"section\":\"bar\",\"material\":\"steel\"" + more + "}");
  }

  private static String study(List<String> members) {
    StringBuilder parameters = new StringBuilder();
    for (int k = 0; k < PARAMETERS; k++) {
      StringBuilder scales = new StringBuilder();
      for (int i = k; i < members.size(); i += PARAMETERS) {
        for (String component : new String[] {"EIy", "EIz", "GJ"}) {
          comma(scales).append("\"members." + members.get(i) + "." + component + "\"");
        }
      }
      comma(parameters)
          .append("\"p" + k + "\":{\"scales\":[" + scales
              + "],\"lower\":0.5,\"upper\":2,\"priorStandardDeviation\":0.3}");
    }
    return "{\"model\":\"m.json\",\"log\":\"l.xlsx\",\"parameters\":{" + parameters + "}}";
  }

  /** Factor and solves. */
  @Benchmark
  public double[] coefficients() {
    return problem.function().coefficients(model.x(at));
  }

  /** Factor, solves and sensitivities. */
  @Benchmark
  public double[][] coefficientsAndJacobian() {
    return problem.function().at(model.x(at)).jacobian();
  }

  /** One bounded least-squares step. */
  @Benchmark
  public double[] boundedStep() {
    DMatrixRMaj jacobian = linear.jacobian;
    double[] low = model.lower();
    double[] high = model.upper();
    return new BoundedRidge(jacobian, linear.residuals, model.ridge(1), at).solve(low, high);
  }

  /** The whole μ = 1 estimate. */
  @Benchmark
  public int estimate() {
    return new GaussNewton(model, model.lower(), model.upper())
        .minimise(at, model.ridge(1))
        .iterations;
  }
}
