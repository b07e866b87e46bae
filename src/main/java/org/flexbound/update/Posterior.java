package org.flexbound.update;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.dense.row.factory.LinearSolverFactory_DDRM;
import org.ejml.interfaces.decomposition.SingularValueDecomposition_F64;
import org.ejml.interfaces.linsol.LinearSolverDense;

/**
 * The normal posterior of the parameters at μ = 1 without bounds, from the linearised model with the
 * gains integrated out; in scaled unknowns, in which the prior is the unit normal.
 *
 * <p>With the whitened Jacobians X of the parameters and G of the gains, the data's covariance is C =
 * I + GGᵀ = LLᵀ; from the singular values L⁻¹X = U diag(σ) Vᵀ the covariance of the parameters is I −
 * V diag(σ²/(1 + σ²)) Vᵀ, to full precision even where some are not seen at all.
 */
final class Posterior {
  /** Singular values below this share of the largest are rounding. */
  private static final double ROUNDING = 1e-12;

  private final double[] singular;
  private final DMatrixRMaj right;
  private final DMatrixRMaj jacobian;
  private final double[] mean;
  private final DMatrixRMaj covariance;

  /**
   * The posterior at a point.
   *
   * @param linear residuals and Jacobian there, gains in the last columns
   * @param w the point
   * @param parameters how many of the unknowns are parameters
   */
  Posterior(WhitenedModel.Linear linear, double[] w, int parameters) {
    int m = linear.residuals.length;
    int gains = w.length - parameters;
    DMatrixRMaj x =
        parameters == 0
            ? new DMatrixRMaj(m, 0)
            : CommonOps_DDRM.extract(linear.jacobian, 0, m, 0, parameters);
    DMatrixRMaj right1 = new DMatrixRMaj(m, 1);
    for (int row = 0; row < m; row++) {
      double sum = linear.residuals[row];
      for (int i = 0; i < w.length; i++) {
        sum += linear.jacobian.unsafe_get(row, i) * w[i];
      }
      right1.set(row, 0, sum);
    }
    DMatrixRMaj target = right1;
    if (gains > 0) {
      DMatrixRMaj factor = gainFactor(linear.jacobian, parameters);
      x = solveLower(factor, x);
      target = solveLower(factor, right1);
    }
    this.jacobian = x;
    SingularValueDecomposition_F64<DMatrixRMaj> svd =
        DecompositionFactory_DDRM.svd(Math.max(m, 1), Math.max(parameters, 1), true, true, true);
    int rank = Math.min(m, parameters);
    singular = new double[rank];
    right = new DMatrixRMaj(parameters, rank);
    mean = new double[parameters];
    covariance = CommonOps_DDRM.identity(parameters);
    if (rank == 0) {
      return;
    }
    if (!svd.decompose(x.copy())) {
      throw new ArithmeticException("the singular values of the Jacobian were not found");
    }
    DMatrixRMaj u = svd.getU(null, false);
    DMatrixRMaj v = svd.getV(null, false);
    Integer[] order = new Integer[rank];
    double[] values = svd.getSingularValues();
    for (int i = 0; i < rank; i++) {
      order[i] = i;
    }
    java.util.Arrays.sort(order, (a, b) -> Double.compare(values[b], values[a]));
    for (int j = 0; j < rank; j++) {
      double sigma = values[order[j]];
      singular[j] = sigma;
      double along = 0;
      for (int row = 0; row < m; row++) {
        along += u.get(row, order[j]) * target.get(row);
      }
      for (int i = 0; i < parameters; i++) {
        right.set(i, j, v.get(i, order[j]));
        mean[i] += right.get(i, j) * sigma / (1 + sigma * sigma) * along;
      }
      double share = sigma * sigma / (1 + sigma * sigma);
      for (int i = 0; i < parameters; i++) {
        double left = right.get(i, j) * share;
        for (int k = 0; k < parameters; k++) {
          covariance.add(i, k, -left * right.get(k, j));
        }
      }
    }
  }

