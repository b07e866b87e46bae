/**
 * Reports: results.json (written and read back), the results workbook, HTML, PDF and figures.
 *
 * <p>In: the results of the earlier rooms, gathered into one {@link
 * org.flexbound.report.results.Results}. Out: files. Every output is drawn from that one record, so
 * that a report can be made again from results.json alone and no two outputs can disagree.
 *
 * <p>Units: SI inside (N, m, rad, kg); the reader of a report chooses the units it is shown in
 * ({@link org.flexbound.report.UnitSystem}). Signs: a motion is positive along (or, by the
 * right-hand rule, about) the direction of its gauge.
 *
 * <ol>
 *   <li>Gather: earlier rooms' results to {@code Results}.
 *   <li>Write results.json: canonical order, no timestamps, names relative; the same results give
 *       the same bytes.
 *   <li>Draw the figures as vector graphics, fill the templates, write workbook, HTML and PDF.
 * </ol>
 */
@NullMarked
package org.flexbound.report;

import org.jspecify.annotations.NullMarked;
