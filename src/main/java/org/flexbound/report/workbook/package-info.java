/**
 * results.xlsx: the results for those who carry on in a spreadsheet.
 *
 * <p>In: {@link org.flexbound.report.results.Results} and the units to show. Out: a workbook with
 * real numbers under headers that name their units, frozen headers, and native charts of the
 * load-deflection curves. Texts are stored as texts, also where they begin like a formula.
 */
@NullMarked
package org.flexbound.report.workbook;

import org.jspecify.annotations.NullMarked;
