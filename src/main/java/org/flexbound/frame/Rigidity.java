package org.flexbound.frame;

import java.util.Arrays;
import java.util.Optional;

/** A stiffness of a member's cross-section, about (along) the principal axes of the section. */
public enum Rigidity {
  /** Axial, N. */
  EA("EA"),
  /** Bending about y, N·m². */
  EI_Y("EIy"),
  /** Bending about z, N·m². */
  EI_Z("EIz"),
  /** Saint-Venant torsion, N·m². */
  GJ("GJ"),
  /** Shear along y, N; rigid where the section has no shear deformation. */
  GA_Y("GAy"),
  /** Shear along z, N; rigid where the section has no shear deformation. */
  GA_Z("GAz");

  private final String key;

  Rigidity(String key) {
    this.key = key;
  }

  /**
   * The stiffness as files spell it.
   *
   * @return {@code EA} … {@code GAz}
   */
  public String key() {
    return key;
  }

  /**
   * The stiffness that a key names.
   *
   * @param key as in a file
   * @return the stiffness, if there is one
   */
  public static Optional<Rigidity> of(String key) {
    return Arrays.stream(values()).filter(rigidity -> rigidity.key.equals(key)).findFirst();
  }
}
