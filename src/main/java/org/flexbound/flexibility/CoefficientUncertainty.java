package org.flexbound.flexibility;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/** Combines scatter, floors and gains into the standard uncertainty of each compared coefficient. */
public final class CoefficientUncertainty {
  private CoefficientUncertainty() {}

  /**
   * The compared coefficients with their combined uncertainty (JCGM 100:2008, 5.2) and effective
   * degrees of freedom (Welch–Satterthwaite, G.4.1: only the scatter has finite ones; parts of one
   * row with the same degrees of freedom come from one pooled estimate and stand together).
   *
   * @param names gauge and load index of each row of the map
   * @param absolute the absolute coefficients
   * @param gains the gains
   * @param map from absolute to compared
   * @return the coefficients in the order of the map's rows
   */
  public static List<Coefficient> coefficients(
      int[][] names,
      List<AbsoluteCoefficient> absolute,
      List<Gain> gains,
      LinearMap map) {
    double[] values = absolute.stream().mapToDouble(AbsoluteCoefficient::value).toArray();
    double[] compared = map.apply(values);
    double[] scatter = variance(map, absolute, true);
    double[] floor = variance(map, absolute, false);
    double[] gain = new double[names.length];
    for (int g = 0; g < gains.size(); g++) {
      double[] effect = effect(g, gains, absolute, map);
      for (int row = 0; row < gain.length; row++) {
        gain[row] += effect[row] * effect[row];
      }
    }
    List<Coefficient> list = new ArrayList<>();
    for (int row = 0; row < names.length; row++) {
      double total = scatter[row] + floor[row] + gain[row];
      list.add(
          new Coefficient(
              names[row][0],
              names[row][1],
              compared[row],
              Math.sqrt(total),
              degreesOfFreedom(map, row, absolute, total)));
    }
    return list;
  }

  private static double degreesOfFreedom(
      LinearMap map, int row, List<AbsoluteCoefficient> absolute, double total) {
    Map<Double, Double> pooled = new TreeMap<>();
    int[] columns = map.columns(row);
    double[] weights = map.weights(row);
    for (int k = 0; k < columns.length; k++) {
      AbsoluteCoefficient a = absolute.get(columns[k]);
      double u = weights[k] * a.scatterUncertainty();
      pooled.merge(a.scatterDegreesOfFreedom(), u * u, Double::sum);
    }
    double sum = 0;
    for (Map.Entry<Double, Double> part : pooled.entrySet()) {
      sum += part.getValue() * part.getValue() / part.getKey();
    }
    return sum > 0 ? total * total / sum : Double.POSITIVE_INFINITY;
  }

  /**
   * What one standard uncertainty of a gain changes in each compared coefficient.
   *
   * @param gain the gain's index
   * @param gains the gains
   * @param absolute the absolute coefficients
   * @param map from absolute to compared
   * @return one number for each row of the map, SI
   */
  public static double[] effect(
      int gain, List<Gain> gains, List<AbsoluteCoefficient> absolute, LinearMap map) {
    double u = gains.get(gain).priorUncertainty();
    return map.apply(
        absolute.stream()
            .mapToDouble(a -> a.gains().contains(gain) ? u * a.value() : 0)
            .toArray());
  }

  private static double[] variance(
      LinearMap map, List<AbsoluteCoefficient> absolute, boolean scatter) {
    double[] result = new double[map.outputs()];
    for (int row = 0; row < result.length; row++) {
      int[] columns = map.columns(row);
      double[] weights = map.weights(row);
      for (int k = 0; k < columns.length; k++) {
        AbsoluteCoefficient a = absolute.get(columns[k]);
        double u = scatter ? a.scatterUncertainty() : a.floorUncertainty();
        result[row] += weights[k] * weights[k] * u * u;
      }
    }
    return result;
  }
}
