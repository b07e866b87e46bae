package org.flexbound.document;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.flexbound.finding.Where;

/** A JSON value (RFC 8259) that knows its place in the file it came from. */
public sealed interface Json {
  /**
   * Where the value stands.
   *
   * @return file, JSON pointer and line
   */
  Where where();

  /**
   * An object; members keep the order of the file.
   *
   * @param where its place
   * @param members the members by name, in the order of the file
   */
  record Members(Where where, Map<String, Json> members) implements Json {
    /** Copies the map and keeps its order. */
    public Members {
      members = Collections.unmodifiableMap(new LinkedHashMap<>(members));
    }

    /**
     * One member.
     *
     * @param name its name
     * @return the value, if there is one of that name
     */
    public Optional<Json> get(String name) {
      return Optional.ofNullable(members.get(name));
    }
  }

  /**
   * An array.
   *
   * @param where its place
   * @param items the items in order
   */
  record Items(Where where, List<Json> items) implements Json {
    /** Copies the list. */
    public Items {
      items = List.copyOf(items);
    }
  }

  /**
   * A string.
   *
   * @param where its place
   * @param text the text
   */
  record Text(Where where, String text) implements Json {}

  /**
   * A number.
   *
   * @param where its place
   * @param value the value
   */
  record Numeral(Where where, double value) implements Json {}

  /**
   * A truth value.
   *
   * @param where its place
   * @param value the value
   */
  record Truth(Where where, boolean value) implements Json {}

  /**
   * The literal null.
   *
   * @param where its place
   */
  record Nothing(Where where) implements Json {}
}
