package org.flexbound.solve;

import java.util.Optional;

/**
 * The springs of a joint at a member's end, of a connection or of a support: the slots of the six
 * components and, where they were given as a full matrix, that matrix for nominal factors.
 */
final class EndSprings {
  private final int[] slots;
  private final double[] nominalDiagonal;
  private final double[] matrix;

  /**
   * Springs.
   *
   * @param slots six slots
   * @param matrix the full matrix as the model has it, where there is one
   */
  EndSprings(int[] slots, Optional<double[][]> matrix) {
    this.slots = slots;
    if (matrix.isPresent()) {
      this.matrix = new double[36];
      this.nominalDiagonal = new double[6];
      for (int i = 0; i < 6; i++) {
        System.arraycopy(matrix.get()[i], 0, this.matrix, 6 * i, 6);
        nominalDiagonal[i] = matrix.get()[i][i];
      }
    } else {
      this.matrix = new double[0];
      this.nominalDiagonal = new double[0];
    }
  }

  boolean full() {
    return matrix.length > 0;
  }

  int[] slots() {
    return slots.clone();
  }

  int slot(int component) {
    return slots[component];
  }

  /** The full matrix with the factors of its slots: K_ij √f_i √f_j. */
  double[] matrix(double[] stiffness) {
    double[] result = matrix.clone();
    for (int i = 0; i < 6; i++) {
      for (int j = 0; j < 6; j++) {
        result[i * 6 + j] *= root(stiffness, i) * root(stiffness, j);
      }
    }
    return result;
  }

  private double root(double[] stiffness, int i) {
    return nominalDiagonal[i] == 0 ? 1 : Math.sqrt(stiffness[slots[i]] / nominalDiagonal[i]);
  }
}
