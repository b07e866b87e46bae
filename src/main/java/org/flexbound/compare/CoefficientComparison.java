package org.flexbound.compare;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;

/**
 * One coefficient, measured against computed.
 *
 * @param configuration the configuration
 * @param gauge the gauge's name
 * @param load the load's name
 * @param measured as measured, SI
 * @param computed as computed, base motion taken out of it in the same way
 * @param difference measured − computed
 * @param ratio measured / computed; empty where the computed one is nothing against its uncertainty
 * @param standardUncertainty of the difference, gains included
 * @param z difference / standard uncertainty
 * @param truncated what truncation does to it; empty where the comparison is with the full flexibility
 * @param fromMeasuredModes what a table of measured modes makes it, base motion taken out in the same
 *     way; empty where there is none, or it lacks a gauge or load
 * @param contributions what each part of the structure contributes to the computed coefficient,
 *     largest in size first
 */
public record CoefficientComparison(
    String configuration,
    String gauge,
    String load,
    double measured,
    double computed,
    double difference,
    OptionalDouble ratio,
    double standardUncertainty,
    double z,
    Optional<Truncated> truncated,
    OptionalDouble fromMeasuredModes,
    List<Contribution> contributions) {
  /** Copies the list. */
  public CoefficientComparison {
    contributions = List.copyOf(contributions);
  }

  /**
   * What the lowest modes leave out of a coefficient of the nominal model.
   *
   * @param full the coefficient of all modes
   * @param remainder full − computed from the lowest modes
   * @param massless the part of it that no number of modes makes up, for freedoms without mass
   * @param within10 from how many modes on the error stays within 10 % of the full coefficient; empty
   *     where more are needed than were worked out
   * @param within5 the same for 5 %
   * @param within1 the same for 1 %
   */
  public record Truncated(
      double full,
      double remainder,
      double massless,
      OptionalInt within10,
      OptionalInt within5,
      OptionalInt within1) {}

  /**
   * What a part of the structure contributes.
   *
   * @param part the part, e.g. {@code joints.knee.rz}
   * @param value the contribution, in the unit of the coefficient; may be negative
   */
  public record Contribution(String part, double value) {}
}
