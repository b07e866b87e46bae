package org.flexbound.frame;

import org.flexbound.finding.Where;

/**
 * A rigid link: the second node moves with the first as one rigid body.
 *
 * @param from the node that leads
 * @param to the node that follows
 * @param where its place in the user's file
 */
public record RigidLink(String from, String to, Where where) {}
