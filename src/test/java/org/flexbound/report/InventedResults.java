package org.flexbound.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import java.util.function.UnaryOperator;
import org.flexbound.report.results.*;

/** Results of a test that never took place: every kind of entry, for tests of the outputs. */
final class InventedResults {
  static final String CONFIGURATION = "as tested";
  private static final double PEAK = 4000;

  private final UnaryOperator<String> name;
  private final int gauges;
  private final int loads;
  private final int steps;
  private int limitSets = 1;
  private final Random random = new Random(20260117);

  private InventedResults(UnaryOperator<String> name, int gauges, int loads, int steps) {
    this.name = name;
    this.gauges = gauges;
    this.loads = loads;
    this.steps = steps;
  }

  /** A small test. */
  static Results small() {
    return new InventedResults(UnaryOperator.identity(), 5, 3, 7).make();
  }

  /** A small test in which every name that a user can choose is changed. */
  static Results named(UnaryOperator<String> name) {
    return new InventedResults(name, 4, 2, 5).make();
  }

  /** A small test with three limits so often. */
  static Results limited(UnaryOperator<String> name, int times) {
    InventedResults results = new InventedResults(name, 4, 2, 5);
    results.limitSets = times;
    return results.make();
  }

  /** A large test. */
  static Results large(int gauges, int loads, int steps) {
    return new InventedResults(UnaryOperator.identity(), gauges, loads, steps).make();
  }

  private String gauge(int k) {
    return name.apply("D" + (k + 1));
  }

  private String load(int k) {
    return name.apply("P" + (k + 1));
  }

