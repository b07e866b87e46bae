package org.flexbound.report.gather;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.flexbound.flexibility.AbsoluteCoefficient;
import org.flexbound.flexibility.CoefficientUncertainty;
import org.flexbound.flexibility.Gain;
import org.flexbound.flexibility.LinearMap;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.flexibility.Bound;
import org.flexbound.flexibility.MatrixChecks;
import org.flexbound.flexibility.ReciprocityTable;
import org.flexbound.reduce.Reduction;
import org.flexbound.reduce.RunResult;
import org.flexbound.reduce.RunSlope;
import org.flexbound.report.results.Absolute;
import org.flexbound.report.results.Coefficient;
import org.flexbound.report.results.Covariance;
import org.flexbound.report.results.Exclusion;
import org.flexbound.report.results.JointTest;
import org.flexbound.report.results.OperatorRow;
import org.flexbound.report.results.Quality;
import org.flexbound.report.results.Reciprocity;
import org.flexbound.report.results.Run;
import org.flexbound.report.results.SharedFactor;
import org.flexbound.report.results.Term;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Load;
import org.flexbound.setup.QualityLimits;
import org.flexbound.testlog.TestLog;

/** What a reduction found in one configuration. */
final class ReductionPart {
  private static final double JOINT_LIMIT = MatrixChecks.JOINT_LEVEL;

  /** A motion smaller than this many uncertainties has no span that figures could be shares of. */
  private static final double SEEN = 3;

  private final Reduction reduction;
  private final MeasuredFlexibility flexibility;
  private final TestLog log;

  ReductionPart(Reduction reduction, TestLog log) {
    this.reduction = reduction;
    this.flexibility = reduction.flexibility();
    this.log = log;
  }

  String configuration() {
    return flexibility.configuration();
  }

  private Gauge gauge(int index) {
    return flexibility.gauges().get(index);
  }

  private Load load(int index) {
    return flexibility.loads().get(index);
  }

  /** The SI unit of each coefficient, by {@link ComparisonPart#key}. */
  Map<String, String> units() {
    Map<String, String> units = new LinkedHashMap<>();
    for (Gauge gauge : flexibility.gauges()) {
      for (Load load : flexibility.loads()) {
        units.put(
            ComparisonPart.key(configuration(), gauge.name(), load.name()),
            Values.coefficientUnit(gauge, load));
      }
    }
    return units;
  }

  List<Run> runs() {
    List<Run> result = new ArrayList<>();
    for (RunResult run : reduction.runs()) {
      String unit =
          flexibility.loads().stream()
              .filter(l -> run.loads().contains(l.name()))
              .findFirst()
              .map(Values::loadUnit)
              .orElse("N");
      result.add(
          new Run(
              configuration(),
              run.name(),
              Values.word(run.verdict()),
              run.reasons(),
              run.date(),
              run.temperature(),
              run.use(),
              run.loads(),
              Values.finite(run.peakLoad()),
              unit,
              run.steps(),
              run.cycles(),
              run.remark(),
              run.where().toString()));
    }
    return result;
  }

  List<Exclusion> excluded() {
    return reduction.excluded().stream()
        .map(
            e ->
                new Exclusion(
                    configuration(),
                    e.run(),
                    e.what(),
                    e.where().toString(),
                    e.reason(),
                    e.byUser() ? "the user" : "a rule of the program",
                    e.readings()))
        .toList();
  }

