package org.flexbound.sparse;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.math.BigDecimal;
import java.math.MathContext;
import org.junit.jupiter.api.Test;

class RefinementTest {
  @Test
  void anIllConditionedChainIsSolvedToTheLastDigits() {
    // Springs in series from 1e0 to 1e11, grounded at the first: the end moves by the sum of all compliances.
    int n = 12;
    int[][] blocks = new int[n][];
    for (int i = 0; i < n; i++) {
      blocks[i] = new int[] {i - 1, i};
    }
    double[] stiffness = new double[n];
    MathContext digits = MathContext.DECIMAL128;
    for (int i = 0; i < n; i++) {
      stiffness[i] = Math.pow(10, (i * 7) % 12) * (1 + i / 3.0);
    }
    SymmetricMatrix matrix = BlockAssembly.of(n, blocks).assemble((b, values) -> {
      values[0] = stiffness[b];
      values[1] = -stiffness[b];
      values[2] = -stiffness[b];
      values[3] = stiffness[b];
    });
    // The assembled diagonal is rounded: solve the rounded matrix exactly, by elimination from the end in decimal arithmetic.
    BigDecimal[] pivot = new BigDecimal[n];
    BigDecimal[] load = new BigDecimal[n];
    for (int i = n - 1; i >= 0; i--) {
      pivot[i] = new BigDecimal(matrix.get(i, i));
      load[i] = i == n - 1 ? BigDecimal.ONE : BigDecimal.ZERO;
      if (i < n - 1) {
        BigDecimal factor = new BigDecimal(matrix.get(i + 1, i)).divide(pivot[i + 1], digits);
        pivot[i] = pivot[i].subtract(factor.multiply(new BigDecimal(matrix.get(i + 1, i)), digits), digits);
        load[i] = load[i].subtract(factor.multiply(load[i + 1], digits), digits);
      }
    }
    double[] exact = new double[n];
    BigDecimal before = BigDecimal.ZERO;
    for (int i = 0; i < n; i++) {
      BigDecimal known = i == 0 ? BigDecimal.ZERO : new BigDecimal(matrix.get(i, i - 1)).multiply(before, digits);
      before = load[i].subtract(known, digits).divide(pivot[i], digits);
      exact[i] = before.doubleValue();
    }
    double[] rhs = new double[n];
    rhs[n - 1] = 1;
    NumericFactor factor = SymbolicFactor.analyze(matrix.pattern()).indefinite(matrix);
    RefinedSolution refined = new Refinement(30).solve(matrix, factor, rhs, 1);
    assertThat(refined.outcome(0)).isEqualTo(RefinedSolution.Outcome.SETTLED);
    for (int i = 0; i < n; i++) {
      assertThat(refined.solution()[i]).isCloseTo(exact[i], within(4 * Math.ulp(exact[i])));
    }
    assertThat(refined.backwardErrors()[0]).isLessThan(3e-16);
  }

  @Test
  void theSlenderBoomSettlesWhereThePlainSolutionHasFewDigits() {
    LatticeFrame frame = LatticeFrame.of(2, 2, 1500, true, true);
    int n = frame.stiffness.size();
    NumericFactor factor = SymbolicFactor.analyze(frame.stiffness.pattern(), frame.group, FactorSettings.defaults()).cholesky(frame.stiffness);
    double[] rhs = new double[n];
    rhs[n - 6] = 1;
    double[] plain = rhs.clone();
    factor.solve(plain, 1);
    RefinedSolution refined = new Refinement(20).solve(frame.stiffness, factor, rhs, 1);
    assertThat(refined.outcome(0)).isEqualTo(RefinedSolution.Outcome.SETTLED);
    assertThat(refined.steps(0)).isGreaterThan(1);
    // Another order of elimination rounds differently but must settle on the same digits.
    NumericFactor other = SymbolicFactor.analyze(frame.stiffness.pattern(), frame.group,
        FactorSettings.defaults().withOrdering(Ordering.nestedDissection(5))).cholesky(frame.stiffness);
    double[] again = new Refinement(20).solve(frame.stiffness, other, rhs, 1).solution();
    double tip = refined.solution()[n - 6];
    assertThat(again[n - 6]).isCloseTo(tip, within(4 * Math.ulp(tip)));
    assertThat(Math.abs(plain[n - 6] - tip)).isGreaterThan(1e-12 * Math.abs(tip));
  }

  @Test
  void severalColumnsAreRefinedEachByItself() {
    SymmetricMatrix matrix = SymmetricMatrix.ofDense(RandomMatrix.definite(30, 0.2, 2));
    NumericFactor factor = SymbolicFactor.analyze(matrix.pattern()).cholesky(matrix);
    double[] rhs = RandomMatrix.vector(90, 4);
    RefinedSolution refined = new Refinement(5).solve(matrix, factor, rhs, 3);
    assertThat(RandomMatrix.residual(matrix, refined.solution(), rhs, 3)).isLessThan(1e-15);
    assertThat(refined.columns()).isEqualTo(3);
  }
}
