package org.flexbound.statistics;

import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.QRDecomposition;

/**
 * Ordinary least squares y ≈ X b by Householder QR, columns scaled to unit length, with one step of
 * refinement (Golub &amp; Van Loan, Matrix Computations, 4th ed., 5.3).
 */
public final class Regression {
  /** A column counts as a combination of the others below this share of its length. */
  private static final double DEPENDENT = 1e-12;

  private final double[] coefficients;
  private final double[][] covariance;
  private final double[] residuals;
  private final double[] leverages;
  private final double residualSumOfSquares;
  private final int degreesOfFreedom;

  private Regression(
      double[] coefficients,
      double[][] covariance,
      double[] residuals,
      double[] leverages,
      double residualSumOfSquares,
      int degreesOfFreedom) {
    this.coefficients = coefficients;
    this.covariance = covariance;
    this.residuals = residuals;
    this.leverages = leverages;
    this.residualSumOfSquares = residualSumOfSquares;
    this.degreesOfFreedom = degreesOfFreedom;
  }

  /** A design matrix of which one column is a combination of the others. */
  public static final class DependentColumns extends RuntimeException {
    private static final long serialVersionUID = 1L;

    private final int column;

    DependentColumns(int column) {
      super("column " + column + " of the design is a combination of the others");
      this.column = column;
    }

    /**
     * The column.
     *
     * @return its index
     */
    public int column() {
      return column;
    }
  }

  /**
   * Fits.
   *
   * @param design X, one row for each observation; at least as many rows as columns
   * @param y the observations
   * @return the fit
   * @throws DependentColumns where X has not full column rank
   */
  public static Regression fit(double[][] design, double[] y) {
    int rows = design.length;
    int columns = rows == 0 ? 0 : design[0].length;
    if (columns == 0 || rows < columns || y.length != rows) {
      throw new IllegalArgumentException(
          rows + " rows, " + columns + " columns and " + y.length + " observations do not fit");
    }
    double[] scale = new double[columns];
    DMatrixRMaj x = new DMatrixRMaj(rows, columns);
    for (int c = 0; c < columns; c++) {
      double sum = 0;
      for (double[] row : design) {
        sum += row[c] * row[c];
      }
      scale[c] = Math.sqrt(sum);
      if (!(scale[c] > 0)) {
        throw new DependentColumns(c);
      }
      for (int r = 0; r < rows; r++) {
        x.set(r, c, design[r][c] / scale[c]);
      }
    }
    QRDecomposition<DMatrixRMaj> qr = DecompositionFactory_DDRM.qr(rows, columns);
    qr.decompose(x.copy());
    DMatrixRMaj q = qr.getQ(null, true);
    DMatrixRMaj r = qr.getR(null, true);
    for (int c = 0; c < columns; c++) {
      if (Math.abs(r.get(c, c)) < DEPENDENT) {
        throw new DependentColumns(c);
      }
    }
    double[] scaled = new double[columns];
    double[] residuals = y.clone();
    for (int pass = 0; pass < 2; pass++) {
      double[] step = solve(q, r, residuals);
      for (int c = 0; c < columns; c++) {
        scaled[c] += step[c];
      }
      for (int row = 0; row < rows; row++) {
        double fitted = 0;
        for (int c = 0; c < columns; c++) {
          fitted = Math.fma(x.get(row, c), scaled[c], fitted);
        }
        residuals[row] = y[row] - fitted;
      }
    }
    return finish(q, r, scale, scaled, residuals);
  }

  private static double[] solve(DMatrixRMaj q, DMatrixRMaj r, double[] rhs) {
    int columns = r.numCols;
    double[] b = new double[columns];
    for (int c = 0; c < columns; c++) {
      double sum = 0;
      for (int row = 0; row < q.numRows; row++) {
        sum = Math.fma(q.get(row, c), rhs[row], sum);
      }
      b[c] = sum;
    }
    for (int c = columns - 1; c >= 0; c--) {
      double sum = b[c];
      for (int k = c + 1; k < columns; k++) {
        sum -= r.get(c, k) * b[k];
      }
      b[c] = sum / r.get(c, c);
    }
    return b;
  }

