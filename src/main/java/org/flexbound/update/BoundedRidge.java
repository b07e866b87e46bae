package org.flexbound.update;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.LinearSolverFactory_DDRM;
import org.ejml.interfaces.linsol.LinearSolverDense;

/**
 * Least squares with a ridge within bounds: minimises ½‖Jz − r‖² + ½ Σ dᵢ²(zᵢ + wᵢ)² for l ≤ z ≤ u.
 *
 * <p>Every dᵢ is above 0, so the problem is strictly convex and its solution unique. Active sets are
 * exchanged by block principal pivoting (Portugal, Júdice &amp; Vicente 1994, Mathematics of
 * Computation 63, 625), with single exchanges where blocks stop helping, which makes it finite. The
 * free variables are found from the QR factors of the stacked matrix [J; D], never from normal
 * equations; where the free variables outnumber the rows of J and the ridge is not small, from
 * (JD⁻¹D⁻¹Jᵀ + I), whose condition is that of the few rows, with one step of refinement.
 */
final class BoundedRidge {
  /** Below this ridge the short form loses digits that the stacked QR keeps. */
  private static final double SMALL_RIDGE = 0.03;

  private static final int BLOCK_TRIES = 3;

  private final DMatrixRMaj jacobian;
  private final double[] target;
  private final double[] ridge;
  private final double[] centre;

  /**
   * A problem.
   *
   * @param jacobian J, rows × n; only read
   * @param target r, one for each row
   * @param ridge d, each above 0
   * @param at w, the point that z is added to
   */
  BoundedRidge(DMatrixRMaj jacobian, double[] target, double[] ridge, double[] at) {
    this.jacobian = jacobian;
    this.target = target;
    this.ridge = ridge;
    this.centre = at;
  }

  /**
   * Solves within bounds.
   *
   * @param lower l; equal to u for a variable that is held
   * @param upper u
   * @return z
   */
  double[] solve(double[] lower, double[] upper) {
    int n = ridge.length;
    // 0 free, -1 on the lower bound, +1 on the upper one, 2 held
    int[] state = new int[n];
    for (int i = 0; i < n; i++) {
      state[i] = lower[i] >= upper[i] ? 2 : 0;
    }
    double[] z = new double[n];
    int fewest = n + 1;
    int tries = BLOCK_TRIES;
    int limit = 20 * (n + 5);
    for (int round = 0; round < limit; round++) {
      for (int i = 0; i < n; i++) {
        if (state[i] != 0) {
          z[i] = state[i] == 1 ? upper[i] : lower[i];
        }
      }
      solveFree(state, z);
      double[] gradient = gradient(z);
      double scale = largest(gradient, z);
      int wrong = 0;
      int last = -1;
      for (int i = 0; i < n; i++) {
        if (isWrong(i, state[i], z, gradient, scale, lower, upper)) {
          wrong++;
          last = i;
        }
      }
      if (wrong == 0) {
        break;
      }
      boolean block = true;
      if (wrong < fewest) {
        fewest = wrong;
        tries = BLOCK_TRIES;
      } else if (tries > 0) {
        tries--;
      } else {
        block = false;
      }
      for (int i = block ? 0 : last; i <= last; i++) {
        if (isWrong(i, state[i], z, gradient, scale, lower, upper)) {
          state[i] = state[i] != 0 ? 0 : z[i] < lower[i] ? -1 : 1;
        }
      }
    }
    for (int i = 0; i < n; i++) {
      z[i] = Math.min(Math.max(z[i], lower[i]), upper[i]);
    }
    return z;
  }

  private boolean isWrong(
      int i,
      int state,
      double[] z,
      double[] gradient,
      double scale,
      double[] lower,
      double[] upper) {
    double tolerance = 1e-11 * scale;
    return switch (state) {
      case 0 -> z[i] < lower[i] - 1e-13 || z[i] > upper[i] + 1e-13;
      case -1 -> gradient[i] < -tolerance;
      case 1 -> gradient[i] > tolerance;
      default -> false;
    };
  }

  private double largest(double[] gradient, double[] z) {
    double result = 1;
    for (int i = 0; i < z.length; i++) {
      result = Math.max(result, Math.abs(gradient[i]));
    }
    return result;
  }

  /** The gradient Jᵀ(Jz − r) + D²(z + w). */
  private double[] gradient(double[] z) {
    double[] misses = misses(z);
    double[] result = new double[z.length];
    for (int row = 0; row < misses.length; row++) {
      for (int i = 0; i < z.length; i++) {
        result[i] -= jacobian.unsafe_get(row, i) * misses[row];
      }
    }
    for (int i = 0; i < z.length; i++) {
      result[i] += ridge[i] * ridge[i] * (z[i] + centre[i]);
    }
    return result;
  }

