package org.flexbound.sparse;

import java.util.Arrays;

/**
 * Finds the lowest eigenpairs of {@code K phi = lambda M phi}, K and M symmetric, M positive semidefinite (rows without mass are allowed), by
 * a block Lanczos process on {@code (K - shift M)⁻¹ M}.
 *
 * <p>If K is singular or indefinite (a free structure) the shift is put below the lowest eigenvalue. After the pairs have settled, the number
 * of negative pivots of {@code K - s M}, with s just above the highest, must equal the number of pairs; if it is larger, the search goes on.
 */
public final class EigenSolver {
  /** A first shift below zero, relative to the largest ratio of the diagonals of K and M. */
  private static final double SMALL_SHIFT = 1e-9;
  /** The projected problem is solved again when the basis has grown by this part of its size. */
  private static final int CHECK_GROWTH = 10;

  /** A pivot smaller than this part of its diagonal may be a zero blurred by rounding: the shift is lowered then, twice at most. */
  private static final double SOUND = 1e-10;

  private static final int ATTEMPTS = 12;

  private final EigenSettings settings;
  private final FactorSettings factorSettings;

  /** A solver with settings for the search and for the factors. */
  public EigenSolver(EigenSettings settings, FactorSettings factorSettings) {
    this.settings = settings;
    this.factorSettings = factorSettings;
  }

  /** A solver with the usual settings. */
  public EigenSolver() {
    this(EigenSettings.defaults(), FactorSettings.defaults());
  }

  /**
   * The lowest pairs.
   *
   * @param k first matrix (stiffness)
   * @param m second matrix (mass), positive semidefinite
   * @param group the group (node) of every unknown, as {@link SymbolicFactor#analyze(SparsePattern, int[], FactorSettings)} takes it
   * @param count number of pairs, at least one
   * @throws PivotBreakdownException if no shift can be found at which {@code K - shift M} can be factorized (both have a common null vector)
   * @throws IllegalArgumentException if sizes differ, or M has a negative diagonal entry
   */
  public EigenPairs lowest(SymmetricMatrix k, SymmetricMatrix m, int[] group, int count) {
    if (k.size() != m.size()) {
      throw new IllegalArgumentException("sizes differ: " + k.size() + " and " + m.size());
    }
    if (count < 1) {
      throw new IllegalArgumentException("at least one pair must be asked for, not " + count);
    }
    for (double d : m.diagonal()) {
      if (!(d >= 0)) {
        throw new IllegalArgumentException("the second matrix has the diagonal entry " + d + "; it must be positive semidefinite");
      }
    }
    SymbolicFactor symbolic = SymbolicFactor.analyze(k.pattern().union(m.pattern()), group, factorSettings);
    Shifted start = belowAll(symbolic, k, m);
    BlockLanczos lanczos = new BlockLanczos(start.factor, m, settings.blockSize(), settings.seed());
    int limit = Math.max(settings.largestBasis(), 2 * count + 4 * settings.blockSize());
    int wanted = count;
    int next = count;
    for (;;) {
      if (lanczos.basisSize() < Math.min(next, limit - settings.blockSize()) && !lanczos.exhausted()) {
        lanczos.step();
        continue;
      }
      next = lanczos.basisSize() + Math.max(1, lanczos.basisSize() / CHECK_GROWTH);
      int settled = lanczos.settle(settings.tolerance());
      boolean full = lanczos.basisSize() + settings.blockSize() > limit;
      if (settled < wanted && !lanczos.exhausted() && !full) {
        lanczos.step();
        continue;
      }
      int have = Math.min(lanczos.exhausted() ? positive(lanczos.ritzValues()) : settled, count);
      if (have < count && !lanczos.exhausted()) {
        return pairs(k, m, start.shift, lanczos, have, -1, Double.POSITIVE_INFINITY, EigenPairs.Outcome.BASIS_FULL);
      }
      if (lanczos.exhausted() && have < count) {
        return pairs(k, m, start.shift, lanczos, have, have, Double.POSITIVE_INFINITY, EigenPairs.Outcome.FEWER_EXIST);
      }
      Count check = countBelow(symbolic, k, m, start.shift, lanczos.ritzValues(), have);
      if (check.found >= check.counted) {
        return pairs(k, m, start.shift, lanczos, have, check.counted, check.at, EigenPairs.Outcome.COMPLETE);
      }
      if (lanczos.exhausted() || full) {
        return pairs(k, m, start.shift, lanczos, have, check.counted, check.at, EigenPairs.Outcome.SOME_MISSED);
      }
      wanted = Math.max(wanted, check.found) + 1;
      lanczos.step();
    }
  }

  private static int positive(double[] ritz) {
    int count = 0;
    while (count < ritz.length && ritz[count] > 1e-14 * ritz[0]) {
      count++;
    }
    return count;
  }

  private record Shifted(NumericFactor factor, double shift) {}

  private record Count(int found, int counted, double at) {}

