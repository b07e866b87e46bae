package org.flexbound.acceptance;

import java.util.List;
import java.util.Optional;

/**
 * A test as its results.json keeps it: what later tests are compared with.
 *
 * @param name how it is named to the reader, such as its file
 * @param date ISO 8601, or empty
 * @param coefficients its coefficients
 * @param covariances their covariance, one entry for each configuration, ordered as its coefficients
 * @param parameters the parameters of its update; empty where there was none
 */
public record KeptTest(
    String name,
    String date,
    List<Value> coefficients,
    List<Covariance> covariances,
    List<ParameterValue> parameters) {
  /** Copies the lists. */
  public KeptTest {
    coefficients = List.copyOf(coefficients);
    covariances = List.copyOf(covariances);
    parameters = List.copyOf(parameters);
  }

  /**
   * A coefficient.
   *
   * @param configuration the configuration
   * @param gauge the gauge
   * @param load the load
   * @param place where gauge and load are and in which directions, in words that can be compared;
   *     empty where not known
   * @param value motion per load, SI
   * @param unit the SI unit
   * @param standardUncertainty from all sources
   * @param scatter its part from run-to-run scatter
   */
  public record Value(
      String configuration,
      String gauge,
      String load,
      String place,
      double value,
      String unit,
      double standardUncertainty,
      double scatter) {
    /**
     * What makes it the same coefficient in another test.
     *
     * @return configuration, gauge and load
     */
    public String key() {
      return configuration + " | " + gauge + " | " + load;
    }

    /**
     * The coefficient for the reader.
     *
     * @return gauge and load
     */
    public String name() {
      return gauge + " under " + load;
    }
  }

  /**
   * The covariance of one configuration.
   *
   * @param configuration the configuration
   * @param scatterDegreesOfFreedom of the pooled scatter; infinite where stated
   * @param scatter from scatter and floors
   * @param shared the shared sources
   */
  public record Covariance(
      String configuration,
      double scatterDegreesOfFreedom,
      List<List<Double>> scatter,
      List<Shared> shared) {
    /** Copies the lists. */
    public Covariance {
      scatter = List.copyOf(scatter);
      shared = List.copyOf(shared);
    }
  }

  /**
   * A source that several coefficients share.
   *
   * @param description for the reader
   * @param calibration what makes it the same error in another test: serial number, certificate and
   *     date of calibration; empty where these are not stated or where it is no calibration
   * @param instrument what makes it the same instrument, or empty
   * @param effect what one standard uncertainty of it changes in each coefficient, SI
   */
  public record Shared(
      String description,
      Optional<String> calibration,
      String instrument,
      List<Double> effect) {
    /** Copies the list. */
    public Shared {
      effect = List.copyOf(effect);
    }
  }

  /**
   * A parameter of an update.
   *
   * @param name its name
   * @param unit the SI unit of its value
   * @param value the updated stiffness, SI, or factor
   * @param standardUncertainty of the value, to the first order; NaN where not known
   * @param working its value in the working variable
   */
  public record ParameterValue(
      String name, String unit, double value, double standardUncertainty, double working) {}
}
