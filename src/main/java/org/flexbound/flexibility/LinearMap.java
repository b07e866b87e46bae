package org.flexbound.flexibility;

import java.util.Arrays;

/**
 * A sparse linear map from the absolute coefficients to the coefficients that are compared: it takes
 * out base motion and averages what was measured more than once.
 *
 * <p>Row r of the result is Σ weights[r][k] · absolute[columns[r][k]]. The same map is applied to
 * readings, gains, floors, scatter and computed flexibility.
 */
public final class LinearMap {
  private final int inputs;
  private final int[][] columns;
  private final double[][] weights;

  /**
   * A map by its rows.
   *
   * @param inputs the number of absolute coefficients
   * @param columns for each row the indices of the absolute coefficients it uses
   * @param weights for each row the weights, in the order of its columns
   */
  public LinearMap(int inputs, int[][] columns, double[][] weights) {
    if (columns.length != weights.length) {
      throw new IllegalArgumentException(
          columns.length + " rows of columns but " + weights.length + " rows of weights");
    }
    this.inputs = inputs;
    this.columns = Arrays.stream(columns).map(int[]::clone).toArray(int[][]::new);
    this.weights = Arrays.stream(weights).map(double[]::clone).toArray(double[][]::new);
  }

  /**
   * The map that changes nothing.
   *
   * @param size the number of coefficients
   * @return the identity
   */
  public static LinearMap identity(int size) {
    int[][] columns = new int[size][];
    double[][] weights = new double[size][];
    for (int row = 0; row < size; row++) {
      columns[row] = new int[] {row};
      weights[row] = new double[] {1};
    }
    return new LinearMap(size, columns, weights);
  }

  /**
   * The number of absolute coefficients.
   *
   * @return the length of what {@link #apply} takes
   */
  public int inputs() {
    return inputs;
  }

  /**
   * The number of coefficients that are compared.
   *
   * @return the length of what {@link #apply} gives
   */
  public int outputs() {
    return columns.length;
  }

  /**
   * Applies the map.
   *
   * @param absolute one number for each absolute coefficient
   * @return one number for each coefficient that is compared
   */
  public double[] apply(double[] absolute) {
    double[] result = new double[columns.length];
    for (int row = 0; row < columns.length; row++) {
      double sum = 0;
      for (int k = 0; k < columns[row].length; k++) {
        sum += weights[row][k] * absolute[columns[row][k]];
      }
      result[row] = sum;
    }
    return result;
  }

  /**
   * The absolute coefficients that a row uses.
   *
   * @param row the row
   * @return their indices
   */
  public int[] columns(int row) {
    return columns[row].clone();
  }

  /**
   * The weights of a row.
   *
   * @param row the row
   * @return the weights, in the order of its columns
   */
  public double[] weights(int row) {
    return weights[row].clone();
  }

  /**
   * The covariance of the result where the absolute coefficients are independent.
   *
   * @param variances the variance of each absolute coefficient
   * @return the covariance, outputs × outputs
   */
  public double[][] covariance(double[] variances) {
    double[][] dense = new double[columns.length][inputs];
    for (int row = 0; row < columns.length; row++) {
      for (int k = 0; k < columns[row].length; k++) {
        dense[row][columns[row][k]] += weights[row][k];
      }
    }
    double[][] result = new double[columns.length][columns.length];
    for (int row = 0; row < columns.length; row++) {
      for (int other = 0; other <= row; other++) {
        double sum = 0;
        for (int k = 0; k < columns[row].length; k++) {
          int input = columns[row][k];
          sum += weights[row][k] * variances[input] * dense[other][input];
        }
        result[row][other] = sum;
        result[other][row] = sum;
      }
    }
    return result;
  }
}
