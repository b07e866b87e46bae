/**
 * The content of a report, in a reader's order, as blocks of text, tables and figures: the same for
 * the web page and for the PDF.
 *
 * <p>In: {@link org.flexbound.report.results.Results} and the units to show. Out: a {@link
 * org.flexbound.report.page.ReportPage}, all values rounded and worded; templates only lay it out.
 * Nothing in it is markup but the figures' graphics: names are text, whatever characters they hold.
 */
@NullMarked
package org.flexbound.report.page;

import org.jspecify.annotations.NullMarked;
