package org.flexbound.update;

import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.LinearSolverFactory_DDRM;
import org.ejml.interfaces.linsol.LinearSolverDense;

/**
 * What the other measured coefficients say of some left out, under the joint covariance.
 *
 * <p>In the linearised model the measured values are jointly normal with covariance K = V + JJᵀ, V
 * scatter and floors, J the derivatives by the scaled unknowns (parameters off their bounds, and
 * gains), whose priors are unit normals. With r the residuals of the priors' mean and B what is left
 * out, the prediction error of B from the rest is e = (K⁻¹_BB)⁻¹ (K⁻¹r)_B, with covariance
 * (K⁻¹_BB)⁻¹, and the estimate of the unknowns moves by −JᵀK⁻¹_{:B} e (Rasmussen &amp; Williams 2006,
 * section 5.4.2, for single values). Gains that the left-out values share with the others are thereby
 * conditioned on.
 */
final class LeaveOut {
  /** Keeps K invertible where coefficients depend on each other; far below any uncertainty. */
  private static final double RELATIVE_NUGGET = 1e-11;

  private final DMatrixRMaj jacobian;
  private final DMatrixRMaj inverse;
  private final double[] weighted;
  private final double[] noiseInverse;

  /**
   * The joint model.
   *
   * @param covariance V
   * @param jacobian J, columns: parameters, then gains
   * @param parameters how many of the columns are parameters
   * @param residuals r = y − f(w) + J w
   */
  LeaveOut(DMatrixRMaj covariance, DMatrixRMaj jacobian, int parameters, double[] residuals) {
    this.jacobian = jacobian;
    DMatrixRMaj whole = covariance.copy();
    CommonOps_DDRM.multAddTransB(jacobian, jacobian, whole);
    this.inverse = inverse(whole);
    this.weighted = times(inverse, residuals);
    DMatrixRMaj noise = covariance.copy();
    if (jacobian.numCols > parameters) {
      DMatrixRMaj gains =
          CommonOps_DDRM.extract(jacobian, 0, jacobian.numRows, parameters, jacobian.numCols);
      CommonOps_DDRM.multAddTransB(gains, gains, noise);
    }
    DMatrixRMaj inverted = inverse(noise);
    this.noiseInverse = new double[residuals.length];
    for (int i = 0; i < residuals.length; i++) {
      noiseInverse[i] = inverted.get(i, i);
    }
  }

  private static DMatrixRMaj inverse(DMatrixRMaj matrix) {
    int n = matrix.numRows;
    double[] scale = new double[n];
    for (int i = 0; i < n; i++) {
      scale[i] = Math.sqrt(matrix.get(i, i));
    }
    DMatrixRMaj scaled = new DMatrixRMaj(n, n);
    for (int i = 0; i < n; i++) {
      for (int k = 0; k < n; k++) {
        scaled.set(i, k, matrix.get(i, k) / (scale[i] * scale[k]));
      }
      scaled.add(i, i, RELATIVE_NUGGET);
    }
    LinearSolverDense<DMatrixRMaj> solver = LinearSolverFactory_DDRM.symmPosDef(n);
    if (n > 0 && !solver.setA(scaled)) {
      throw new ArithmeticException("a joint covariance is not positive definite");
    }
    DMatrixRMaj result = new DMatrixRMaj(n, n);
    if (n > 0) {
      solver.invert(result);
    }
    for (int i = 0; i < n; i++) {
      for (int k = 0; k < n; k++) {
        result.set(i, k, result.get(i, k) / (scale[i] * scale[k]));
      }
    }
    return result;
  }

  private static double[] times(DMatrixRMaj matrix, double[] vector) {
    double[] result = new double[matrix.numRows];
    for (int i = 0; i < matrix.numRows; i++) {
      for (int k = 0; k < matrix.numCols; k++) {
        result[i] += matrix.get(i, k) * vector[k];
      }
    }
    return result;
  }

  /** How a value left out alone differs from its prediction, in standard deviations. */
  double studentised(int row) {
    return weighted[row] / Math.sqrt(inverse.get(row, row));
  }

  /** The share of a value's own say in its fit, 0 to 1. */
  double leverage(int row) {
    return Math.min(Math.max(1 - inverse.get(row, row) / noiseInverse[row], 0), 1);
  }

  /** What leaving some rows out shows. */
  final class Left {
    /** The prediction errors, measured − predicted. */
    final double[] errors;

    /** Their covariance. */
    final DMatrixRMaj covariance;

    /** How far the unknowns move when the rows are left out. */
    final double[] shift;

    Left(List<Integer> rows) {
      int n = rows.size();
      DMatrixRMaj block = new DMatrixRMaj(n, n);
      double[] part = new double[n];
      for (int i = 0; i < n; i++) {
        part[i] = weighted[rows.get(i)];
        for (int k = 0; k < n; k++) {
          block.set(i, k, inverse.get(rows.get(i), rows.get(k)));
        }
      }
      covariance = LeaveOut.inverse(block);
      errors = times(covariance, part);
      shift = new double[jacobian.numCols];
      double[] back = new double[jacobian.numRows];
      for (int row = 0; row < back.length; row++) {
        for (int i = 0; i < n; i++) {
          back[row] += inverse.get(row, rows.get(i)) * errors[i];
        }
      }
      for (int u = 0; u < shift.length; u++) {
        for (int row = 0; row < back.length; row++) {
          shift[u] -= jacobian.get(row, u) * back[row];
        }
      }
    }

    private Left(double[] errors, DMatrixRMaj covariance, double[] shift) {
      this.errors = errors;
      this.covariance = covariance;
      this.shift = shift;
    }

    /** Some of what was left out, by its places within it; the rest stays left out. */
    Left part(List<Integer> places) {
      int n = places.size();
      double[] some = new double[n];
      DMatrixRMaj block = new DMatrixRMaj(n, n);
      for (int i = 0; i < n; i++) {
        some[i] = errors[places.get(i)];
        for (int k = 0; k < n; k++) {
          block.set(i, k, covariance.get(places.get(i), places.get(k)));
        }
      }
      return new Left(some, block, shift);
    }

    /** The sum of squares of the errors under their covariance. */
    double misfit() {
      double sum = 0;
      for (double v : Whitener.of(covariance).whiten(errors)) {
        sum += v * v;
      }
      return sum;
    }
  }

  Left without(List<Integer> rows) {
    return new Left(rows);
  }
}
