package org.flexbound.report.results;

/**
 * A file that was read.
 *
 * @param file its name, relative to the file that names it
 * @param sha256 its SHA-256 checksum, 64 lower-case hexadecimal digits
 */
public record Input(
    String file,
    String sha256) {}