  private Results make() {
    Test test =
        new Test(
            name.apply("Proof test (invented)"),
            name.apply("bolted bracket"),
            name.apply("strong floor"),
            "2026-01-17",
            name.apply("bay 3"),
            name.apply("night shift"),
            "21 °C",
            name.apply("nothing to add"));
    List<Load> loadList = new ArrayList<>();
    for (int k = 0; k < loads; k++) {
      loadList.add(
          new Load(
              CONFIGURATION,
              load(k),
              List.of(point(3.0 * (k + 1) / loads, 2.5, k % 2 == 0 ? 2 : 1)),
              name.apply("cell"),
              OptionalDouble.of(5000),
              ""));
    }
    List<Gauge> gaugeList = new ArrayList<>();
    for (int k = 0; k < gauges; k++) {
      gaugeList.add(
          new Gauge(
              CONFIGURATION,
              gauge(k),
              k == gauges - 1 ? "rotation" : "displacement",
              point(3.0 * (k + 1) / gauges, 2.5, k % 2 == 0 ? 2 : 1),
              Optional.empty(),
              "article",
              "ground",
              k == 0,
              name.apply("dial " + k),
              ""));
    }
    List<Run> runs = new ArrayList<>();
    List<Curve> curves = new ArrayList<>();
    List<Coefficient> coefficients = new ArrayList<>();
    List<Comparison> comparison = new ArrayList<>();
    List<Contribution> contributions = new ArrayList<>();
    for (int j = 0; j < loads; j++) {
      for (int r = 0; r < 2; r++) {
        runs.add(
            new Run(
                CONFIGURATION,
                name.apply("R" + j + r),
                r == 0 ? "accept" : "doubtful",
                r == 0 ? List.of() : List.of("the zero did not come back"),
                "2026-01-17",
                OptionalDouble.of(294),
                true,
                List.of(load(j)),
                OptionalDouble.of(PEAK),
                "N",
                steps,
                1,
                r == 0 ? "" : name.apply("wind"),
                "log.xlsx, sheet R" + j + r));
      }
      for (int i = 0; i < gauges; i++) {
        coefficient(i, j, curves, coefficients, comparison, contributions);
      }
    }
    return new Results(
        Results.FORMAT,
        Program.NAME + " " + Program.VERSION,
        "update",
        name.apply("Bracket study (invented)"),
        test,
        List.of(new Configuration(CONFIGURATION, name.apply("log.xlsx"), test, List.of())),
        List.of(new Input(name.apply("log.xlsx"), "ab".repeat(32))),
        List.of(
            new Instrument(
                CONFIGURATION,
                name.apply("cell"),
                "load cell",
                "12",
                name.apply("cert 1"),
                "2025-06-01",
                OptionalDouble.of(0.005),
                OptionalDouble.empty(),
                OptionalDouble.of(1),
                OptionalDouble.of(1e4))),
        loadList,
        gaugeList,
        List.of(new Option("fit range", "10 to 100 % of the peak load", "default")),
        List.of(
            new Finding(
                "note", "LOG-NUMBER-AS-TEXT", name.apply("a number stood as text"),
                "log.xlsx, sheet R00, cell B4", "Nothing needs to be done."),
            new Finding(
                "warning", "REDUCE-ZERO", name.apply("the zero did not come back"),
                "log.xlsx, sheet R01", "Repeat the run.")),
        runs,
        List.of(
            new Exclusion(
                CONFIGURATION, name.apply("R01"), "row 9", "log.xlsx, sheet R01, cells A9:D9",
                name.apply("somebody leant on the post"), "the user (column Use)", 4)),
        coefficients,
        List.of(
            new Covariance(
                CONFIGURATION,
                OptionalDouble.of(17),
                List.of(List.of(1e-20, 0.0), List.of(0.0, 1e-20)),
                List.of(new SharedFactor("cell / cert 1", "load cell", 0.005, List.of(1e-9, 2e-9), false)))),
        List.of(),
        List.of(),
        List.of(
            new Reciprocity(
                CONFIGURATION, gauge(0) + " / " + load(1), gauge(1) + " / " + load(0), 1.02e-6,
                1.00e-6, "m/N", 2e-8, 1.1e-8,
                OptionalDouble.of(1.82))),
        List.of(
            new JointTest(
                CONFIGURATION, "Reciprocity of all pairs", 3.3, OptionalDouble.of(7.8),
                OptionalDouble.of(3), OptionalDouble.of(0.35), true, "")),
        List.of(
            new MatrixCheck(
                CONFIGURATION,
                Optional.of(
                    new SmallestEigenvalue(
                        List.of(load(0), load(1)), 0.2, 0.01, OptionalDouble.of(20), 3,
                        List.of(0.6, -0.8), true)),
                List.of(
                    new BoundCheck(
                        gauge(0) + " under " + load(1), false, 0.8, OptionalDouble.of(-20), 3, true)),
                List.of(
                    new PointGain(
                        gauge(0), load(0), 25.4, Math.log(25.4), 0.01, OptionalDouble.of(300), 3,
                        true)),
                List.of(
                    new TripleProduct(
                        List.of(load(0), load(1), load(0)), 1.01, OptionalDouble.of(1), 3, true)),
                List.of(new Hint(name.apply("a gauge reversed"), "it fits", 500, 2)))),
        Optional.of(structure()),
        comparison,
        List.of(
            new JointTest(
                CONFIGURATION, "Nominal model against all coefficients", 5000,
                OptionalDouble.of(25), OptionalDouble.of(15), OptionalDouble.empty(), false,
                "the nominal model disagrees with the test by more than chance explains")),
        contributions,
        List.of(
            parameter("base rz", 0.52, 0.05, "identified", 0.99),
            parameter("splice ry", 1.02, 0.49, "not identifiable from this test", 0.02)),
        Optional.of(update()),
        List.of(
            new Validation(
                CONFIGURATION, gauge(0), load(0), 1.1e-6, 1.08e-6, 2e-8, 1.04e-6, 1.12e-6, 1.0,
                true, "m/N")),
        Optional.empty(),
        limits(),
        List.of(
            new FixtureShare(
                CONFIGURATION, gauge(0), load(0), "m/N", 1.1e-6, 1e-8, 0.9e-6, 2e-8,
                OptionalDouble.of(0.18), OptionalDouble.of(0.02))),
        Optional.of(
            new Recheck(
                name.apply("earlier.json"), name.apply("earlier"), "2025-01-17",
                List.of(
                    new CoefficientChange(
                        CONFIGURATION, gauge(0), load(0), "m/N", 1e-6, 1.1e-6, 1e-7, 1e-8,
                        OptionalDouble.of(20), 1e-9, 2e-9, true)),
                120, 6, OptionalDouble.of(34), 1e-9, true, List.of(name.apply("cell")),
                Optional.of(
                    new ChangeExplanation(
                        true,
                        List.of(
                            new ChangeSubset(
                                List.of(
                                    new ParameterChange(
                                        name.apply("clamp"), OptionalDouble.of(0.4))),
                                4, 9, 5)))))),
        List.of(new Energy(CONFIGURATION, name.apply("R00"), 11.3, true)),
        curves);
  }

