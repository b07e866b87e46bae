package org.flexbound.compare;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.flexibility.AbsoluteCoefficient;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.flexibility.OutsideFlexibility;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Load;

/**
 * A model held elsewhere, known by a table of its flexibility and sensitivities at one point: linear in
 * every compliance about that point, A(x) = A₀ − Σ S_k (exp(x₀_k − x_k) − 1) with S_k = ∂A/∂ln θ_k.
 * That is exact for a determinate structure, and the first step for any other.
 *
 * <p>x is the logarithm of a stiffness over its nominal value. Coefficients are the measured absolute
 * ones, all configurations one after another.
 */
public final class OutsideModel {
  private final double[] point;
  private final double[] values;
  private final double[][] sensitivities;

  private OutsideModel(double[] point, double[] values, double[][] sensitivities) {
    this.point = point;
    this.values = values;
    this.sensitivities = sensitivities;
  }

  /**
   * The model, where its table has every measured coefficient.
   *
   * @param table the table
   * @param measured what was measured
   * @param parameters the parameters' names
   * @param findings takes what the table lacks
   * @return the model
   */
  public static Optional<OutsideModel> of(
      OutsideTable table,
      List<MeasuredFlexibility> measured,
      List<String> parameters,
      Findings findings) {
    List<OutsideFlexibility.Entry> found = new ArrayList<>();
    boolean complete = true;
    for (MeasuredFlexibility m : measured) {
      for (AbsoluteCoefficient a : m.absolute()) {
        String gauge = m.gauges().get(a.gauge()).name();
        String load = m.loads().get(a.load()).name();
        Optional<OutsideFlexibility.Entry> entry =
            entry(table, m.configuration(), gauge, load, findings);
        complete &= entry.isPresent();
        entry.ifPresent(found::add);
      }
    }
    if (!complete) {
      return Optional.empty();
    }
    double[] values = new double[found.size()];
    double[][] sensitivities = new double[found.size()][parameters.size()];
    for (int i = 0; i < values.length; i++) {
      values[i] = found.get(i).value();
      for (int k = 0; k < parameters.size(); k++) {
        Double by = found.get(i).byLogarithm().get(parameters.get(k));
        sensitivities[i][k] = by == null ? 0 : by;
      }
    }
    double[] point = new double[parameters.size()];
    for (int k = 0; k < point.length; k++) {
      Double factor = table.at().get(parameters.get(k));
      point[k] = factor == null ? 0 : Math.log(factor);
    }
    return Optional.of(new OutsideModel(point, values, sensitivities));
  }

  /**
   * A whole matrix of a table's values.
   *
   * @param table the table
   * @param configuration the configuration
   * @param gauges the gauges
   * @param loads the loads
   * @return gauges × loads, SI; no value where the table lacks one
   */
  public static Outcome<double[][]> matrix(
      OutsideTable table, String configuration, List<Gauge> gauges, List<Load> loads) {
    Findings findings = new Findings();
    double[][] result = new double[gauges.size()][loads.size()];
    for (int g = 0; g < gauges.size(); g++) {
      for (int l = 0; l < loads.size(); l++) {
        Optional<OutsideFlexibility.Entry> entry =
            entry(
                table, configuration, gauges.get(g).name(), loads.get(l).name(), findings);
        result[g][l] = entry.map(OutsideFlexibility.Entry::value).orElse(0.0);
      }
    }
    return findings.hasErrors()
        ? Outcome.none(findings.list())
        : Outcome.of(result, findings.list());
  }

  private static Optional<OutsideFlexibility.Entry> entry(
      OutsideTable table, String configuration, String gauge, String load, Findings findings) {
    Optional<OutsideFlexibility.Entry> entry =
        table.flexibility().find(configuration, gauge, load);
    if (entry.isEmpty()) {
      findings.add(
          CompareFinding.NOT_IN_TABLE,
          table.flexibility().where(),
          "the table has no row for gauge "
              + gauge
              + " under load "
              + load
              + " ("
              + configuration
              + ")");
    }
    return entry;
  }

  /**
   * Where the table was computed.
   *
   * @return x₀
   */
  public double[] point() {
    return point.clone();
  }

  /**
   * The coefficients.
   *
   * @param x logarithms of the factors on the nominal stiffnesses
   * @return one for each measured absolute coefficient, SI
   */
  public double[] coefficients(double[] x) {
    double[] result = values.clone();
    for (int i = 0; i < values.length; i++) {
      for (int k = 0; k < x.length; k++) {
        result[i] -= sensitivities[i][k] * Math.expm1(point[k] - x[k]);
      }
    }
    return result;
  }

  /**
   * Their derivatives.
   *
   * @param x logarithms of the factors on the nominal stiffnesses
   * @return by coefficient and parameter, SI
   */
  public double[][] derivatives(double[] x) {
    double[][] result = new double[values.length][x.length];
    for (int i = 0; i < values.length; i++) {
      for (int k = 0; k < x.length; k++) {
        result[i][k] = sensitivities[i][k] * Math.exp(point[k] - x[k]);
      }
    }
    return result;
  }

  /**
   * How far another table at its own point is from what this one says of that point.
   *
   * @param other the other model, of the same measurements
   * @return the largest difference, as a share of the largest coefficient
   */
  public double departure(OutsideModel other) {
    double[] here = coefficients(other.point);
    double most = 0;
    double largest = 0;
    for (int i = 0; i < here.length; i++) {
      most = Math.max(most, Math.abs(here[i] - other.values[i]));
      largest = Math.max(largest, Math.abs(other.values[i]));
    }
    return largest > 0 ? most / largest : 0;
  }
}
