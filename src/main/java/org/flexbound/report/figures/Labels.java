package org.flexbound.report.figures;

/** Names as they fit into a figure. */
final class Labels {
  private static final int LONGEST = 48;

  private Labels() {}

  /** A long name with its middle left out. */
  static String brief(String name) {
    return brief(name, LONGEST);
  }

  /** A name longer than so many characters with its middle left out. */
  static String brief(String name, int longest) {
    int[] points = name.codePoints().map(p -> p < 0x20 ? ' ' : p).toArray();
    if (points.length <= longest) {
      return new String(points, 0, points.length);
    }
    int head = longest * 2 / 3;
    int tail = longest - head - 1;
    return new String(points, 0, head) + "…" + new String(points, points.length - tail, tail);
  }

  /** Gauge and load, with the configuration where there are several. */
  static String coefficient(boolean several, String configuration, String gauge, String load) {
    return (several ? configuration + ": " : "") + gauge + " / " + load;
  }
}
