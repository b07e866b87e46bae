/**
 * Statistics: line fits, regression, pooled scatter, quantiles. Pure numerics; knows neither tests
 * nor structures.
 *
 * <p>In: arrays of numbers. Out: records with estimates, their standard errors and the evidence for
 * them. Units are the caller's.
 *
 * <ol>
 *   <li>Straight lines are fitted by least squares with one slope and an intercept for every group
 *       (Draper &amp; Smith, Applied Regression Analysis, 3rd ed., ch. 1 and 14).
 *   <li>Multiple regression goes by Householder QR (EJML), columns scaled to unit length.
 *   <li>Lines with errors in both variables follow York et al. 2004.
 *   <li>Scatter is pooled by a variance model with a floor and a share.
 * </ol>
 */
@NullMarked
package org.flexbound.statistics;

import org.jspecify.annotations.NullMarked;
