package org.flexbound.document;

import java.nio.charset.Charset;
import java.util.Optional;

/**
 * How a CSV file is written, as far as the user says so; what is left open is found out from the
 * text, with a finding.
 *
 * @param separator what stands between fields
 * @param decimalSign point or comma
 * @param charset the encoding; a byte order mark in the file goes before it
 */
public record CsvLayout(
    Optional<Character> separator, Optional<Character> decimalSign, Optional<Charset> charset) {

  /** Nothing is said. */
  public static final CsvLayout FOUND_BY_ITSELF =
      new CsvLayout(Optional.empty(), Optional.empty(), Optional.empty());

  /** Checks that the signs are single bytes that do not stand for something else. */
  public CsvLayout {
    if (separator.filter(sign -> sign >= 128 || sign == '"' || sign == '\n').isPresent()) {
      throw new IllegalArgumentException("no separator: " + separator.orElseThrow());
    }
    if (decimalSign.filter(sign -> sign != '.' && sign != ',').isPresent()) {
      throw new IllegalArgumentException("no decimal sign: " + decimalSign.orElseThrow());
    }
    if (separator.isPresent() && separator.equals(decimalSign)) {
      throw new IllegalArgumentException("separator and decimal sign are the same");
    }
  }
}
