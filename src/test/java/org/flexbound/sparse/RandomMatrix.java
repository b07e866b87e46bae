package org.flexbound.sparse;

import java.util.Random;

/** Seeded random symmetric matrices for tests. */
final class RandomMatrix {
  private RandomMatrix() {}

  /** Weakly diagonally dominant, so positive definite; each entry off the diagonal present with the given probability. */
  static double[][] definite(int n, double density, long seed) {
    Random random = new Random(seed);
    double[][] a = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < i; j++) {
        if (random.nextDouble() < density) {
          double v = random.nextGaussian();
          a[i][j] = v;
          a[j][i] = v;
          a[i][i] += Math.abs(v);
          a[j][j] += Math.abs(v);
        }
      }
      a[i][i] += 0.1 + random.nextDouble();
    }
    return a;
  }

  /** A chain of n unknowns joined by springs and grounded at its start, with extra springs between random unknowns. */
  static SymmetricMatrix chain(int n, int extra, long seed) {
    Random random = new Random(seed);
    int[][] blocks = new int[n + extra][];
    blocks[0] = new int[] {-1, 0};
    for (int i = 1; i < n; i++) {
      blocks[i] = new int[] {i - 1, i};
    }
    for (int e = 0; e < extra; e++) {
      int a = random.nextInt(n);
      int b = Math.min(n - 1, a + random.nextInt(10));
      blocks[n + e] = new int[] {a, b == a ? -1 : b};
    }
    return BlockAssembly.of(n, blocks).assemble((block, values) -> {
      values[0] = 1;
      values[1] = -1;
      values[2] = -1;
      values[3] = 1;
    });
  }

  static int[] alone(int n) {
    int[] group = new int[n];
    for (int i = 0; i < n; i++) {
      group[i] = i;
    }
    return group;
  }

  static double[] vector(int n, long seed) {
    return new Random(seed).doubles(n, -1, 1).toArray();
  }

  /** Largest entry of |b - A x| over that of |b|, with columns side by side. */
  static double residual(SymmetricMatrix a, double[] x, double[] b, int columns) {
    double[] ax = new double[b.length];
    a.multiply(x, ax, columns);
    double above = 0;
    double below = 0;
    for (int i = 0; i < b.length; i++) {
      above = Math.max(above, Math.abs(ax[i] - b[i]));
      below = Math.max(below, Math.abs(b[i]));
    }
    return above / below;
  }
}
