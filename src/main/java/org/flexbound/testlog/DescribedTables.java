package org.flexbound.testlog;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import org.flexbound.document.CellKind;
import org.flexbound.document.EntryTable;
import org.flexbound.document.EntryTable.Value;
import org.flexbound.document.Json;
import org.flexbound.document.JsonKeys;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;

/** The tables of entries of a description of a log, which say the same as the workbook's sheets. */
final class DescribedTables implements LogTables {
  private final Json.Members top;
  private final JsonKeys keys;
  private final Optional<DescribedFiles> files;
  private final Findings findings;

  DescribedTables(Json.Members top, DescribedFiles files, Findings findings) {
    this(top, Optional.of(files), findings);
  }

  /** Tables that name no file. */
  DescribedTables(Json.Members top, Findings findings) {
    this(top, Optional.empty(), findings);
  }

  private DescribedTables(Json.Members top, Optional<DescribedFiles> files, Findings findings) {
    this.top = top;
    this.files = files;
    this.findings = findings;
    this.keys = new JsonKeys(findings);
  }

  private static String key(SheetLayout layout) {
    return DescriptionKeys.of(layout.name());
  }

  @Override
  public boolean has(SheetLayout layout) {
    return top.get(key(layout)).isPresent();
  }

  @Override
  public SheetLayout runs() {
    return SheetLayout.RUNS_IN_FILES;
  }

  @Override
  public String name(SheetLayout layout) {
    return "key '" + key(layout) + "'";
  }

  @Override
  public Where where(SheetLayout layout) {
    return top.get(key(layout)).orElse(top).where();
  }

  @Override
  public Optional<EntryTable> table(SheetLayout layout) {
    return top.get(key(layout))
        .flatMap(
            value -> {
              if (layout.equals(SheetLayout.COEFFICIENTS)
                  && value instanceof Json.Members elsewhere) {
                return files
                    .flatMap(found -> found.table(elsewhere))
                    .flatMap(
                        sheet ->
                            EntryTable.read(
                                sheet, layout.required(), layout.optional(), findings));
              }
              Rows rows = new Rows(layout);
              boolean sound =
                  layout.equals(SheetLayout.TEST)
                      ? items(value, SheetLayout.TEST_ITEMS, rows)
                      : layout.equals(SheetLayout.OPTIONS)
                          ? options(value, rows)
                          : list(value, rows);
              return sound ? Optional.of(rows.table(value.where())) : Optional.empty();
            });
  }

  /** The rows of a table as they are gathered. */
  private static final class Rows {
    private final SheetLayout layout;
    private final List<Map<String, Value>> rows = new ArrayList<>();
    private final List<Where> places = new ArrayList<>();

    Rows(SheetLayout layout) {
      this.layout = layout;
    }

    void add(Map<String, Value> row, Where place) {
      rows.add(row);
      places.add(place);
    }

    EntryTable table(Where where) {
      return EntryTable.of(
          where,
          layout.columns().stream().map(SheetLayout.Column::name).toList(),
          rows,
          places);
    }
  }

  /** An object of items, each a row of item and entry. */
  private boolean items(Json value, List<String> names, Rows rows) {
    Optional<Json.Members> object = keys.members(value, "entries by their names");
    object.ifPresent(members -> entries(members, names, Optional.empty(), List.of(), rows));
    return object.isPresent();
  }

  private void entries(
      Json.Members members,
      List<String> names,
      Optional<Json.Text> gauge,
      List<String> others,
      Rows rows) {
    Map<String, String> known = DescriptionKeys.byKey(names);
    List<String> allowed = new ArrayList<>(known.keySet());
    allowed.addAll(others);
    keys.refuseOthers(members, allowed);
    members
        .members()
        .forEach(
            (key, entry) -> {
              Optional<String> name = Optional.ofNullable(known.get(key));
              Optional<Value> cell = name.flatMap(found -> value(entry));
              if (name.isPresent() && cell.isPresent()) {
                Map<String, Value> row = new LinkedHashMap<>();
                row.put("Item", text(name.get(), entry.where()));
                row.put("Entry", cell.get());
                gauge.ifPresent(g -> row.put("Gauge", text(g.text(), entry.where())));
                rows.add(row, entry.where());
              }
            });
  }