  /** r − Jz. */
  private double[] misses(double[] z) {
    double[] result = target.clone();
    for (int row = 0; row < result.length; row++) {
      for (int i = 0; i < z.length; i++) {
        result[row] -= jacobian.unsafe_get(row, i) * z[i];
      }
    }
    return result;
  }

  private void solveFree(int[] state, double[] z) {
    int free = 0;
    boolean smallRidge = false;
    for (int i = 0; i < state.length; i++) {
      if (state[i] == 0) {
        free++;
        z[i] = 0;
        smallRidge |= ridge[i] < SMALL_RIDGE;
      }
    }
    if (free == 0) {
      return;
    }
    int[] index = new int[free];
    int next = 0;
    for (int i = 0; i < state.length; i++) {
      if (state[i] == 0) {
        index[next++] = i;
      }
    }
    if (free > jacobian.numRows && !smallRidge) {
      solveShort(index, z);
      solveShort(index, z);
    } else {
      solveStacked(index, z);
    }
  }

  private void solveStacked(int[] index, double[] z) {
    int rows = jacobian.numRows;
    DMatrixRMaj stacked = new DMatrixRMaj(rows + index.length, index.length);
    DMatrixRMaj right = new DMatrixRMaj(rows + index.length, 1);
    double[] misses = misses(z);
    for (int row = 0; row < rows; row++) {
      right.set(row, 0, misses[row]);
      for (int k = 0; k < index.length; k++) {
        stacked.set(row, k, jacobian.unsafe_get(row, index[k]));
      }
    }
    for (int k = 0; k < index.length; k++) {
      double d = ridge[index[k]];
      stacked.set(rows + k, k, d);
      right.set(rows + k, 0, -d * centre[index[k]]);
    }
    LinearSolverDense<DMatrixRMaj> solver =
        LinearSolverFactory_DDRM.qr(rows + index.length, index.length);
    if (!solver.setA(stacked)) {
      throw new ArithmeticException("the ridge of a bounded step is not above 0");
    }
    DMatrixRMaj solution = new DMatrixRMaj(index.length, 1);
    solver.solve(right, solution);
    for (int k = 0; k < index.length; k++) {
      z[index[k]] = solution.get(k);
    }
  }

  /** Adds to z what is missing to the solution: called again, it refines. */
  private void solveShort(int[] index, double[] z) {
    int rows = jacobian.numRows;
    DMatrixRMaj scaled = new DMatrixRMaj(rows, index.length);
    for (int row = 0; row < rows; row++) {
      for (int k = 0; k < index.length; k++) {
        scaled.unsafe_set(row, k, jacobian.unsafe_get(row, index[k]) / ridge[index[k]]);
      }
    }
    // with v = D dz: minimise ½‖A v − s‖² + ½‖v − t‖², t = −D(w + z): v = t + Aᵀ(AAᵀ + I)⁻¹(s − A t)
    double[] misses = misses(z);
    double[] t = new double[index.length];
    for (int k = 0; k < index.length; k++) {
      t[k] = -ridge[index[k]] * (centre[index[k]] + z[index[k]]);
    }
    DMatrixRMaj right = new DMatrixRMaj(rows, 1);
    for (int row = 0; row < rows; row++) {
      double sum = misses[row];
      for (int k = 0; k < index.length; k++) {
        sum -= scaled.unsafe_get(row, k) * t[k];
      }
      right.set(row, 0, sum);
    }
    DMatrixRMaj square = new DMatrixRMaj(rows, rows);
    CommonOps_DDRM.multTransB(scaled, scaled, square);
    for (int row = 0; row < rows; row++) {
      square.add(row, row, 1);
    }
    LinearSolverDense<DMatrixRMaj> solver = LinearSolverFactory_DDRM.chol(rows);
    if (!solver.setA(square)) {
      throw new ArithmeticException("a bounded step has entries that are not numbers");
    }
    DMatrixRMaj multiplier = new DMatrixRMaj(rows, 1);
    solver.solve(right, multiplier);
    for (int k = 0; k < index.length; k++) {
      double v = t[k];
      for (int row = 0; row < rows; row++) {
        v += scaled.unsafe_get(row, k) * multiplier.get(row);
      }
      z[index[k]] += v / ridge[index[k]];
    }
  }
}
