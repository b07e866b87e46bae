package org.flexbound.report.gather;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.flexbound.acceptance.Change;
import org.flexbound.acceptance.ChangeReport;
import org.flexbound.acceptance.Explanation;
import org.flexbound.acceptance.IndividualsChart;
import org.flexbound.acceptance.KeptTest;
import org.flexbound.acceptance.Trend;
import org.flexbound.report.Program;
import org.flexbound.report.results.ChangeExplanation;
import org.flexbound.report.results.ChangeSubset;
import org.flexbound.report.results.Coefficient;
import org.flexbound.report.results.CoefficientChange;
import org.flexbound.report.results.Covariance;
import org.flexbound.report.results.Finding;
import org.flexbound.report.results.Gauge;
import org.flexbound.report.results.Instrument;
import org.flexbound.report.results.Load;
import org.flexbound.report.results.Parameter;
import org.flexbound.report.results.ParameterChange;
import org.flexbound.report.results.Point;
import org.flexbound.report.results.Recheck;
import org.flexbound.report.results.Results;
import org.flexbound.report.results.SharedFactor;
import org.flexbound.report.results.TrendPoint;
import org.flexbound.report.results.TrendResults;
import org.flexbound.report.results.TrendSeries;
import org.flexbound.report.results.TrendTest;

/** Kept results as tests to compare with, and what comes of it as results. */
public final class HistoryPart {
  private HistoryPart() {}

  /**
   * Kept results as a test.
   *
   * @param name how it is named to the reader
   * @param results the results
   * @return what later tests are compared with
   */
  public static KeptTest kept(String name, Results results) {
    return new KeptTest(
        name,
        results.test().date(),
        results.coefficients().stream().map(c -> value(c, results)).toList(),
        results.covariance().stream().map(c -> covariance(c, results)).toList(),
        results.parameters().stream().map(HistoryPart::parameter).toList());
  }

  private static KeptTest.Value value(Coefficient c, Results results) {
    Optional<String> gauge =
        results.gauges().stream()
            .filter(g -> g.configuration().equals(c.configuration()) && g.name().equals(c.gauge()))
            .findFirst()
            .map(Gauge::point)
            .flatMap(HistoryPart::place);
    Optional<String> load =
        results.loads().stream()
            .filter(l -> l.configuration().equals(c.configuration()) && l.name().equals(c.load()))
            .findFirst()
            .map(Load::points)
            .flatMap(HistoryPart::places);
    return new KeptTest.Value(
        c.configuration(),
        c.gauge(),
        c.load(),
        gauge.flatMap(g -> load.map(l -> g + " under " + l)).orElse(""),
        c.value(),
        c.unit(),
        c.standardUncertainty(),
        c.scatter());
  }

  /** Coordinates to the millimetre and direction to a thousandth; empty where not known. */
  private static Optional<String> place(Point point) {
    if (point.coordinates().size() != 3 || point.direction().size() != 3) {
      return Optional.empty();
    }
    StringBuilder text = new StringBuilder(point.rotation() ? "about" : "along");
    for (double d : point.direction()) {
      text.append(String.format(Locale.ROOT, " %.3f", d + 0.0));
    }
    for (double x : point.coordinates()) {
      text.append(String.format(Locale.ROOT, " %d", Math.round(1000 * x)));
    }
    return Optional.of(text.toString());
  }

  private static Optional<String> places(List<Point> points) {
    StringBuilder text = new StringBuilder();
    for (Point point : points) {
      Optional<String> place = place(point);
      if (place.isEmpty()) {
        return Optional.empty();
      }
      text.append(place.get()).append("; ");
    }
    return Optional.of(text.toString());
  }

  private static KeptTest.Covariance covariance(Covariance c, Results results) {
    return new KeptTest.Covariance(
        c.configuration(),
        c.scatterDegreesOfFreedom().orElse(Double.POSITIVE_INFINITY),
        c.scatter(),
        c.factors().stream().map(f -> shared(f, results)).toList());
  }

