package org.flexbound.report.results;

/**
 * A reading, a step or a run that was left out of the fits.
 *
 * @param configuration the configuration
 * @param run the run
 * @param what what was left out
 * @param where its cells
 * @param reason why
 * @param by who decided: the user, or the rule of the program
 * @param readings how many readings
 */
public record Exclusion(
    String configuration,
    String run,
    String what,
    String where,
    String reason,
    String by,
    int readings) {}
