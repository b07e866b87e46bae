/**
 * The figures of a report, as static vector graphics (SVG).
 *
 * <p>In: {@link org.flexbound.report.results.Results} (SI) and the units to show. Out: {@link
 * org.flexbound.report.figures.Figure}s that stand without scripts, on paper, and without colour:
 * whatever colour tells apart, shape, fill or position tells apart too. The palette is that of Okabe
 * and Ito (2008, Color Universal Design), which remains distinct for colour-blind readers.
 *
 * <p>A point that stands for a reading carries a title of its own, which a browser shows when the
 * pointer rests on it.
 */
@NullMarked
package org.flexbound.report.figures;

import org.jspecify.annotations.NullMarked;
