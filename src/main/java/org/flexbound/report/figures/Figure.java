package org.flexbound.report.figures;

/**
 * A figure ready to stand in a page.
 *
 * @param id a name unique in the report, of letters, digits and hyphens
 * @param heading what is drawn
 * @param caption what to see in it
 * @param svg the graphic: one {@code svg} element with its title and description
 */
public record Figure(String id, String heading, String caption, String svg) {}
