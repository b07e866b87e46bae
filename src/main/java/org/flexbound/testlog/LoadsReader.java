package org.flexbound.testlog;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.document.EntryTable;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Unit;
import org.flexbound.setup.Direction;
import org.flexbound.setup.Load;
import org.flexbound.setup.LoadPoint;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;

/** Reads the sheet Load points: rows of one name make a pattern. */
final class LoadsReader {
  private final EntryTable table;
  private final PlacesReader places;
  private final EntryCells cells;
  private final Findings findings;
  private final double gravity;
  private final boolean stated;
  private final List<Claim> claims = new ArrayList<>();

  /**
   * A reader.
   *
   * @param gravity the weight of a mass, m/s²
   * @param stated whether coefficients are stated in place of readings, so that there are no columns
   */
  LoadsReader(
      EntryTable table,
      PlacesReader places,
      EntryCells cells,
      Findings findings,
      double gravity,
      boolean stated) {
    this.stated = stated;
    this.table = table;
    this.places = places;
    this.cells = cells;
    this.findings = findings;
    this.gravity = gravity;
  }

  List<Claim> claims() {
    return List.copyOf(claims);
  }

  List<Load> read() {
    Map<String, List<EntryTable.Entry>> byName = new LinkedHashMap<>();
    for (EntryTable.Entry entry : table.entries()) {
      cells
          .need(entry, "Load")
          .ifPresent(name -> byName.computeIfAbsent(name, key -> new ArrayList<>()).add(entry));
    }
    List<Load> loads = new ArrayList<>();
    byName.forEach((name, rows) -> load(name, rows).ifPresent(loads::add));
    return loads;
  }

  private Optional<Load> load(String name, List<EntryTable.Entry> rows) {
    List<LoadPoint> points = new ArrayList<>();
    EntryTable.Entry first = rows.get(0);
    for (EntryTable.Entry row : rows) {
      point(row, rows.size()).ifPresent(points::add);
      if (!EntryCells.text(row, "Column").equals(EntryCells.text(first, "Column"))) {
        findings.add(
            TestlogFinding.PATTERN,
            row.get("Column").where(),
            "found the column '"
                + EntryCells.text(row, "Column")
                + "' for the pattern '"
                + name
                + "'; expected '"
                + EntryCells.text(first, "Column")
                + "' as at "
                + first.get("Column").where());
      }
    }
    Optional<String> column =
        stated ? Optional.of(EntryCells.text(first, "Column")) : cells.need(first, "Column");
    if (points.isEmpty() || column.isEmpty()) {
      return Optional.empty();
    }
    boolean moment = points.get(0).direction().rotation();
    if (points.stream().anyMatch(point -> point.direction().rotation() != moment)) {
      findings.add(
          TestlogFinding.PATTERN,
          first.get("Load").where(),
          "the pattern '" + name + "' mixes forces and moments; expected one kind");
      return Optional.empty();
    }
    Optional<Unit> unit =
        cells
            .unit(
                first.get("Unit"),
                PlacesReader.loadDimensions(moment),
                moment ? "moment" : "force (or mass, for dead weights)")
            .map(found -> weight(found, gravity));
    OptionalDouble limit =
        cells.notNegative(
            first.get("Limit"),
            "Limit",
            cells.si(
                first,
                "Limit",
                unit,
                PlacesReader.loadDimensions(moment),
                stated -> weight(stated, gravity)));
    if (!stated) {
      claims.add(Claim.of(first, name, true, column.get(), unit));
    }
    return Optional.of(
        new Load(
            name,
            points,
            EntryCells.name(first, "Instrument"),
            limit,
            EntryCells.text(first, "Remark"),
            first.get("Load").where()));
  }

  /** A unit of mass stands for the weight of dead weights. */
  static Unit weight(Unit unit, double gravity) {
    return unit.dimension().equals(org.flexbound.quantity.Dimension.MASS)
        ? new Unit(
            unit.symbol(),
            org.flexbound.quantity.Dimension.FORCE,
            unit.siFactor() * gravity,
            0)
        : unit;
  }

  private Optional<LoadPoint> point(EntryTable.Entry row, int points) {
    Optional<Vector> coordinates = places.coordinates(row);
    Optional<Station> station =
        places.station(row.get("Node")).or(() -> coordinates.map(Station.AtPoint::new));
    Optional<Direction> direction = places.direction(row);
    if (station.isEmpty() && row.get("Node").isBlank()) {
      findings.add(
          TestlogFinding.NO_PLACE,
          row.get("Node").where(),
          "found neither a node nor X, Y, Z for the load '" + EntryCells.text(row, "Load") + "'");
    }
    OptionalDouble share = cells.number(row, "Share");
    if (share.isEmpty() && points > 1) {
      findings.add(
          TestlogFinding.PATTERN,
          row.get("Share").where(),
          "found no share for a point of the pattern '"
              + EntryCells.text(row, "Load")
              + "'; expected its part of the total");
    }
    if (station.isEmpty() || direction.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new LoadPoint(
            station.get(), coordinates, direction.get(), share.orElse(1), places.placing(row)));
  }
}
