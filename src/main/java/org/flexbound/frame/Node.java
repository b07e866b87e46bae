package org.flexbound.frame;

import org.flexbound.finding.Where;
import org.flexbound.setup.Vector;

/**
 * A node.
 *
 * @param name its name
 * @param place its place, m, global axes
 * @param where its place in the user's file
 */
public record Node(String name, Vector place, Where where) {}
