package org.flexbound.flexibility;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.SplittableRandom;
import org.flexbound.finding.Where;
import org.flexbound.setup.Direction;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.setup.LoadPoint;
import org.flexbound.setup.Part;
import org.flexbound.setup.Placing;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;
import org.junit.jupiter.api.Test;

class MatrixChecksTest {
  private static final double SCATTER = 0.002;
  private static final double DEGREES = 24;

  /**
   * Flexibility of a cantilever at four points along it: a²(3b − a)/6EI, a the smaller distance from
   * the root (Timoshenko, Strength of Materials I), EI = 1.
   */
  private static double[][] cantilever(int n) {
    double[][] matrix = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        double a = 1 + Math.min(i, j);
        double b = 1 + Math.max(i, j);
        matrix[i][j] = a * a * (3 * b - a) / 6;
      }
    }
    return matrix;
  }

  private static Station node(int k) {
    return new Station.AtNode("n" + k, Vector.ZERO);
  }

  private static Gauge gauge(int k, Direction direction) {
    return new Gauge(
        "G" + k, GaugeKind.DISPLACEMENT, node(k), Optional.empty(), Optional.empty(), direction,
        Optional.empty(), Part.ARTICLE, Part.GROUND, false, Optional.empty(), Placing.UNSTATED, "",
        Where.cells("log", "Gauges", "A" + k));
  }

  private static Load load(String name, int node, Direction direction) {
    return new Load(
        name,
        List.of(new LoadPoint(node(node), Optional.empty(), direction, 1, Placing.UNSTATED)),
        Optional.empty(), OptionalDouble.empty(), "", Where.nowhere());
  }

  private static MeasuredFlexibility measured(
      double[][] matrix, double scatter, double cell, long seed) {
    Direction down = Direction.along(new Vector(0, 0, -1));
    SplittableRandom random = new SplittableRandom(seed);
    List<Gauge> gauges = new ArrayList<>();
    List<Load> loads = new ArrayList<>();
    List<AbsoluteCoefficient> absolute = new ArrayList<>();
    List<Coefficient> coefficients = new ArrayList<>();
    double gain = 1 + cell * random.nextGaussian();
    for (int i = 0; i < matrix.length; i++) {
      gauges.add(gauge(i, down));
    }
    for (int j = 0; j < matrix[0].length; j++) {
      loads.add(load("P" + j, j, down));
    }
    for (int i = 0; i < matrix.length; i++) {
      for (int j = 0; j < matrix[i].length; j++) {
        double u = scatter * Math.abs(matrix[i][j]);
        double value = gain * matrix[i][j] + u * random.nextGaussian();
        absolute.add(new AbsoluteCoefficient(i, j, value, u, 0, cell > 0 ? List.of(0) : List.of(), 3));
        coefficients.add(new Coefficient(i, j, value, u, DEGREES));
      }
    }
    return new MeasuredFlexibility(
        "made", gauges, loads, absolute,
        cell > 0 ? List.of(new Gain("cell", "cell", cell)) : List.of(),
        scatter > 0 ? DEGREES : Double.POSITIVE_INFINITY,
        LinearMap.identity(absolute.size()), coefficients);
  }

  private static MatrixChecks check(double[][] matrix) {
    return MatrixChecks.of(measured(matrix, SCATTER, 0.01, 5), s -> Optional.empty(), 3);
  }

  private static boolean broken(MatrixChecks checks) {
    return checks.reciprocity().pairs().stream().anyMatch(ReciprocityTable.Pair::broken)
        || checks.reciprocity().probability() < MatrixChecks.JOINT_LEVEL
        || checks.bounds().stream().anyMatch(Bound::broken)
        || checks.definiteness().filter(Definiteness::broken).isPresent()
        || checks.gainPattern().filter(g -> g.suspect().isPresent()).isPresent()
        || checks.triples().stream().anyMatch(TripleProduct::broken)
        || !checks.hints().isEmpty();
  }

  @Test
  void soundMatricesSeldomBreakAnything() {
    int alarms = 0;
    for (int seed = 0; seed < 400; seed++) {
      MatrixChecks checks =
          MatrixChecks.of(
              measured(cantilever(5), SCATTER, 0.01, seed), s -> Optional.empty(), 3);
      assertThat(checks.reciprocity().pairs()).hasSize(10);
      assertThat(checks.triples()).hasSize(10);
      alarms += broken(checks) ? 1 : 0;
    }
    // five checks at a false-alarm rate of 0.3 % or less each
    assertThat(alarms).isLessThanOrEqualTo(8);
  }

  @Test
  void theScaledSmallestEigenvalueIsThatOfTheMatrix() {
    // two points of a cantilever: scaled off-diagonal 2.5/√8·... = 5/√(2·16), smallest 1 − that
    double[][] two = {{2, 5}, {5, 16}};
    Definiteness found = check(two).definiteness().orElseThrow();
    assertThat(found.smallest()).isCloseTo(1 - 5 / Math.sqrt(32), within(3 * found.standardUncertainty()));
    assertThat(found.broken()).isFalse();
  }

  @Test
  void anIndefiniteMatrixIsFoundAlthoughItIsReciprocal() {
    double[][] matrix = cantilever(3);
    matrix[0][2] *= 0.8;
    matrix[2][0] *= 0.8;
    MatrixChecks checks = check(matrix);
    assertThat(checks.reciprocity().pairs()).noneMatch(ReciprocityTable.Pair::broken);
    assertThat(checks.bounds()).noneMatch(Bound::broken);
    assertThat(checks.definiteness().orElseThrow().broken()).isTrue();
  }

  @Test
  void aGaugeOutOfScaleIsPointedAtAndTripleProductsStillHold() {
    double[][] matrix = cantilever(4);
    for (int j = 0; j < 4; j++) {
      matrix[2][j] *= 1.1;
    }
    MatrixChecks checks = check(matrix);
    GainPattern pattern = checks.gainPattern().orElseThrow();
    assertThat(pattern.suspect()).hasValue(2);
    assertThat(Math.exp(pattern.points().get(2).logRatio())).isCloseTo(1.1, within(0.01));
    assertThat(pattern.probability()).isGreaterThan(0.01);
    assertThat(checks.triples()).noneMatch(TripleProduct::broken);
    assertThat(checks.hints()).isEmpty();
  }

  @Test
  void withTwoPointsAGainCannotBePlaced() {
    double[][] matrix = {{2.2, 5.5}, {5, 16}};
    MatrixChecks checks = check(matrix);
    assertThat(checks.reciprocity().pairs()).anyMatch(ReciprocityTable.Pair::broken);
    assertThat(checks.gainPattern().orElseThrow().suspect()).isEmpty();
  }

  @Test
  void aScaleErrorCommonToEverythingCannotBeSeen() {
    double[][] matrix = cantilever(4);
    for (double[] row : matrix) {
      for (int j = 0; j < row.length; j++) {
        row[j] *= 25.4;
      }
    }
    assertThat(broken(check(matrix))).isFalse();
  }

  @Test
  void aMisplacedGaugeBreaksTripleProducts() {
    double[][] matrix = cantilever(4);
    for (int j = 0; j < 4; j++) {
      double[][] finer = cantilever(8);
      matrix[2][j] = finer[2][j] * 0.8 + finer[3][j] * 0.2;
    }
    MatrixChecks checks = check(matrix);
    assertThat(checks.triples().get(0).broken()).isTrue();
    assertThat(checks.gainPattern().orElseThrow().probability()).isLessThan(0.001);
  }

  @Test
  void aReversedGaugeLooksReversed() {
    double[][] matrix = cantilever(4);
    for (int j = 0; j < 4; j++) {
      matrix[1][j] *= -1;
    }
    MatrixChecks checks = check(matrix);
    assertThat(checks.bounds()).filteredOn(Bound::broken).extracting(Bound::name)
        .contains("G1 under P1");
    assertThat(checks.hints()).singleElement()
        .satisfies(h -> {
          assertThat(h.kind()).isEqualTo(Hint.Kind.REVERSED);
          assertThat(h.gauges()).containsExactly(1);
          assertThat(h.sentence()).startsWith("looks like gauge 'G1' or load 'P1' reversed, because");
        });
  }

  @Test
  void twoExchangedColumnsLookExchanged() {
    double[][] matrix = cantilever(5);
    double[] first = matrix[1];
    matrix[1] = matrix[3];
    matrix[3] = first;
    assertThat(check(matrix).hints()).singleElement()
        .satisfies(h -> {
          assertThat(h.kind()).isEqualTo(Hint.Kind.EXCHANGED);
          assertThat(h.gauges()).containsExactly(1, 3);
        });
  }

  @Test
  void eachUnitMistakenForAnotherIsNamed() {
    for (UnitFactor factor : UnitFactor.USUAL) {
      double[][] matrix = cantilever(4);
      for (int j = 0; j < 4; j++) {
        matrix[3][j] *= factor.value();
      }
      assertThat(check(matrix).hints()).singleElement()
          .satisfies(h -> {
            assertThat(h.kind()).isEqualTo(Hint.Kind.UNIT);
            assertThat(h.looksLike()).contains(factor.words()).contains("'G3'");
          });
    }
  }

  @Test
  void aFactorThatIsNoUnitIsNotTakenForOne() {
    double[][] matrix = cantilever(4);
    for (int j = 0; j < 4; j++) {
      matrix[3][j] *= 10.4;
    }
    assertThat(check(matrix).hints()).isEmpty();
  }

  @Test
  void withoutAnyUncertaintyNothingIsDividedByNought() {
    double[][] matrix = cantilever(3);
    matrix[0][1] *= 1.001;
    MatrixChecks checks =
        MatrixChecks.of(measured(matrix, 0, 0, 1), s -> Optional.empty(), 3);
    assertThat(checks.reciprocity().pairs())
        .allMatch(pair -> pair.z().isEmpty())
        .filteredOn(ReciprocityTable.Pair::broken)
        .singleElement()
        .satisfies(pair -> assertThat(pair.share()).isCloseTo(0.001, within(1e-5)));
    assertThat(checks.reciprocity().degreesOfFreedom()).isZero();
  }
}
