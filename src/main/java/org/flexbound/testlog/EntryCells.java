package org.flexbound.testlog;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.function.UnaryOperator;
import org.flexbound.document.CellKind;
import org.flexbound.document.EntryTable;
import org.flexbound.document.StatedNumber;
import org.flexbound.finding.Findings;
import org.flexbound.quantity.Dimension;
import org.flexbound.quantity.NearestWord;
import org.flexbound.quantity.Unit;
import org.flexbound.quantity.UnitException;
import org.flexbound.quantity.Units;
import org.flexbound.setup.Direction;
import org.flexbound.setup.DirectionText;

/** Takes typed entries out of the cells of an entry sheet, with a finding for each that is wrong. */
final class EntryCells {
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

  /** A number with the unit that stands with it, where there is one; what is none is a finding. */
  private Optional<StatedNumber> stated(EntryTable.Entry entry, String column) {
    EntryTable.Value value = entry.get(column);
    if (value.isBlank()) {
      return Optional.empty();
    }
    Optional<StatedNumber> stated = StatedNumber.of(value);
    if (stated.isEmpty()) {
      findings.add(
          TestlogFinding.NOT_A_NUMBER,
          value.where(),
          "found " + show(value.kind(), value.text()) + "; expected a number");
    } else if (stated.get().isText()) {
      findings.add(
          TestlogFinding.NUMBER_AS_TEXT,
          value.where(),
          "found the text '" + value.text() + "', read as " + stated.get().value());
    }
    return stated;
  }

  /**
   * A pure number, where one stands; numbers stored as text are taken where they can mean one thing,
   * and 50 % is 0.5.
   */
  OptionalDouble number(EntryTable.Entry entry, String column) {
    Optional<StatedNumber> stated = stated(entry, column);
    return stated.isEmpty()
        ? OptionalDouble.empty()
        : inSi(entry.get(column), stated.get(), Optional.of(Unit.ONE), List.of(Dimension.NUMBER), "number");
  }

  /** A share that is not negative and whose number counts percent where no unit stands with it. */
  OptionalDouble percent(EntryTable.Entry entry, String column) {
    Optional<StatedNumber> stated = stated(entry, column);
    return stated.isEmpty()
        ? OptionalDouble.empty()
        : notNegative(
            entry.get(column),
            column,
            inSi(
                entry.get(column),
                stated.get(),
                Optional.of(Units.known("%")),
                List.of(Dimension.NUMBER),
                "share, such as %"));
  }

  /** A number in SI: in its own unit, or in that of its column's header, or in the fallback. */
  OptionalDouble si(
      EntryTable table,
      EntryTable.Entry entry,
      String column,
      Unit otherwise,
      Dimension wanted,
      String what) {
    Optional<StatedNumber> stated = stated(entry, column);
    if (stated.isEmpty()) {
      return OptionalDouble.empty();
    }
    Optional<Unit> unit =
        stated.get().unit().isPresent()
            ? Optional.empty()
            : Optional.of(headerUnit(table, column, otherwise, wanted, what));
    return inSi(entry.get(column), stated.get(), unit, List.of(wanted), what);
  }

  /** A number in SI: in its own unit, or in that of its row. */
  OptionalDouble si(
      EntryTable.Entry entry,
      String column,
      Optional<Unit> ofRow,
      List<Dimension> wanted,
      UnaryOperator<Unit> meaning) {
    Optional<StatedNumber> stated = stated(entry, column);
    if (stated.isEmpty()) {
      return OptionalDouble.empty();
    }
    if (stated.get().unit().isEmpty() && ofRow.isEmpty()) {
      if (entry.get("Unit").isBlank()) {
        findings.add(
            TestlogFinding.NO_UNIT,
            entry.get(column).where(),
            "found "
                + entry.get(column).text()
                + " for "
                + column
                + " without a unit; expected one beside it, or with the number");
      }
      return OptionalDouble.empty();
    }
    return inSi(
        entry.get(column), stated.get(), ofRow, wanted, "what stands beside it", meaning);
  }

  private OptionalDouble inSi(
      EntryTable.Value value,
      StatedNumber stated,
      Optional<Unit> otherwise,
      List<Dimension> wanted,
      String what) {
    return inSi(value, stated, otherwise, wanted, what, UnaryOperator.identity());
  }

  private OptionalDouble inSi(
      EntryTable.Value value,
      StatedNumber stated,
      Optional<Unit> otherwise,
      List<Dimension> wanted,
      String what,
      UnaryOperator<Unit> meaning) {
    if (stated.unit().isPresent()
        && wanted.stream().noneMatch(stated.unit().get().dimension()::fits)) {
      findings.add(
          TestlogFinding.UNIT,
          value.where(),
          "found '" + value.text() + "'; expected a number or a unit of " + what);
      return OptionalDouble.empty();
    }
    Optional<Unit> unit = stated.unit().map(meaning).or(() -> otherwise);
    return unit.isEmpty()
        ? OptionalDouble.empty()
        : OptionalDouble.of(unit.get().toSi(stated.value()));
  }

  static String show(CellKind kind, String text) {
    return switch (kind) {
      case ERROR -> "the error " + text;
      case DATE -> "the date " + text;
      case BLANK -> "nothing";
      case TEXT, NUMBER, TRUTH -> "'" + text + "'";
    };
  }

  /** The number of a row, from 1, where one stands. */
  OptionalInt row(EntryTable.Entry entry, String column) {
    OptionalDouble number = number(entry, column);
    if (number.isEmpty()) {
      return OptionalInt.empty();
    }
    double value = number.getAsDouble();
    if (!(value >= 1 && value <= Integer.MAX_VALUE && value == Math.rint(value))) {
      findings.add(
          TestlogFinding.OUT_OF_RANGE,
          entry.get(column).where(),
          "found '" + entry.get(column).text() + "'; expected the number of a row, from 1");
      return OptionalInt.empty();
    }
    return OptionalInt.of((int) value);
  }

  /** A pure number that is not negative, where one stands. */
  OptionalDouble notNegative(EntryTable.Entry entry, String column) {
    return notNegative(entry.get(column), column, number(entry, column));
  }

  /** The same number, where it is not negative. */
  OptionalDouble notNegative(EntryTable.Value value, String column, OptionalDouble number) {
    if (number.isPresent() && !(number.getAsDouble() >= 0)) {
      findings.add(
          TestlogFinding.OUT_OF_RANGE,
          value.where(),
          "found '" + value.text() + "'; expected " + column + " of at least 0");
      return OptionalDouble.empty();
    }
    return number;
  }

  /** The direction in the column Direction, where one stands; a wrong one is a finding. */
  Optional<Direction> direction(EntryTable.Entry entry) {
    EntryTable.Value value = entry.get("Direction");
    if (value.isBlank()) {
      return Optional.empty();
    }
    Optional<Direction> direction = DirectionText.parse(value.text());
    if (direction.isEmpty()) {
      findings.add(
          TestlogFinding.DIRECTION,
          value.where(),
          "found '" + value.text() + "'; expected one such as " + DirectionText.EXPECTED);
    }
    return direction;
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
        "found '"
            + value.text()
            + "'; expected "
            + String.join(", ", words)
            + NearestWord.question(value.text(), words));
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
