package org.flexbound.update;

import java.util.List;
import org.ejml.data.DMatrixRMaj;

/**
 * The whitened residuals of some of the measured coefficients, as a function of the scaled unknowns
 * w = [(x − nominal)/s, gain/u].
 */
final class FittedModel implements WhitenedModel {
  private final Observations observations;
  private final List<WorkingParameter> parameters;
  private final FlexibilityFunction function;
  private final int[] chosen;
  private final Whitener whitener;
  private final double[] gainUncertainty;

  FittedModel(
      Observations observations,
      List<WorkingParameter> parameters,
      FlexibilityFunction function,
      int[] chosen) {
    this.observations = observations;
    this.parameters = List.copyOf(parameters);
    this.function = function;
    this.chosen = chosen.clone();
    this.whitener = Whitener.of(observations.covariance(chosen));
    this.gainUncertainty = observations.gainUncertainties();
  }

  int unknowns() {
    return parameters.size() + gainUncertainty.length;
  }

  int size() {
    return chosen.length;
  }

  int[] chosen() {
    return chosen.clone();
  }

  /** The lower bounds of w; gains are not bounded but for staying sensible. */
  double[] lower() {
    double[] result = new double[unknowns()];
    for (int i = 0; i < result.length; i++) {
      result[i] = i < parameters.size() ? scaledLower(i) : gainBound(i, -1);
    }
    return result;
  }

  /** The upper bounds of w. */
  double[] upper() {
    double[] result = new double[unknowns()];
    for (int i = 0; i < result.length; i++) {
      result[i] = i < parameters.size() ? scaledUpper(i) : gainBound(i, 1);
    }
    return result;
  }

  private double scaledLower(int i) {
    WorkingParameter p = parameters.get(i);
    return (p.lower() - p.nominal()) / p.priorStandardDeviation();
  }

  private double scaledUpper(int i) {
    WorkingParameter p = parameters.get(i);
    return (p.upper() - p.nominal()) / p.priorStandardDeviation();
  }

  /** A gain of −90 % or +900 % is no calibration any more; far outside of what a prior lets through. */
  private double gainBound(int i, int side) {
    return (side < 0 ? -0.9 : 9) / gainUncertainty[i - parameters.size()];
  }

  /** The parameters in their working variables. */
  double[] x(double[] w) {
    double[] x = new double[parameters.size()];
    for (int i = 0; i < x.length; i++) {
      WorkingParameter p = parameters.get(i);
      double free = p.nominal() + w[i] * p.priorStandardDeviation();
      x[i] = Math.min(Math.max(free, p.lower()), p.upper());
    }
    return x;
  }

  /** The gains, relative. */
  double[] gains(double[] w) {
    double[] result = new double[gainUncertainty.length];
    for (int g = 0; g < result.length; g++) {
      result[g] = w[parameters.size() + g] * gainUncertainty[g];
    }
    return result;
  }

  @Override
  public Linear linearise(double[] w) {
    FlexibilityFunction.Computed computed = function.at(x(w));
    double[] gains = gains(w);
    double[] values = observations.values(chosen);
    double[] predicted = observations.predict(chosen, computed.coefficients(), gains);
    for (int r = 0; r < values.length; r++) {
      values[r] -= predicted[r];
    }
    return new Linear(whitener.whiten(values), whitener.whiten(columns(computed, gains, chosen)));
  }

  /** Derivatives of the model side by w, not whitened. */
  DMatrixRMaj columns(FlexibilityFunction.Computed computed, double[] gains, int[] rows) {
    DMatrixRMaj result =
        observations.derivatives(
            rows, computed.coefficients(), computed.jacobian(), gains, parameters.size());
    for (int r = 0; r < result.numRows; r++) {
      for (int i = 0; i < result.numCols; i++) {
        double scale =
            i < parameters.size()
                ? parameters.get(i).priorStandardDeviation()
                : gainUncertainty[i - parameters.size()];
        result.set(r, i, result.get(r, i) * scale);
      }
    }
    return result;
  }

  /** The ridge of the objective: √μ for parameters, 1 for gains. */
  double[] ridge(double weight) {
    double[] result = new double[unknowns()];
    for (int i = 0; i < result.length; i++) {
      result[i] = i < parameters.size() ? Math.sqrt(weight) : 1;
    }
    return result;
  }
}
