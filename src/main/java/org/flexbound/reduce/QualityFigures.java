package org.flexbound.reduce;

import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.statistics.GroupedLine;
import org.flexbound.statistics.Kink;

/** Works out the quality figures of a fitted slope. */
final class QualityFigures {
  private QualityFigures() {}

  static SlopeQuality of(
      ZeroReturn zero,
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
        zero.share(),
        span > 0 ? resolution / span : Double.NaN,
        used.size(),
        zero.kind(),
        SlopePair.loadingAndUnloading(used, line.slope()),
        SlopePair.pullAndPush(used, line.slope()),
        Kink.search(
            used.stream().mapToDouble(LoadStep::load).toArray(),
            used.stream().mapToDouble(LoadStep::motion).toArray(),
            used.stream().mapToInt(LoadStep::branch).toArray()),
        Arrays.stream(line.regression().studentisedDeletedResiduals()).boxed().toList());
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
}
