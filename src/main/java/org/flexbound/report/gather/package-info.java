/**
 * Gathers what the earlier rooms found into one {@link org.flexbound.report.results.Results}.
 *
 * <p>In: test logs, reductions, model, comparison, update, as far as a command has them. Out: the
 * content of results.json, SI units, everything in the order of the user's files.
 */
@NullMarked
package org.flexbound.report.gather;

import org.jspecify.annotations.NullMarked;
