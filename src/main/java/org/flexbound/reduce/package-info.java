/**
 * The reduction: readings to flexibility coefficients, with a verdict on every run.
 *
 * <p>In: a test log, and where the nodes of a model stand if there is one. Out: {@link
 * org.flexbound.reduce.Reduction}. SI units; a motion is positive along the gauge's direction, a
 * load along its own.
 *
 * <ol>
 *   <li>Rows at one held load become a step: their mean.
 *   <li>Turning points of the load part the steps into branches and cycles; the first cycle is left
 *       out where there are others.
 *   <li>In each run a line with one slope and an intercept for each branch is fitted to the steps
 *       within the fit range (several loads that move independently: multiple regression).
 *   <li>Faults of gauges and load columns are looked for in the readings of all runs: flat, lost,
 *       stepped, drifting, kinked or coarse ones, a cell's zero that moved, a load past its limit or off
 *       its line; each run is held against the others of its load. Nothing found is put right.
 *   <li>Over runs the slopes are averaged; scatter is pooled over all absolute coefficients by a
 *       variance model (floor and share).
 *   <li>Calibration enters as gains of instruments, shared by all that they read; fixed floors as
 *       √2·u₀/ΔP for a gauge and relative √2·u₀/ΔP for a load.
 *   <li>Base motion is taken out by a linear map, only where the base gauges determine it.
 *   <li>The absolute matrix is held against what every elastic structure keeps.
 * </ol>
 */
@NullMarked
package org.flexbound.reduce;

import org.jspecify.annotations.NullMarked;
