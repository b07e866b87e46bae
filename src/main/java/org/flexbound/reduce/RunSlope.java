package org.flexbound.reduce;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.flexbound.setup.SlopeFit;

/**
 * What one gauge showed for one load in one run: its steps and, where there were enough, the slope.
 *
 * @param run the run's name
 * @param gauge the gauge's name
 * @param load the load's name
 * @param gaugeInstrument the instrument that read the gauge
 * @param loadInstrument the instrument that read the load
 * @param steps the load steps in order
 * @param slope motion per load, SI; NaN where it could not be fitted
 * @param standardError its standard error from the residuals of this run; NaN without degrees of
 *     freedom
 * @param intercepts the fitted motion at no load for each branch
 * @param fitFrom lower end of the fit range, magnitude of the load
 * @param fitTo upper end of the fit range
 * @param quality the quality figures; empty where there is no slope
 * @param fit how the slope was fitted; never automatic
 * @param otherTreatment how far the slope would lie from this one were drift taken for set, or set for drift; 0 where there are no zeros
 */
public record RunSlope(
    String run,
    String gauge,
    String load,
    Optional<String> gaugeInstrument,
    Optional<String> loadInstrument,
    List<LoadStep> steps,
    double slope,
    double standardError,
    Map<Integer, Double> intercepts,
    double fitFrom,
    double fitTo,
    Optional<SlopeQuality> quality,
    SlopeFit fit,
    double otherTreatment) {
  /** Copies the collections. */
  public RunSlope {
    steps = List.copyOf(steps);
    intercepts = Collections.unmodifiableMap(new LinkedHashMap<>(intercepts));
  }

  /**
   * Whether there is a slope.
   *
   * @return true where one was fitted
   */
  public boolean isFitted() {
    return !Double.isNaN(slope);
  }

  /**
   * A step's distance from its branch's line.
   *
   * @param step one of the steps
   * @return motion less line, SI; NaN where the branch has no line
   */
  public double residual(LoadStep step) {
    Double intercept = intercepts.get(step.branch());
    return intercept == null ? Double.NaN : step.motion() - intercept - slope * step.load();
  }

  /** The same slope with the standard error of a fit of several loads together. */
  RunSlope withStandardError(double error) {
    return new RunSlope(
        run, gauge, load, gaugeInstrument, loadInstrument, steps, slope, error, intercepts, fitFrom, fitTo, quality, fit, otherTreatment);
  }
}
