package org.flexbound.update;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.NavigableMap;
import java.util.TreeMap;

/**
 * Profiles: for each value of one scaled parameter the least misfit plus the other parameters'
 * priors, its own prior left out (Venzon &amp; Moolgavkar 1988; Raue et al. 2009).
 *
 * <p>First the linearised model says where the profile should reach its threshold; two evaluations
 * there show whether it does. Only where it does not is the curve traced.
 */
final class ProfileTracer {
  /** Departure from the parabola, as a share of the threshold, from which a curve is traced. */
  private static final double CURVED = 0.08;

  private static final int TRACED_POINTS = 24;

  private final GaussNewton solver;
  private final FittedModel model;
  private final Posterior posterior;
  private final Minimum estimate;
  private final double[] lower;
  private final double[] upper;
  private final double two;
  private final double one;

  /**
   * A tracer about the μ = 1 estimate.
   *
   * @param solver the solver
   * @param model the model
   * @param posterior the posterior at the estimate
   * @param estimate the estimate
   * @param scatterDegrees ν
   */
  ProfileTracer(
      GaussNewton solver,
      FittedModel model,
      Posterior posterior,
      Minimum estimate,
      double scatterDegrees) {
    this.solver = solver;
    this.model = model;
    this.posterior = posterior;
    this.estimate = estimate;
    this.lower = model.lower();
    this.upper = model.upper();
    double t2 = MisfitLimit.student(0.975, scatterDegrees);
    double t1 = MisfitLimit.student(0.95, scatterDegrees);
    this.two = 0.5 * t2 * t2;
    this.one = 0.5 * t1 * t1;
  }

  double threshold() {
    return two;
  }

  /** A profile in scaled unknowns; crossings are NaN where a side is open. */
  record Traced(
      boolean evaluated,
      boolean parabolic,
      double best,
      double low,
      double high,
      double oneSidedLow,
      double oneSidedHigh,
      NavigableMap<Double, Double> curve,
      NavigableMap<Double, Double> logVolume) {
    boolean lowOpen() {
      return Double.isNaN(low);
    }

    boolean highOpen() {
      return Double.isNaN(high);
    }
  }

  /** The profile by the linearised model alone. */
  Traced linear(int k) {
    double q = precision(k);
    double centre = centre(k, q);
    double best = Math.min(Math.max(centre, lower[k]), upper[k]);
    double atBest = 0.5 * q * (best - centre) * (best - centre);
    return new Traced(
        false,
        true,
        best,
        crossing(k, -1, q, centre, atBest + two),
        crossing(k, 1, q, centre, atBest + two),
        crossing(k, -1, q, centre, atBest + one),
        crossing(k, 1, q, centre, atBest + one),
        new TreeMap<>(),
        new TreeMap<>());
  }

  private double crossing(int k, int side, double q, double centre, double rise) {
    double at = centre + side * Math.sqrt(2 * rise / q);
    boolean inside = side < 0 ? at > lower[k] : at < upper[k];
    return inside ? at : Double.NaN;
  }

  /** The precision of the profile: that of the posterior less its own prior. */
  private double precision(int k) {
    double variance = posterior.covariance(k, k);
    return Math.max(posterior.removed(k) / Math.max(variance, 1e-300), 1e-12);
  }

  private double centre(int k, double q) {
    return posterior.mean(k) / posterior.covariance(k, k) / q;
  }

  /** The profile by minimisation. */
  Traced trace(int k) {
    Run run = new Run(k);
    double best = run.best;
    double q = precision(k);
    double reach = Math.sqrt(2 * two / q);
    double left = Math.max(lower[k], best - reach);
    double right = Math.min(upper[k], best + reach);
    boolean parabolic =
        run.isParabolic(left, q) && run.isParabolic(right, q) && run.isParabolic(lower[k], q, two)
            && run.isParabolic(upper[k], q, two);
    double low = run.crossing(-1, two, left);
    double high = run.crossing(1, two, right);
    double oneLow = run.crossing(-1, one, left);
    double oneHigh = run.crossing(1, one, right);
    if (!parabolic) {
      double from = Double.isNaN(low) ? lower[k] : Math.max(lower[k], best + 2 * (low - best));
      double to = Double.isNaN(high) ? upper[k] : Math.min(upper[k], best + 2 * (high - best));
      run.fill(from, to);
    }
    return new Traced(
        true, parabolic, best, low, high, oneLow, oneHigh, run.rises(), run.volumes());
  }