  /** A factor at a shift below which no eigenvalue lies. */
  private Shifted belowAll(SymbolicFactor symbolic, SymmetricMatrix k, SymmetricMatrix m) {
    double largest = 0;
    double[] kd = k.diagonal();
    double[] md = m.diagonal();
    for (int i = 0; i < kd.length; i++) {
      if (md[i] > 0) {
        largest = Math.max(largest, Math.abs(kd[i]) / md[i]);
      }
    }
    double shift = settings.shift().orElse(0);
    double down = Math.max(SMALL_SHIFT * largest, Double.MIN_NORMAL);
    for (int attempt = 0;; attempt++) {
      try {
        NumericFactor factor = symbolic.shifted(k, shift, m);
        if (factor.negativePivots() == 0 && (factor.leastPivotRatio() > SOUND || attempt >= 2)) {
          return new Shifted(factor, shift);
        }
        if (attempt > ATTEMPTS) {
          throw new IllegalArgumentException("no shift below all eigenvalues found down to " + shift);
        }
      } catch (PivotBreakdownException e) {
        if (attempt > ATTEMPTS) {
          throw e;
        }
      }
      shift = Math.min(shift, 0) - down;
      down *= 10;
    }
  }

  /** Counts the eigenvalues below a point in the first gap above the pairs found. */
  private static Count countBelow(SymbolicFactor symbolic, SymmetricMatrix k, SymmetricMatrix m, double shift, double[] ritz, int have) {
    int upTo = have;
    // Pairs that agree with the next one to eight digits stand in one cluster: count above the whole of it.
    while (upTo < ritz.length && ritz[upTo] > 0 && ritz[upTo] > ritz[upTo - 1] * (1 - 1e-8)) {
      upTo++;
    }
    double lower = shift + 1 / ritz[upTo - 1];
    double upper = upTo < ritz.length && ritz[upTo] > 0 ? Math.min(shift + 1 / ritz[upTo], shift + 1.02 / ritz[upTo - 1]) : shift + 1.02 / ritz[upTo - 1];
    for (double part = 0.5; part > 0.01; part *= 0.7) {
      double at = lower + part * (upper - lower);
      try {
        return new Count(upTo, symbolic.shifted(k, at, m).negativePivots(), at);
      } catch (PivotBreakdownException ignored) { // the point meets an eigenvalue of a leading part of the matrix: try one nearby
      }
    }
    return new Count(upTo, upTo, Double.NaN);
  }

  private static EigenPairs pairs(SymmetricMatrix k, SymmetricMatrix m, double shift, BlockLanczos lanczos, int have, int counted, double at,
      EigenPairs.Outcome outcome) {
    int n = k.size();
    double[] x = lanczos.vectors(have);
    double[] mx = new double[n * have];
    double[] kx = new double[n * have];
    m.multiply(x, mx, have);
    double[] values = new double[have];
    for (int j = 0; j < have; j++) {
      values[j] = shift + 1 / lanczos.ritzValues()[j];
      double norm = Math.sqrt(TallBlocks.dot(n, x, j * n, mx, j * n));
      int largest = j * n;
      for (int i = j * n; i < (j + 1) * n; i++) {
        largest = Math.abs(x[i]) > Math.abs(x[largest]) * (1 + 1e-9) ? i : largest;
      }
      double factor = x[largest] < 0 ? -1 / norm : 1 / norm;
      for (int i = j * n; i < (j + 1) * n; i++) {
        x[i] *= factor;
        mx[i] *= factor;
      }
    }
    k.multiply(x, kx, have);
    double[] residuals = residuals(k, m, shift, values, kx, mx);
    double[] gram = new double[have * have];
    TallBlocks.project(n, x, 0, have, mx, 0, have, gram);
    double orthogonality = 0;
    for (int i = 0; i < have; i++) {
      gram[i * have + i] -= 1;
    }
    for (double g : gram) {
      orthogonality = Math.max(orthogonality, Math.abs(g));
    }
    return new EigenPairs(n, values, x, residuals, orthogonality, shift, counted, at, lanczos.calls(), outcome);
  }

  private static double[] residuals(SymmetricMatrix k, SymmetricMatrix m, double shift, double[] values, double[] kx, double[] mx) {
    int n = k.size();
    double[] weight = k.diagonal();
    double[] md = m.diagonal();
    for (int i = 0; i < n; i++) {
      double d = Math.abs(weight[i]) + Math.abs(shift) * md[i];
      weight[i] = d > 0 ? 1 / d : 0;
    }
    double[] residuals = new double[values.length];
    for (int j = 0; j < values.length; j++) {
      double above = 0;
      double below = 0;
      for (int i = 0; i < n; i++) {
        double r = kx[j * n + i] - values[j] * mx[j * n + i];
        double s = (Math.abs(values[j]) + Math.abs(shift)) * mx[j * n + i];
        above += weight[i] * r * r;
        below += weight[i] * s * s;
      }
      residuals[j] = below > 0 ? Math.sqrt(above / below) : 0;
    }
    return residuals;
  }

  @Override
  public String toString() {
    return "EigenSolver" + Arrays.asList(settings, factorSettings);
  }
}
