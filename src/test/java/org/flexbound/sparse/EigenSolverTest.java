package org.flexbound.sparse;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class EigenSolverTest {
  @ParameterizedTest
  @CsvSource({"8, 15.957337, 124.492304", "12, 10.065282, 78.995088"})
  void frequenciesOfLatticesAreThoseOfAnIndependentProgram(int n, double first, double thirtieth) {
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
  void unknownsWithoutMassGiveNoEigenvalues() {
    SymmetricMatrix k = SymmetricMatrix.ofDense(new double[][] {{2, -1, 0}, {-1, 2, -1}, {0, -1, 1}});
    SymmetricMatrix m = SymmetricMatrix.ofDense(new double[][] {{0, 0, 0}, {0, 0, 0}, {0, 0, 3}});
    EigenPairs pairs = new EigenSolver().lowest(k, m, new int[] {0, 1, 2}, 2);
    assertThat(pairs.outcome()).isEqualTo(EigenPairs.Outcome.FEWER_EXIST);
    assertThat(pairs.values()).hasSize(1);
    // Three unit springs in series: 1/3, over the mass 3.
    assertThat(pairs.values()[0]).isCloseTo(1.0 / 9, within(1e-14));
  }

  private static double hertz(double value) {
    return Math.sqrt(value) / (2 * Math.PI);
  }
}
