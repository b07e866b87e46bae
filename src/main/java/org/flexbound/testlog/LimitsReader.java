package org.flexbound.testlog;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.UnaryOperator;
import org.flexbound.document.EntryTable;
import org.flexbound.finding.Findings;
import org.flexbound.quantity.Dimension;
import org.flexbound.quantity.Unit;
import org.flexbound.quantity.UnitException;
import org.flexbound.quantity.Units;
import org.flexbound.setup.LimitKind;
import org.flexbound.setup.LimitSpec;

/** Reads the sheet Limits. */
final class LimitsReader {
  private final EntryCells cells;
  private final Findings findings;

  LimitsReader(EntryCells cells, Findings findings) {
    this.cells = cells;
    this.findings = findings;
  }

  List<LimitSpec> read(EntryTable table) {
    List<String> kinds = SheetLayout.LIMITS.columns().get(1).choices();
    List<LimitSpec> limits = new ArrayList<>();
    for (EntryTable.Entry entry : table.entries()) {
      Optional<String> name = cells.need(entry, "Limit");
      Optional<String> on = cells.need(entry, "On");
      if (name.isEmpty() || on.isEmpty()) {
        continue;
      }
      LimitKind kind = List.of(LimitKind.values()).get(cells.choice(entry, "On", kinds, 0));
      Optional<Unit> unit = unit(entry, kind);
      if (entry.get("Lower").isBlank() && entry.get("Upper").isBlank()) {
        findings.add(
            TestlogFinding.MISSING_ENTRY,
            entry.get("Upper").where(),
            "found no value; expected a lower or an upper limit");
        continue;
      }
      unit.ifPresent(
          found ->
              limits.add(
                  new LimitSpec(
                      name.get(),
                      kind,
                      EntryCells.name(entry, "Gauge"),
                      EntryCells.name(entry, "Load"),
                      EntryCells.name(entry, "Node"),
                      cells.direction(entry),
                      value(entry, "Lower", found),
                      value(entry, "Upper", found),
                      found,
                      entry.get("Limit").where())));
    }
    return limits;
  }

  private OptionalDouble value(EntryTable.Entry entry, String column, Unit unit) {
    return cells.si(
        entry, column, Optional.of(unit), List.of(unit.dimension()), UnaryOperator.identity());
  }

  /** A unit of motion per load, of load per motion, or a share, by the kind of limit. */
  private Optional<Unit> unit(EntryTable.Entry entry, LimitKind kind) {
    EntryTable.Value value = entry.get("Unit");
    boolean share =
        switch (kind) {
          case COEFFICIENT, DIRECT_STIFFNESS, COMPLIANCE, SOFTEST_COMPLIANCE -> false;
          case FIXTURE_SHARE,
              MODEL_AGREEMENT,
              RECIPROCITY,
              LINEARITY,
              HYSTERESIS,
              REPEATABILITY,
              SET -> true;
        };
    if (share) {
      return value.isBlank()
          ? Optional.of(Units.known("%"))
          : cells.unit(value, List.of(Dimension.NUMBER), "share, such as %");
    }
    if (value.isBlank()) {
      findings.add(
          TestlogFinding.NO_UNIT, value.where(), "found no unit; expected one such as µm/kN");
      return Optional.empty();
    }
    List<Dimension> motions = List.of(Dimension.LENGTH, Dimension.ANGLE, Dimension.NUMBER);
    List<Dimension> loads = List.of(Dimension.FORCE, Dimension.MOMENT);
    try {
      Dimension found = Units.parse(value.text()).dimension();
      for (Dimension motion : motions) {
        for (Dimension load : loads) {
          Dimension wanted =
              kind == LimitKind.DIRECT_STIFFNESS ? load.per(motion) : motion.per(load);
          if (found.fits(wanted)) {
            return Optional.of(Units.parse(value.text()));
          }
        }
      }
      findings.add(
          TestlogFinding.UNIT,
          value.where(),
          "found '"
              + value.text()
              + "'; expected a unit of "
              + (kind == LimitKind.DIRECT_STIFFNESS
                  ? "load per motion, such as kN/mm"
                  : "motion per load, such as µm/kN"));
    } catch (UnitException unknown) {
      findings.add(TestlogFinding.UNIT, value.where(), String.valueOf(unknown.getMessage()));
    }
    return Optional.empty();
  }
}
