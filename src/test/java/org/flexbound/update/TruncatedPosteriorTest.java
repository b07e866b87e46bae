package org.flexbound.update;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;

class TruncatedPosteriorTest {
  /** Two correlated parameters, one of them cut off hard: quantiles against a fine grid. */
  @Test
  void quantilesTakeTheBoundsOfTheOtherParameterIntoAccount() {
    DMatrixRMaj jacobian = new DMatrixRMaj(new double[][] {{3, 3}, {0.5, -0.4}});
    double[] residuals = {5, 0.2};
    double[] low = {-1, -1};
    double[] high = {2, 0.5};
    Posterior posterior =
        new Posterior(
            new WhitenedModel.Linear(residuals, jacobian), new double[2], 2);
    TruncatedPosterior cut = new TruncatedPosterior(posterior, low, high);
    int cells = 1500;
    double[] marginal = new double[cells];
    double total = 0;
    for (int i = 0; i < cells; i++) {
      double x = low[0] + (high[0] - low[0]) * (i + 0.5) / cells;
      for (int k = 0; k < cells; k++) {
        double y = low[1] + (high[1] - low[1]) * (k + 0.5) / cells;
        double a = residuals[0] - 3 * x - 3 * y;
        double b = residuals[1] - 0.5 * x + 0.4 * y;
        double density = Math.exp(-0.5 * (a * a + b * b + x * x + y * y));
        marginal[i] += density;
        total += density;
      }
    }
    for (double probability : new double[] {0.025, 0.5, 0.975}) {
      double sum = 0;
      int i = 0;
      while (sum < probability * total) {
        sum += marginal[i++];
      }
      double exact = low[0] + (high[0] - low[0]) * i / cells;
      // Expectation propagation is an approximation: a seventh of the standard deviation of 0.35.
      assertThat(cut.quantile(0, probability)).isCloseTo(exact, within(0.05));
    }
  }

  @Test
  void withoutBoundsInReachItIsTheNormalPosterior() {
    DMatrixRMaj jacobian = new DMatrixRMaj(new double[][] {{3, 1}});
    Posterior posterior =
        new Posterior(
            new WhitenedModel.Linear(new double[] {1}, jacobian), new double[2], 2);
    TruncatedPosterior cut =
        new TruncatedPosterior(posterior, new double[] {-50, -50}, new double[] {50, 50});
    double sd = posterior.standardDeviation(0);
    assertThat(cut.quantile(0, 0.975) - posterior.mean(0)).isCloseTo(1.959964 * sd, within(1e-5));
    // Gaussian conditioning: mean J/(1 + JJᵀ), variance 1 − J₀²/(1 + JJᵀ)
    assertThat(posterior.mean(0)).isCloseTo(3.0 / 11, within(1e-12));
    assertThat(sd * sd).isCloseTo(1 - 9.0 / 11, within(1e-12));
  }
}
