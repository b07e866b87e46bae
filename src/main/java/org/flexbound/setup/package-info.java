/**
 * The setup of a test: what stands where and what was asked for.
 *
 * <p>Places, directions, load points and patterns, gauges, instruments with their calibration,
 * reduction options, quality figures and limits, as types. Lengths in m, forces in N, angles in
 * rad, global right-handed axes; a reading is positive along (or, by the right-hand rule, about)
 * its direction.
 *
 * <p>In: what the readers of the load-test workbook and of the study make out. Out: immutable
 * values used by every later room.
 */
@NullMarked
package org.flexbound.setup;

import org.jspecify.annotations.NullMarked;