  /** The evaluations for one parameter. */
  private final class Run {
    private final int k;
    private final double[] ridge;
    private final TreeMap<Double, Minimum> known = new TreeMap<>();
    private final double base;
    private final double best;

    Run(int k) {
      this.k = k;
      this.ridge = model.ridge(1);
      this.ridge[k] = 0;
      Minimum free = solver.minimise(estimate.w, ridge);
      known.put(free.w[k], free);
      best = free.w[k];
      base = free.objective;
    }

    double rise(double at) {
      Minimum there = known.get(at);
      if (there == null) {
        there = minimise(at);
        known.put(at, there);
      }
      return Math.max(there.objective - base, 0);
    }

    private Minimum minimise(double at) {
      var below = known.floorEntry(at);
      var above = known.ceilingEntry(at);
      Minimum from = estimate;
      if (below != null && (above == null || at - below.getKey() < above.getKey() - at)) {
        from = below.getValue();
      } else if (above != null) {
        from = above.getValue();
      }
      double[] start = from.w.clone();
      double[] low = lower.clone();
      double[] high = upper.clone();
      double along = (at - start[k]) / Math.max(posterior.covariance(k, k), 1e-300);
      for (int i = 0; i < posterior.size(); i++) {
        start[i] += posterior.covariance(i, k) * along;
      }
      start[k] = at;
      low[k] = at;
      high[k] = at;
      return solver.minimise(start, ridge, low, high);
    }

    boolean isParabolic(double at, double q) {
      double expected = 0.5 * q * (at - best) * (at - best);
      return Math.abs(rise(at) - expected) <= CURVED * two;
    }

    /** At a bound only where the parabola says that it lies within reach of the threshold. */
    boolean isParabolic(double at, double q, double threshold) {
      double expected = 0.5 * q * (at - best) * (at - best);
      if (expected > threshold) {
        return true;
      }
      return Math.abs(rise(at) - expected) <= CURVED * threshold;
    }

    /** Where the rise reaches a threshold on one side; NaN where the bound comes first. */
    double crossing(int side, double threshold, double guess) {
      double bound = side < 0 ? lower[k] : upper[k];
      double near = best;
      double far = guess;
      double rise = rise(far);
      for (int i = 0; i < 60 && rise < threshold; i++) {
        if (far == bound) {
          return Double.NaN;
        }
        near = far;
        double step = (far - best) * 1.5;
        far = side < 0 ? Math.max(bound, best + step) : Math.min(bound, best + step);
        if (Math.abs(far - best) < 1e-12) {
          far = bound;
        }
        rise = rise(far);
      }
      // The square root of the rise is nearly straight: regula falsi with halving (Illinois).
      double a = near;
      double fa = Math.sqrt(rise(near)) - Math.sqrt(threshold);
      double b = far;
      double fb = Math.sqrt(rise) - Math.sqrt(threshold);
      for (int i = 0; i < 40 && Math.abs(fb) > 1e-5; i++) {
        double c = b - fb * (b - a) / (fb - fa);
        if (c == a || c == b) {
          break;
        }
        double fc = Math.sqrt(rise(c)) - Math.sqrt(threshold);
        if (Math.signum(fc) == Math.signum(fb)) {
          fa *= 0.5;
        } else {
          a = b;
          fa = fb;
        }
        b = c;
        fb = fc;
      }
      return b;
    }

    void fill(double from, double to) {
      double[] points = new double[TRACED_POINTS + 1];
      for (int i = 0; i <= TRACED_POINTS; i++) {
        points[i] = from + (to - from) * i / TRACED_POINTS;
      }
      // outward from the best point, so that each starts from a neighbour
      List<Double> order = new ArrayList<>();
      Arrays.stream(points).filter(p -> p >= best).forEach(order::add);
      for (int i = points.length - 1; i >= 0; i--) {
        if (points[i] < best) {
          order.add(points[i]);
        }
      }
      order.forEach(this::rise);
    }

    NavigableMap<Double, Double> rises() {
      TreeMap<Double, Double> result = new TreeMap<>();
      known.forEach((at, there) -> result.put(at, Math.max(there.objective - base, 0)));
      return result;
    }

    /** −½ ln det of the Hessian by the other unknowns (Laplace; Tierney &amp; Kadane 1986). */
    NavigableMap<Double, Double> volumes() {
      TreeMap<Double, Double> result = new TreeMap<>();
      known.forEach((at, there) -> result.put(at, LogVolume.of(there, k, ridge)));
      return result;
    }
  }
}
