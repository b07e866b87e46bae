package org.flexbound.update;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/**
 * The curve of misfit against change: the minimum for every weight μ of the prior, from the stiffest
 * to next to none.
 */
final class TradeOff {
  /** Next to no prior: what the bounds alone allow. */
  static final double LEAST = 1e-6;

  /** As good as no change at all; also stands for the nominal model itself. */
  static final double MOST = 1e6;
  private static final int STEPS_PER_DECADE = 2;

  private final GaussNewton solver;
  private final FittedModel model;
  private final FitQuality quality;
  private final int parameters;

  /** Minima by the logarithm of their weight, in ascending order. */
  private final TreeMap<Double, Minimum> minima = new TreeMap<>();

  private final List<Double> grid;

  TradeOff(
      GaussNewton solver,
      FittedModel model,
      FitQuality quality,
      int parameters,
      Minimum atOne,
      boolean whole) {
    this.solver = solver;
    this.model = model;
    this.quality = quality;
    this.parameters = parameters;
    minima.put(0.0, atOne);
    if (!whole) {
      at(Math.log(LEAST));
      grid = List.copyOf(minima.keySet());
      return;
    }
    int steps = (int) Math.round(Math.log10(MOST / LEAST)) * STEPS_PER_DECADE;
    double step = Math.log(MOST / LEAST) / steps;
    int down = (int) Math.round(-Math.log(LEAST) / step);
    int up = steps - down;
    for (int i = 1; i <= up; i++) {
      at(i * step);
    }
    for (int i = 1; i <= down; i++) {
      at(-i * step);
    }
    grid = List.copyOf(minima.keySet());
  }

  /** The minimum at a weight, found from the nearest known one. */
  Minimum at(double lnWeight) {
    Minimum known = minima.get(lnWeight);
    if (known != null) {
      return known;
    }
    Map.Entry<Double, Minimum> below = minima.floorEntry(lnWeight);
    Map.Entry<Double, Minimum> above = minima.ceilingEntry(lnWeight);
    Minimum nearest = minima.firstEntry().getValue();
    if (below != null && above != null) {
      boolean nearerBelow = lnWeight - below.getKey() < above.getKey() - lnWeight;
      nearest = nearerBelow ? below.getValue() : above.getValue();
    } else if (below != null) {
      nearest = below.getValue();
    }
    Minimum found = solver.minimise(nearest.w, model.ridge(Math.exp(lnWeight)));
    minima.put(lnWeight, found);
    return found;
  }

  Minimum best() {
    return at(grid.get(0));
  }

  double bestWeight() {
    return Math.exp(grid.get(0));
  }

  /**
   * The largest weight at which the point agrees with the data, by bisection between the points of
   * the curve; empty (NaN) where none does.
   */
  double largestAgreeing() {
    int first = grid.size() - 1;
    while (first >= 0 && !agrees(grid.get(first))) {
      first--;
    }
    if (first < 0) {
      return Double.NaN;
    }
    if (first == grid.size() - 1) {
      return grid.get(first);
    }
    double low = grid.get(first);
    double high = grid.get(first + 1);
    while (high - low > 1e-7) {
      double middle = 0.5 * (low + high);
      if (agrees(middle)) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return low;
  }

  private boolean agrees(double lnWeight) {
    return quality.judge(at(lnWeight), Math.exp(lnWeight)).agrees();
  }

  /**
   * The corner of the curve ln √misfit against ln change: the point of largest curvature, by Menger's
   * formula on neighbouring points (Hansen 1992, SIAM Review 34, 561; Hansen &amp; O'Leary 1993).
   */
  double corner() {
    double best = 0;
    double sharpest = 0;
    for (int i = 1; i + 1 < grid.size(); i++) {
      double[] a = plotted(grid.get(i - 1));
      double[] b = plotted(grid.get(i));
      double[] c = plotted(grid.get(i + 1));
      double cross = (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]);
      double product = distance(a, b) * distance(b, c) * distance(a, c);
      // Walked from little weight to much, the change falls first and the misfit grows then: the
      // corner turns anticlockwise.
      double curvature = product > 1e-12 ? 2 * cross / product : 0;
      if (curvature > sharpest) {
        sharpest = curvature;
        best = grid.get(i);
      }
    }
    return best;
  }

  private double[] plotted(double key) {
    Minimum point = at(key);
    return new double[] {
      0.5 * Math.log(Math.max(quality.misfit(point), 1e-12)),
      Math.log(Math.max(change(point), 1e-9))
    };
  }

  private static double distance(double[] a, double[] b) {
    return Math.hypot(a[0] - b[0], a[1] - b[1]);
  }

  /** √Σ(x/s)². */
  double change(Minimum point) {
    double sum = 0;
    for (int i = 0; i < parameters; i++) {
      sum += point.w[i] * point.w[i];
    }
    return Math.sqrt(sum);
  }

  /** The curve, largest weight first. */
  List<TradeOffPoint> curve() {
    List<TradeOffPoint> result = new ArrayList<>();
    for (int i = grid.size() - 1; i >= 0; i--) {
      double key = grid.get(i);
      Minimum point = at(key);
      List<Double> values = new ArrayList<>();
      for (double x : model.x(point.w)) {
        values.add(x);
      }
      result.add(
          new TradeOffPoint(
              Math.exp(key),
              quality.misfit(point),
              change(point),
              quality.effective(point, Math.exp(key)),
              values));
    }
    return result;
  }
}
