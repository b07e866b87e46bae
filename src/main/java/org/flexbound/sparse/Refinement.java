package org.flexbound.sparse;

import java.util.Arrays;

/**
 * Iterative refinement of solutions: the residual is computed as if in twice the working precision, solved for with the factor at hand, and
 * added, until it changes nothing more. It brings the solution to full working precision unless the matrix is so ill-conditioned that the
 * factor itself holds no digit.
 *
 * <p>Source: T. Ogita, S. M. Rump, S. Oishi, "Accurate sum and dot product", SIAM J. Sci. Comput. 26 (2005) 1955-1988, algorithms 3.1
 * (TwoSum), 3.5 (TwoProductFMA) and 5.3 (Dot2).
 */
public final class Refinement {
  /** A correction must shrink at least so much from one step to the next. */
  private static final double LEAST_GAIN = 0.5;

  private static final double ROUNDING = 0x1p-52;

  private final int mostSteps;

  /** A refinement of at most so many steps a column. */
  public Refinement(int mostSteps) {
    if (mostSteps < 1) {
      throw new IllegalArgumentException("at least one step is needed, not " + mostSteps);
    }
    this.mostSteps = mostSteps;
  }

  /**
   * Solves and refines.
   *
   * @param matrix the matrix that was factorized (or one near it: the factor then preconditions)
   * @param factor its factor
   * @param rhs size × columns, column-major
   * @param columns number of right-hand sides
   * @throws IllegalArgumentException if sizes differ
   */
  public RefinedSolution solve(SymmetricMatrix matrix, NumericFactor factor, double[] rhs, int columns) {
    int n = matrix.size();
    if (factor.size() != n || rhs.length < (long) n * columns) {
      throw new IllegalArgumentException("sizes differ: matrix " + n + ", factor " + factor.size() + ", right-hand sides " + rhs.length);
    }
    double[] x = Arrays.copyOf(rhs, n * columns);
    factor.solve(x, columns);
    double[] weight = matrix.diagonal();
    for (int i = 0; i < n; i++) {
      weight[i] = Math.sqrt(Math.abs(weight[i]));
    }
    double[] backward = new double[columns];
    double[] corrections = new double[columns];
    int[] steps = new int[columns];
    RefinedSolution.Outcome[] outcomes = new RefinedSolution.Outcome[columns];
    Residual residual = new Residual(matrix);
    for (int c = 0; c < columns; c++) {
      double before = Double.POSITIVE_INFINITY;
      outcomes[c] = RefinedSolution.Outcome.STEP_LIMIT;
      for (int step = 0; step < mostSteps; step++) {
        double[] d = residual.of(x, c * n, rhs, c * n);
        factor.solve(d, 1);
        double correction = ratio(d, x, c * n, weight);
        if (!(correction < LEAST_GAIN * before) && correction > ROUNDING) {
          // It would do harm: keep what the last step gave.
          outcomes[c] = RefinedSolution.Outcome.STAGNATED;
          break;
        }
        for (int i = 0; i < n; i++) {
          x[c * n + i] += d[i];
        }
        steps[c]++;
        corrections[c] = correction;
        before = correction;
        if (correction <= ROUNDING) {
          outcomes[c] = RefinedSolution.Outcome.SETTLED;
          break;
        }
      }
      residual.of(x, c * n, rhs, c * n);
      backward[c] = residual.backwardError();
    }
    return new RefinedSolution(x, columns, backward, corrections, steps, outcomes);
  }

  private static double ratio(double[] d, double[] x, int at, double[] weight) {
    double above = 0;
    double below = 0;
    for (int i = 0; i < weight.length; i++) {
      above = Math.max(above, weight[i] * Math.abs(d[i]));
      below = Math.max(below, weight[i] * Math.abs(x[at + i]));
    }
    return above == 0 ? 0 : above / below;
  }

  /** Residuals in twice the working precision. */
  private static final class Residual {
    private final SymmetricMatrix matrix;
    private final double[] high;
    private final double[] low;
    private final double[] size;

    Residual(SymmetricMatrix matrix) {
      this.matrix = matrix;
      high = new double[matrix.size()];
      low = new double[matrix.size()];
      size = new double[matrix.size()];
    }

    /** {@code b - A x}, rounded once at the end. */
    double[] of(double[] x, int xo, double[] b, int bo) {
      int n = matrix.size();
      int[] starts = matrix.pattern().starts();
      int[] rows = matrix.pattern().rowIndices();
      double[] values = matrix.entries();
      System.arraycopy(b, bo, high, 0, n);
      Arrays.fill(low, 0);
      for (int i = 0; i < n; i++) {
        size[i] = Math.abs(high[i]);
      }
      for (int j = 0; j < n; j++) {
        take(j, values[starts[j]], x[xo + j]);
        for (int p = starts[j] + 1; p < starts[j + 1]; p++) {
          take(rows[p], values[p], x[xo + j]);
          take(j, values[p], x[xo + rows[p]]);
        }
      }
      double[] r = new double[n];
      for (int i = 0; i < n; i++) {
        r[i] = high[i] + low[i];
      }
      return r;
    }

    private void take(int i, double a, double x) {
      double product = -a * x;
      double productError = Math.fma(-a, x, -product);
      double sum = high[i] + product;
      double part = sum - high[i];
      double sumError = (high[i] - (sum - part)) + (product - part);
      high[i] = sum;
      low[i] += sumError + productError;
      size[i] += Math.abs(product);
    }

    /** The componentwise backward error of the last residual. */
    double backwardError() {
      double largest = 0;
      for (int i = 0; i < high.length; i++) {
        double r = Math.abs(high[i] + low[i]);
        largest = Math.max(largest, r == 0 ? 0 : r / size[i]);
      }
      return largest;
    }
  }
}
