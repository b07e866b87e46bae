package org.flexbound.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * The opening of free joint components: the combination Σ a_r δ_r of their rows that equals a given
 * deformation, by least squares weighed with the stiffness of the flexible part.
 */
final class FreeGaps {
  private FreeGaps() {}

  /**
   * A free component.
   *
   * @param values what gives its force out of the force of the member piece
   * @param slot its stiffness; -1 for a direction of a full matrix
   */
  @SuppressWarnings("ArrayRecordComponent") // used at once, never kept
  record Row(double[] values, int slot) {
    boolean same(Row other) {
      return slot == other.slot && Arrays.equals(values, other.values);
    }
  }

  /**
   * The opening of one component.
   *
   * @param k the stiffness without the free components taken out
   * @param free all free components
   * @param deformation what their opening must make up
   * @param wanted the component asked for
   * @param out the share of stiffness below which a component depends on those before it
   * @return its opening; shared equally with a partner at the other end that has the same stiffness;
   *     0 where a partner of another stiffness may turn as well, since stiffening one alone changes
   *     nothing then
   */
  static double of(double[] k, List<Row> free, double[] deformation, Row wanted, double out) {
    List<double[]> order = new ArrayList<>();
    int partners = 0;
    for (Row a : free) {
      if (a.same(wanted)) {
        partners++;
      } else {
        order.add(a.values());
      }
    }
    order.add(wanted.values());
    List<double[]> kept = new ArrayList<>();
    double[] rest = k.clone();
    for (double[] a : order) {
      double[] ra = Matrix6.times(rest, a);
      double left = Matrix6.dot(a, ra);
      if (left > out * Matrix6.form(a, k, a)) {
        Matrix6.addOuter(rest, -1 / left, ra);
        kept.add(a);
      } else if (a == wanted.values()) {
        return 0;
      }
    }
    int n = kept.size();
    double[][] normal = new double[n][n + 1];
    double[] kd = Matrix6.times(k, deformation);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        normal[i][j] = Matrix6.form(kept.get(i), k, kept.get(j));
      }
      normal[i][n] = Matrix6.dot(kept.get(i), kd);
    }
    return solve(normal, n)[n - 1] / partners;
  }

  /** Gauss on a positive definite system of up to six equations, right side in the last column. */
  private static double[] solve(double[][] a, int n) {
    for (int p = 0; p < n; p++) {
      for (int i = p + 1; i < n; i++) {
        double factor = a[i][p] / a[p][p];
        for (int j = p; j <= n; j++) {
          a[i][j] -= factor * a[p][j];
        }
      }
    }
    double[] x = new double[n];
    for (int i = n - 1; i >= 0; i--) {
      double sum = a[i][n];
      for (int j = i + 1; j < n; j++) {
        sum -= a[i][j] * x[j];
      }
      x[i] = sum / a[i][i];
    }
    return x;
  }
}
