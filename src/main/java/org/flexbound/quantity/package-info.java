/**
 * Units and dimensions: spellings that people use, turned into SI values.
 *
 * <p>In: texts from files. Out: {@link org.flexbound.quantity.Unit}, {@link
 * org.flexbound.quantity.Quantity} and {@link org.flexbound.quantity.Uncertain} values. Inside the
 * program everything is in SI units (m, N, kg, s, rad); a unit is met only at the edge, where files
 * are read and reports written. Factors follow NIST Special Publication 811 (2008), appendix B.
 *
 * <ol>
 *   <li>A text is split at products, quotients and powers; each piece is looked up in the table.
 *   <li>The dimension that results is checked against the one asked for.
 * </ol>
 */
@NullMarked
package org.flexbound.quantity;

import org.jspecify.annotations.NullMarked;
