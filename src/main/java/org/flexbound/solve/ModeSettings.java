package org.flexbound.solve;

import java.util.OptionalInt;

/**
 * How modes are worked out.
 *
 * @param count how many elastic modes, at least 1
 * @param pieces into how many pieces every member is divided; empty for as many as its shortest
 *     half-wave at the highest frequency needs
 */
public record ModeSettings(int count, OptionalInt pieces) {
  /** Checks the numbers. */
  public ModeSettings {
    if (count < 1 || (pieces.isPresent() && pieces.getAsInt() < 1)) {
      throw new IllegalArgumentException("at least one mode and one piece a member are needed");
    }
  }

  /**
   * So many modes, members divided by the program.
   *
   * @param count at least 1
   * @return the settings
   */
  public static ModeSettings of(int count) {
    return new ModeSettings(count, OptionalInt.empty());
  }

  /**
   * The same with members divided into so many pieces each.
   *
   * @param number at least 1
   * @return the settings
   */
  public ModeSettings withPieces(int number) {
    return new ModeSettings(count, OptionalInt.of(number));
  }
}
