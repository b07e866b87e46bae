package org.flexbound.update;

/**
 * Minimises ½‖r(w)‖² + ½ Σ dᵢ² wᵢ² within bounds by Gauss–Newton steps in a trust region.
 *
 * <p>The trust region is a box, so that every step is one bounded least-squares problem ({@link
 * BoundedRidge}). A step is taken where the objective falls by at least a tenth of a thousandth of
 * what the linear model promised; the box is halved where it fell by less than a quarter of it and
 * doubled where by more than three quarters (usual trust-region practice, e.g. Nocedal &amp; Wright
 * 2006, algorithm 4.1). Optimality is the projected gradient: the largest |P(w − g) − w|, P the
 * projection on the bounds.
 */
final class GaussNewton {
  /**
   * For the projected gradient: the Hessian is at least 1 where the prior's weight is, so this bounds
   * the distance to the minimum in prior standard deviations.
   */
  private static final double TOLERANCE = 1e-9;

  /** A step of this size in scaled unknowns no longer changes any digit that is shown. */
  private static final double STEP_TOLERANCE = 1e-11;

  private static final double FIRST_BOX = 4;
  private static final int LIMIT = 200;

  private final WhitenedModel model;
  private final double[] lower;
  private final double[] upper;

  /**
   * A solver for one model.
   *
   * @param model the residuals
   * @param lower bounds of w
   * @param upper bounds of w
   */
  GaussNewton(WhitenedModel model, double[] lower, double[] upper) {
    this.model = model;
    this.lower = lower;
    this.upper = upper;
  }

  /**
   * Minimises.
   *
   * @param start where to begin; moved into the bounds
   * @param ridge d, each at least 0 (one of 0 is taken as 1e-6, which changes nothing that is seen)
   * @return where it ended
   */
  Minimum minimise(double[] start, double[] ridge) {
    return minimise(start, ridge, lower, upper);
  }

  /**
   * Minimises within other bounds, e.g. with some unknowns held.
   *
   * @param start where to begin; moved into the bounds
   * @param ridge d
   * @param low lower bounds
   * @param high upper bounds
   * @return where it ended
   */
  Minimum minimise(double[] start, double[] ridge, double[] low, double[] high) {
    int n = start.length;
    double[] d = new double[n];
    double[] w = new double[n];
    for (int i = 0; i < n; i++) {
      d[i] = Math.max(ridge[i], 1e-6);
      w[i] = Math.min(Math.max(start[i], low[i]), high[i]);
    }
    WhitenedModel.Linear linear = model.linearise(w);
    double objective = objective(linear.residuals, w, d);
    int evaluations = 1;
    double firstGradient = Math.max(1, projectedGradient(linear, w, d, low, high));
    double box = FIRST_BOX;
    double[] stepLow = new double[n];
    double[] stepHigh = new double[n];
    for (int iteration = 0; ; iteration++) {
      double gradient = projectedGradient(linear, w, d, low, high);
      if (gradient <= TOLERANCE + 1e-14 * firstGradient) {
        return new Minimum(
            w, objective, linear, iteration, evaluations, gradient / firstGradient, true,
            "the projected gradient vanished");
      }
      if (iteration == LIMIT || !Double.isFinite(objective)) {
        return new Minimum(
            w, objective, linear, iteration, evaluations, gradient / firstGradient, false,
            Double.isFinite(objective)
                ? "no end after " + LIMIT + " iterations"
                : "the computed flexibility is not a number at the start");
      }
      for (int i = 0; i < n; i++) {
        stepLow[i] = Math.max(low[i] - w[i], -box);
        stepHigh[i] = Math.min(high[i] - w[i], box);
      }
      double[] step = new BoundedRidge(linear.jacobian, linear.residuals, d, w).solve(stepLow, stepHigh);
      double size = 0;
      double[] trial = new double[n];
      for (int i = 0; i < n; i++) {
        size = Math.max(size, Math.abs(step[i]));
        trial[i] = Math.min(Math.max(w[i] + step[i], low[i]), high[i]);
      }
      double promised = objective - promisedObjective(linear, w, step, d);
      if (size <= STEP_TOLERANCE || promised <= 1e-15 * objective) {
        return new Minimum(
            w, objective, linear, iteration, evaluations, gradient / firstGradient, true,
            "the step vanished");
      }
      WhitenedModel.Linear there = model.linearise(trial);
      evaluations++;
      double next = objective(there.residuals, trial, d);
      double share = (objective - next) / promised;
      if (share > 1e-4) {
        w = trial;
        objective = next;
        linear = there;
      } else if (size < 1e-7) {
        // Rounding hides what is left of the descent.
        return new Minimum(
            w, objective, linear, iteration, evaluations, gradient / firstGradient, true,
            "no further descent within rounding");
      }
      if (!(share >= 0.25)) {
        box = 0.5 * Math.min(box, size);
      } else if (share > 0.75) {
        box = Math.max(box, 2 * size);
      }
    }
  }

  static double objective(double[] residuals, double[] w, double[] d) {
    double sum = 0;
    for (double r : residuals) {
      sum += r * r;
    }
    for (int i = 0; i < w.length; i++) {
      sum += d[i] * d[i] * w[i] * w[i];
    }
    return 0.5 * sum;
  }

  private static double promisedObjective(
      WhitenedModel.Linear linear, double[] w, double[] step, double[] d) {
    double[] left = linear.residuals.clone();
    double[] moved = new double[w.length];
    for (int row = 0; row < left.length; row++) {
      for (int i = 0; i < step.length; i++) {
        left[row] -= linear.jacobian.unsafe_get(row, i) * step[i];
      }
    }
    for (int i = 0; i < step.length; i++) {
      moved[i] = w[i] + step[i];
    }
    return objective(left, moved, d);
  }

  private static double projectedGradient(
      WhitenedModel.Linear linear, double[] w, double[] d, double[] low, double[] high) {
    double result = 0;
    double[] gradient = new double[w.length];
    for (int row = 0; row < linear.residuals.length; row++) {
      for (int i = 0; i < w.length; i++) {
        gradient[i] -= linear.jacobian.unsafe_get(row, i) * linear.residuals[row];
      }
    }
    for (int i = 0; i < w.length; i++) {
      double g = gradient[i] + d[i] * d[i] * w[i];
      double to = Math.min(Math.max(w[i] - g, low[i]), high[i]);
      result = Math.max(result, Math.abs(to - w[i]));
    }
    return result;
  }
}