  List<Coefficient> coefficients() {
    LinearMap map = flexibility.map();
    double[][] effects = effects();
    List<Coefficient> result = new ArrayList<>();
    for (int row = 0; row < flexibility.coefficients().size(); row++) {
      org.flexbound.flexibility.Coefficient c = flexibility.coefficients().get(row);
      int[] columns = map.columns(row);
      double[] weights = map.weights(row);
      double scatter = 0;
      double floor = 0;
      double gain = 0;
      int runs = 0;
      OptionalDouble absolute = OptionalDouble.empty();
      for (int k = 0; k < columns.length; k++) {
        AbsoluteCoefficient a = flexibility.absolute().get(columns[k]);
        scatter += Math.pow(weights[k] * a.scatterUncertainty(), 2);
        floor += Math.pow(weights[k] * a.floorUncertainty(), 2);
        if (a.gauge() == c.gauge() && a.load() == c.load()) {
          runs += a.runs();
          absolute = OptionalDouble.of(a.value());
        }
      }
      for (double[] effect : effects) {
        gain += effect[row] * effect[row];
      }
      Gauge gauge = gauge(c.gauge());
      Load load = load(c.load());
      boolean same = absolute.isPresent() && absolute.getAsDouble() == c.value();
      result.add(
          new Coefficient(
              configuration(),
              gauge.name(),
              load.name(),
              c.value(),
              Values.coefficientUnit(gauge, load),
              c.standardUncertainty(),
              Values.finite(c.degreesOfFreedom()),
              Math.sqrt(scatter),
              Math.sqrt(floor),
              Math.sqrt(gain),
              same ? OptionalDouble.empty() : absolute,
              runs,
              Math.abs(c.value()) > SEEN * c.standardUncertainty()
                  ? quality(gauge.name(), load.name())
                  : List.of()));
    }
    return result;
  }

  private double[][] effects() {
    List<Gain> gains = flexibility.gains();
    double[][] effects = new double[gains.size()][];
    for (int g = 0; g < effects.length; g++) {
      effects[g] =
          CoefficientUncertainty.effect(g, gains, flexibility.absolute(), flexibility.map());
    }
    return effects;
  }

  /** The worst of all runs, for each figure. */
  private List<Quality> quality(String gauge, String load) {
    QualityLimits limits = log.options().qualityLimits();
    double[] worst = new double[5];
    boolean any = false;
    for (RunSlope slope : reduction.slopes()) {
      if (slope.gauge().equals(gauge)
          && slope.load().equals(load)
          && slope.isFitted()
          && slope.quality().isPresent()) {
        any = true;
        var q = slope.quality().get();
        double[] these = {
          q.linearity(), q.hysteresis(), q.curvature(), Math.abs(q.zeroReturn()), q.resolution()
        };
        for (int k = 0; k < worst.length; k++) {
          if (Double.isFinite(these[k])) {
            worst[k] = Math.max(worst[k], these[k]);
          }
        }
      }
    }
    List<Quality> result = new ArrayList<>();
    if (any) {
      result.add(quality("linearity", worst[0], limits.linearity()));
      result.add(quality("hysteresis", worst[1], limits.hysteresis()));
      result.add(quality("curvature", worst[2], limits.curvature()));
      result.add(quality("zero return", worst[3], limits.zeroReturn()));
      result.add(quality("resolution", worst[4], limits.resolution()));
    }
    Double repeatability = reduction.repeatability().get(Reduction.key(gauge, load));
    if (repeatability != null && Double.isFinite(repeatability)) {
      result.add(quality("repeatability", repeatability, limits.repeatability()));
    }
    Double base = reduction.baseMotionShare().get(Reduction.key(gauge, load));
    if (base != null && Double.isFinite(base)) {
      result.add(quality("base motion", base, limits.baseMotionShare()));
    }
    return result;
  }

  private static Quality quality(String name, double value, double limit) {
    return new Quality(name, value, OptionalDouble.of(limit), value <= limit);
  }

  Covariance covariance() {
    double[][] effects = effects();
    List<SharedFactor> factors = new ArrayList<>();
    for (int g = 0; g < effects.length; g++) {
      Gain gain = flexibility.gains().get(g);
      factors.add(
          new SharedFactor(
              gain.key(),
              gain.description(),
              gain.priorUncertainty(),
              Values.list(effects[g]),
              gain.ofOneTest()));
    }
    return new Covariance(
        configuration(),
        Values.finite(flexibility.scatterDegreesOfFreedom()),
        Values.rows(flexibility.scatterCovariance()),
        factors);
  }

  List<Absolute> absolute() {
    List<Absolute> result = new ArrayList<>();
    for (AbsoluteCoefficient a : flexibility.absolute()) {
      Gauge gauge = gauge(a.gauge());
      Load load = load(a.load());
      result.add(
          new Absolute(
              configuration(),
              gauge.name(),
              load.name(),
              a.value(),
              Values.coefficientUnit(gauge, load),
              a.scatterUncertainty(),
              a.floorUncertainty(),
              a.gains().stream().map(g -> flexibility.gains().get(g).key()).toList(),
              a.runs()));
    }
    return result;
  }

