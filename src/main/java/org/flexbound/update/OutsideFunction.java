package org.flexbound.update;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.flexbound.finding.Findings;
import org.flexbound.flexibility.AbsoluteCoefficient;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.flexibility.OutsideFlexibility;

/**
 * The flexibility from a table computed elsewhere: linear in every compliance about the table's point,
 * A(x) = A₀ − Σ S_k (exp(−x_k) − 1) with S_k = ∂A/∂ln θ_k, which is exact for a determinate structure
 * and the first step for any other.
 */
final class OutsideFunction implements FlexibilityFunction {
  private final double[] values;
  private final double[][] sensitivities;

  private OutsideFunction(double[] values, double[][] sensitivities) {
    this.values = values;
    this.sensitivities = sensitivities;
  }

  /** The function, where the table has every measured coefficient. */
  static Optional<OutsideFunction> of(
      OutsideFlexibility table,
      List<MeasuredFlexibility> measured,
      List<WorkingParameter> parameters,
      Findings findings) {
    List<OutsideFlexibility.Entry> found = new ArrayList<>();
    for (MeasuredFlexibility m : measured) {
      for (AbsoluteCoefficient a : m.absolute()) {
        String gauge = m.gauges().get(a.gauge()).name();
        String load = m.loads().get(a.load()).name();
        Optional<OutsideFlexibility.Entry> entry = table.find(m.configuration(), gauge, load);
        if (entry.isEmpty()) {
          findings.add(
              UpdateFinding.NOT_IN_TABLE,
              table.where(),
              "the table has no row for gauge "
                  + gauge
                  + " under load "
                  + load
                  + " ("
                  + m.configuration()
                  + "), which was measured");
        }
        entry.ifPresent(found::add);
      }
    }
    if (findings.hasErrors()) {
      return Optional.empty();
    }
    double[] values = new double[found.size()];
    double[][] sensitivities = new double[found.size()][parameters.size()];
    for (int i = 0; i < values.length; i++) {
      values[i] = found.get(i).value();
      for (int k = 0; k < parameters.size(); k++) {
        Double by = found.get(i).byLogarithm().get(parameters.get(k).name());
        sensitivities[i][k] = by == null ? 0 : by;
      }
    }
    return Optional.of(new OutsideFunction(values, sensitivities));
  }

  @Override
  public Computed at(double[] x) {
    double[] result = values.clone();
    double[][] jacobian = new double[values.length][x.length];
    for (int i = 0; i < values.length; i++) {
      for (int k = 0; k < x.length; k++) {
        double e = Math.exp(-x[k]);
        result[i] -= sensitivities[i][k] * (e - 1);
        jacobian[i][k] = sensitivities[i][k] * e;
      }
    }
    return new Computed(result, jacobian);
  }
}
