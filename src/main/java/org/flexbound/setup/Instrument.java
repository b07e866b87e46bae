package org.flexbound.setup;

import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.finding.Where;

/**
 * A load cell or a transducer with its calibration. Its error has two parts: a share of the reading
 * (a gain, common to all its readings) and a fixed floor.
 *
 * @param name its name
 * @param kind what it is, in the user's words
 * @param serial its serial number, or empty
 * @param calibrationReference the certificate, or empty; the same instrument with the same
 *     reference has the same gain
 * @param calibrationDate as written, or empty
 * @param gainUncertainty standard uncertainty (k = 1) of the gain, relative; empty where not stated
 * @param floorUncertainty standard uncertainty (k = 1) of the fixed part, SI; empty where not
 *     stated
 * @param resolution smallest step it shows, SI
 * @param range largest reading it can show, SI
 * @param where its place in the user's file
 */
public record Instrument(
    String name,
    String kind,
    String serial,
    String calibrationReference,
    String calibrationDate,
    OptionalDouble gainUncertainty,
    OptionalDouble floorUncertainty,
    OptionalDouble resolution,
    OptionalDouble range,
    Where where) {

  /**
   * What tells one gain from another: the same instrument under the same calibration.
   *
   * @return name (or serial number, where stated) and calibration reference
   */
  public String gainKey() {
    String identity = serial.isEmpty() ? name : serial;
    return calibrationReference.isEmpty() ? identity : identity + " / " + calibrationReference;
  }

  /**
   * Whether nothing at all is known of its calibration.
   *
   * @return true if neither gain nor floor is stated
   */
  public boolean uncalibrated() {
    return gainUncertainty.isEmpty() && floorUncertainty.isEmpty();
  }

  /**
   * The sentence for results that lack this instrument's part.
   *
   * @return the name with the certificate, if any
   */
  public Optional<String> certificate() {
    return calibrationReference.isEmpty() ? Optional.empty() : Optional.of(calibrationReference);
  }
}
