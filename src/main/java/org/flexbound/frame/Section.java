package org.flexbound.frame;

import org.flexbound.finding.Where;

/**
 * A cross-section.
 *
 * @param name its name
 * @param shape by numbers or by a shape
 * @param where its place in the user's file
 */
public record Section(String name, SectionShape shape, Where where) {}
