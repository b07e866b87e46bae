package org.flexbound.sparse;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.Random;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.junit.jupiter.api.Test;

class FactorTest {
  static double[][] randomDefinite(int n, double density, long seed) {
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

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 5, 10, 40, 150})
  void solutionsAgreeWithADenseSolver(int n) {
    for (double density : new double[] {0, 0.02, 0.1, 0.5, 1}) {
      double[][] dense = randomDefinite(n, density, n * 31L + (long) (density * 100));
      NumericFactor factor = SymbolicFactor.analyze(SymmetricMatrix.ofDense(dense).pattern()).cholesky(SymmetricMatrix.ofDense(dense));
      double[] rhs = new Random(5).doubles(3L * n, -1, 1).toArray();
      double[] x = rhs.clone();
      factor.solve(x, 3);
      for (int c = 0; c < 3; c++) {
        DMatrixRMaj b = new DMatrixRMaj(n, 1);
        System.arraycopy(rhs, c * n, b.data, 0, n);
        DMatrixRMaj expected = new DMatrixRMaj(n, 1);
        assertThat(CommonOps_DDRM.solve(new DMatrixRMaj(dense), b, expected)).isTrue();
        for (int i = 0; i < n; i++) {
          assertThat(x[c * n + i]).isCloseTo(expected.get(i), within(1e-10));
        }
      }
    }
  }

  @Test
  void aMechanismIsNamedByItsUnknown() {
    SymmetricMatrix matrix = SymmetricMatrix.ofDense(new double[][] {{1e9, 0, 0}, {0, 2, -2}, {0, -2, 2}});
    PivotBreakdownException e = assertThrows(PivotBreakdownException.class,
        () -> SymbolicFactor.analyze(matrix.pattern()).cholesky(matrix));
    assertThat(e.unknown()).isIn(1, 2);
    assertThat(e.diagonal()).isEqualTo(2);
    assertThat(e.pivot()).isEqualTo(0);
  }
}
