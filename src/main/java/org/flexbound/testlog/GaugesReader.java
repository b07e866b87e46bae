package org.flexbound.testlog;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.flexbound.document.EntryTable;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Dimension;
import org.flexbound.quantity.Unit;
import org.flexbound.setup.Direction;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Part;
import org.flexbound.setup.SectionPoint;
import org.flexbound.setup.Station;
import org.flexbound.setup.Vector;

/** Reads the sheet Gauges. */
final class GaugesReader {
  private static final List<String> KINDS =
      List.of("displacement", "rotation", "relative", "strain");
  private static final List<String> PARTS = List.of("article", "fixture", "ground");
  private static final Pattern SECTION_POINT =
      Pattern.compile("\\(?\\s*([-+0-9.eE]+)\\s*[,;]\\s*([-+0-9.eE]+)\\s*\\)?");

  private final EntryTable table;
  private final PlacesReader places;
  private final EntryCells cells;
  private final Findings findings;
  private final Unit length;
  private final boolean stated;
  private final List<Claim> claims = new ArrayList<>();

  /**
   * A reader.
   *
   * @param length the unit of lengths that state none
   * @param stated whether coefficients are stated in place of readings, so that there are no columns
   */
  GaugesReader(
      EntryTable table,
      PlacesReader places,
      EntryCells cells,
      Findings findings,
      Unit length,
      boolean stated) {
    this.stated = stated;
    this.table = table;
    this.places = places;
    this.cells = cells;
    this.findings = findings;
    this.length = length;
  }

  List<Claim> claims() {
    return List.copyOf(claims);
  }

  List<Gauge> read() {
    Map<String, Where> seen = new LinkedHashMap<>();
    List<Gauge> gauges = new ArrayList<>();
    for (EntryTable.Entry entry : table.entries()) {
      Optional<String> name = cells.need(entry, "Gauge");
      if (name.isEmpty()) {
        continue;
      }
      Where first = seen.putIfAbsent(name.get(), entry.get("Gauge").where());
      if (first != null) {
        findings.add(
            TestlogFinding.TWICE,
            entry.get("Gauge").where(),
            "found the gauge '" + name.get() + "' again, first at " + first);
        continue;
      }
      gauge(entry, name.get()).ifPresent(gauges::add);
    }
    return gauges;
  }

  private Optional<Gauge> gauge(EntryTable.Entry entry, String name) {
    Optional<Direction> direction =
        EntryCells.text(entry, "Kind").equalsIgnoreCase("strain")
            ? Optional.of(Direction.along(new Vector(1, 0, 0)))
            : places.direction(entry);
    GaugeKind kind = kind(entry, direction);
    Optional<Unit> unit =
        cells.unit(
            entry.get("Unit"),
            List.of(
                switch (kind) {
                  case DISPLACEMENT, RELATIVE -> Dimension.LENGTH;
                  case ROTATION -> Dimension.ANGLE;
                  case STRAIN -> Dimension.NUMBER;
                }),
            switch (kind) {
              case DISPLACEMENT, RELATIVE -> "length";
              case ROTATION -> "angle";
              case STRAIN -> "strain";
            });
    Optional<String> column =
        stated ? Optional.of(EntryCells.text(entry, "Column")) : cells.need(entry, "Column");
    Optional<Vector> coordinates = places.coordinates(entry);
    Optional<Station> station = station(entry, coordinates);
    Optional<Station> second = places.station(entry.get("Node 2"));
    if (kind == GaugeKind.RELATIVE && second.isEmpty()) {
      findings.add(
          TestlogFinding.NO_PLACE,
          entry.get("Node 2").where(),
          "found no second node for the relative gauge '" + name + "'");
    }
    if (column.isEmpty() || station.isEmpty() || direction.isEmpty()) {
      return Optional.empty();
    }
    if (!stated) {
      claims.add(Claim.of(entry, name, false, column.get(), unit));
    }
    return Optional.of(
        new Gauge(
            name,
            kind,
            station.get(),
            second,
            coordinates,
            direction.get(),
            kind == GaugeKind.STRAIN ? Optional.of(sectionPoint(entry)) : Optional.empty(),
            part(entry, "Measures", Part.ARTICLE),
            part(entry, "Stands on", Part.GROUND),
            cells.yes(entry, "Base", false),
            EntryCells.name(entry, "Instrument"),
            places.placing(entry),
            EntryCells.text(entry, "Remark"),
            entry.get("Gauge").where()));
  }

  private GaugeKind kind(EntryTable.Entry entry, Optional<Direction> direction) {
    boolean turns = direction.isPresent() && direction.get().rotation();
    int chosen = cells.choice(entry, "Kind", KINDS, turns ? 1 : 0);
    GaugeKind kind = List.of(GaugeKind.values()).get(chosen);
    if (direction.isPresent() && kind != GaugeKind.STRAIN && (kind == GaugeKind.ROTATION) != turns) {
      findings.add(
          TestlogFinding.DIRECTION,
          entry.get("Direction").where(),
          "found '"
              + EntryCells.text(entry, "Direction")
              + "' for a "
              + KINDS.get(chosen)
              + " gauge; expected "
              + (turns ? "a direction such as +z" : "a rotation such as rz"));
    }
    return kind;
  }

  private Part part(EntryTable.Entry entry, String column, Part otherwise) {
    List<Part> parts = List.of(Part.values());
    return parts.get(cells.choice(entry, column, PARTS, parts.indexOf(otherwise)));
  }

  private Optional<Station> station(EntryTable.Entry entry, Optional<Vector> coordinates) {
    Optional<Station> node = places.station(entry.get("Node"));
    if (node.isPresent()) {
      return node;
    }
    Optional<String> member = EntryCells.name(entry, "Member");
    if (member.isPresent()) {
      OptionalDouble at = cells.number(entry, "At");
      if (at.isEmpty() || !(at.getAsDouble() >= 0 && at.getAsDouble() <= 1)) {
        findings.add(
            TestlogFinding.OUT_OF_RANGE,
            entry.get("At").where(),
            "found '" + EntryCells.text(entry, "At") + "'; expected a share from 0 to 1");
        return Optional.empty();
      }
      return Optional.of(new Station.OnMember(member.get(), at.getAsDouble()));
    }
    if (coordinates.isEmpty() && entry.get("Node").isBlank()) {
      findings.add(
          TestlogFinding.NO_PLACE,
          entry.get("Node").where(),
          "found neither a node, nor a member, nor X, Y, Z for the gauge '"
              + EntryCells.text(entry, "Gauge")
              + "'");
    }
    return coordinates.map(Station.AtPoint::new);
  }

  private SectionPoint sectionPoint(EntryTable.Entry entry) {
    EntryTable.Value value = entry.get("Section point");
    Matcher matcher = SECTION_POINT.matcher(value.text());
    if (!matcher.matches()) {
      findings.add(
          TestlogFinding.OUT_OF_RANGE,
          value.where(),
          "found '" + value.text() + "'; expected y and z from the centroid, as in (0, 50)");
      return new SectionPoint(0, 0);
    }
    Unit unit =
        cells.headerUnit(table, "Section point", length, Dimension.LENGTH, "length");
    return new SectionPoint(
        unit.toSi(Double.parseDouble(matcher.group(1))),
        unit.toSi(Double.parseDouble(matcher.group(2))));
  }
}
