package org.flexbound.update;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.SplittableRandom;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.ojalgo.optimisation.Expression;
import org.ojalgo.optimisation.ExpressionsBasedModel;
import org.ojalgo.optimisation.Optimisation;
import org.ojalgo.optimisation.Variable;

class BoundedRidgeTest {
  @ParameterizedTest
  @CsvSource({"8,5,1", "30,12,0.4", "6,20,0.5", "6,20,0.001", "1,3,1"})
  void agreesWithAGeneralConvexSolverAndMeetsTheOptimalityConditions(
      int rows, int n, double ridge) {
    SplittableRandom random = new SplittableRandom(rows * 100L + n);
    for (int trial = 0; trial < 10; trial++) {
      DMatrixRMaj jacobian = new DMatrixRMaj(rows, n);
      double[] target = new double[rows];
      double[] d = new double[n];
      double[] at = new double[n];
      double[] low = new double[n];
      double[] high = new double[n];
      for (int r = 0; r < rows; r++) {
        target[r] = 3 * random.nextGaussian();
        for (int i = 0; i < n; i++) {
          jacobian.set(r, i, random.nextGaussian());
        }
      }
      for (int i = 0; i < n; i++) {
        d[i] = ridge * (0.5 + random.nextDouble());
        at[i] = random.nextGaussian();
        low[i] = -0.3 * random.nextDouble();
        high[i] = i == 1 ? low[i] : 0.3 * random.nextDouble();
      }
      double[] z = new BoundedRidge(jacobian, target, d, at).solve(low, high);
      assertOptimal(jacobian, target, d, at, low, high, z);
      double[] reference = convex(jacobian, target, d, at, low, high);
      assertThat(objective(jacobian, target, d, at, z))
          .isLessThanOrEqualTo(objective(jacobian, target, d, at, reference) * (1 + 1e-6));
    }
  }

  private static double objective(
      DMatrixRMaj j, double[] r, double[] d, double[] w, double[] z) {
    double sum = 0;
    for (int row = 0; row < r.length; row++) {
      double miss = r[row];
      for (int i = 0; i < z.length; i++) {
        miss -= j.get(row, i) * z[i];
      }
      sum += miss * miss;
    }
    for (int i = 0; i < z.length; i++) {
      sum += d[i] * d[i] * (z[i] + w[i]) * (z[i] + w[i]);
    }
    return sum;
  }

  private static void assertOptimal(
      DMatrixRMaj j,
      double[] r,
      double[] d,
      double[] w,
      double[] low,
      double[] high,
      double[] z) {
    for (int i = 0; i < z.length; i++) {
      assertThat(z[i]).isBetween(low[i], high[i]);
      double gradient = d[i] * d[i] * (z[i] + w[i]);
      for (int row = 0; row < r.length; row++) {
        double miss = -r[row];
        for (int k = 0; k < z.length; k++) {
          miss += j.get(row, k) * z[k];
        }
        gradient += j.get(row, i) * miss;
      }
      double to = Math.min(Math.max(z[i] - gradient, low[i]), high[i]);
      assertThat(to).isCloseTo(z[i], within(1e-9));
    }
  }

  private static double[] convex(
      DMatrixRMaj j, double[] r, double[] d, double[] w, double[] low, double[] high) {
    ExpressionsBasedModel model = new ExpressionsBasedModel();
    int n = d.length;
    Variable[] variables = new Variable[n];
    for (int i = 0; i < n; i++) {
      variables[i] = model.newVariable("z" + i).lower(low[i]).upper(high[i]);
    }
    Expression objective = model.newExpression("objective").weight(1);
    for (int i = 0; i < n; i++) {
      double linear = d[i] * d[i] * w[i];
      for (int row = 0; row < r.length; row++) {
        linear -= j.get(row, i) * r[row];
      }
      objective.set(variables[i], linear);
      for (int k = 0; k < n; k++) {
        double sum = i == k ? d[i] * d[i] : 0;
        for (int row = 0; row < r.length; row++) {
          sum += j.get(row, i) * j.get(row, k);
        }
        objective.set(variables[i], variables[k], 0.5 * sum);
      }
    }
    Optimisation.Result result = model.minimise();
    double[] z = new double[n];
    for (int i = 0; i < n; i++) {
      z[i] = Math.min(Math.max(result.get(i).doubleValue(), low[i]), high[i]);
    }
    return z;
  }
}