  private List<Limit> limits() {
    List<Limit> limits = new ArrayList<>();
    for (int k = 0; k < limitSets; k++) {
      limits.add(limit("pass", 3.8e-9, 0.99));
      limits.add(limit("undecided", 3.98e-9, 0.6));
      limits.add(limit("fail", 5e-9, 0));
    }
    return limits;
  }

  private Limit limit(String decision, double value, double probability) {
    return new Limit(
        CONFIGURATION,
        name.apply("stiff enough"),
        "coefficient",
        gauge(0) + " under " + load(0),
        OptionalDouble.of(value),
        OptionalDouble.of(0.08e-9),
        OptionalDouble.of(17),
        OptionalDouble.empty(),
        OptionalDouble.of(4e-9),
        "m/N",
        "µm/kN",
        1e-9,
        2,
        "guarded",
        0.05,
        OptionalDouble.of(0.14e-9),
        OptionalDouble.of(probability),
        decision,
        OptionalDouble.of(Math.min(probability, 1 - probability)),
        decision.equals("undecided") ? "2 more runs would settle it" : "",
        List.of(new UncertaintyShare(name.apply("cell"), 0.7)));
  }

  private void coefficient(
      int i,
      int j,
      List<Curve> curves,
      List<Coefficient> coefficients,
      List<Comparison> comparison,
      List<Contribution> contributions) {
    double a = ((i + j) % 3 == 2 ? -1 : 1) * 1e-6 * (1 + i) * (1 + j) / (gauges * loads) * 4;
    String unit = i == gauges - 1 ? "rad/N" : "m/N";
    double u = 0.02 * Math.abs(a);
    coefficients.add(
        new Coefficient(
            CONFIGURATION, gauge(i), load(j), a, unit, u, OptionalDouble.of(11), 0.7 * u, 0.3 * u,
            0.6 * u, OptionalDouble.of(1.01 * a), 2,
            List.of(new Quality("linearity", 0.004, OptionalDouble.of(0.02), true))));
    double computed = a / (1.3 + 0.05 * random.nextGaussian());
    double updated = a / (1 + 0.02 * random.nextGaussian());
    comparison.add(
        new Comparison(
            CONFIGURATION, gauge(i), load(j), a, u, computed, OptionalDouble.of(a / computed),
            (a - computed) / u, OptionalDouble.of(updated), OptionalDouble.of(a / updated),
            OptionalDouble.of((a - updated) / u), j == 0,
            OptionalDouble.empty(), OptionalDouble.empty(), OptionalDouble.empty(),
            OptionalDouble.empty(), OptionalDouble.empty(), OptionalDouble.empty(), unit));
    contributions.add(
        new Contribution(CONFIGURATION, gauge(i), load(j), "joints.base.rz", 0.6 * a, unit));
    contributions.add(
        new Contribution(CONFIGURATION, gauge(i), load(j), "members.post.EIy", 0.55 * a, unit));
    contributions.add(
        new Contribution(CONFIGURATION, gauge(i), load(j), "joints.knee.ry", -0.15 * a, unit));
    for (int r = 0; r < 2; r++) {
      List<CurvePoint> points = new ArrayList<>();
      for (int s = 0; s < 2 * steps - 1; s++) {
        int up = s < steps ? s : 2 * steps - 2 - s;
        double load = PEAK * up / (steps - 1);
        double residual = 0.01 * Math.abs(a) * PEAK * random.nextGaussian();
        points.add(
            new CurvePoint(
                load, a * load + residual, s < steps ? "loading" : "unloading", 1, s != 1, residual,
                "log.xlsx, sheet R" + j + r + ", cell C" + (s + 2)));
      }
      curves.add(
          new Curve(
              CONFIGURATION, name.apply("R" + j + r), gauge(i), load(j), "N",
              i == gauges - 1 ? "rad" : "m", a, 0.01 * Math.abs(a),
              List.of(new Line("loading", 1, 0), new Line("unloading", 1, 0.005 * a * PEAK)),
              0.1 * PEAK, PEAK, points));
    }
  }

  private Point point(double x, double z, int axis) {
    return new Point(
        name.apply("node " + x), List.of(x, 0.0, z),
        List.of(axis == 0 ? 1.0 : 0.0, axis == 1 ? 1.0 : 0.0, axis == 2 ? -1.0 : 0.0), false, 1,
        OptionalDouble.empty(), OptionalDouble.empty());
  }

