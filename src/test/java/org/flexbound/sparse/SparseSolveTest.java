package org.flexbound.sparse;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class SparseSolveTest {
  @ParameterizedTest
  @CsvSource({"1, 1", "3, 5", "10, 40", "50, 7"})
  void wantedRowsAgreeWithTheWholeSolution(int columns, int gauges) {
    LatticeFrame frame = LatticeFrame.of(6, 5, 4, true, true);
    int n = frame.stiffness.size();
    NumericFactor factor = SymbolicFactor.analyze(frame.stiffness.pattern(), frame.group, FactorSettings.defaults()).cholesky(frame.stiffness);
    Random random = new Random(columns);
    int[] starts = new int[columns + 1];
    int[] rows = new int[3 * columns];
    double[] values = new double[3 * columns];
    for (int c = 0; c < columns; c++) {
      starts[c + 1] = 3 * c + 3;
      for (int p = 3 * c; p < 3 * c + 3; p++) {
        rows[p] = random.nextInt(n);
        values[p] = random.nextGaussian();
      }
    }
    SparseColumns loads = new SparseColumns(n, starts, rows, values);
    int[] wanted = random.ints(gauges, 0, n).toArray();
    double[] some = factor.solve(loads, wanted);
    double[] all = loads.dense();
    factor.solve(all, columns);
    for (int c = 0; c < columns; c++) {
      for (int w = 0; w < gauges; w++) {
        double expected = all[c * n + wanted[w]];
        assertThat(some[c * gauges + w]).isCloseTo(expected, within(1e-12 * Math.abs(expected) + 1e-22));
      }
    }
  }

  @Test
  void flexibilityIsReciprocal() {
    LatticeFrame frame = LatticeFrame.of(4, 4, 6, true, true);
    int n = frame.stiffness.size();
    NumericFactor factor = SymbolicFactor.analyze(frame.stiffness.pattern(), frame.group, FactorSettings.defaults()).cholesky(frame.stiffness);
    int[] points = new Random(1).ints(20, 0, n).distinct().toArray();
    double[] g = factor.solve(SparseColumns.units(n, points), points);
    int m = points.length;
    for (int i = 0; i < m; i++) {
      for (int j = 0; j < i; j++) {
        assertThat(g[i * m + j]).isCloseTo(g[j * m + i], within(1e-12 * Math.sqrt(g[i * m + i] * g[j * m + j])));
      }
    }
  }

  @Test
  void noLoadsAndNoGaugesGiveNothing() {
    SymmetricMatrix matrix = SymmetricMatrix.ofDense(new double[][] {{2}});
    NumericFactor factor = SymbolicFactor.analyze(matrix.pattern()).cholesky(matrix);
    assertThat(factor.solve(SparseColumns.units(1), new int[] {0})).isEmpty();
    assertThat(factor.solve(SparseColumns.units(1, 0), new int[0])).isEmpty();
    assertThat(factor.solve(SparseColumns.units(1, 0), new int[] {0, 0})).containsExactly(0.5, 0.5);
  }

  @Test
  void rowsThatDoNotExistAreRefused() {
    SymmetricMatrix matrix = SymmetricMatrix.ofDense(new double[][] {{2}});
    NumericFactor factor = SymbolicFactor.analyze(matrix.pattern()).cholesky(matrix);
    assertThat(assertThrows(IllegalArgumentException.class, () -> factor.solve(SparseColumns.units(1, 0), new int[] {1})))
        .hasMessage("wanted row 1 is not from 0 to 0");
    assertThat(assertThrows(IllegalArgumentException.class, () -> SparseColumns.units(3, 3))).hasMessage("row 3 is not from 0 to 2");
    assertThat(assertThrows(IllegalArgumentException.class, () -> factor.solve(SparseColumns.units(2, 0), new int[] {0})))
        .hasMessage("right-hand sides have 2 rows, the matrix 1");
  }
}
