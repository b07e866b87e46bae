package org.flexbound.quantity;

import org.jspecify.annotations.Nullable;

/** The temperature scales, which have an offset and stand by themselves. */
final class TemperatureUnits {
  private TemperatureUnits() {}

  static @Nullable Unit find(String text) {
    return switch (text) {
      case "K" -> new Unit("K", Dimension.TEMPERATURE, 1, 0);
      case "°C", "degC", "℃", "C" -> new Unit("°C", Dimension.TEMPERATURE, 1, 273.15);
      case "°F", "degF", "℉", "F" ->
          new Unit("°F", Dimension.TEMPERATURE, 5.0 / 9.0, 273.15 - 32 * 5.0 / 9.0);
      default -> null;
    };
  }
}
