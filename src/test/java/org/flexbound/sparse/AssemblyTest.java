package org.flexbound.sparse;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class AssemblyTest {
  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4})
  void blocksAddUpToTheDenseSum(long seed) {
    Random random = new Random(seed);
    int n = 12;
    int[][] blocks = new int[15][];
    double[][][] values = new double[15][][];
    double[][] sum = new double[n][n];
    for (int b = 0; b < blocks.length; b++) {
      int m = random.nextInt(6);
      blocks[b] = new int[m];
      values[b] = new double[m][m];
      for (int r = 0; r < m; r++) {
        blocks[b][r] = random.nextInt(n + 3) - 3;
        blocks[b][r] = Math.max(-1, blocks[b][r]);
        for (int c = 0; c <= r; c++) {
          values[b][r][c] = random.nextGaussian();
          values[b][c][r] = values[b][r][c];
        }
      }
      for (int r = 0; r < m; r++) {
        for (int c = 0; c < m; c++) {
          if (blocks[b][r] >= 0 && blocks[b][c] >= 0) {
            sum[blocks[b][r]][blocks[b][c]] += values[b][r][c];
          }
        }
      }
    }
    SymmetricMatrix matrix = BlockAssembly.of(n, blocks).assemble((b, target) -> {
      for (int r = 0; r < values[b].length; r++) {
        System.arraycopy(values[b][r], 0, target, r * values[b].length, values[b].length);
      }
    });
    double[] x = RandomMatrix.vector(2 * n, seed);
    double[] y = new double[2 * n];
    matrix.multiply(x, y, 2);
    for (int i = 0; i < n; i++) {
      double[] row = new double[2];
      for (int j = 0; j < n; j++) {
        assertThat(matrix.get(i, j)).isCloseTo(sum[i][j], within(1e-14));
        row[0] += sum[i][j] * x[j];
        row[1] += sum[i][j] * x[n + j];
      }
      assertThat(y[i]).isCloseTo(row[0], within(1e-13));
      assertThat(y[n + i]).isCloseTo(row[1], within(1e-13));
      assertThat(matrix.diagonal()[i]).isCloseTo(sum[i][i], within(1e-14));
    }
  }

  @Test
  void unknownsOutOfRangeAreRefused() {
    assertThat(assertThrows(IllegalArgumentException.class, () -> BlockAssembly.of(2, new int[][] {{0, 1}, {1, 2}})))
        .hasMessage("block 1 names unknown 2 of 2");
  }

  @Test
  void sumsLieOnTheUnionOfBothPatterns() {
    SymmetricMatrix a = SymmetricMatrix.ofDense(new double[][] {{1, 2, 0}, {2, 3, 0}, {0, 0, 4}});
    SymmetricMatrix b = SymmetricMatrix.ofDense(new double[][] {{5, 0, 6}, {0, 7, 0}, {6, 0, 8}});
    assertThat(a.plus(-2, b)).isEqualTo(SymmetricMatrix.ofDense(new double[][] {{-9, 2, -12}, {2, -11, 0}, {-12, 0, -12}}));
    assertThat(a.plus(1, a).pattern()).isSameAs(a.pattern());
    assertThat(a.on(a.plus(1, b).pattern()).get(2, 0)).isZero();
    assertThat(assertThrows(IllegalArgumentException.class, () -> a.on(b.pattern()))).hasMessage("entry (1, 0) is not in the pattern");
  }

  @Test
  void malformedPatternsAreRefused() {
    assertThrows(IllegalArgumentException.class, () -> SparsePattern.of(new int[] {0, 1}, new int[] {0, 1}));
    assertThat(assertThrows(IllegalArgumentException.class, () -> SparsePattern.of(new int[] {0, 1, 2}, new int[] {1, 1})))
        .hasMessage("column 0 must begin with its diagonal entry");
    assertThat(assertThrows(IllegalArgumentException.class, () -> SparsePattern.of(new int[] {0, 3, 4, 5}, new int[] {0, 2, 1, 1, 2})))
        .hasMessage("rows of column 0 must ascend and stay below 3");
  }

  @Test
  void valuesOfAnotherNumberAreRefused() {
    SparsePattern pattern = SparsePattern.of(new int[] {0, 2, 3}, new int[] {0, 1, 1});
    assertThat(assertThrows(IllegalArgumentException.class, () -> SymmetricMatrix.of(pattern, new double[2])))
        .hasMessage("2 values for 3 entries");
  }
}
