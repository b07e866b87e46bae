package org.flexbound.update;

/**
 * The class of a joint by its rotational stiffness against that of its beam.
 *
 * @param member the beam
 * @param ratio S_j L/(E I)
 * @param en1993 by EN 1993-1-8:2005, 5.2.2, e.g. {@code semi-rigid} (limits from memory: confirm
 *     against the standard)
 * @param aisc360 by the commentary of ANSI/AISC 360, B3.4 (limits from memory: confirm)
 */
public record JointClass(String member, double ratio, String en1993, String aisc360) {}
