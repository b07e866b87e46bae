package org.flexbound.frame;

import java.util.Locale;
import java.util.Map;
import org.flexbound.document.Json;

/** The text of a tree of values: two blanks a level, short lists and small objects on one line. */
final class JsonText {
  private static final int LINE = 88;

  private final StringBuilder text = new StringBuilder();

  private JsonText() {}

  static String of(Json value) {
    JsonText writer = new JsonText();
    writer.write(value, 0);
    return writer.text.append('\n').toString();
  }

  private void write(Json value, int depth) {
    String flat = flat(value);
    boolean top = depth <= 1 && value instanceof Json.Members;
    if (!top && flat.length() + 2 * depth <= LINE) {
      text.append(flat);
      return;
    }
    if (value instanceof Json.Members members && !members.members().isEmpty()) {
      String comma = "{\n";
      for (Map.Entry<String, Json> entry : members.members().entrySet()) {
        text.append(comma).append("  ".repeat(depth + 1)).append(quoted(entry.getKey()));
        text.append(": ");
        write(entry.getValue(), depth + 1);
        comma = ",\n";
      }
      text.append('\n').append("  ".repeat(depth)).append('}');
    } else if (value instanceof Json.Items items && !items.items().isEmpty()) {
      String comma = "[\n";
      for (Json item : items.items()) {
        text.append(comma).append("  ".repeat(depth + 1));
        write(item, depth + 1);
        comma = ",\n";
      }
      text.append('\n').append("  ".repeat(depth)).append(']');
    } else {
      text.append(flat);
    }
  }

  private static String flat(Json value) {
    if (value instanceof Json.Text t) {
      return quoted(t.text());
    }
    if (value instanceof Json.Numeral n) {
      return Json.plain(n.value());
    }
    if (value instanceof Json.Truth t) {
      return String.valueOf(t.value());
    }
    StringBuilder line = new StringBuilder();
    if (value instanceof Json.Items items) {
      line.append('[');
      String comma = "";
      for (Json item : items.items()) {
        line.append(comma).append(flat(item));
        comma = ", ";
      }
      return line.append(']').toString();
    }
    if (value instanceof Json.Members members) {
      line.append('{');
      String comma = "";
      for (Map.Entry<String, Json> entry : members.members().entrySet()) {
        line.append(comma).append(quoted(entry.getKey())).append(": ");
        line.append(flat(entry.getValue()));
        comma = ", ";
      }
      return line.append('}').toString();
    }
    return "null";
  }

  private static String quoted(String raw) {
    StringBuilder quoted = new StringBuilder("\"");
    for (int i = 0; i < raw.length(); i++) {
      char c = raw.charAt(i);
      if (c == '"' || c == '\\') {
        quoted.append('\\').append(c);
      } else if (c < 0x20) {
        quoted.append(String.format(Locale.ROOT, "\\u%04x", (int) c));
      } else {
        quoted.append(c);
      }
    }
    return quoted.append('"').toString();
  }
}
