package org.flexbound.testlog;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.flexbound.document.EntryTable;
import org.flexbound.quantity.Unit;
import org.flexbound.quantity.UnitException;
import org.flexbound.quantity.Units;

/**
 * A header such as {@code Weg 1 [mm]}, parted into the column's name and its unit.
 *
 * @param name the name
 * @param unit the unit as written; empty where none stands
 */
record HeaderText(String name, String unit) {
  /** How loggers write a unit after a name: in parentheses, or after a stroke or "in". */
  private static final List<Pattern> OTHERS =
      List.of(
          Pattern.compile("(.+?)\\s*\\(([^()]*)\\)"),
          Pattern.compile("(.+?)\\s+/\\s*(\\S+)"),
          Pattern.compile("(.+?)\\s+in\\s+(\\S+)", Pattern.CASE_INSENSITIVE));

  /** A name as it is compared: upper and lower case alike, without blanks around it. */
  static String key(String text) {
    return text.strip().toLowerCase(Locale.ROOT);
  }

  /**
   * The key of a column that a load or a gauge claims: the same whether or not the unit is written
   * with it.
   */
  static String claimedKey(String text) {
    String[] parts = EntryTable.nameAndUnit(text);
    return parts[1].isEmpty() || unit(parts[1]).isEmpty() ? key(text) : key(parts[0]);
  }

  /** Parts a header so that its name is one of those known, if it can be. */
  static HeaderText of(String text, Set<String> known) {
    String[] bracketed = EntryTable.nameAndUnit(text);
    HeaderText usual = new HeaderText(bracketed[0], bracketed[1]);
    List<HeaderText> ways = new ArrayList<>();
    ways.add(usual);
    HeaderText other = usual;
    for (Pattern pattern : OTHERS) {
      Matcher matcher = pattern.matcher(text.strip());
      if (matcher.matches() && unit(matcher.group(2)).isPresent()) {
        other = new HeaderText(matcher.group(1), matcher.group(2).strip());
        ways.add(other);
      }
    }
    if (known.contains(key(text))) {
      return new HeaderText(text.strip(), other.unit());
    }
    return ways.stream().filter(way -> known.contains(key(way.name()))).findFirst().orElse(usual);
  }

  /** A unit in brackets or bare, if it is one; pure numbers are none. */
  static Optional<Unit> unit(String text) {
    String bare = bare(text);
    if (bare.isEmpty() || bare.chars().allMatch(Character::isDigit)) {
      return Optional.empty();
    }
    try {
      return Optional.of(Units.parse(bare));
    } catch (UnitException none) {
      return Optional.empty();
    }
  }

  /** A unit without its brackets or parentheses. */
  static String bare(String text) {
    String stripped = text.strip();
    boolean framed =
        (stripped.startsWith("[") && stripped.endsWith("]"))
            || (stripped.startsWith("(") && stripped.endsWith(")"));
    return framed ? stripped.substring(1, stripped.length() - 1).strip() : stripped;
  }
}
