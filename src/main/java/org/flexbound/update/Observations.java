package org.flexbound.update;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.ejml.data.DMatrixRMaj;
import org.flexbound.flexibility.AbsoluteCoefficient;
import org.flexbound.flexibility.Coefficient;
import org.flexbound.flexibility.Gain;
import org.flexbound.flexibility.MeasuredFlexibility;

/**
 * The measured coefficients of all configurations as one vector, with the way that leads from
 * computed absolute coefficients and gains to what should have been measured: f = T[Π(1 + gain) ∘ A].
 *
 * <p>A gain of the same key is the same gain in every configuration.
 */
final class Observations {
  private final List<MeasuredFlexibility> measured;
  private final List<Gain> gains = new ArrayList<>();
  private final List<Row> rows = new ArrayList<>();
  private final int absolutes;
  private final int[][] gainsOfAbsolute;
  private final double[] variance;
  private final List<List<Double>> sharedEffects;

  /**
   * One measured coefficient.
   *
   * @param configuration index of its configuration
   * @param name the configuration's name
   * @param gauge the gauge's name
   * @param load the load's name
   * @param value as measured
   * @param columns indices of the absolute coefficients it is made of, over all configurations
   * @param weights their weights
   */
  record Row(
      int configuration,
      String name,
      String gauge,
      String load,
      double value,
      List<Integer> columns,
      List<Double> weights) {
    String caseName() {
      return name + ": " + load;
    }
  }

  /**
   * Puts the configurations one after another.
   *
   * @param measured one for each configuration
   * @param sharedEffects what one standard uncertainty of each place or direction adds to the
   *     absolute coefficients
   * @param scatterFactor what the scatter's variances are multiplied by (1, or more for intervals
   *     under Student's t)
   */
  Observations(
      List<MeasuredFlexibility> measured, List<List<Double>> sharedEffects, double scatterFactor) {
    this.measured = List.copyOf(measured);
    this.sharedEffects = sharedEffects;
    Map<String, Integer> known = new LinkedHashMap<>();
    absolutes = measured.stream().mapToInt(m -> m.absolute().size()).sum();
    gainsOfAbsolute = new int[absolutes][];
    variance = new double[absolutes];
    int offset = 0;
    for (int c = 0; c < measured.size(); c++) {
      MeasuredFlexibility m = measured.get(c);
      for (int i = 0; i < m.absolute().size(); i++) {
        AbsoluteCoefficient a = m.absolute().get(i);
        gainsOfAbsolute[offset + i] =
            a.gains().stream()
                .map(g -> m.gains().get(g))
                .filter(g -> g.priorUncertainty() > 0)
                .mapToInt(g -> index(g, known))
                .toArray();
        variance[offset + i] =
            scatterFactor * a.scatterUncertainty() * a.scatterUncertainty()
                + a.floorUncertainty() * a.floorUncertainty();
      }
      for (int r = 0; r < m.coefficients().size(); r++) {
        Coefficient coefficient = m.coefficients().get(r);
        List<Integer> columns = new ArrayList<>();
        List<Double> weights = new ArrayList<>();
        int[] local = m.map().columns(r);
        double[] weight = m.map().weights(r);
        for (int k = 0; k < local.length; k++) {
          columns.add(offset + local[k]);
          weights.add(weight[k]);
        }
        rows.add(
            new Row(
                c,
                m.configuration(),
                m.gauges().get(coefficient.gauge()).name(),
                m.loads().get(coefficient.load()).name(),
                coefficient.value(),
                List.copyOf(columns),
                List.copyOf(weights)));
      }
      offset += m.absolute().size();
    }
  }

  private int index(Gain gain, Map<String, Integer> known) {
    Integer before = known.get(gain.key());
    if (before != null) {
      return before;
    }
    known.put(gain.key(), gains.size());
    gains.add(gain);
    return gains.size() - 1;
  }

  List<MeasuredFlexibility> measured() {
    return measured;
  }

  List<Gain> gains() {
    return List.copyOf(gains);
  }

  List<Row> rows() {
    return List.copyOf(rows);
  }

  int absolutes() {
    return absolutes;
  }

  double[] gainUncertainties() {
    return gains.stream().mapToDouble(Gain::priorUncertainty).toArray();
  }

