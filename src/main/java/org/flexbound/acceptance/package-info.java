/**
 * Acceptance: is the thing under test stiff enough, and has it changed?
 *
 * <p>In: what a reduction measured, with its covariance by source, the limits of the log or the
 * study, and, where there is a model, its comparison. Out: a {@link
 * org.flexbound.acceptance.Decision} on every limit. SI units; shares are numbers (0.02 = 2 %).
 *
 * <ol>
 *   <li>A limit is resolved to the quantities that it is set on; one that names something unmeasured
 *       is refused.
 *   <li>Each quantity comes with its gradient by the absolute coefficients, from which scatter,
 *       floors and every gain are propagated apart (JCGM 100:2008, 5.1.2; the law of propagation is
 *       linear).
 *   <li>The probability that the true value lies within the limit is that of Student's t about the
 *       value (JCGM 106:2012, clause 7); a repeatability takes χ².
 *   <li>Pass and fail by a stated largest probability of being wrong (guarded acceptance and guarded
 *       rejection, JCGM 106:2012, clause 8); between them the test cannot decide.
 *   <li>Where it cannot, how many more runs would settle it, or which source of uncertainty stands
 *       in the way.
 * </ol>
 */
@NullMarked
package org.flexbound.acceptance;

import org.jspecify.annotations.NullMarked;
