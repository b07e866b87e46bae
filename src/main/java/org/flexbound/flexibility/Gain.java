package org.flexbound.flexibility;

/**
 * A relative error common to many absolute coefficients: reading = (1 + gain) · truth.
 *
 * <p>An instrument's calibration is one gain, shared by everything it read under the same
 * calibration; a load instrument's fixed floor is one gain for each load point (common to all
 * gauges of that column); scatter that all gauges of a load's runs share is one for each load of
 * each test.
 *
 * @param key what makes it the same gain elsewhere: instrument and calibration
 * @param description for the reader, e.g. {@code load cell C1, certificate 4711}
 * @param priorUncertainty standard uncertainty (k = 1), relative
 * @param ofOneTest true where the error belongs to this test alone, whatever calibration was used
 */
public record Gain(String key, String description, double priorUncertainty, boolean ofOneTest) {
  /**
   * The gain of a calibration: the same wherever the instrument was used under it.
   *
   * @param key what makes it the same gain elsewhere
   * @param description for the reader
   * @param priorUncertainty standard uncertainty (k = 1), relative
   */
  public Gain(String key, String description, double priorUncertainty) {
    this(key, description, priorUncertainty, false);
  }
}
