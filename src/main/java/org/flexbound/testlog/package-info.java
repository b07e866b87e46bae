/**
 * The load-test log: the workbook and foreign spreadsheets, read into runs of readings of which each
 * knows its cell.
 *
 * <p>In: a workbook, or a JSON description with the files it names. Out: a test log: what stands
 * where (rooms of {@code setup}), and runs whose readings are streamed in SI units. Signs are those
 * of the user's directions.
 */
@NullMarked
package org.flexbound.testlog;

import org.jspecify.annotations.NullMarked;
