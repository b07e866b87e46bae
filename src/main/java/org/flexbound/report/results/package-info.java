/**
 * The content of results.json as records: one record for each kind of entry, fields in the order in
 * which they are written, SI units throughout.
 *
 * <p>A field that may be missing is an {@code Optional}; it is then left out of the file. The
 * published schema {@code schema/results.schema.json} explains every field; a test keeps both in
 * step.
 */
@NullMarked
package org.flexbound.report.results;

import org.jspecify.annotations.NullMarked;