  /** The lower Cholesky factor of I + GGᵀ. */
  static DMatrixRMaj gainFactor(DMatrixRMaj jacobian, int parameters) {
    int m = jacobian.numRows;
    DMatrixRMaj g = CommonOps_DDRM.extract(jacobian, 0, m, parameters, jacobian.numCols);
    DMatrixRMaj c = new DMatrixRMaj(m, m);
    CommonOps_DDRM.multTransB(g, g, c);
    for (int row = 0; row < m; row++) {
      c.add(row, row, 1);
    }
    var cholesky = DecompositionFactory_DDRM.chol(m, true);
    if (!cholesky.decompose(c)) {
      throw new ArithmeticException("the covariance with gains is not positive definite");
    }
    return cholesky.getT(null);
  }

  static DMatrixRMaj solveLower(DMatrixRMaj factor, DMatrixRMaj columns) {
    DMatrixRMaj result = columns.copy();
    for (int i = 0; i < factor.numRows; i++) {
      for (int k = 0; k < i; k++) {
        double l = factor.unsafe_get(i, k);
        for (int j = 0; j < result.numCols; j++) {
          result.unsafe_set(i, j, result.unsafe_get(i, j) - l * result.unsafe_get(k, j));
        }
      }
      for (int j = 0; j < result.numCols; j++) {
        result.unsafe_set(i, j, result.unsafe_get(i, j) / factor.unsafe_get(i, i));
      }
    }
    return result;
  }

  int size() {
    return mean.length;
  }

  double[] singularValues() {
    return singular.clone();
  }

  /** The whitened Jacobian of the parameters, gains integrated out. */
  DMatrixRMaj jacobian() {
    return jacobian;
  }

  /** The mean, without bounds. */
  double mean(int parameter) {
    return mean[parameter];
  }

  double covariance(int first, int second) {
    return covariance.get(first, second);
  }

  DMatrixRMaj covariance() {
    return covariance.copy();
  }

  double standardDeviation(int parameter) {
    return Math.sqrt(Math.max(covariance.get(parameter, parameter), 0));
  }

  /** The share of the prior variance that the data removed. */
  double removed(int parameter) {
    double sum = 0;
    for (int j = 0; j < singular.length; j++) {
      double s2 = singular[j] * singular[j];
      sum += right.get(parameter, j) * right.get(parameter, j) * s2 / (1 + s2);
    }
    return Math.min(sum, 1);
  }

  /** The variance from data and gain priors alone; infinite where they leave a direction open. */
  double dataVariance(int parameter) {
    double inside = 0;
    double sum = 0;
    double least = singular.length == 0 ? 0 : ROUNDING * singular[0];
    for (int j = 0; j < singular.length; j++) {
      double v2 = right.get(parameter, j) * right.get(parameter, j);
      if (singular[j] > least) {
        inside += v2;
        sum += v2 / (singular[j] * singular[j]);
      }
    }
    return inside < 1 - 1e-9 ? Double.POSITIVE_INFINITY : sum;
  }

  /** Σ σ²/(σ² + μ): the effective number of parameters at a weight. */
  double effective(double weight) {
    double sum = 0;
    for (double s : singular) {
      sum += s * s / (s * s + weight);
    }
    return sum;
  }

  /** Solves a symmetric positive definite system. */
  static double[] solveSymmetric(DMatrixRMaj matrix, double[] target) {
    LinearSolverDense<DMatrixRMaj> solver = LinearSolverFactory_DDRM.symmPosDef(target.length);
    if (!solver.setA(matrix.copy())) {
      throw new ArithmeticException("a covariance is not positive definite");
    }
    DMatrixRMaj result = new DMatrixRMaj(target.length, 1);
    solver.solve(DMatrixRMaj.wrap(target.length, 1, target.clone()), result);
    return result.getData().clone();
  }
}
