package org.flexbound.acceptance;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.flexbound.flexibility.Coefficient;
import org.flexbound.flexibility.MeasuredFlexibility;
import org.flexbound.statistics.Quantiles;
import org.flexbound.update.FlexibilityFunction;
import org.flexbound.update.UpdateProblem;
import org.flexbound.update.WorkingParameter;

/**
 * Explains the differences between two tests by changes of a model's parameters.
 *
 * <p>The computed change of the coefficients is g(x) − g(x₀), x₀ the parameters of the earlier test
 * where it was updated, otherwise the nominal ones. For every subset of one parameter, and of two
 * where no one is enough, the weighted squares of what is left are made smallest within the bounds by
 * Gauss–Newton steps with halving. A subset explains the change where what is left is below the 95 %
 * quantile of F (or χ²). Of those, the best is shown with all that lie within 3.84 of it (95 % of χ²
 * with one degree of freedom): they cannot be told apart by this test.
 */
public final class ChangeModel {
  private static final double LEVEL = 0.95;
  private static final double ALIKE = 3.84;
  private static final int STEPS = 20;

  private final UpdateProblem problem;
  private final double[] start;

  /**
   * A model.
   *
   * @param problem this test's update, as it would be solved
   * @param before the earlier test, whose parameters are the start where it has them
   */
  public ChangeModel(UpdateProblem problem, KeptTest before) {
    this.problem = problem;
    this.start = new double[problem.parameters().size()];
    for (int k = 0; k < start.length; k++) {
      WorkingParameter parameter = problem.parameters().get(k);
      double kept =
          before.parameters().stream()
              .filter(p -> p.name().equals(parameter.name()))
              .mapToDouble(KeptTest.ParameterValue::working)
              .findFirst()
              .orElse(parameter.nominal());
      start[k] = Math.min(parameter.upper(), Math.max(parameter.lower(), kept));
    }
  }

  /** What is to be explained, with the model's answer to it. */
  private final class Fitting {
    private final int[] rows;
    private final double[] differences;
    private final Whitening whitening;
    private final double[] atStart;

    Fitting(List<KeptTest.Value> matched, double[] differences, Whitening whitening) {
      this.rows = rows(matched);
      this.differences = differences;
      this.whitening = whitening;
      this.atStart = compared(problem.function().coefficients(start));
    }

    /** The rows of the compared coefficients, all configurations one after another. */
    private int[] rows(List<KeptTest.Value> matched) {
      List<String> keys = new ArrayList<>();
      for (MeasuredFlexibility measured : problem.measured()) {
        for (Coefficient c : measured.coefficients()) {
          keys.add(
              measured.configuration()
                  + " | "
                  + measured.gauges().get(c.gauge()).name()
                  + " | "
                  + measured.loads().get(c.load()).name());
        }
      }
      return matched.stream().mapToInt(v -> keys.indexOf(v.key())).toArray();
    }

    /** The compared coefficients that were matched, of absolute ones. */
    private double[] compared(double[] absolute) {
      List<double[]> parts = new ArrayList<>();
      int offset = 0;
      for (MeasuredFlexibility measured : problem.measured()) {
        int size = measured.absolute().size();
        parts.add(measured.map().apply(Arrays.copyOfRange(absolute, offset, offset + size)));
        offset += size;
      }
      double[] all = parts.stream().flatMapToDouble(Arrays::stream).toArray();
      return Arrays.stream(rows).mapToDouble(row -> row < 0 ? 0 : all[row]).toArray();
    }

    private double[] left(double[] absolute) {
      double[] computed = compared(absolute);
      double[] left = new double[differences.length];
      for (int i = 0; i < left.length; i++) {
        left[i] = differences[i] - (computed[i] - atStart[i]);
      }
      return left;
    }

    private double misfit(double[] x) {
      return whitening.squares(left(problem.function().coefficients(x)));
    }

