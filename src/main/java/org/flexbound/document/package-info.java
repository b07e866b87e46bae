/**
 * Documents: JSON, sheets and CSV as values that know their place; schema checking; atomic writing.
 *
 * <p>In: files. Out: {@link org.flexbound.document.Json} values and {@link
 * org.flexbound.document.Sheet} rows, each with its place for messages, and findings. No units and
 * no meaning: that is for the rooms which read them.
 */
@NullMarked
package org.flexbound.document;

import org.jspecify.annotations.NullMarked;