  private static Regression finish(
      DMatrixRMaj q, DMatrixRMaj r, double[] scale, double[] scaled, double[] residuals) {
    int columns = scaled.length;
    int rows = residuals.length;
    double sum = 0;
    for (double residual : residuals) {
      sum = Math.fma(residual, residual, sum);
    }
    int dof = rows - columns;
    double variance = dof > 0 ? sum / dof : Double.NaN;
    DMatrixRMaj inverse = new DMatrixRMaj(columns, columns);
    CommonOps_DDRM.invert(r, inverse);
    double[][] covariance = new double[columns][columns];
    double[] coefficients = new double[columns];
    for (int i = 0; i < columns; i++) {
      coefficients[i] = scaled[i] / scale[i];
      for (int j = 0; j < columns; j++) {
        double entry = 0;
        for (int k = Math.max(i, j); k < columns; k++) {
          entry += inverse.get(i, k) * inverse.get(j, k);
        }
        covariance[i][j] = variance * entry / scale[i] / scale[j];
      }
    }
    double[] leverages = new double[rows];
    for (int row = 0; row < rows; row++) {
      for (int c = 0; c < columns; c++) {
        leverages[row] += q.get(row, c) * q.get(row, c);
      }
    }
    return new Regression(coefficients, covariance, residuals, leverages, sum, dof);
  }

  /**
   * The fitted coefficients.
   *
   * @return b, one for each column of X
   */
  public double[] coefficients() {
    return coefficients.clone();
  }

  /**
   * The covariance of the coefficients.
   *
   * @return residual variance times (XᵀX)⁻¹
   */
  public double[][] covariance() {
    return Arrays.stream(covariance).map(double[]::clone).toArray(double[][]::new);
  }

  /**
   * The residuals.
   *
   * @return y − X b
   */
  public double[] residuals() {
    return residuals.clone();
  }

  /**
   * The leverages.
   *
   * @return the diagonal of the hat matrix
   */
  public double[] leverages() {
    return leverages.clone();
  }

  /**
   * The residual sum of squares.
   *
   * @return Σ residual²
   */
  public double residualSumOfSquares() {
    return residualSumOfSquares;
  }

  /**
   * The degrees of freedom.
   *
   * @return rows less columns
   */
  public int degreesOfFreedom() {
    return degreesOfFreedom;
  }

  /**
   * The residual standard deviation.
   *
   * @return √(Σ residual²/degrees of freedom); NaN where there are none
   */
  public double residualStandardDeviation() {
    return degreesOfFreedom > 0
        ? Math.sqrt(residualSumOfSquares / degreesOfFreedom)
        : Double.NaN;
  }

  /**
   * The standard error of a coefficient.
   *
   * @param column which
   * @return its standard error
   */
  public double standardError(int column) {
    return Math.sqrt(covariance[column][column]);
  }

  /**
   * Studentised deleted residuals (Belsley, Kuh &amp; Welsch 1980, 2.1): each residual against the
   * fit without it; Student's t with one degree of freedom less where all is well.
   *
   * @return one for each row; NaN where a row cannot be left out
   */
  public double[] studentisedDeletedResiduals() {
    double[] result = new double[residuals.length];
    for (int row = 0; row < residuals.length; row++) {
      double free = 1 - leverages[row];
      double without =
          (residualSumOfSquares - residuals[row] * residuals[row] / free) / (degreesOfFreedom - 1);
      result[row] =
          free < 1e-10 || degreesOfFreedom < 2
              ? Double.NaN
              : residuals[row] / Math.sqrt(Math.max(without, 0) * free);
    }
    return result;
  }
}
