package org.flexbound.sparse;

import java.util.Arrays;

/**
 * Stiffness and consistent mass of a regular lattice frame of Euler-Bernoulli members: nx × ny × nz nodes on a 1 m grid, members between
 * neighbours along the three axes, base layer fixed and eliminated, six unknowns a node, nodes numbered x fastest. The mass is consistent,
 * without rotary inertia in bending, torsional inertia by the polar moment.
 */
final class LatticeFrame {
  private static final double E = 210e9;
  private static final double G = 81e9;
  private static final double A = 5e-3;
  private static final double I = 2e-5;
  private static final double J = 3e-5;
  private static final double RHO = 7850;

  final SymmetricMatrix stiffness;
  final SymmetricMatrix mass;
  final int[] group;

  private LatticeFrame(SymmetricMatrix stiffness, SymmetricMatrix mass, int[] group) {
    this.stiffness = stiffness;
    this.mass = mass;
    this.group = group;
  }

  /** An n × n × n lattice. */
  static LatticeFrame cube(int n) {
    return of(n, n, n, false, true);
  }

  /**
   * A lattice by name: {@code n12} is a cube of 12 nodes a side, {@code boom} 2 × 2 × 4168 nodes; an r at the end turns it.
   *
   * <p>Entries that are zero are left out of the patterns, as they are in the files the native reference reads.
   */
  static LatticeFrame named(String name) {
    boolean turned = name.endsWith("r");
    String plain = turned ? name.substring(0, name.length() - 1) : name;
    LatticeFrame frame;
    if (plain.equals("boom")) {
      frame = of(2, 2, 4168, turned, true);
    } else {
      int n = Integer.parseInt(plain.substring(1));
      frame = of(n, n, n, turned, true);
    }
    return new LatticeFrame(withoutZeros(frame.stiffness), withoutZeros(frame.mass), frame.group);
  }

  private static SymmetricMatrix withoutZeros(SymmetricMatrix matrix) {
    int n = matrix.size();
    int[] starts = matrix.pattern().columnStarts();
    int[] rows = matrix.pattern().rows();
    double[] values = matrix.values();
    int[] keptStarts = new int[n + 1];
    int count = 0;
    for (int j = 0; j < n; j++) {
      for (int p = starts[j]; p < starts[j + 1]; p++) {
        if (rows[p] == j || values[p] != 0) {
          rows[count] = rows[p];
          values[count++] = values[p];
        }
      }
      keptStarts[j + 1] = count;
    }
    return SymmetricMatrix.of(SparsePattern.of(keptStarts, Arrays.copyOf(rows, count)), Arrays.copyOf(values, count));
  }

  /**
   * A lattice.
   *
   * @param turned whether all triples are turned by the rotation vector (0.4, 0.7, -0.3)
   * @param fixed whether the base layer is fixed
   */
  static LatticeFrame of(int nx, int ny, int nz, boolean turned, boolean fixed) {
    int nodes = nx * ny * nz;
    int base = fixed ? nx * ny : 0;
    int[][] blocks = new int[3 * nodes][];
    int[] axes = new int[3 * nodes];
    int[] step = {1, nx, nx * ny};
    int count = 0;
    for (int v = 0; v < nodes; v++) {
      int[] at = {v % nx, v / nx % ny, v / (nx * ny)};
      int[] end = {nx, ny, nz};
      for (int axis = 0; axis < 3; axis++) {
        if (at[axis] + 1 < end[axis] && !(fixed && axis < 2 && at[2] == 0)) {
          int[] block = new int[12];
          for (int d = 0; d < 6; d++) {
            block[d] = v < base ? -1 : (v - base) * 6 + d;
            block[6 + d] = (v + step[axis] - base) * 6 + d;
          }
          axes[count] = axis;
          blocks[count++] = block;
        }
      }
    }
    int size = (nodes - base) * 6;
    BlockAssembly assembly = BlockAssembly.of(size, Arrays.copyOf(blocks, count));
    double[][] k = new double[3][];
    double[][] m = new double[3][];
    double[][] turn = turned ? rotation(0.4, 0.7, -0.3) : rotation(0, 0, 0);
    for (int axis = 0; axis < 3; axis++) {
      k[axis] = oriented(memberStiffness(), axis, turn);
      m[axis] = oriented(memberMass(), axis, turn);
    }
    int[] group = new int[size];
    for (int i = 0; i < size; i++) {
      group[i] = i / 6;
    }
    return new LatticeFrame(assembly.assemble((b, values) -> System.arraycopy(k[axes[b]], 0, values, 0, 144)),
        assembly.assemble((b, values) -> System.arraycopy(m[axes[b]], 0, values, 0, 144)), group);
  }