  private boolean options(Json value, Rows rows) {
    List<String> names = List.copyOf(OptionsReader.ITEMS.keySet());
    Optional<Json.Members> object = keys.members(value, "options by their names");
    if (object.isEmpty()) {
      return false;
    }
    entries(object.get(), names, Optional.empty(), List.of(DescriptionKeys.GAUGES), rows);
    object
        .get()
        .get(DescriptionKeys.GAUGES)
        .flatMap(gauges -> keys.members(gauges, "options by the gauge's name"))
        .ifPresent(
            gauges ->
                gauges
                    .members()
                    .forEach(
                        (gauge, own) ->
                            keys.members(own, "options of a gauge")
                                .ifPresent(
                                    members ->
                                        entries(
                                            members,
                                            OptionsReader.OF_A_GAUGE,
                                            Optional.of(new Json.Text(own.where(), gauge)),
                                            List.of(),
                                            rows))));
    return true;
  }

  /** A list of objects, each a row; for runs, a row for each column whose meaning is given. */
  private boolean list(Json value, Rows rows) {
    boolean runs = rows.layout.equals(SheetLayout.RUNS_IN_FILES);
    if (!(value instanceof Json.Items)) {
      keys.items(value, "a row for each entry");
      return false;
    }
    Map<String, String> known = DescriptionKeys.columns(rows.layout);
    if (runs) {
      known.remove(DescriptionKeys.of("Column"));
      known.remove(DescriptionKeys.of("Load or gauge"));
    }
    List<String> allowed = new ArrayList<>(known.keySet());
    if (runs) {
      allowed.add(DescriptionKeys.COLUMNS);
    }
    for (Json item : keys.items(value, "a row for each entry")) {
      Optional<Json.Members> members = keys.members(item, "a row");
      if (members.isEmpty()) {
        continue;
      }
      keys.refuseOthers(members.get(), allowed);
      Map<String, Value> row = new LinkedHashMap<>();
      members
          .get()
          .members()
          .forEach(
              (key, entry) -> {
                String column = known.get(key);
                if (column != null) {
                  value(entry).ifPresent(cell -> row.put(column, cell));
                }
              });
      if (!runs || !meanings(members.get(), row, rows)) {
        rows.add(row, item.where());
      }
    }
    return true;
  }

  /** A row for each column whose meaning the run states; false where it states none. */
  private boolean meanings(Json.Members run, Map<String, Value> row, Rows rows) {
    Optional<Json.Members> columns =
        run.get(DescriptionKeys.COLUMNS)
            .flatMap(value -> keys.members(value, "the load or gauge of each column"));
    if (columns.isEmpty() || columns.get().members().isEmpty()) {
      return false;
    }
    columns
        .get()
        .members()
        .forEach(
            (column, meaning) -> {
              Map<String, Value> own = new LinkedHashMap<>(row);
              own.put("Column", text(column, meaning.where()));
              value(meaning).ifPresent(cell -> own.put("Load or gauge", cell));
              rows.add(own, run.where());
            });
    return true;
  }

  private static Value text(String text, Where where) {
    return new Value(CellKind.TEXT, text, Double.NaN, where);
  }

  /** A value as a cell; numbers in brackets are a direction or a point. */
  private Optional<Value> value(Json json) {
    if (json instanceof Json.Text text) {
      String stripped = text.text().strip();
      return Optional.of(
          new Value(
              stripped.isEmpty() ? CellKind.BLANK : CellKind.TEXT,
              stripped,
              Double.NaN,
              json.where()));
    }
    if (json instanceof Json.Numeral numeral) {
      return Optional.of(
          new Value(CellKind.NUMBER, Json.plain(numeral.value()), numeral.value(), json.where()));
    }
    if (json instanceof Json.Truth truth) {
      return Optional.of(
          new Value(CellKind.TRUTH, truth.value() ? "TRUE" : "FALSE", Double.NaN, json.where()));
    }
    if (json instanceof Json.Items list
        && list.items().stream().allMatch(Json.Numeral.class::isInstance)) {
      return Optional.of(
          text(
              list.items().stream().map(Json::shown).collect(Collectors.joining(", ", "(", ")")),
              json.where()));
    }
    keys.wrong(json, "a text, a number, or true or false");
    return Optional.empty();
  }
}
