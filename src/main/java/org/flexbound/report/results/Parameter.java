package org.flexbound.report.results;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A stiffness that the update may change, or several tied together.
 *
 * @param name its name in the study
 * @param scales what it scales
 * @param unit the SI unit of nominal, updated and bounds; 1 where several unlike stiffnesses
 *     are tied and they are factors
 * @param nominal nominal stiffness, SI; left out where it is rigid
 * @param updated updated stiffness at the point shown, SI; left out where it is rigid
 * @param factor updated over nominal; left out where the nominal is rigid or free
 * @param lowerBound lower bound, in the unit
 * @param upperBound upper bound, in the unit; left out where it is rigid
 * @param working the working variable: ln (logarithm of the factor), compliance or fixity
 * @param priorMean mean of the prior, in the working variable
 * @param workingValue the point shown, in the working variable
 * @param workingEstimate the estimate at weight 1, in the working variable
 * @param priorStandardDeviation standard deviation of the prior, in the working variable
 * @param posteriorStandardDeviation standard deviation after the data (at weight 1), in the
 *     working variable
 * @param varianceRemoved share of the prior variance that the data removed, 0 to 1
 * @param lower95 lower end of the 95 % interval, in the unit; left out where it is open
 * @param upper95 upper end of the 95 % interval, in the unit; left out where it is open
 * @param status identified, identified only in combination, weakly identified, not
 *     identifiable from this test, lower limit only or upper limit only
 * @param onBound whether the point shown lies on a bound
 * @param needsReason whether it moved far, or ended on a bound, without a justification
 * @param justification the reason for a change, as the study states it; or empty
 * @param classBefore class of the joint with its nominal stiffness
 * @param classAfter class of the joint with its updated stiffness
 * @param notes remarks for the reader
 * @param profile the misfit against this parameter, where it says more than the standard
 *     deviation
 */
public record Parameter(
    String name,
    List<String> scales,
    String unit,
    OptionalDouble nominal,
    OptionalDouble updated,
    OptionalDouble factor,
    OptionalDouble lowerBound,
    OptionalDouble upperBound,
    String working,
    double priorMean,
    double workingValue,
    double workingEstimate,
    double priorStandardDeviation,
    double posteriorStandardDeviation,
    double varianceRemoved,
    OptionalDouble lower95,
    OptionalDouble upper95,
    String status,
    boolean onBound,
    boolean needsReason,
    String justification,
    Optional<JointClass> classBefore,
    Optional<JointClass> classAfter,
    List<String> notes,
    Optional<Profile> profile) {
  /** Copies the lists. */
  public Parameter {
    scales = List.copyOf(scales);
    notes = List.copyOf(notes);
  }
}
