package org.flexbound.study;

import java.util.List;
import java.util.Optional;
import org.flexbound.finding.Where;

/**
 * One thing that may change: a common multiplier of one or several stiffnesses.
 *
 * @param name its name
 * @param scales the stiffnesses it multiplies, e.g. {@code joints.knee.rz}, at least one
 * @param lower the lower bound
 * @param upper the upper bound
 * @param priorStandardDeviation how far from nominal it is expected; empty for (upper − lower)/4 in
 *     the working variable
 * @param working the variable in which it is worked
 * @param referenceMember the beam of a fixity factor and of the classes of joints
 * @param justification the engineer's reason for a change, or empty
 * @param where its place in the study
 */
public record Parameter(
    String name,
    List<String> scales,
    Level lower,
    Level upper,
    Optional<Spread> priorStandardDeviation,
    Working working,
    Optional<String> referenceMember,
    String justification,
    Where where) {
  /** Copies the list. */
  public Parameter {
    scales = List.copyOf(scales);
    if (scales.isEmpty()) {
      throw new IllegalArgumentException("parameter " + name + " scales nothing");
    }
  }
}
