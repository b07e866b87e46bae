package org.flexbound.report.results;

/**
 * Something the user should know, tied to its place.
 *
 * @param severity error, warning or note
 * @param code the stable code of its kind
 * @param message what was found and what was expected
 * @param where file, sheet and cell, or JSON path and line; empty for the whole
 * @param remedy what to do
 */
public record Finding(
    String severity,
    String code,
    String message,
    String where,
    String remedy) {}
