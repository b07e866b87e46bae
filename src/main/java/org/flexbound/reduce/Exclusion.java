package org.flexbound.reduce;

import org.flexbound.finding.Where;

/**
 * Something that was left out of the fits.
 *
 * @param run the run
 * @param what a run, a row or a step
 * @param where its place
 * @param reason why
 * @param byUser true where the user decided, false where a rule of the program did
 * @param readings how many readings
 */
public record Exclusion(
    String run, String what, Where where, String reason, boolean byUser, int readings) {}
