package org.flexbound.flexibility;

import java.util.ArrayList;
import java.util.List;

/** Combines scatter, floors and gains into the standard uncertainty of each compared coefficient. */
public final class CoefficientUncertainty {
  private CoefficientUncertainty() {}

  /**
   * The compared coefficients with their combined uncertainty (JCGM 100:2008, 5.2) and effective
   * degrees of freedom (Welch–Satterthwaite, G.4.1: only the scatter has finite ones).
   *
   * @param names gauge and load index of each row of the map
   * @param absolute the absolute coefficients
   * @param gains the gains
   * @param map from absolute to compared
   * @param scatterDegreesOfFreedom of the pooled scatter
   * @return the coefficients in the order of the map's rows
   */
  public static List<Coefficient> coefficients(
      int[][] names,
      List<AbsoluteCoefficient> absolute,
      List<Gain> gains,
      LinearMap map,
      double scatterDegreesOfFreedom) {
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
      double ratio = scatter[row] > 0 ? total / scatter[row] : Double.POSITIVE_INFINITY;
      list.add(
          new Coefficient(
              names[row][0],
              names[row][1],
              compared[row],
              Math.sqrt(total),
              scatterDegreesOfFreedom * ratio * ratio));
    }
    return list;
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
