package org.flexbound.statistics;

import java.util.Arrays;

/**
 * The cheapest one-to-one assignment of rows to columns of a square matrix of costs, by shortest
 * augmenting paths (Kuhn 1955, Nav. Res. Logist. 2:83; Jonker &amp; Volgenant 1987, Computing 38:325).
 */
public final class Assignment {
  private Assignment() {}

  /**
   * Assigns.
   *
   * @param cost square, finite; the cost of giving row i column j
   * @return for each row its column
   */
  public static int[] cheapest(double[][] cost) {
    int n = cost.length;
    // potentials of rows and columns, and the row of each column, counted from 1; 0 stands for none
    double[] ofRow = new double[n + 1];
    double[] ofColumn = new double[n + 1];
    int[] rowOf = new int[n + 1];
    int[] before = new int[n + 1];
    for (int row = 1; row <= n; row++) {
      rowOf[0] = row;
      int column = 0;
      double[] least = new double[n + 1];
      Arrays.fill(least, Double.POSITIVE_INFINITY);
      boolean[] seen = new boolean[n + 1];
      do {
        seen[column] = true;
        int from = rowOf[column];
        double step = Double.POSITIVE_INFINITY;
        int next = 0;
        for (int j = 1; j <= n; j++) {
          if (!seen[j]) {
            double reduced = cost[from - 1][j - 1] - ofRow[from] - ofColumn[j];
            if (reduced < least[j]) {
              least[j] = reduced;
              before[j] = column;
            }
            if (least[j] < step) {
              step = least[j];
              next = j;
            }
          }
        }
        for (int j = 0; j <= n; j++) {
          if (seen[j]) {
            ofRow[rowOf[j]] += step;
            ofColumn[j] -= step;
          } else {
            least[j] -= step;
          }
        }
        column = next;
      } while (rowOf[column] != 0);
      while (column != 0) {
        rowOf[column] = rowOf[before[column]];
        column = before[column];
      }
    }
    int[] result = new int[n];
    for (int j = 1; j <= n; j++) {
      result[rowOf[j] - 1] = j - 1;
    }
    return result;
  }
}
