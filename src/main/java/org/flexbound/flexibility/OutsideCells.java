package org.flexbound.flexibility;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Predicate;
import org.flexbound.document.EntryTable;
import org.flexbound.document.StatedNumber;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Dimension;
import org.flexbound.quantity.Unit;
import org.flexbound.quantity.UnitException;
import org.flexbound.quantity.Units;

/** Takes names, numbers and units out of a table from outside. */
final class OutsideCells {
  private static final List<Dimension> MOTIONS =
      List.of(Dimension.LENGTH, Dimension.ANGLE, Dimension.NUMBER);
  private static final List<Dimension> LOADS = List.of(Dimension.FORCE, Dimension.MOMENT);

  private final EntryTable table;
  private final Findings findings;

  OutsideCells(EntryTable table, Findings findings) {
    this.table = table;
    this.findings = findings;
  }

  boolean has(String column) {
    return table.header(column).isPresent();
  }

  /** A name that must be there. */
  String name(EntryTable.Entry row, String column) {
    EntryTable.Value value = row.get(column);
    if (value.isBlank()) {
      wrong(value, "the name of a " + column.toLowerCase(Locale.ROOT));
    }
    return value.text();
  }

  /** A name, where one stands. */
  Optional<String> optionalName(EntryTable.Entry row, String column) {
    return has(column)
        ? Optional.of(row.get(column).text()).filter(text -> !text.isEmpty())
        : Optional.empty();
  }

  /**
   * A number in SI: in its own unit, in the row's, in the header's, or in the fallback.
   *
   * @param ofRow the column that states the row's unit
   * @param otherwise the unit where none is stated; empty where one must be
   * @param fits what the unit may measure
   * @param expected the number and its unit in words
   * @return the number; empty with a finding where it cannot be read, and without one where blank
   */
  OptionalDouble si(
      EntryTable.Entry row,
      String column,
      Optional<String> ofRow,
      Optional<Unit> otherwise,
      Predicate<Dimension> fits,
      String expected) {
    EntryTable.Value value = row.get(column);
    if (value.isBlank()) {
      return OptionalDouble.empty();
    }
    Optional<StatedNumber> stated = StatedNumber.of(value);
    if (stated.isEmpty()) {
      wrong(value, expected);
      return OptionalDouble.empty();
    }
    Optional<Unit> unit = stated.get().unit();
    if (unit.isPresent()) {
      if (!fits.test(unit.get().dimension())) {
        wrong(value, expected);
        return OptionalDouble.empty();
      }
    } else {
      Optional<EntryTable.Value> beside =
          ofRow.filter(this::has).map(row::get).filter(cell -> !cell.isBlank());
      Optional<EntryTable.Header> header =
          table.header(column).filter(found -> !found.unit().isEmpty());
      if (beside.isPresent()) {
        unit = unit(beside.get().text(), beside.get().where(), fits, expected);
      } else if (header.isPresent()) {
        unit = unit(header.get().unit(), header.get().where(), fits, expected);
      } else if (otherwise.isPresent()) {
        unit = otherwise;
      } else {
        findings.add(
            OutsideTableFinding.WRONG_CELL,
            value.where(),
            "found '" + value.text() + "' without a unit; expected " + expected);
      }
    }
    return unit.isEmpty()
        ? OptionalDouble.empty()
        : OptionalDouble.of(unit.get().toSi(stated.get().value()));
  }

  private Optional<Unit> unit(
      String text, Where where, Predicate<Dimension> fits, String expected) {
    try {
      Unit unit = Units.parse(text);
      if (fits.test(unit.dimension())) {
        return Optional.of(unit);
      }
      findings.add(
          OutsideTableFinding.WRONG_CELL,
          where,
          "found the unit '" + text + "'; expected " + expected);
    } catch (UnitException bad) {
      findings.add(OutsideTableFinding.WRONG_CELL, where, String.valueOf(bad.getMessage()));
    }
    return Optional.empty();
  }

  /** Whether a dimension is that of a motion per load. */
  static boolean isMotionPerLoad(Dimension dimension) {
    return MOTIONS.stream()
        .anyMatch(
            motion -> LOADS.stream().anyMatch(load -> dimension.fits(motion.per(load))));
  }

  /** Whether a dimension is that of a frequency: an angular one is not. */
  static boolean isFrequency(Dimension dimension) {
    return dimension.equals(Dimension.NUMBER.per(Dimension.TIME));
  }

  /** A unit that may or may not be one. */
  static Optional<Unit> known(String text) {
    try {
      return Optional.of(Units.parse(text));
    } catch (UnitException none) {
      return Optional.empty();
    }
  }

  /** Whether a dimension is that of a motion. */
  static boolean isMotion(Dimension dimension) {
    return MOTIONS.stream().anyMatch(dimension::fits);
  }

  void wrong(EntryTable.Value value, String expected) {
    findings.add(
        OutsideTableFinding.WRONG_CELL,
        value.where(),
        "found "
            + (value.isBlank() ? "nothing" : "'" + value.text() + "'")
            + "; expected "
            + expected);
  }
}
