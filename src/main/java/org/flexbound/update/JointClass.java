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
public record JointClass(String member, double ratio, String en1993, String aisc360) {
  /** EN 1993-1-8:2005, 5.2.2.5, from memory: k_b of braced frames. */
  private static final double BRACED = 8;

  /** EN 1993-1-8:2005, 5.2.2.5, from memory: k_b of other frames. */
  private static final double UNBRACED = 25;

  /** EN 1993-1-8:2005, 5.2.2.5, from memory: nominally pinned. */
  private static final double PINNED = 0.5;

  /** ANSI/AISC 360 commentary, B3.4, from memory: fully restrained. */
  private static final double RESTRAINED = 20;

  /** ANSI/AISC 360 commentary, B3.4, from memory: simple. */
  private static final double SIMPLE = 2;

  /**
   * Classes a joint.
   *
   * @param member the beam
   * @param stiffness S_j, N·m/rad
   * @param beamStiffness E I/L of the beam, N·m
   * @return the class by both
   */
  public static JointClass of(String member, double stiffness, double beamStiffness) {
    double ratio = stiffness / beamStiffness;
    String en;
    if (ratio <= PINNED) {
      en = "nominally pinned";
    } else if (ratio < BRACED) {
      en = "semi-rigid";
    } else {
      en = ratio < UNBRACED ? "rigid in braced frames, else semi-rigid" : "rigid";
    }
    String aisc =
        ratio >= RESTRAINED
            ? "fully restrained"
            : ratio <= SIMPLE ? "simple" : "partially restrained";
    return new JointClass(member, ratio, en, aisc);
  }
}
