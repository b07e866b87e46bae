package org.flexbound.update;

/**
 * An instrument gain as the fit found it.
 *
 * @param key which gain
 * @param description for the reader
 * @param priorUncertainty its stated standard uncertainty, relative
 * @param fitted the gain at the μ = 1 estimate, relative
 * @param posteriorStandardDeviation after the data, relative
 */
public record GainResult(
    String key,
    String description,
    double priorUncertainty,
    double fitted,
    double posteriorStandardDeviation) {}
