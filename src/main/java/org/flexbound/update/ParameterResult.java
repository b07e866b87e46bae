package org.flexbound.update;

import java.util.List;
import java.util.Optional;
import org.flexbound.study.Working;

/**
 * One parameter after the update. Factors multiply the nominal stiffness; where the nominal is rigid
 * or free there is no factor, and the values are stiffnesses.
 *
 * @param name its name
 * @param scales what it multiplies
 * @param working the working variable
 * @param stiffnessUnit SI unit of nominal and updated: {@code N/m}, {@code N·m/rad}, … or {@code 1}
 *     where several unlike stiffnesses are tied and values are factors
 * @param nominal nominal stiffness, SI (infinite for rigid); 1 where the unit is 1
 * @param updated updated stiffness at the point shown
 * @param factor updated / nominal; NaN where nominal is rigid or free
 * @param priorMean mean of the prior in the working variable (the nominal)
 * @param workingValue the point shown, in the working variable
 * @param workingEstimate the μ = 1 estimate, in the working variable
 * @param priorStandardDeviation in the working variable
 * @param posteriorStandardDeviation in the working variable
 * @param varianceRemoved share of the prior variance that the data removed, 0 to 1
 * @param lower95 lower end of the 95 % interval, same kind as {@code updated} (a stiffness, or a
 *     factor where the unit is 1); 0 where open
 * @param upper95 upper end; infinite where open
 * @param lowerBound lower bound, same kind
 * @param upperBound upper bound, same kind
 * @param status what the tests can tell
 * @param onBound whether the point shown lies on a bound
 * @param needsReason whether it moved by more than two prior standard deviations or ended on a bound
 *     and has no justification
 * @param justification the engineer's reason, or empty
 * @param classBefore class of the joint before, where a beam is named
 * @param classAfter class of the joint after
 * @param notes remarks for the reader, e.g. that the interval comes from the profile
 */
public record ParameterResult(
    String name,
    List<String> scales,
    Working working,
    String stiffnessUnit,
    double nominal,
    double updated,
    double factor,
    double priorMean,
    double workingValue,
    double workingEstimate,
    double priorStandardDeviation,
    double posteriorStandardDeviation,
    double varianceRemoved,
    double lower95,
    double upper95,
    double lowerBound,
    double upperBound,
    Status status,
    boolean onBound,
    boolean needsReason,
    String justification,
    Optional<JointClass> classBefore,
    Optional<JointClass> classAfter,
    List<String> notes) {
  /** Copies the lists. */
  public ParameterResult {
    scales = List.copyOf(scales);
    notes = List.copyOf(notes);
  }
}
