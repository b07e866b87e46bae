package org.flexbound.testlog;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.document.EntryTable;
import org.flexbound.document.StatedNumber;
import org.flexbound.finding.Findings;
import org.flexbound.quantity.Dimension;
import org.flexbound.quantity.Unit;
import org.flexbound.quantity.Units;
import org.flexbound.setup.Direction;
import org.flexbound.setup.DirectionText;
import org.flexbound.setup.Placing;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;

/** Reads the columns that say where something stands: node, member and share, X, Y, Z, direction. */
final class PlacesReader {
  private final EntryTable table;
  private final Unit length;
  private final EntryCells cells;
  private final Findings findings;

  PlacesReader(EntryTable table, Unit length, EntryCells cells, Findings findings) {
    this.table = table;
    this.length = length;
    this.cells = cells;
    this.findings = findings;
  }

  /** The place in space, where X, Y and Z are stated; a blank one of them beside others is 0. */
  Optional<Vector> coordinates(EntryTable.Entry entry) {
    OptionalDouble x = coordinate(entry, "X");
    OptionalDouble y = coordinate(entry, "Y");
    OptionalDouble z = coordinate(entry, "Z");
    if (x.isEmpty() && y.isEmpty() && z.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(new Vector(x.orElse(0), y.orElse(0), z.orElse(0)));
  }

  private OptionalDouble coordinate(EntryTable.Entry entry, String column) {
    return cells.si(table, entry, column, length, Dimension.LENGTH, "length");
  }

  /** A node, or {@code member @ share}; empty where the cell is blank. */
  Optional<Station> station(EntryTable.Value value) {
    if (value.isBlank()) {
      return Optional.empty();
    }
    int at = value.text().lastIndexOf('@');
    if (at < 0) {
      return Optional.of(new Station.AtNode(value.text(), Vector.ZERO));
    }
    OptionalDouble share = StatedNumber.plain(value.text().substring(at + 1));
    if (share.isEmpty() || !(share.getAsDouble() >= 0 && share.getAsDouble() <= 1)) {
      findings.add(
          TestlogFinding.OUT_OF_RANGE,
          value.where(),
          "found '" + value.text() + "'; expected a member and a share from 0 to 1, as in post @ 0.4");
      return Optional.empty();
    }
    return Optional.of(
        new Station.OnMember(value.text().substring(0, at).strip(), share.getAsDouble()));
  }

  /** The direction; a wrong one is a finding. */
  Optional<Direction> direction(EntryTable.Entry entry) {
    EntryTable.Value value = entry.get("Direction");
    if (value.isBlank()) {
      findings.add(
          TestlogFinding.MISSING_ENTRY,
          value.where(),
          "found no direction; expected one such as " + DirectionText.EXPECTED);
      return Optional.empty();
    }
    return cells.direction(entry);
  }

  /** How well the place and the line are known. */
  Placing placing(EntryTable.Entry entry) {
    OptionalDouble position =
        uncertainty(entry, "Position uncertainty", length, Dimension.LENGTH, "length");
    OptionalDouble angle =
        uncertainty(entry, "Angle uncertainty", degree(), Dimension.ANGLE, "angle");
    return new Placing(position, angle);
  }

  private OptionalDouble uncertainty(
      EntryTable.Entry entry, String column, Unit otherwise, Dimension wanted, String what) {
    OptionalDouble si = cells.si(table, entry, column, otherwise, wanted, what);
    return cells.notNegative(entry.get(column), column, si);
  }

  private static Unit degree() {
    return Units.known("deg");
  }

  /** Dimensions that a load's column may have. */
  static List<Dimension> loadDimensions(boolean moment) {
    return moment
        ? List.of(Dimension.MOMENT)
        : List.of(Dimension.FORCE, Dimension.MASS);
  }
}
