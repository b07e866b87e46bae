package org.flexbound.solve;

import org.flexbound.frame.StiffnessPath;

/**
 * What one part adds to one coefficient.
 *
 * @param part the part: a member's stiffness, or a component of a joint at members' ends, of a
 *     connection or of a support
 * @param value in the unit of the coefficient; a part of a cross coefficient may be negative
 */
public record PartContribution(StiffnessPath part, double value) {}
