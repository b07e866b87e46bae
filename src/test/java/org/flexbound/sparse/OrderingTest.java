package org.flexbound.sparse;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class OrderingTest {
  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
  void everyOrderingGivesEachVertexOnce(long seed) {
    Random random = new Random(seed);
    int n = 1 + random.nextInt(700);
    double density = random.nextDouble() * 4 / n;
    SparsePattern pattern = SymmetricMatrix.ofDense(RandomMatrix.definite(n, density, seed)).pattern();
    int groups = 1 + random.nextInt(n);
    int[] group = new int[n];
    for (int i = 0; i < n; i++) {
      group[i] = i < groups ? i : random.nextInt(groups);
    }
    Graph graph = Graph.of(pattern, group, groups);
    for (Ordering ordering : new Ordering[] {Ordering.minimumDegree(), Ordering.nestedDissection(seed), Ordering.leastWork()}) {
      int[] order = ordering.order(graph);
      assertThat(ordering.order(graph)).as("again").containsExactly(order);
      int[] sorted = order.clone();
      Arrays.sort(sorted);
      for (int v = 0; v < groups; v++) {
        assertThat(sorted[v]).isEqualTo(v);
      }
    }
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6})
  void countedEntriesAreThoseOfPlainElimination(long seed) {
    int n = 5 + (int) seed * 20;
    SymmetricMatrix matrix = SymmetricMatrix.ofDense(RandomMatrix.definite(n, 3.0 / n, seed));
    SymbolicFactor symbolic = SymbolicFactor.analyze(matrix.pattern());
    int[] order = symbolic.order();
    boolean[][] filled = new boolean[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        filled[i][j] = matrix.pattern().position(order[i], order[j]) >= 0;
      }
    }
    long entries = 0;
    double operations = 0;
    for (int k = 0; k < n; k++) {
      int count = 0;
      for (int i = k; i < n; i++) {
        count += filled[i][k] ? 1 : 0;
        for (int j = k + 1; j < n; j++) {
          filled[i][j] |= filled[i][k] && filled[j][k];
        }
      }
      entries += count;
      operations += (double) count * count;
    }
    assertThat(symbolic.nonzeros()).isEqualTo(entries);
    assertThat(symbolic.operations()).isEqualTo(operations);
    assertThat(symbolic.storedNumbers()).isGreaterThanOrEqualTo(entries);
  }

  /** Reference: the best of four orders (minimum degree and METIS, on nodes and on unknowns) of a well-known native library, 10⁶ entries. */
  @ParameterizedTest
  @CsvSource({"n12, 1.79", "n16, 8.46", "boom, 2.25", "boomr, 2.68"})
  void fillIsWithinFifteenPerCentOfTheBestNativeOrder(String name, double reference) {
    checkFill(name, reference);
  }

  @Tag("long")
  @ParameterizedTest
  @CsvSource({"n20, 23.5", "n20r, 24.0", "n26, 71.3", "n26r, 72.6"})
  void fillOfLargeLatticesIsWithinFifteenPerCentOfTheBestNativeOrder(String name, double reference) {
    checkFill(name, reference);
  }

  private static void checkFill(String name, double reference) {
    LatticeFrame frame = LatticeFrame.named(name);
    SymbolicFactor symbolic = SymbolicFactor.analyze(frame.stiffness.pattern(), frame.group, FactorSettings.defaults());
    assertThat(symbolic.nonzeros()).isLessThan((long) (1.15e6 * reference));
    assertThat(symbolic.peakNumbers()).as("numbers held at once").isLessThan((long) (1.5 * symbolic.nonzeros()));
  }
}
