package org.flexbound.frame;

import org.flexbound.finding.Where;

/**
 * A joint: springs between two nodes or at a member's end. A component that is not stated is rigid.
 *
 * @param name its name
 * @param springs the stiffnesses
 * @param where its place in the user's file
 */
public record Joint(String name, SpringSet springs, Where where) {}
