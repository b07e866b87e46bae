package org.flexbound.compare;

import java.util.List;
import org.flexbound.flexibility.MeasuredFlexibility;

/**
 * The covariance of measured less computed coefficients: scatter and floors, and for each gain one
 * rank-one term rebuilt from the computed coefficients, and one for each uncertain place or direction.
 */
final class DifferenceCovariance {
  private DifferenceCovariance() {}

  static double[][] of(
      MeasuredFlexibility measured, double[] computed, List<double[]> placing) {
    double[][] result = measured.scatterCovariance();
    for (int g = 0; g < measured.gains().size(); g++) {
      double[] acted = new double[computed.length];
      for (int i = 0; i < acted.length; i++) {
        int times = 0;
        for (int index : measured.absolute().get(i).gains()) {
          times += index == g ? 1 : 0;
        }
        acted[i] = times * computed[i] * measured.gains().get(g).priorUncertainty();
      }
      add(result, measured.map().apply(acted));
    }
    for (double[] effect : placing) {
      add(result, measured.map().apply(effect));
    }
    return result;
  }

  private static void add(double[][] covariance, double[] effect) {
    for (int r = 0; r < effect.length; r++) {
      for (int s = 0; s < effect.length; s++) {
        covariance[r][s] += effect[r] * effect[s];
      }
    }
  }
}
