package org.flexbound.testlog;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.regex.Pattern;
import org.flexbound.document.CellKind;
import org.flexbound.document.EntryTable;
import org.flexbound.finding.Findings;
import org.flexbound.quantity.Dimension;
import org.flexbound.quantity.Unit;
import org.flexbound.quantity.UnitException;
import org.flexbound.quantity.Units;

/** Takes typed entries out of the cells of an entry sheet, with a finding for each that is wrong. */
final class EntryCells {
  private static final Pattern PLAIN_NUMBER =
      Pattern.compile("[-+]?([0-9]+(\\.[0-9]*)?|\\.[0-9]+)([eE][-+]?[0-9]+)?");
  private static final Pattern COMMA_NUMBER = Pattern.compile("[-+]?[0-9]+,[0-9]{1,2}|[-+]?[0-9]+,[0-9]{4,}");

  private final Findings findings;

  EntryCells(Findings findings) {
    this.findings = findings;
  }

  /** A text that must be there. */
  Optional<String> need(EntryTable.Entry entry, String column) {
    EntryTable.Value value = entry.get(column);
    if (value.isBlank()) {
      findings.add(
          TestlogFinding.MISSING_ENTRY, value.where(), "found nothing; expected " + column);
      return Optional.empty();
    }
    return Optional.of(value.text());
  }

  /** A text, empty if blank. */
  static String text(EntryTable.Entry entry, String column) {
    return entry.get(column).text();
  }

  /** A text that names something, if there is one. */
  static Optional<String> name(EntryTable.Entry entry, String column) {
    return Optional.of(entry.get(column).text()).filter(text -> !text.isEmpty());
  }

  /** A number, where one stands; numbers stored as text are taken where they can mean one thing. */
  OptionalDouble number(EntryTable.Entry entry, String column) {
    EntryTable.Value value = entry.get(column);
    if (value.isBlank()) {
      return OptionalDouble.empty();
    }
    if (value.kind() == CellKind.NUMBER) {
      return OptionalDouble.of(value.number());
    }
    OptionalDouble read = value.kind() == CellKind.TEXT ? numberIn(value.text()) : OptionalDouble.empty();
    if (read.isPresent()) {
      findings.add(
          TestlogFinding.NUMBER_AS_TEXT,
          value.where(),
          "found the text '" + value.text() + "', read as " + read.getAsDouble());
      return read;
    }
    findings.add(
        TestlogFinding.NOT_A_NUMBER,
        value.where(),
        "found " + show(value.kind(), value.text()) + "; expected a number");
    return OptionalDouble.empty();
  }

  /** The number a text states, if it can mean only one. */
  static OptionalDouble numberIn(String text) {
    String plain = text.strip().replace('\u2212', '-');
    if (PLAIN_NUMBER.matcher(plain).matches()) {
      return OptionalDouble.of(Double.parseDouble(plain));
    }
    if (COMMA_NUMBER.matcher(plain).matches()) {
      return OptionalDouble.of(Double.parseDouble(plain.replace(',', '.')));
    }
    return OptionalDouble.empty();
  }

  static String show(CellKind kind, String text) {
    return switch (kind) {
      case ERROR -> "the error " + text;
      case DATE -> "the date " + text;
      case BLANK -> "nothing";
      case TEXT, NUMBER, TRUTH -> "'" + text + "'";
    };
  }

  /** A number that is not negative, where one stands. */
  OptionalDouble notNegative(EntryTable.Entry entry, String column) {
    OptionalDouble number = number(entry, column);
    if (number.isPresent() && !(number.getAsDouble() >= 0)) {
      findings.add(
          TestlogFinding.OUT_OF_RANGE,
          entry.get(column).where(),
          "found " + number.getAsDouble() + "; expected " + column + " of at least 0");
      return OptionalDouble.empty();
    }
    return number;
  }

  /** One of the words offered, by its position; blank is the default. */
  int choice(EntryTable.Entry entry, String column, List<String> words, int otherwise) {
    EntryTable.Value value = entry.get(column);
    if (value.isBlank()) {
      return otherwise;
    }
    String wanted = value.text().toLowerCase(Locale.ROOT);
    for (int k = 0; k < words.size(); k++) {
      if (words.get(k).toLowerCase(Locale.ROOT).equals(wanted)) {
        return k;
      }
    }
    findings.add(
        TestlogFinding.CHOICE,
        value.where(),
        "found '" + value.text() + "'; expected " + String.join(", ", words));
    return otherwise;
  }

  /** Yes or no; blank is the default. */
  boolean yes(EntryTable.Entry entry, String column, boolean otherwise) {
    if (entry.get(column).kind() == CellKind.TRUTH) {
      return entry.get(column).text().equals("TRUE");
    }
    return choice(entry, column, List.of("no", "yes"), otherwise ? 1 : 0) == 1;
  }

  /** The unit in a cell, where one stands; it must measure one of these. */
  Optional<Unit> unit(EntryTable.Value value, List<Dimension> wanted, String what) {
    return value.isBlank()
        ? Optional.empty()
        : unit(value.text(), value.where(), wanted, what);
  }

  /** A unit in a text. */
  Optional<Unit> unit(
      String text, org.flexbound.finding.Where where, List<Dimension> wanted, String what) {
    try {
      Unit unit = Units.parse(text);
      if (wanted.stream().noneMatch(unit.dimension()::fits)) {
        findings.add(
            TestlogFinding.UNIT, where, "found '" + text + "'; expected a unit of " + what);
        return Optional.empty();
      }
      return Optional.of(unit);
    } catch (UnitException unknown) {
      findings.add(
          TestlogFinding.UNIT, where, unknown.getMessage() + "; expected a unit of " + what);
      return Optional.empty();
    }
  }

  /** The unit of a column: in its header's brackets, or the fallback. */
  Unit headerUnit(EntryTable table, String column, Unit otherwise, Dimension wanted, String what) {
    return table
        .header(column)
        .filter(header -> !header.unit().isEmpty())
        .flatMap(header -> unit(header.unit(), header.where(), List.of(wanted), what))
        .orElse(otherwise);
  }
}