  List<OperatorRow> baseMotion() {
    List<OperatorRow> result = new ArrayList<>();
    for (int row = 0; row < flexibility.coefficients().size(); row++) {
      org.flexbound.flexibility.Coefficient c = flexibility.coefficients().get(row);
      int[] columns = flexibility.map().columns(row);
      double[] weights = flexibility.map().weights(row);
      List<Term> terms = new ArrayList<>();
      for (int k = 0; k < columns.length; k++) {
        AbsoluteCoefficient a = flexibility.absolute().get(columns[k]);
        terms.add(new Term(gauge(a.gauge()).name(), load(a.load()).name(), weights[k]));
      }
      result.add(
          new OperatorRow(
              configuration(), gauge(c.gauge()).name(), load(c.load()).name(), terms));
    }
    return result;
  }

  List<Reciprocity> reciprocity() {
    return reduction.reciprocity().pairs().stream()
        .map(
            p ->
                new Reciprocity(
                    configuration(),
                    p.first(),
                    p.second(),
                    p.firstValue(),
                    p.secondValue(),
                    pairUnit(p),
                    p.difference(),
                    p.standardUncertainty(),
                    p.z()))
        .toList();
  }

  /** The unit of the first coefficient of a pair. */
  private String pairUnit(ReciprocityTable.Pair pair) {
    for (AbsoluteCoefficient a : flexibility.absolute()) {
      if (a.value() == pair.firstValue()) {
        return Values.coefficientUnit(gauge(a.gauge()), load(a.load()));
      }
    }
    return "m/N";
  }

  List<JointTest> jointTests() {
    ReciprocityTable table = reduction.reciprocity();
    List<JointTest> result = new ArrayList<>();
    if (table.degreesOfFreedom() > 0) {
      boolean passed = !(table.probability() < JOINT_LIMIT);
      result.add(
          new JointTest(
              configuration(),
              "Reciprocity of all pairs together",
              Values.orZero(table.statistic()),
              Values.finite(
                  table.degreesOfFreedom()
                      * org.flexbound.statistics.Quantiles.f(
                          1 - JOINT_LIMIT,
                          table.degreesOfFreedom(),
                          flexibility.scatterDegreesOfFreedom())),
              OptionalDouble.of(table.degreesOfFreedom()),
              Values.finite(table.probability()),
              passed,
              passed
                  ? "the pairs agree within their uncertainty"
                  : "the pairs disagree by more than chance explains"));
    }
    long broken = reduction.matrix().bounds().stream().filter(Bound::broken).count();
    if (!reduction.matrix().bounds().isEmpty()) {
      result.add(
          new JointTest(
              configuration(),
              "Bounds of an elastic structure that are broken",
              broken,
              OptionalDouble.of(0),
              OptionalDouble.empty(),
              OptionalDouble.empty(),
              broken == 0,
              "of " + reduction.matrix().bounds().size() + " bounds"));
    }
    reduction
        .matrix()
        .definiteness()
        .ifPresent(
            d ->
                result.add(
                    new JointTest(
                        configuration(),
                        "Smallest eigenvalue of the square part, in standard uncertainties",
                        d.z().orElse(d.smallest()),
                        OptionalDouble.of(-d.limit()),
                        OptionalDouble.empty(),
                        OptionalDouble.empty(),
                        !d.broken(),
                        "of " + d.points().size() + " points; may not lie below its limit")));
    reduction
        .matrix()
        .gainPattern()
        .filter(g -> g.degreesOfFreedom() > 0)
        .ifPresent(
            g ->
                result.add(
                    new JointTest(
                        configuration(),
                        "Gains alone as the reason for what the pairs differ by",
                        g.misfit(),
                        Values.finite(
                            g.degreesOfFreedom()
                                * org.flexbound.statistics.Quantiles.f(
                                    1 - JOINT_LIMIT,
                                    g.degreesOfFreedom(),
                                    flexibility.scatterDegreesOfFreedom())),
                        OptionalDouble.of(g.degreesOfFreedom()),
                        Values.finite(g.probability()),
                        !(g.probability() < JOINT_LIMIT),
                        "whether differing scales of gauges and loads, and nothing else, could be"
                            + " behind the differences")));
    return result;
  }
}
