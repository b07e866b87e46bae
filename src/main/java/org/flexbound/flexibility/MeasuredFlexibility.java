package org.flexbound.flexibility;

import java.util.List;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Load;

/**
 * The partial flexibility matrix of one configuration as measured, with all that its uncertainty is
 * made of.
 *
 * <p>Model of the measurement: absolute coefficient a = Π(1 + gain) · truth + scatter + floor, and
 * the coefficients that are compared are y = map · a. Scatter and floors are independent between
 * absolute coefficients; gains are shared.
 *
 * @param configuration the configuration's name
 * @param gauges the gauges (rows), base gauges included
 * @param loads the loads (columns)
 * @param absolute the absolute coefficients that were measured, in a fixed order
 * @param gains the gains that act on them
 * @param scatterDegreesOfFreedom ν, the degrees of freedom of the pooled scatter; infinite where a
 *     stated repeatability took its place
 * @param map from the absolute coefficients to those that are compared
 * @param coefficients what is compared, in the order of the map's rows
 */
public record MeasuredFlexibility(
    String configuration,
    List<Gauge> gauges,
    List<Load> loads,
    List<AbsoluteCoefficient> absolute,
    List<Gain> gains,
    double scatterDegreesOfFreedom,
    LinearMap map,
    List<Coefficient> coefficients) {
  /** Copies the lists and checks that they fit together. */
  public MeasuredFlexibility {
    gauges = List.copyOf(gauges);
    loads = List.copyOf(loads);
    absolute = List.copyOf(absolute);
    gains = List.copyOf(gains);
    coefficients = List.copyOf(coefficients);
    if (map.inputs() != absolute.size() || map.outputs() != coefficients.size()) {
      throw new IllegalArgumentException(
          "the map goes from "
              + map.inputs()
              + " to "
              + map.outputs()
              + " coefficients, but there are "
              + absolute.size()
              + " and "
              + coefficients.size());
    }
  }

  /**
   * The values that are compared.
   *
   * @return y, in the order of {@link #coefficients()}
   */
  public double[] values() {
    return coefficients.stream().mapToDouble(Coefficient::value).toArray();
  }

  /**
   * The covariance of the values from scatter and floors, without gains.
   *
   * @return V, square, ordered as {@link #coefficients()}
   */
  public double[][] scatterCovariance() {
    double[] variances =
        absolute.stream()
            .mapToDouble(
                a ->
                    a.scatterUncertainty() * a.scatterUncertainty()
                        + a.floorUncertainty() * a.floorUncertainty())
            .toArray();
    return map.covariance(variances);
  }
}