  /** A gain is that of an instrument whose identity and certificate make its key. */
  private static KeptTest.Shared shared(SharedFactor factor, Results results) {
    for (Instrument i : results.instruments()) {
      String identity = i.serial().isEmpty() ? i.name() : i.serial();
      String key =
          i.calibrationReference().isEmpty()
              ? identity
              : identity + " / " + i.calibrationReference();
      if (key.equals(factor.key())) {
        boolean stated = !i.calibrationReference().isEmpty() || !i.calibrationDate().isEmpty();
        return new KeptTest.Shared(
            factor.description(),
            stated ? Optional.of(key + " / " + i.calibrationDate()) : Optional.empty(),
            identity,
            factor.effect());
      }
    }
    return new KeptTest.Shared(factor.description(), Optional.empty(), "", factor.effect());
  }

  private static KeptTest.ParameterValue parameter(Parameter p) {
    double value = p.updated().orElse(Double.NaN);
    // in the logarithm a standard deviation is a relative one; other variables have no plain one
    double u =
        p.working().equals("ln") ? value * p.posteriorStandardDeviation() : Double.NaN;
    return new KeptTest.ParameterValue(p.name(), p.unit(), value, u, p.workingValue());
  }

  static Recheck recheck(ChangeReport report, String title) {
    return new Recheck(
        report.before().name(),
        title,
        report.before().date(),
        report.changes().stream().map(HistoryPart::change).toList(),
        report.statistic(),
        report.rank(),
        Values.finite(report.scatterDegreesOfFreedom()),
        report.probability(),
        report.changed(),
        report.shared(),
        report.explanation().map(HistoryPart::explanation));
  }

  private static CoefficientChange change(Change c) {
    return new CoefficientChange(
        c.now().configuration(),
        c.now().gauge(),
        c.now().load(),
        c.now().unit(),
        c.before(),
        c.now().value(),
        c.difference(),
        c.standardUncertainty(),
        Values.finite(c.degreesOfFreedom()),
        c.probability(),
        c.adjusted(),
        c.significant());
  }

  private static ChangeExplanation explanation(Explanation e) {
    List<ChangeSubset> subsets = new ArrayList<>();
    for (Explanation.Subset s : e.subsets()) {
      List<ParameterChange> parameters = new ArrayList<>();
      for (int k = 0; k < s.parameters().size(); k++) {
        parameters.add(
            new ParameterChange(s.parameters().get(k), Values.finite(s.factors().get(k))));
      }
      subsets.add(new ChangeSubset(parameters, s.misfit(), s.limit(), s.degreesOfFreedom()));
    }
    return new ChangeExplanation(e.explained(), subsets);
  }

  /**
   * A history as results.
   *
   * @param trend the history
   * @param title the title of the latest test
   * @param findings what was noticed
   * @return the content of trend.json
   */
  public static TrendResults trend(
      Trend trend, String title, List<org.flexbound.finding.Finding> findings) {
    return new TrendResults(
        TrendResults.FORMAT,
        Program.NAME + " " + Program.VERSION,
        title,
        trend.baseline(),
        trend.tests().stream().map(t -> new TrendTest(t.name(), t.date())).toList(),
        trend.series().stream().map(HistoryPart::series).toList(),
        findings.stream()
            .map(
                f ->
                    new Finding(
                        f.severity().name().toLowerCase(Locale.ROOT),
                        f.code(),
                        f.message(),
                        f.where().toString(),
                        f.kind().remedy()))
            .toList());
  }

  private static TrendSeries series(Trend.Series s) {
    IndividualsChart chart = s.chart();
    return new TrendSeries(
        s.parameter() ? "parameter" : "coefficient",
        s.configuration(),
        s.name(),
        s.unit(),
        chart.predicted() ? "prediction interval" : "individuals and moving range",
        chart.baseline(),
        chart.centre(),
        chart.lower(),
        chart.upper(),
        chart.meanRange(),
        Values.finite(chart.upperRange()),
        s.points().stream()
            .map(
                p ->
                    new TrendPoint(
                        p.test(),
                        p.date(),
                        p.value(),
                        Values.finite(p.standardUncertainty()),
                        Values.finite(p.range()),
                        p.baseline(),
                        p.outside(),
                        p.jump()))
            .toList());
  }
}
