package org.flexbound.frame;

import java.util.Collections;
import java.util.EnumMap;
import java.util.Map;
import java.util.Optional;
import org.flexbound.finding.Where;
import org.flexbound.setup.Vector;

/**
 * A member. From a node to its flexible part: the rigid end offset, then the joint, then the
 * flexible part.
 *
 * @param name its name
 * @param startNode the first node
 * @param endNode the second node
 * @param section the section (at the start, where it tapers)
 * @param endSection the section at the end of a member that tapers linearly in its dimensions
 * @param material the material
 * @param reference the direction in whose plane with x the member's z lies; empty for the model's up
 * @param startOffset from the first node to the start of the flexible part, m, global axes
 * @param endOffset from the second node to the end of the flexible part, m, global axes
 * @param startJoint the joint at the start; empty for none (rigid)
 * @param endJoint the joint at the end; empty for none (rigid)
 * @param massPerLength non-structural mass, kg/m
 * @param factors what an update made of its stiffnesses
 * @param where its place in the user's file
 */
public record Member(
    String name,
    String startNode,
    String endNode,
    String section,
    Optional<String> endSection,
    String material,
    Optional<Vector> reference,
    Vector startOffset,
    Vector endOffset,
    Optional<String> startJoint,
    Optional<String> endJoint,
    double massPerLength,
    Map<Rigidity, StiffnessSetting> factors,
    Where where) {
  /** Copies the map. */
  public Member {
    Map<Rigidity, StiffnessSetting> copy = new EnumMap<>(Rigidity.class);
    copy.putAll(factors);
    factors = Collections.unmodifiableMap(copy);
  }

  /**
   * What an update made of a stiffness.
   *
   * @param rigidity which
   * @return the setting, nominal where there is none
   */
  public StiffnessSetting factor(Rigidity rigidity) {
    return factors.getOrDefault(rigidity, StiffnessSetting.nominal());
  }

  Member withFactors(Map<Rigidity, StiffnessSetting> next) {
    return new Member(
        name,
        startNode,
        endNode,
        section,
        endSection,
        material,
        reference,
        startOffset,
        endOffset,
        startJoint,
        endJoint,
        massPerLength,
        next,
        where);
  }
}