  /**
   * ν over all configurations: the degrees of freedom of the pooled scatters together; infinite where
   * none is estimated.
   */
  double scatterDegreesOfFreedom() {
    double sum = 0;
    boolean finite = false;
    for (MeasuredFlexibility m : measured) {
      if (Double.isFinite(m.scatterDegreesOfFreedom())) {
        sum += m.scatterDegreesOfFreedom();
        finite = true;
      }
    }
    return finite ? sum : Double.POSITIVE_INFINITY;
  }

  /** The covariance of scatter, floors, places and directions between some rows. */
  DMatrixRMaj covariance(int[] chosen) {
    DMatrixRMaj result = new DMatrixRMaj(chosen.length, chosen.length);
    Map<Integer, List<int[]>> users = new LinkedHashMap<>();
    for (int r = 0; r < chosen.length; r++) {
      Row row = rows.get(chosen[r]);
      for (int k = 0; k < row.columns().size(); k++) {
        users
            .computeIfAbsent(row.columns().get(k), unused -> new ArrayList<>())
            .add(new int[] {r, k});
      }
    }
    users.forEach(
        (absolute, list) -> {
          for (int[] first : list) {
            double left = rows.get(chosen[first[0]]).weights().get(first[1]) * variance[absolute];
            for (int[] second : list) {
              double right = rows.get(chosen[second[0]]).weights().get(second[1]);
              result.add(first[0], second[0], left * right);
            }
          }
        });
    for (List<Double> effect : sharedEffects) {
      double[] mapped = mapped(chosen, effect);
      for (int r = 0; r < chosen.length; r++) {
        for (int s = 0; s < chosen.length && mapped[r] != 0; s++) {
          result.add(r, s, mapped[r] * mapped[s]);
        }
      }
    }
    return result;
  }

  private double[] mapped(int[] chosen, List<Double> absolute) {
    double[] result = new double[chosen.length];
    for (int r = 0; r < chosen.length; r++) {
      Row row = rows.get(chosen[r]);
      for (int k = 0; k < row.columns().size(); k++) {
        result[r] += row.weights().get(k) * absolute.get(row.columns().get(k));
      }
    }
    return result;
  }

  /** The values of some rows. */
  double[] values(int[] chosen) {
    double[] result = new double[chosen.length];
    for (int r = 0; r < chosen.length; r++) {
      result[r] = rows.get(chosen[r]).value();
    }
    return result;
  }

  /** What the rows should read: T[Π(1 + gain) ∘ A]. */
  double[] predict(int[] chosen, double[] absolute, double[] gain) {
    double[] result = new double[chosen.length];
    for (int r = 0; r < chosen.length; r++) {
      Row row = rows.get(chosen[r]);
      double sum = 0;
      for (int k = 0; k < row.columns().size(); k++) {
        int column = row.columns().get(k);
        sum += row.weights().get(k) * factor(column, gain, -1) * absolute[column];
      }
      result[r] = sum;
    }
    return result;
  }

  /** Derivatives of {@link #predict} by the parameters, then by the gains. */
  DMatrixRMaj derivatives(
      int[] chosen, double[] absolute, double[][] jacobian, double[] gain, int parameters) {
    DMatrixRMaj result = new DMatrixRMaj(chosen.length, parameters + gain.length);
    for (int r = 0; r < chosen.length; r++) {
      Row row = rows.get(chosen[r]);
      for (int k = 0; k < row.columns().size(); k++) {
        int column = row.columns().get(k);
        double weight = row.weights().get(k);
        double whole = weight * factor(column, gain, -1);
        for (int p = 0; p < parameters; p++) {
          result.add(r, p, whole * jacobian[column][p]);
        }
        int[] acting = gainsOfAbsolute[column];
        for (int g = 0; g < acting.length; g++) {
          result.add(
              r, parameters + acting[g], weight * factor(column, gain, g) * absolute[column]);
        }
      }
    }
    return result;
  }

  private double factor(int column, double[] gain, int without) {
    double result = 1;
    int[] acting = gainsOfAbsolute[column];
    for (int g = 0; g < acting.length; g++) {
      if (g != without) {
        result *= 1 + gain[acting[g]];
      }
    }
    return result;
  }
}