  private static double[][] memberStiffness() {
    double[][] k = new double[12][12];
    pair(k, 0, 6, E * A);
    pair(k, 3, 9, G * J);
    bend(k, 1, 5, 1, E * I * 12, E * I * 6, E * I * 4, E * I * 2, -E * I * 12);
    bend(k, 2, 4, -1, E * I * 12, E * I * 6, E * I * 4, E * I * 2, -E * I * 12);
    return k;
  }

  private static void pair(double[][] k, int i, int j, double v) {
    k[i][i] = v;
    k[j][j] = v;
    k[i][j] = -v;
    k[j][i] = -v;
  }

  private static void bend(double[][] k, int w, int r, int sign, double kww, double kwr, double krr, double krs, double kws) {
    k[w][w] = kww;
    k[w + 6][w + 6] = kww;
    set(k, w, w + 6, kws);
    set(k, w, r, sign * kwr);
    set(k, w, r + 6, sign * kwr);
    set(k, w + 6, r, -sign * kwr);
    set(k, w + 6, r + 6, -sign * kwr);
    k[r][r] = krr;
    k[r + 6][r + 6] = krr;
    set(k, r, r + 6, krs);
  }

  private static void set(double[][] k, int i, int j, double v) {
    k[i][j] = v;
    k[j][i] = v;
  }

  private static double[][] memberMass() {
    double[][] m = new double[12][12];
    double mass = RHO * A;
    double polar = RHO * 2 * I;
    m[0][0] = mass / 3;
    m[6][6] = mass / 3;
    set(m, 0, 6, mass / 6);
    m[3][3] = polar / 3;
    m[9][9] = polar / 3;
    set(m, 3, 9, polar / 6);
    for (int s = 1; s >= -1; s -= 2) {
      int w = s > 0 ? 1 : 2;
      int r = s > 0 ? 5 : 4;
      double c = mass / 420;
      m[w][w] = 156 * c;
      m[w + 6][w + 6] = 156 * c;
      set(m, w, w + 6, 54 * c);
      set(m, w, r, s * 22 * c);
      set(m, w, r + 6, -s * 13 * c);
      set(m, w + 6, r, s * 13 * c);
      set(m, w + 6, r + 6, -s * 22 * c);
      m[r][r] = 4 * c;
      m[r + 6][r + 6] = 4 * c;
      set(m, r, r + 6, -3 * c);
    }
    return m;
  }

  /** Turns a member matrix from its local axes (x along the member) to those of the lattice, then by the given rotation. */
  private static double[] oriented(double[][] local, int axis, double[][] turn) {
    // Rows: local axes in global terms, cyclic so that they stay right-handed.
    double[][] t = new double[3][3];
    for (int i = 0; i < 3; i++) {
      for (int j = 0; j < 3; j++) {
        t[i][j] = turn[j][(axis + i) % 3];
      }
    }
    double[] out = new double[144];
    for (int i = 0; i < 12; i++) {
      for (int j = 0; j < 12; j++) {
        double sum = 0;
        for (int a = 0; a < 3; a++) {
          for (int b = 0; b < 3; b++) {
            sum += t[a][i % 3] * local[i / 3 * 3 + a][j / 3 * 3 + b] * t[b][j % 3];
          }
        }
        out[i * 12 + j] = sum;
      }
    }
    return out;
  }

  /** The rotation by a vector (Rodrigues). */
  private static double[][] rotation(double x, double y, double z) {
    double angle = Math.sqrt(x * x + y * y + z * z);
    double[][] s = {{0, -z, y}, {z, 0, -x}, {-y, x, 0}};
    double a = angle == 0 ? 1 : Math.sin(angle) / angle;
    double b = angle == 0 ? 0.5 : (1 - Math.cos(angle)) / (angle * angle);
    double[][] r = new double[3][3];
    for (int i = 0; i < 3; i++) {
      for (int j = 0; j < 3; j++) {
        double square = 0;
        for (int l = 0; l < 3; l++) {
          square += s[i][l] * s[l][j];
        }
        r[i][j] = (i == j ? 1 : 0) + a * s[i][j] + b * square;
      }
    }
    return r;
  }
}
