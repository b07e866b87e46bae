package org.flexbound.document;

import tools.jackson.core.JacksonException;
import tools.jackson.core.exc.UnexpectedEndOfInputException;

/** Says in plain words what breaks the rules of JSON. */
final class JsonSyntax {
  private JsonSyntax() {}

  /** What was found and expected, for the commonest slips; the parser's own words for the others. */
  static String words(JacksonException broken, String text, int line) {
    String own = String.valueOf(broken.getOriginalMessage());
    String shown = text.lines().skip(line - 1L).findFirst().orElse("").strip();
    if (shown.length() > 60) {
      shown = shown.substring(0, 57) + "…";
    }
    if (broken instanceof UnexpectedEndOfInputException || own.contains("end-of-input")) {
      return "the file ends in the middle of a value; expected a closing bracket, brace or quote";
    }
    if (own.contains("maybe a (non-standard) comment") || shown.startsWith("//")
        || shown.startsWith("/*") || shown.startsWith("#")) {
      return "found a comment ('" + shown + "'); JSON has no comments";
    }
    if (own.contains("Non-standard token 'NaN'") || own.contains("INF") || own.contains("Infinity")) {
      return "found NaN or Infinity in '" + shown + "'; expected a number";
    }
    if (own.contains("Leading zeroes") || own.contains("leading zero")) {
      return "found a number that begins with 0 in '" + shown + "'; expected it without";
    }
    if (own.contains("was expecting double-quote to start property name")) {
      return "found '"
          + shown
          + "'; expected a key in double quotes (a comma before a closing brace is one too many)";
    }
    if (own.contains("was expecting comma to separate")) {
      return "found '" + shown + "'; expected a comma between the values before it and here";
    }
    return "found '" + shown + "'; " + own.substring(0, 1).toLowerCase(java.util.Locale.ROOT)
        + own.substring(1);
  }
}
