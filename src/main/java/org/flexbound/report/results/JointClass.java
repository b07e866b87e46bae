package org.flexbound.report.results;

/**
 * The class of a joint by its rotational stiffness against that of its beam.
 *
 * @param member the beam
 * @param ratio stiffness of the joint times length over EI of the beam
 * @param en1993 class by EN 1993-1-8:2005, 5.2.2
 * @param aisc360 class by the commentary of ANSI/AISC 360, B3.4
 */
public record JointClass(
    String member,
    double ratio,
    String en1993,
    String aisc360) {}
