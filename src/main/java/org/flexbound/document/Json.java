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
   * The value as it is shown in a message.
   *
   * @return a text in quotes, a number, true or false; objects and lists by their kind
   */
  String shown();

  /**
   * A number in its shortest decimal form, whole numbers without a point.
   *
   * @param value the number
   * @return the text
   */
  static String plain(double value) {
    return DecimalText.shortest(value);
  }

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

    @Override
    public String shown() {
      return "an object";
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

    @Override
    public String shown() {
      return "a list";
    }
  }

  /**
   * A string.
   *
   * @param where its place
   * @param text the text
   */
  record Text(Where where, String text) implements Json {
    @Override
    public String shown() {
      return "\"" + text + "\"";
    }
  }

  /**
   * A number.
   *
   * @param where its place
   * @param value the value
   */
  record Numeral(Where where, double value) implements Json {
    @Override
    public String shown() {
      return plain(value);
    }
  }

  /**
   * A truth value.
   *
   * @param where its place
   * @param value the value
   */
  record Truth(Where where, boolean value) implements Json {
    @Override
    public String shown() {
      return String.valueOf(value);
    }
  }

  /**
   * The literal null.
   *
   * @param where its place
   */
  record Nothing(Where where) implements Json {
    @Override
    public String shown() {
      return "null";
    }
  }
}
