package org.flexbound.testlog;

import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.UnaryOperator;
import org.flexbound.document.EntryTable;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Dimension;
import org.flexbound.quantity.NearestWord;
import org.flexbound.quantity.Unit;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.GaugeKind;
import org.flexbound.setup.Load;
import org.flexbound.setup.StatedCoefficient;

/** Reads the table of coefficients that were reduced elsewhere. */
final class CoefficientsReader {
  private static final String VALUE = "Value";
  private static final String UNCERTAINTY = "Standard uncertainty";
  private static final String FREEDOM = "Degrees of freedom";

  private final EntryTable table;
  private final EntryCells cells;
  private final Findings findings;
  private final Map<String, Gauge> gauges = new LinkedHashMap<>();
  private final Map<String, Load> loads = new LinkedHashMap<>();
  private final OptionalDouble repeatability;

  CoefficientsReader(
      EntryTable table,
      List<Gauge> gauges,
      List<Load> loads,
      OptionalDouble repeatability,
      EntryCells cells,
      Findings findings) {
    this.table = table;
    this.cells = cells;
    this.findings = findings;
    this.repeatability = repeatability;
    gauges.forEach(gauge -> this.gauges.put(gauge.name(), gauge));
    loads.forEach(load -> this.loads.put(load.name(), load));
  }

  List<StatedCoefficient> read() {
    Map<List<String>, Where> seen = new LinkedHashMap<>();
    List<StatedCoefficient> stated = new ArrayList<>();
    for (EntryTable.Entry entry : table.entries()) {
      Optional<Gauge> gauge =
          cells.need(entry, "Gauge").flatMap(name -> known(name, gauges, entry.get("Gauge")));
      Optional<Load> load =
          cells.need(entry, "Load").flatMap(name -> known(name, loads, entry.get("Load")));
      if (gauge.isEmpty() || load.isEmpty()) {
        continue;
      }
      Where first =
          seen.putIfAbsent(List.of(gauge.get().name(), load.get().name()), entry.where());
      if (first != null) {
        findings.add(
            TestlogFinding.TWICE,
            entry.where(),
            "found '"
                + gauge.get().name()
                + "' under '"
                + load.get().name()
                + "' again, first at "
                + first);
      } else {
        coefficient(entry, gauge.get(), load.get()).ifPresent(stated::add);
      }
    }
    return stated;
  }

  private <T> Optional<T> known(String name, Map<String, T> known, EntryTable.Value cell) {
    Collection<String> names = known.keySet();
    if (!known.containsKey(name)) {
      findings.add(
          TestlogFinding.UNKNOWN_NAME,
          cell.where(),
          "found '"
              + name
              + "'; expected one of "
              + String.join(", ", names)
              + NearestWord.question(name, names));
    }
    return Optional.ofNullable(known.get(name));
  }

  private Optional<StatedCoefficient> coefficient(
      EntryTable.Entry entry, Gauge gauge, Load load) {
    Dimension wanted =
        motion(gauge.kind()).per(load.isMoment() ? Dimension.MOMENT : Dimension.FORCE);
    String expected =
        (gauge.readsAngle() ? "rotation" : "motion") + " per " + (load.isMoment() ? "moment" : "force");
    Optional<Unit> beside = cells.unit(entry.get("Unit"), List.of(wanted), expected);
    Optional<Unit> unit = beside.isPresent() ? beside : header(VALUE, wanted, expected);
    if (entry.get(VALUE).isBlank()) {
      cells.need(entry, VALUE);
      return Optional.empty();
    }
    OptionalDouble value =
        cells.si(entry, VALUE, unit, List.of(wanted), UnaryOperator.identity());
    if (value.isEmpty()) {
      return Optional.empty();
    }
    Optional<Unit> ofUncertainty = header(UNCERTAINTY, wanted, expected).or(() -> unit);
    OptionalDouble uncertainty = uncertainty(entry, value.getAsDouble(), ofUncertainty, wanted);
    OptionalDouble freedom = cells.number(entry, FREEDOM);
    if (uncertainty.isEmpty()
        || !positive(entry, UNCERTAINTY, uncertainty)
        || !positive(entry, FREEDOM, freedom)) {
      return Optional.empty();
    }
    return Optional.of(
        new StatedCoefficient(
            gauge.name(),
            load.name(),
            value.getAsDouble(),
            uncertainty.getAsDouble(),
            freedom.orElse(Double.POSITIVE_INFINITY),
            entry.where()));
  }

  private Optional<Unit> header(String column, Dimension wanted, String expected) {
    return table
        .header(column)
        .filter(header -> !header.unit().isEmpty())
        .flatMap(
            header -> cells.unit(header.unit(), header.where(), List.of(wanted), expected));
  }

  /** The stated uncertainty, as such or in percent of the value; else the stated repeatability. */
  private OptionalDouble uncertainty(
      EntryTable.Entry entry, double value, Optional<Unit> unit, Dimension wanted) {
    EntryTable.Value cell = entry.get(UNCERTAINTY);
    if (cell.isBlank()) {
      if (repeatability.isPresent()) {
        return OptionalDouble.of(repeatability.getAsDouble() * Math.abs(value));
      }
      findings.add(
          TestlogFinding.MISSING_ENTRY,
          cell.where(),
          "found no standard uncertainty; expected one, or a stated repeatability among the"
              + " options");
      return OptionalDouble.empty();
    }
    if (cell.text().endsWith("%")) {
      OptionalDouble share = cells.percent(entry, UNCERTAINTY);
      return share.isPresent()
          ? OptionalDouble.of(share.getAsDouble() * Math.abs(value))
          : share;
    }
    return cells.si(entry, UNCERTAINTY, unit, List.of(wanted), UnaryOperator.identity());
  }

  private boolean positive(EntryTable.Entry entry, String column, OptionalDouble number) {
    if (number.isPresent() && !(number.getAsDouble() > 0)) {
      findings.add(
          TestlogFinding.OUT_OF_RANGE,
          entry.get(column).where(),
          "found '" + entry.get(column).text() + "'; expected " + column + " above 0");
      return false;
    }
    return true;
  }

  private static Dimension motion(GaugeKind kind) {
    return switch (kind) {
      case DISPLACEMENT, RELATIVE -> Dimension.LENGTH;
      case ROTATION -> Dimension.ANGLE;
      case STRAIN -> Dimension.NUMBER;
    };
  }
}
