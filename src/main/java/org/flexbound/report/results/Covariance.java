package org.flexbound.report.results;

import java.util.List;
import java.util.OptionalDouble;

/**
 * The covariance of the coefficients of one configuration: scatter plus the sum of the products of
 * the shared factors with themselves.
 *
 * @param configuration the configuration
 * @param scatterDegreesOfFreedom degrees of freedom of the pooled scatter; left out where
 *     infinite (a stated repeatability)
 * @param scatter covariance from scatter and floors; rows and columns in the order of the
 *     coefficients of this configuration
 * @param factors the shared sources
 */
public record Covariance(
    String configuration,
    OptionalDouble scatterDegreesOfFreedom,
    List<List<Double>> scatter,
    List<SharedFactor> factors) {
  /** Copies the lists. */
  public Covariance {
    scatter = List.copyOf(scatter);
    factors = List.copyOf(factors);
  }
}