    Explanation.Subset fit(int[] subset, double scatterDegrees) {
      double[] x = start.clone();
      double misfit = misfit(x);
      for (int step = 0; step < STEPS; step++) {
        double[] next = step(x, subset, misfit);
        double better = misfit(next);
        boolean settled = better > misfit * (1 - 1e-6);
        if (better < misfit) {
          x = next;
          misfit = better;
        }
        if (settled) {
          break;
        }
      }
      int degrees = Math.max(1, whitening.rank() - subset.length);
      List<String> names = new ArrayList<>();
      List<Double> factors = new ArrayList<>();
      for (int k : subset) {
        WorkingParameter parameter = problem.parameters().get(k);
        names.add(parameter.name());
        double from = parameter.stiffness(start[k]);
        factors.add(
            from > 0 && Double.isFinite(from) ? parameter.stiffness(x[k]) / from : Double.NaN);
      }
      return new Explanation.Subset(
          names,
          factors,
          misfit,
          degrees * Quantiles.f(LEVEL, degrees, scatterDegrees),
          degrees);
    }

    /** A Gauss–Newton step within the bounds, halved until it helps. */
    private double[] step(double[] x, int[] subset, double misfit) {
      FlexibilityFunction.Computed computed = problem.function().at(x);
      double[] left = whitening.apply(left(computed.coefficients()));
      DMatrixRMaj design = new DMatrixRMaj(left.length, subset.length);
      for (int c = 0; c < subset.length; c++) {
        double[] column = new double[computed.coefficients().length];
        for (int i = 0; i < column.length; i++) {
          column[i] = computed.jacobian()[i][subset[c]];
        }
        double[] white = whitening.apply(compared(column));
        for (int r = 0; r < left.length; r++) {
          design.set(r, c, white[r]);
        }
      }
      DMatrixRMaj inverse = new DMatrixRMaj(subset.length, left.length);
      CommonOps_DDRM.pinv(design, inverse);
      DMatrixRMaj move = new DMatrixRMaj(subset.length, 1);
      CommonOps_DDRM.mult(inverse, DMatrixRMaj.wrap(left.length, 1, left), move);
      double share = 1;
      double[] next = x;
      for (int halving = 0; halving < 8; halving++) {
        next = x.clone();
        for (int c = 0; c < subset.length; c++) {
          WorkingParameter parameter = problem.parameters().get(subset[c]);
          next[subset[c]] =
              Math.min(
                  parameter.upper(),
                  Math.max(parameter.lower(), x[subset[c]] + share * move.get(c)));
        }
        if (misfit(next) < misfit) {
          return next;
        }
        share /= 2;
      }
      return next;
    }
  }

  /** The fewest parameters that explain the differences. */
  Explanation explain(
      List<KeptTest.Value> matched,
      double[] differences,
      Whitening whitening,
      double scatterDegrees) {
    Fitting fitting = new Fitting(matched, differences, whitening);
    Explanation best = new Explanation(List.of(), false);
    for (int size = 1; size <= Math.min(2, start.length); size++) {
      List<Explanation.Subset> subsets = new ArrayList<>();
      for (int[] subset : subsets(size)) {
        subsets.add(fitting.fit(subset, scatterDegrees));
      }
      subsets.sort(Comparator.comparingDouble(Explanation.Subset::misfit));
      Optional<Explanation> explained = explained(subsets);
      if (explained.isPresent()) {
        return explained.get();
      }
      best = new Explanation(subsets.subList(0, 1), false);
    }
    return best;
  }

  private static Optional<Explanation> explained(List<Explanation.Subset> sorted) {
    Explanation.Subset best = sorted.get(0);
    if (best.misfit() > best.limit()) {
      return Optional.empty();
    }
    return Optional.of(
        new Explanation(
            sorted.stream()
                .filter(s -> s.misfit() <= s.limit() && s.misfit() <= best.misfit() + ALIKE)
                .toList(),
            true));
  }

  private List<int[]> subsets(int size) {
    List<int[]> result = new ArrayList<>();
    for (int i = 0; i < start.length; i++) {
      if (size == 1) {
        result.add(new int[] {i});
      } else {
        for (int j = i + 1; j < start.length; j++) {
          result.add(new int[] {i, j});
        }
      }
    }
    return result;
  }
}
