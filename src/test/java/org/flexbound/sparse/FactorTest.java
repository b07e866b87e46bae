package org.flexbound.sparse;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.Arrays;
import java.util.Random;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.DMatrixSparseCSC;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.sparse.csc.CommonOps_DSCC;
import org.ejml.sparse.csc.factory.LinearSolverFactory_DSCC;
import org.ejml.sparse.FillReducing;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class FactorTest {
  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 5, 10, 40, 150, 260})
  void solutionsAgreeWithADenseSolver(int n) {
    for (double density : new double[] {0, 0.01, 0.05, 0.5, 1}) {
      double[][] dense = RandomMatrix.definite(n, density, n * 31L + (long) (density * 100));
      agreesWithDense(dense, 1);
    }
  }

  private static void agreesWithDense(double[][] dense, int columns) {
    int n = dense.length;
    SymmetricMatrix matrix = SymmetricMatrix.ofDense(dense);
    double[] rhs = RandomMatrix.vector(n * columns, 5);
    double[] x = rhs.clone();
    SymbolicFactor.analyze(matrix.pattern()).cholesky(matrix).solve(x, columns);
    double[] expected = denseSolution(dense, rhs, columns);
    for (int i = 0; i < n * columns; i++) {
      assertThat(x[i]).isCloseTo(expected[i], within(1e-11 * (1 + Math.abs(expected[i]))));
    }
  }

  private static double[] denseSolution(double[][] dense, double[] rhs, int columns) {
    int n = dense.length;
    DMatrixRMaj b = new DMatrixRMaj(n, columns);
    for (int c = 0; c < columns; c++) {
      for (int i = 0; i < n; i++) {
        b.set(i, c, rhs[c * n + i]);
      }
    }
    DMatrixRMaj expected = new DMatrixRMaj(n, columns);
    assertThat(CommonOps_DDRM.solve(new DMatrixRMaj(dense), b, expected)).isTrue();
    double[] x = new double[n * columns];
    for (int c = 0; c < columns; c++) {
      for (int i = 0; i < n; i++) {
        x[c * n + i] = expected.get(i, c);
      }
    }
    return x;
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 6, 7, 8, 23, 24, 25, 31, 50, 73})
  void anyNumberOfRightHandSidesIsSolved(int columns) {
    agreesWithDense(RandomMatrix.definite(70, 0.1, 3), columns);
  }

  @ParameterizedTest
  @CsvSource({"diagonal", "dense", "arrowDown", "arrowUp", "disconnected", "star of stars"})
  void specialShapesAreSolved(String shape) {
    int n = 120;
    double[][] a = new double[n][n];
    Random random = new Random(8);
    for (int i = 0; i < n; i++) {
      a[i][i] = 3 * n;
      for (int j = 0; j < i; j++) {
        boolean present = switch (shape) {
          case "diagonal" -> false;
          case "dense" -> true;
          case "arrowDown" -> i == n - 1;
          case "arrowUp" -> j == 0;
          case "disconnected" -> i / 7 == j / 7;
          default -> i % 10 == 0 ? j % 10 == 0 : i / 10 == j / 10 && j % 10 == 0;
        };
        if (present) {
          a[i][j] = random.nextGaussian();
          a[j][i] = a[i][j];
        }
      }
    }
    agreesWithDense(a, 3);
  }

  @Test
  void renumberingTheUnknownsRenumbersTheSolution() {
    int n = 90;
    double[][] a = RandomMatrix.definite(n, 0.06, 4);
    Integer[] shuffled = IntStream.range(0, n).boxed().toArray(Integer[]::new);
    java.util.Collections.shuffle(Arrays.asList(shuffled), new Random(2));
    double[][] renumbered = new double[n][n];
    double[] rhs = RandomMatrix.vector(n, 6);
    double[] moved = new double[n];
    for (int i = 0; i < n; i++) {
      moved[i] = rhs[shuffled[i]];
      for (int j = 0; j < n; j++) {
        renumbered[i][j] = a[shuffled[i]][shuffled[j]];
      }
    }
    solve(SymmetricMatrix.ofDense(a), rhs);
    solve(SymmetricMatrix.ofDense(renumbered), moved);
    for (int i = 0; i < n; i++) {
      assertThat(moved[i]).isCloseTo(rhs[shuffled[i]], within(1e-11 * (1 + Math.abs(moved[i]))));
    }
  }

  @Test
  void scalingByPowersOfTwoScalesTheSolutionToTheLastBit() {
    // Other units for translations and rotations scale rows and columns; the factor must do the same arithmetic.
    int n = 80;
    double[][] a = RandomMatrix.definite(n, 0.08, 14);
    double[][] scaled = new double[n][n];
    double[] factor = new double[n];
    for (int i = 0; i < n; i++) {
      factor[i] = i % 3 == 0 ? 0x1p20 : i % 3 == 1 ? 0x1p-30 : 1;
    }
    double[] rhs = RandomMatrix.vector(n, 7);
    double[] other = rhs.clone();
    for (int i = 0; i < n; i++) {
      other[i] *= factor[i];
      for (int j = 0; j < n; j++) {
        scaled[i][j] = a[i][j] * factor[i] * factor[j];
      }
    }
    solve(SymmetricMatrix.ofDense(a), rhs);
    solve(SymmetricMatrix.ofDense(scaled), other);
    for (int i = 0; i < n; i++) {
      assertThat(other[i] * factor[i]).isEqualTo(rhs[i]);
    }
  }

  private static void solve(SymmetricMatrix matrix, double[] rhs) {
    SymbolicFactor.analyze(matrix.pattern()).cholesky(matrix).solve(rhs, 1);
  }

  @ParameterizedTest
  @CsvSource({"4, 4, 5, false", "5, 4, 3, true", "2, 2, 30, true", "7, 7, 7, false"})
  void framesAgreeWithAnIndependentSparseFactor(int nx, int ny, int nz, boolean turned) {
    LatticeFrame frame = LatticeFrame.of(nx, ny, nz, turned, true);
    int n = frame.stiffness.size();
    DMatrixSparseCSC full = new DMatrixSparseCSC(n, n);
    int[] starts = frame.stiffness.pattern().columnStarts();
    int[] rows = frame.stiffness.pattern().rows();
    double[] values = frame.stiffness.values();
    org.ejml.data.DMatrixSparseTriplet triplets = new org.ejml.data.DMatrixSparseTriplet(n, n, 2 * rows.length);
    for (int j = 0; j < n; j++) {
      for (int p = starts[j]; p < starts[j + 1]; p++) {
        triplets.addItem(rows[p], j, values[p]);
        if (rows[p] != j) {
          triplets.addItem(j, rows[p], values[p]);
        }
      }
    }
    org.ejml.ops.DConvertMatrixStruct.convert(triplets, full);
    CommonOps_DSCC.removeZeros(full, 0);
    var reference = LinearSolverFactory_DSCC.cholesky(FillReducing.NONE);
    assertThat(reference.setA(full)).isTrue();
    DMatrixRMaj b = new DMatrixRMaj(n, 1);
    b.setData(RandomMatrix.vector(n, 9));
    DMatrixRMaj expected = new DMatrixRMaj(n, 1);
    reference.solve(b, expected);
    double[] x = b.getData().clone();
    SymbolicFactor.analyze(frame.stiffness.pattern(), frame.group, FactorSettings.defaults()).cholesky(frame.stiffness).solve(x, 1);
    double largest = Arrays.stream(x).map(Math::abs).max().orElseThrow();
    for (int i = 0; i < n; i++) {
      assertThat(x[i]).isCloseTo(expected.get(i), within(1e-9 * largest));
    }
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 100, 10_000, 100_000})
  void chainsOfAnyLengthAreSolved(int n) {
    SymmetricMatrix matrix = RandomMatrix.chain(n, n / 2, 21);
    double[] exact = RandomMatrix.vector(n, 3);
    double[] b = new double[n];
    matrix.multiply(exact, b, 1);
    double[] x = b.clone();
    solve(matrix, x);
    assertThat(RandomMatrix.residual(matrix, x, b, 1)).isLessThan(1e-9);
  }

  @Test
  void hundredThousandLooseUnknownsAreSolved() {
    int n = 100_000;
    int[][] blocks = new int[n][];
    for (int i = 0; i < n; i++) {
      blocks[i] = new int[] {i};
    }
    SymmetricMatrix matrix = BlockAssembly.of(n, blocks).assemble((block, values) -> values[0] = 2 + block % 3);
    double[] x = new double[n];
    Arrays.fill(x, 12);
    solve(matrix, x);
    for (int i = 0; i < n; i++) {
      assertThat(x[i]).isEqualTo(12.0 / (2 + i % 3));
    }
  }

  @Test
  @Tag("long")
  void aLatticeOfHundredThousandUnknownsIsSolved() {
    LatticeFrame frame = LatticeFrame.cube(26);
    double[] exact = RandomMatrix.vector(frame.stiffness.size(), 3);
    double[] b = new double[exact.length];
    frame.stiffness.multiply(exact, b, 1);
    double[] x = b.clone();
    SymbolicFactor.analyze(frame.stiffness.pattern(), frame.group, FactorSettings.defaults().withThreads(2)).cholesky(frame.stiffness)
        .solve(x, 1);
    assertThat(RandomMatrix.residual(frame.stiffness, x, b, 1)).isLessThan(1e-12);
  }

  @ParameterizedTest
  @CsvSource({"9, 9, 9", "2, 2, 400"})
  void theSameBytesComeOutForAnyNumberOfThreads(int nx, int ny, int nz) {
    LatticeFrame frame = LatticeFrame.of(nx, ny, nz, true, true);
    int n = frame.stiffness.size();
    double[] rhs = RandomMatrix.vector(n * 30, 11);
    double[] one = new double[0];
    for (int threads : new int[] {1, 2, 3, 7}) {
      SymbolicFactor symbolic = SymbolicFactor.analyze(frame.stiffness.pattern(), frame.group, FactorSettings.defaults().withThreads(threads));
      NumericFactor factor = symbolic.cholesky(frame.stiffness);
      double[] x = rhs.clone();
      factor.solve(x, 30);
      if (threads == 1) {
        one = x;
      } else {
        assertThat(Arrays.equals(x, one)).as("%d threads", threads).isTrue();
      }
    }
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5})
  void negativePivotsCountNegativeEigenvalues(long seed) {
    int n = 60;
    Random random = new Random(seed);
    double[][] a = RandomMatrix.definite(n, 0.07, seed);
    // A congruence keeps the inertia: S A S + change of sign on some diagonal entries of a diagonal matrix would be known exactly.
    double[][] l = new double[n][n];
    int negative = 0;
    double[] d = new double[n];
    for (int i = 0; i < n; i++) {
      d[i] = (random.nextBoolean() ? 1 : -1) * (0.5 + random.nextDouble());
      negative += d[i] < 0 ? 1 : 0;
      for (int j = 0; j < i; j++) {
        l[i][j] = a[i][j] / 4;
      }
      l[i][i] = 1;
    }
    double[][] b = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        for (int k = 0; k < n; k++) {
          b[i][j] += l[i][k] * d[k] * l[j][k];
        }
      }
    }
    SymmetricMatrix matrix = SymmetricMatrix.ofDense(b);
    NumericFactor factor = SymbolicFactor.analyze(matrix.pattern()).indefinite(matrix);
    assertThat(factor.negativePivots()).isEqualTo(negative);
    double[] exact = RandomMatrix.vector(n, 1);
    double[] rhs = new double[n];
    matrix.multiply(exact, rhs, 1);
    double[] x = rhs.clone();
    factor.solve(x, 1);
    assertThat(RandomMatrix.residual(matrix, x, rhs, 1)).isLessThan(1e-8);
  }

  @Test
  void aShiftedPencilCountsTheEigenvaluesBelow() {
    // A chain of n unit springs and masses, one end fixed: eigenvalues 4 sin²((2k - 1) pi / (2 (2n + 1))).
    int n = 40;
    SymmetricMatrix k = RandomMatrix.chain(n, 0, 0);
    double[][] unit = new double[n][n];
    for (int i = 0; i < n; i++) {
      unit[i][i] = 1;
    }
    SymmetricMatrix m = SymmetricMatrix.ofDense(unit);
    SymbolicFactor symbolic = SymbolicFactor.analyze(k.pattern());
    for (int count = 1; count < n; count++) {
      double at = (chainEigenvalue(n, count) + chainEigenvalue(n, count + 1)) / 2;
      assertThat(symbolic.shifted(k, at, m).negativePivots()).isEqualTo(count);
    }
  }

  private static double chainEigenvalue(int n, int k) {
    double s = Math.sin((2 * k - 1) * Math.PI / (2 * (2 * n + 1)));
    return 4 * s * s;
  }

  @Test
  void aMechanismIsNamedByItsUnknown() {
    SymmetricMatrix matrix = SymmetricMatrix.ofDense(new double[][] {{1e9, 0, 0}, {0, 2, -2}, {0, -2, 2}});
    PivotBreakdownException e = assertThrows(PivotBreakdownException.class,
        () -> SymbolicFactor.analyze(matrix.pattern()).cholesky(matrix));
    assertThat(e.unknown()).isIn(1, 2);
    assertThat(e.diagonal()).isEqualTo(2);
    assertThat(e.pivot()).isEqualTo(0);
    assertThat(e.limit()).isEqualTo(FactorSettings.DEFAULT_PIVOT_LIMIT);
    assertThat(e).hasMessageContaining("unknown " + e.unknown());
  }

  @ParameterizedTest
  @ValueSource(doubles = {1, 1e-12, 1e15})
  void whatIsSingularDoesNotDependOnUnits(double unit) {
    double soft = 1e-8;
    SymmetricMatrix sound = SymmetricMatrix.ofDense(new double[][] {{(1 + soft) * unit, -unit}, {-unit, unit}});
    NumericFactor factor = SymbolicFactor.analyze(sound.pattern()).cholesky(sound);
    assertThat(factor.leastPivotRatio()).isCloseTo(soft, within(soft / 100));
    double none = 1e-14;
    SymmetricMatrix singular = SymmetricMatrix.ofDense(new double[][] {{(1 + none) * unit, -unit}, {-unit, unit}});
    assertThrows(PivotBreakdownException.class, () -> SymbolicFactor.analyze(singular.pattern()).cholesky(singular));
  }

  @Test
  void aFreeFrameBreaksDownAtTheSameUnknownForAnyNumberOfThreads() {
    LatticeFrame frame = LatticeFrame.of(8, 8, 8, false, false);
    int[] named = new int[2];
    for (int t = 0; t < 2; t++) {
      SymbolicFactor symbolic = SymbolicFactor.analyze(frame.stiffness.pattern(), frame.group, FactorSettings.defaults().withThreads(1 + t));
      named[t] = assertThrows(PivotBreakdownException.class, () -> symbolic.cholesky(frame.stiffness)).unknown();
    }
    assertThat(named[0]).isEqualTo(named[1]);
  }

  @Test
  void aNegativePivotIsNotPositiveDefinite() {
    SymmetricMatrix matrix = SymmetricMatrix.ofDense(new double[][] {{1, 2}, {2, 1}});
    PivotBreakdownException e = assertThrows(PivotBreakdownException.class,
        () -> SymbolicFactor.analyze(matrix.pattern()).cholesky(matrix));
    assertThat(e.pivot()).isEqualTo(-3);
    assertThat(SymbolicFactor.analyze(matrix.pattern()).indefinite(matrix).negativePivots()).isEqualTo(1);
  }

  @Test
  void numbersThatAreNoneBreakDown() {
    SymmetricMatrix matrix = SymmetricMatrix.ofDense(new double[][] {{1, 0}, {0, Double.NaN}});
    assertThat(assertThrows(PivotBreakdownException.class, () -> SymbolicFactor.analyze(matrix.pattern()).cholesky(matrix)).unknown())
        .isEqualTo(1);
  }

  @Test
  void anotherPatternIsRefused() {
    SymmetricMatrix one = SymmetricMatrix.ofDense(new double[][] {{1, 0}, {0, 1}});
    SymmetricMatrix other = SymmetricMatrix.ofDense(new double[][] {{2, 1}, {1, 2}});
    assertThat(assertThrows(IllegalArgumentException.class, () -> SymbolicFactor.analyze(one.pattern()).cholesky(other)))
        .hasMessageContaining("another pattern");
  }

  @Test
  void aMatrixWithoutUnknownsHasAnEmptySolution() {
    SymmetricMatrix nothing = SymmetricMatrix.ofDense(new double[0][0]);
    NumericFactor factor = SymbolicFactor.analyze(nothing.pattern()).cholesky(nothing);
    factor.solve(new double[0], 3);
    assertThat(factor.negativePivots()).isZero();
  }
}
