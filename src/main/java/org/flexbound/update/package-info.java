/**
 * The smallest change of a model that agrees with the tests, and what the tests could not tell.
 *
 * <p>In: measured flexibility of one or several configurations, the model's flexibility as a function
 * of the parameters, bounds and prior standard deviations. Out: {@link
 * org.flexbound.update.UpdateResult}. Parameters are worked in a working variable x (by default the
 * natural logarithm of stiffness over nominal stiffness), coefficients in SI.
 *
 * <ol>
 *   <li>All coefficients are whitened by the covariance of scatter and floors; instrument gains are
 *       parameters of their own, with normal priors.
 *   <li>Bounded Gauss–Newton with a trust region minimises ½ misfit + ½ Σ(gain/u)² + ½ μ Σ(x/s)².
 *   <li>The weight μ of the point shown comes from the rule; intervals and statuses always come from
 *       μ = 1.
 *   <li>Singular values, variance removed, collinear groups and profiles say what the data can tell.
 *   <li>Influence, residuals under the covariance, the result without each load case and held-out
 *       load cases say how far the answer can be trusted.
 * </ol>
 */
@NullMarked
package org.flexbound.update;

import org.jspecify.annotations.NullMarked;
