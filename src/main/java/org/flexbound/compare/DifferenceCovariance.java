package org.flexbound.compare;

import org.flexbound.flexibility.MeasuredFlexibility;

/**
 * The covariance of measured less computed coefficients: scatter and floors, and for each gain one
 * rank-one term rebuilt from the computed coefficients.
 */
final class DifferenceCovariance {
  private DifferenceCovariance() {}

  static double[][] of(MeasuredFlexibility measured, double[] computed) {
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
      double[] effect = measured.map().apply(acted);
      for (int r = 0; r < effect.length; r++) {
        for (int s = 0; s < effect.length; s++) {
          result[r][s] += effect[r] * effect[s];
        }
      }
    }
    return result;
  }
}
