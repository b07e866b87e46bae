package org.flexbound.reduce;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.statistics.GroupedLine;

/** Works out the quality figures of a fitted slope. */
final class QualityFigures {
  /** Steps below this share of the peak load count as unloaded. */
  private static final double UNLOADED = 0.02;

  private QualityFigures() {}

  static SlopeQuality of(
      List<LoadStep> all,
      List<LoadStep> used,
      GroupedLine line,
      GroupedLine.Curvature curvature,
      double resolution) {
    double low = used.stream().mapToDouble(LoadStep::motion).min().orElse(0);
    double high = used.stream().mapToDouble(LoadStep::motion).max().orElse(0);
    double span = high - low;
    double largest = 0;
    for (double residual : line.regression().residuals()) {
      largest = Math.max(largest, Math.abs(residual));
    }
    double share = span > 0 ? 1 / span : 0;
    return new SlopeQuality(
        span,
        largest * share,
        gap(used, line) * share,
        curvature.departure() * share,
        curvature.probability(),
        zeroReturn(all),
        span > 0 ? resolution / span : Double.NaN,
        used.size());
  }

  /** The largest distance between the lines of the rising and the falling branch of one cycle. */
  private static double gap(List<LoadStep> used, GroupedLine line) {
    Map<Integer, double[]> byCycle = new LinkedHashMap<>();
    for (LoadStep step : used) {
      double intercept = line.intercepts().getOrDefault(step.branch(), 0.0);
      double[] pair =
          byCycle.computeIfAbsent(step.cycle(), key -> new double[] {Double.NaN, Double.NaN});
      pair[step.rising() ? 0 : 1] = intercept;
    }
    double gap = 0;
    for (double[] pair : byCycle.values()) {
      if (!Double.isNaN(pair[0]) && !Double.isNaN(pair[1])) {
        gap = Math.max(gap, Math.abs(pair[0] - pair[1]));
      }
    }
    return gap;
  }

  private static double zeroReturn(List<LoadStep> all) {
    List<LoadStep> read =
        all.stream().filter(step -> !Double.isNaN(step.motion())).toList();
    if (read.size() < 3) {
      return Double.NaN;
    }
    double peak = read.stream().mapToDouble(step -> Math.abs(step.load())).max().orElse(0);
    LoadStep first = read.get(0);
    LoadStep last = read.get(read.size() - 1);
    if (Math.abs(first.load()) > UNLOADED * peak || Math.abs(last.load()) > UNLOADED * peak) {
      return Double.NaN;
    }
    double motion = 0;
    for (LoadStep step : read) {
      motion = Math.max(motion, Math.abs(step.motion() - first.motion()));
    }
    return motion > 0 ? (last.motion() - first.motion()) / motion : 0;
  }
}
