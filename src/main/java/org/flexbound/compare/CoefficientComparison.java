package org.flexbound.compare;

import java.util.List;
import java.util.OptionalDouble;

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
 * @param truncation computed in full − computed from the lowest modes; empty where the comparison is
 *     with the full flexibility
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
    OptionalDouble truncation,
    List<Contribution> contributions) {
  /** Copies the list. */
  public CoefficientComparison {
    contributions = List.copyOf(contributions);
  }

  /**
   * What a part of the structure contributes.
   *
   * @param part the part, e.g. {@code joints.knee.rz}
   * @param value the contribution, in the unit of the coefficient; may be negative
   */
  public record Contribution(String part, double value) {}
}
