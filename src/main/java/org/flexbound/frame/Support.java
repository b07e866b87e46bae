package org.flexbound.frame;

import org.flexbound.finding.Where;

/**
 * What holds a node to the ground. A component that is not stated is free; a rigid one is fixed.
 *
 * @param node the node's name
 * @param springs the stiffnesses
 * @param axes its axes
 * @param where its place in the user's file
 */
public record Support(String node, SpringSet springs, Axes axes, Where where) {}
