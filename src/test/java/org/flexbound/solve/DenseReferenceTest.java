package org.flexbound.solve;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.flexbound.frame.FrameModel;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Load;
import org.hipparchus.linear.Array2DRowRealMatrix;
import org.hipparchus.linear.ArrayRealVector;
import org.hipparchus.linear.CholeskyDecomposer;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Random space frames against the direct stiffness method written out here from the slope-deflection
 * formulas with shear (Przemieniecki 1968, Theory of Matrix Structural Analysis, eq. 5.116), assembled
 * densely and solved by two general-purpose libraries.
 */
class DenseReferenceTest {
  private static final int NODES = 9;

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6})
  void randomFramesAgreeWithADenseSolve(long seed) {
    Random random = new Random(seed);
    double[][] places = new double[NODES][3];
    StringBuilder nodes = new StringBuilder();
    for (int n = 0; n < NODES; n++) {
      for (int i = 0; i < 3; i++) {
        places[n][i] = Math.round(1000 * (random.nextDouble() * 4 + (i == 2 ? n : 0))) / 1000.0;
      }
      nodes.append(n == 0 ? "" : ", ").append(
          String.format(
              Locale.ROOT, "\"n%d\": [%s, %s, %s]", n, places[n][0], places[n][1], places[n][2]));
    }
    DMatrixRMaj k = new DMatrixRMaj(6 * NODES, 6 * NODES);
    StringBuilder members = new StringBuilder();
    StringBuilder sections = new StringBuilder();
    for (int a = 0; a < NODES; a++) {
      for (int b = a + 1; b < NODES; b++) {
        if (b != a + 1 && random.nextDouble() > 0.3) {
          continue;
        }
        double[] s = new double[6];
        for (int i = 0; i < 6; i++) {
          s[i] = 1 + random.nextDouble();
        }
        double[] p = {4e-3 * s[0], 2e-5 * s[1], 1e-5 * s[2], 1.5e-5 * s[3], 2e-3 * s[4], 1e-3 * s[5]};
        double[] reference = {random.nextGaussian(), random.nextGaussian(), random.nextGaussian()};
        add(k, a, b, places, p, reference);
        String comma = members.length() == 0 ? "" : ", ";
        sections.append(comma).append(
            String.format(
                Locale.ROOT,
                "\"s%d%d\": {\"A\": %s, \"Iy\": %s, \"Iz\": %s, \"J\": %s, \"Ay\": %s, \"Az\": %s}",
                a, b, p[0], p[1], p[2], p[3], p[4], p[5]));
        members.append(comma).append(
            String.format(
                Locale.ROOT,
                "\"m%d%d\": {\"nodes\": [\"n%d\", \"n%d\"], \"section\": \"s%d%d\", \"material\": \"m\","
                    + " \"reference\": [%s, %s, %s]}",
                a, b, a, b, a, b, reference[0], reference[1], reference[2]));
      }
    }
    double[] springs = new double[12];
    for (int i = 0; i < 12; i++) {
      springs[i] = (i % 6 < 3 ? 1e7 : 1e6) * (1 + random.nextDouble());
      k.add((i < 6 ? 0 : 6 * (NODES - 1)) + i % 6, (i < 6 ? 0 : 6 * (NODES - 1)) + i % 6, springs[i]);
    }
    FrameModel model =
        Frames.model(
            """
            {"units": {"length": "m", "force": "N", "mass": "kg", "angle": "rad"},
             "nodes": {%s}, "materials": {"m": {"E": 210e9, "G": 81e9}}, "sections": {%s},
             "members": {%s},
             "supports": {"n0": {%s}, "n8": {%s}}}
            """
                .formatted(nodes, sections, members, support(springs, 0), support(springs, 6)));
    List<Gauge> gauges = new ArrayList<>();
    List<Load> loads = new ArrayList<>();
    List<Integer> freedoms = new ArrayList<>();
    String[] directions = {"x", "y", "z", "rx", "ry", "rz"};
    for (int n = 1; n < NODES - 1; n++) {
      int c = random.nextInt(6);
      gauges.add(Frames.gauge("n" + n, directions[c]));
      loads.add(Frames.load("n" + n, directions[c]));
      freedoms.add(6 * n + c);
    }
    FlexibilitySolution solution = Frames.solve(model, gauges, loads);
    DMatrixRMaj inverse = new DMatrixRMaj(6 * NODES, 6 * NODES);
    assertThat(CommonOps_DDRM.invert(k, inverse)).isTrue();
    double[][] dense = new double[6 * NODES][6 * NODES];
    for (int i = 0; i < dense.length; i++) {
      for (int j = 0; j < dense.length; j++) {
        dense[i][j] = (k.get(i, j) + k.get(j, i)) / 2;
      }
    }
    var cholesky = new CholeskyDecomposer(1e-8, 0).decompose(new Array2DRowRealMatrix(dense));
    for (int l = 0; l < freedoms.size(); l++) {
      double[] unit = new double[dense.length];
      unit[freedoms.get(l)] = 1;
      double[] u = cholesky.solve(new ArrayRealVector(unit)).toArray();
      for (int g = 0; g < freedoms.size(); g++) {
        int i = freedoms.get(g);
        int j = freedoms.get(l);
        double size = Math.sqrt(inverse.get(i, i) * inverse.get(j, j));
        assertThat(solution.value(g, l)).isCloseTo(inverse.get(i, j), within(1e-9 * size));
        assertThat(solution.value(g, l)).isCloseTo(u[i], within(1e-9 * size));
      }
    }
  }

  private static String support(double[] springs, int from) {
    String[] keys = {"x", "y", "z", "rx", "ry", "rz"};
    StringBuilder text = new StringBuilder();
    for (int i = 0; i < 6; i++) {
      text.append(i == 0 ? "" : ", ").append("\"" + keys[i] + "\": " + springs[from + i]);
    }
    return text.toString();
  }

  /** Adds Tᵀ k T of one member; p is A, Iy, Iz, J, Ay, Az. */
  private static void add(
      DMatrixRMaj k, int a, int b, double[][] places, double[] p, double[] reference) {
    double[] x = new double[3];
    double l = 0;
    for (int i = 0; i < 3; i++) {
      x[i] = places[b][i] - places[a][i];
      l += x[i] * x[i];
    }
    l = Math.sqrt(l);
    double[] ex = {x[0] / l, x[1] / l, x[2] / l};
    double[] ey = unit(cross(reference, ex));
    double[] ez = cross(ex, ey);
    DMatrixRMaj t = new DMatrixRMaj(12, 12);
    for (int block = 0; block < 4; block++) {
      for (int i = 0; i < 3; i++) {
        t.set(3 * block, 3 * block + i, ex[i]);
        t.set(3 * block + 1, 3 * block + i, ey[i]);
        t.set(3 * block + 2, 3 * block + i, ez[i]);
      }
    }
    double e = 210e9;
    double g = 81e9;
    DMatrixRMaj local = new DMatrixRMaj(12, 12);
    pair(local, 0, 6, e * p[0] / l);
    pair(local, 3, 9, g * p[3] / l);
    bending(local, 1, 5, 1, e * p[2], g * p[4], l);
    bending(local, 2, 4, -1, e * p[1], g * p[5], l);
    DMatrixRMaj half = new DMatrixRMaj(12, 12);
    CommonOps_DDRM.mult(local, t, half);
    DMatrixRMaj global = new DMatrixRMaj(12, 12);
    CommonOps_DDRM.multTransA(t, half, global);
    for (int i = 0; i < 12; i++) {
      for (int j = 0; j < 12; j++) {
        k.add((i < 6 ? 6 * a : 6 * b) + i % 6, (j < 6 ? 6 * a : 6 * b) + j % 6, global.get(i, j));
      }
    }
  }

  private static void pair(DMatrixRMaj k, int i, int j, double value) {
    k.set(i, i, value);
    k.set(j, j, value);
    k.set(i, j, -value);
    k.set(j, i, -value);
  }

  private static void bending(
      DMatrixRMaj k, int shift, int turn, double sign, double ei, double gas, double l) {
    double phi = 12 * ei / (gas * l * l);
    double f = ei / (1 + phi);
    pair(k, shift, shift + 6, 12 * f / (l * l * l));
    k.set(turn, turn, (4 + phi) * f / l);
    k.set(turn + 6, turn + 6, (4 + phi) * f / l);
    both(k, turn, turn + 6, (2 - phi) * f / l);
    both(k, shift, turn, sign * 6 * f / (l * l));
    both(k, shift, turn + 6, sign * 6 * f / (l * l));
    both(k, shift + 6, turn, -sign * 6 * f / (l * l));
    both(k, shift + 6, turn + 6, -sign * 6 * f / (l * l));
  }

  private static void both(DMatrixRMaj k, int i, int j, double value) {
    k.set(i, j, value);
    k.set(j, i, value);
  }

  private static double[] cross(double[] a, double[] b) {
    return new double[] {
      a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]
    };
  }

  private static double[] unit(double[] v) {
    double n = Math.sqrt(v[0] * v[0] + v[1] * v[1] + v[2] * v[2]);
    return new double[] {v[0] / n, v[1] / n, v[2] / n};
  }
}