  private Structure structure() {
    List<List<Double>> box =
        List.of(List.of(-0.1, -0.1), List.of(0.1, -0.1), List.of(0.1, 0.1), List.of(-0.1, 0.1));
    return new Structure(
        "model.json",
        List.of(0.0, 0.0, 1.0),
        List.of(
            new Node(name.apply("foot"), 0, 0, 0),
            new Node(name.apply("knee"), 0, 0, 2.5),
            new Node(name.apply("tip"), 3, 0, 2.5)),
        List.of(
            new Member(
                name.apply("post"), name.apply("foot"), name.apply("knee"), "box",
                List.of(0.0, 0.0, 0.0), List.of(0.0, 0.0, 2.5), List.of(1.0, 0.0, 0.0), box),
            new Member(
                name.apply("arm"), name.apply("knee"), name.apply("tip"), "box",
                List.of(0.0, 0.0, 2.5), List.of(3.0, 0.0, 2.5), List.of(0.0, 0.0, 1.0), box)),
        List.of(
            new Place("support", name.apply("foot"), List.of(0.0, 0.0, 0.0), List.of()),
            new Place("joint", name.apply("knee"), List.of(0.0, 0.0, 2.5), List.of())));
  }

  private Parameter parameter(
      String which, double factor, double sd, String status, double removed) {
    List<ProfilePoint> profile = new ArrayList<>();
    for (int k = -5; k <= 5; k++) {
      double x = Math.log(factor) + 0.6 * sd * k;
      profile.add(
          new ProfilePoint(
              OptionalDouble.of(8e6 * Math.exp(x)), x, 0.5 * Math.pow(0.6 * k, 2) * removed));
    }
    return new Parameter(
        name.apply(which),
        List.of("joints." + which.replace(' ', '.')),
        "N·m/rad",
        OptionalDouble.of(8e6),
        OptionalDouble.of(8e6 * factor),
        OptionalDouble.of(factor),
        OptionalDouble.of(8e5),
        OptionalDouble.of(4e7),
        "ln",
        0,
        Math.log(factor),
        Math.log(factor),
        0.5,
        sd,
        removed,
        OptionalDouble.of(8e6 * factor * Math.exp(-2 * sd)),
        OptionalDouble.of(8e6 * factor * Math.exp(2 * sd)),
        status,
        false,
        removed > 0.5,
        name.apply("grout"),
        Optional.empty(),
        Optional.empty(),
        List.of(),
        Optional.of(new Profile(2.1, true, profile)));
  }

  private Update update() {
    List<TradeOff> curve = new ArrayList<>();
    for (int k = 0; k < 9; k++) {
      double weight = Math.pow(10, 4 - k);
      curve.add(new TradeOff(weight, 12 + 5000 / (1 + 100 / weight), 1.4 / (1 + weight / 30), 1));
    }
    Misfit misfit = new Misfit(13, 14, 23.7, CONFIGURATION + ": " + load(0), 1.9, 3.1, true);
    return new Update(
        "prior", "updated", 1, 0,
        new Misfit(5000, 15, 25, CONFIGURATION + ": " + load(0), 40, 3.1, false), misfit, misfit, 1,
        OptionalDouble.of(17), curve,
        List.of(
            new Group(
                List.of(name.apply("base rz"), name.apply("knee ry")), List.of(0.7, 0.7), 0.4, 0.06,
                0.28, 0.52, true, name.apply("base rz · knee ry = 0.31"))),
        List.of(20.0, 0.4), 1, List.of(List.of(1.0, 0.1), List.of(0.1, 1.0)),
        List.of(new GainEstimate("cell / cert 1", "load cell", 0.005, 0.001, 0.004)),
        List.of(
            new Fit(
                CONFIGURATION, gauge(0), load(0), 1.01e-6, 0.4, -3.8, true, List.of(1.4, -0.2))),
        List.of(), List.of(
            new WithoutCase(
                CONFIGURATION, load(0),
                List.of(
                    new ParameterWithout(name.apply("base rz"), OptionalDouble.of(1.2e6), 2.4),
                    new ParameterWithout(name.apply("knee ry"), OptionalDouble.empty(), -0.1)),
                14, 12, false)),
        Optional.empty(), new Unexplained(12, 8, 0.01, List.of(CONFIGURATION + ": " + gauge(0))),
        true, "the step became small", 6, 7, 1e-12, List.of(new Start(true, 6.1, 6, 0)), true);
  }
}
