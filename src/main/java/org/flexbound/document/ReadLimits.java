package org.flexbound.document;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/**
 * How much of a file is read before it is refused: generous bounds that keep a broken or hostile
 * file from taking all memory or all day. A refusal names the limit that was passed.
 *
 * @param rows rows of one sheet or CSV file
 * @param cells cells of one sheet or CSV file that are not blank
 * @param sheets sheets of one workbook
 * @param inflatedBytes bytes of one part of a workbook once unpacked, and of a CSV file
 * @param sharedTextBytes bytes of the shared texts of one workbook once unpacked; they are held in
 *     memory
 * @param textLength characters of one cell or one JSON string
 * @param jsonBytes bytes of one JSON file
 * @param jsonDepth values inside one another in a JSON file
 * @param nodes nodes of one frame model
 */
public record ReadLimits(
    long rows,
    long cells,
    int sheets,
    long inflatedBytes,
    long sharedTextBytes,
    int textLength,
    long jsonBytes,
    int jsonDepth,
    int nodes) {

  /** What serves unless the user says otherwise. */
  public static final ReadLimits USUAL =
      new ReadLimits(
          20_000_000L, 500_000_000L, 1_000, 4L << 30, 128L << 20, 1_000_000, 256L << 20, 100, 1_000_000);

  /** Checks that every limit lets something through. */
  public ReadLimits {
    if (Math.min(Math.min(rows, cells), Math.min(inflatedBytes, jsonBytes)) < 1
        || sharedTextBytes < 1
        || Math.min(Math.min(sheets, textLength), Math.min(jsonDepth, nodes)) < 1) {
      throw new IllegalArgumentException("a limit on reading is at least 1");
    }
  }

  /**
   * The limits by the names that messages and options use, in a fixed order.
   *
   * @return name to value
   */
  public Map<String, Long> byName() {
    Map<String, Long> names = new LinkedHashMap<>();
    names.put("rows", rows);
    names.put("cells", cells);
    names.put("sheets", (long) sheets);
    names.put("inflated-bytes", inflatedBytes);
    names.put("shared-text-bytes", sharedTextBytes);
    names.put("text-length", (long) textLength);
    names.put("json-bytes", jsonBytes);
    names.put("json-depth", (long) jsonDepth);
    names.put("nodes", (long) nodes);
    return names;
  }

  /**
   * The same limits with one changed.
   *
   * @param name its name as in {@link #byName}
   * @param value its new value, at least 1
   * @return the limits; empty where there is no limit of that name
   */
  public Optional<ReadLimits> with(String name, long value) {
    Map<String, Long> names = byName();
    if (names.replace(name, value) == null) {
      return Optional.empty();
    }
    Long[] all = names.values().toArray(new Long[0]);
    return Optional.of(
        new ReadLimits(
            all[0],
            all[1],
            Math.toIntExact(all[2]),
            all[3],
            all[4],
            Math.toIntExact(all[5]),
            all[6],
            Math.toIntExact(all[7]),
            Math.toIntExact(all[8])));
  }
}
