package org.flexbound.report.results;

/**
 * What wrong data look like: a guess with its evidence, never applied.
 *
 * @param looksLike what it looks like
 * @param because the evidence
 * @param before misfit as measured
 * @param after misfit had the guess been put right
 */
public record Hint(String looksLike, String because, double before, double after) {}
