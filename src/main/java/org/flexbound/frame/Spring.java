package org.flexbound.frame;

import java.util.Arrays;
import java.util.Locale;
import java.util.Optional;

/** A component of a joint, a connection or a support, in its own axes. */
public enum Spring {
  /** Along x. */
  X(0),
  /** Along y. */
  Y(1),
  /** Along z. */
  Z(2),
  /** About x. */
  RX(3),
  /** About y. */
  RY(4),
  /** About z. */
  RZ(5);

  private final int index;

  Spring(int index) {
    this.index = index;
  }

  /**
   * Its place among six.
   *
   * @return 0 for x … 5 for rz
   */
  public int index() {
    return index;
  }

  /**
   * The component as files spell it.
   *
   * @return {@code x} … {@code rz}
   */
  public String key() {
    return name().toLowerCase(Locale.ROOT);
  }

  /**
   * Whether it resists a rotation.
   *
   * @return true for N·m/rad, false for N/m
   */
  public boolean rotation() {
    return index >= 3;
  }

  /**
   * The component that a key names.
   *
   * @param key as in a file
   * @return the component, if there is one
   */
  public static Optional<Spring> of(String key) {
    return Arrays.stream(values()).filter(spring -> spring.key().equals(key)).findFirst();
  }
}
