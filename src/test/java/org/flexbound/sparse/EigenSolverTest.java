package org.flexbound.sparse;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.Arrays;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class EigenSolverTest {
  /** Frequencies in Hz by an independent program. */
  @ParameterizedTest
  @CsvSource({"8, 15.957337, 124.492304", "12, 10.065282, 78.995088"})
  void frequenciesOfLatticesAreThoseOfAnIndependentProgram(int n, double first, double thirtieth) {
    checkFrequencies(n, first, thirtieth);
  }

  @Tag("long")
  @ParameterizedTest
  @CsvSource({"16, 7.348707, 57.876786", "20, 5.785748, 45.629075"})
  void frequenciesOfLargeLatticesAreThoseOfAnIndependentProgram(int n, double first, double thirtieth) {
    checkFrequencies(n, first, thirtieth);
  }

  private static void checkFrequencies(int n, double first, double thirtieth) {
    LatticeFrame frame = LatticeFrame.cube(n);
    EigenPairs pairs = new EigenSolver().lowest(frame.stiffness, frame.mass, frame.group, 30);
    assertThat(pairs.outcome()).isEqualTo(EigenPairs.Outcome.COMPLETE);
    assertThat(hertz(pairs.values()[0])).isCloseTo(first, within(1e-6));
    assertThat(hertz(pairs.values()[29])).isCloseTo(thirtieth, within(1e-6));
    assertThat(pairs.countedBelow()).isGreaterThanOrEqualTo(30);
    assertThat(pairs.orthogonality()).isLessThan(1e-10);
    for (double residual : pairs.residuals()) {
      assertThat(residual).isLessThan(1e-6);
    }
  }

  private static double hertz(double value) {
    return Math.sqrt(value) / (2 * Math.PI);
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6})
  void pairsAgreeWithADenseSolver(long seed) {
    int n = 10 + (int) seed * 17;
    double[][] k = RandomMatrix.definite(n, 5.0 / n, seed);
    double[][] m = RandomMatrix.definite(n, 2.0 / n, seed + 100);
    int count = Math.min(n, 3 + (int) seed);
    EigenPairs pairs = new EigenSolver().lowest(SymmetricMatrix.ofDense(k), SymmetricMatrix.ofDense(m), RandomMatrix.alone(n), count);
    double[] expected = denseEigenvalues(k, m);
    assertThat(pairs.outcome()).isEqualTo(EigenPairs.Outcome.COMPLETE);
    for (int i = 0; i < count; i++) {
      assertThat(pairs.values()[i]).isCloseTo(expected[i], within(1e-9 * expected[i]));
      assertThat(pairs.residuals()[i]).isLessThan(1e-8);
    }
    assertThat(pairs.orthogonality()).isLessThan(1e-10);
  }

  private static double[] denseEigenvalues(double[][] k, double[][] m) {
    int n = k.length;
    var cholesky = DecompositionFactory_DDRM.chol(n, true);
    assertThat(cholesky.decompose(new DMatrixRMaj(m))).isTrue();
    DMatrixRMaj l = cholesky.getT(null);
    DMatrixRMaj inverse = new DMatrixRMaj(n, n);
    assertThat(CommonOps_DDRM.invert(l, inverse)).isTrue();
    DMatrixRMaj half = new DMatrixRMaj(n, n);
    DMatrixRMaj whole = new DMatrixRMaj(n, n);
    CommonOps_DDRM.mult(inverse, new DMatrixRMaj(k), half);
    CommonOps_DDRM.multTransB(half, inverse, whole);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < i; j++) {
        whole.set(j, i, whole.get(i, j));
      }
    }
    var eigen = DecompositionFactory_DDRM.eig(n, false, true);
    assertThat(eigen.decompose(whole)).isTrue();
    double[] values = new double[n];
    for (int i = 0; i < n; i++) {
      values[i] = eigen.getEigenvalue(i).getReal();
    }
    Arrays.sort(values);
    return values;
  }

  @Test
  void eigenvaluesRepeatedMoreOftenThanTheBlockIsWideAreAllFound() {
    // Twelve equal chains of five, each grounded: every eigenvalue twelve times.
    int chains = 12;
    int length = 5;
    int[][] blocks = new int[chains * length][];
    for (int i = 0; i < blocks.length; i++) {
      blocks[i] = new int[] {i % length == 0 ? -1 : i - 1, i};
    }
    int n = blocks.length;
    SymmetricMatrix k = BlockAssembly.of(n, blocks).assemble((b, v) -> {
      v[0] = 1;
      v[1] = -1;
      v[2] = -1;
      v[3] = 1;
    });
    int[][] points = new int[n][];
    for (int i = 0; i < n; i++) {
      points[i] = new int[] {i};
    }
    SymmetricMatrix m = BlockAssembly.of(n, points).assemble((b, v) -> v[0] = 1);
    EigenPairs pairs = new EigenSolver(EigenSettings.defaults().withBlockSize(4), FactorSettings.defaults()).lowest(k, m,
        RandomMatrix.alone(n), 30);
    assertThat(pairs.outcome()).isEqualTo(EigenPairs.Outcome.COMPLETE);
    for (int i = 0; i < 30; i++) {
      double s = Math.sin((2 * (i / chains) + 1) * Math.PI / (2 * (2 * length + 1)));
      assertThat(pairs.values()[i]).isCloseTo(4 * s * s, within(1e-10));
    }
    assertThat(pairs.orthogonality()).isLessThan(1e-10);
  }

  @Test
  void aFreeStructureHasSixMotionsWithoutStrain() {
    LatticeFrame frame = LatticeFrame.of(3, 3, 3, true, false);
    EigenPairs pairs = new EigenSolver().lowest(frame.stiffness, frame.mass, frame.group, 8);
    assertThat(pairs.outcome()).isEqualTo(EigenPairs.Outcome.COMPLETE);
    assertThat(pairs.shift()).isNegative();
    for (int i = 0; i < 6; i++) {
      assertThat(Math.abs(pairs.values()[i])).isLessThan(1e-6 * pairs.values()[6]);
    }
    assertThat(pairs.values()[6]).isGreaterThan(1);
  }

  @Test
  void aNegativeEigenvalueIsFoundFromAShiftBelowIt() {
    SymmetricMatrix k = SymmetricMatrix.ofDense(new double[][] {{-5, 0, 0}, {0, 2, 1}, {0, 1, 2}});
    SymmetricMatrix m = SymmetricMatrix.ofDense(new double[][] {{1, 0, 0}, {0, 1, 0}, {0, 0, 1}});
    EigenPairs pairs = new EigenSolver().lowest(k, m, RandomMatrix.alone(3), 3);
    assertThat(pairs.values()[0]).isCloseTo(-5, within(1e-9));
    assertThat(pairs.values()[1]).isCloseTo(1, within(1e-9));
    assertThat(pairs.values()[2]).isCloseTo(3, within(1e-9));
  }

  @Test
  void unknownsWithoutMassGiveNoEigenvalues() {
    SymmetricMatrix k = SymmetricMatrix.ofDense(new double[][] {{2, -1, 0}, {-1, 2, -1}, {0, -1, 1}});
    SymmetricMatrix m = SymmetricMatrix.ofDense(new double[][] {{0, 0, 0}, {0, 0, 0}, {0, 0, 3}});
    EigenPairs pairs = new EigenSolver().lowest(k, m, new int[] {0, 1, 2}, 2);
    assertThat(pairs.outcome()).isEqualTo(EigenPairs.Outcome.FEWER_EXIST);
    assertThat(pairs.values()).hasSize(1);
    // Three unit springs in series: 1/3, over the mass 3.
    assertThat(pairs.values()[0]).isCloseTo(1.0 / 9, within(1e-14));
  }

  @Test
  void manyUnknownsWithoutMassAreCarriedAlong() {
    // Mass at every third unknown of a random structure: the finite eigenvalues are those of the condensed problem.
    int n = 60;
    double[][] k = RandomMatrix.definite(n, 0.06, 12);
    double[][] m = new double[n][n];
    Random random = new Random(4);
    int[] heavy = new int[n / 3];
    for (int i = 0; i < heavy.length; i++) {
      heavy[i] = 3 * i;
      m[3 * i][3 * i] = 0.5 + random.nextDouble();
    }
    EigenPairs pairs = new EigenSolver().lowest(SymmetricMatrix.ofDense(k), SymmetricMatrix.ofDense(m), RandomMatrix.alone(n), 10);
    // Flexibility of the heavy unknowns, inverted: the condensed stiffness.
    DMatrixRMaj inverse = new DMatrixRMaj(n, n);
    assertThat(CommonOps_DDRM.invert(new DMatrixRMaj(k), inverse)).isTrue();
    double[][] flexibility = new double[heavy.length][heavy.length];
    double[][] mass = new double[heavy.length][heavy.length];
    for (int i = 0; i < heavy.length; i++) {
      mass[i][i] = m[heavy[i]][heavy[i]];
      for (int j = 0; j < heavy.length; j++) {
        flexibility[i][j] = inverse.get(heavy[i], heavy[j]);
      }
    }
    DMatrixRMaj condensed = new DMatrixRMaj(heavy.length, heavy.length);
    assertThat(CommonOps_DDRM.invert(new DMatrixRMaj(flexibility), condensed)).isTrue();
    double[][] stiffness = new double[heavy.length][heavy.length];
    for (int i = 0; i < heavy.length; i++) {
      for (int j = 0; j < heavy.length; j++) {
        stiffness[i][j] = (condensed.get(i, j) + condensed.get(j, i)) / 2;
      }
    }
    double[] expected = denseEigenvalues(stiffness, mass);
    for (int i = 0; i < 10; i++) {
      assertThat(pairs.values()[i]).isCloseTo(expected[i], within(1e-9 * expected[i]));
    }
  }

  @Test
  void aBasisTooSmallSaysSo() {
    LatticeFrame frame = LatticeFrame.of(4, 4, 4, false, true);
    EigenPairs pairs = new EigenSolver(EigenSettings.defaults().withLargestBasis(1).withBlockSize(2).withTolerance(1e-14),
        FactorSettings.defaults()).lowest(frame.stiffness, frame.mass, frame.group, 20);
    assertThat(pairs.outcome()).isEqualTo(EigenPairs.Outcome.BASIS_FULL);
    assertThat(pairs.count()).isLessThan(20);
  }

  @Test
  void aSharedNullVectorIsABreakdown() {
    SymmetricMatrix k = SymmetricMatrix.ofDense(new double[][] {{1, 0}, {0, 0}});
    SymmetricMatrix m = SymmetricMatrix.ofDense(new double[][] {{1, 0}, {0, 0}});
    assertThat(assertThrows(PivotBreakdownException.class, () -> new EigenSolver().lowest(k, m, new int[] {0, 1}, 1)).unknown()).isEqualTo(1);
  }
}
