package org.flexbound.testlog;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.flexbound.document.EntryTable;
import org.flexbound.document.Json;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;

/** The tables of a log, with entries of Options and Limits that are stated elsewhere put over them. */
final class OverriddenTables implements LogTables {
  private final LogTables log;
  private final LogContext context;
  private final Findings findings;

  OverriddenTables(LogTables log, LogContext context, Findings findings) {
    this.log = log;
    this.context = context;
    this.findings = findings;
  }

  @Override
  public boolean has(SheetLayout layout) {
    return log.has(layout) || elsewhere(layout).isPresent();
  }

  @Override
  public SheetLayout runs() {
    return log.runs();
  }

  @Override
  public String name(SheetLayout layout) {
    return log.name(layout);
  }

  @Override
  public Where where(SheetLayout layout) {
    return elsewhere(layout).map(Json::where).orElseGet(() -> log.where(layout));
  }

  private Optional<Json> elsewhere(SheetLayout layout) {
    if (layout.equals(SheetLayout.OPTIONS)) {
      return context.options();
    }
    return layout.equals(SheetLayout.LIMITS) ? context.limits() : Optional.empty();
  }

  @Override
  public Optional<EntryTable> table(SheetLayout layout) {
    Optional<EntryTable> own = log.table(layout);
    Optional<EntryTable> over = elsewhere(layout).flatMap(json -> stated(layout, json));
    if (over.isEmpty()) {
      return own;
    }
    Map<String, EntryTable.Entry> merged = new LinkedHashMap<>();
    own.ifPresent(table -> table.entries().forEach(entry -> merged.put(key(layout, entry), entry)));
    for (EntryTable.Entry entry : over.get().entries()) {
      EntryTable.Entry before = merged.put(key(layout, entry), entry);
      if (before != null && !isBlank(layout, before)) {
        findings.add(
            TestlogFinding.OVERRIDDEN,
            entry.where(),
            "'"
                + name(layout, entry)
                + "' takes the place of what "
                + before.where()
                + " states"
                + (layout.equals(SheetLayout.OPTIONS)
                    ? " (" + shown(entry) + " in place of " + shown(before) + ")"
                    : ""));
      }
    }
    List<Map<String, EntryTable.Value>> rows = new ArrayList<>();
    List<Where> places = new ArrayList<>();
    merged
        .values()
        .forEach(
            entry -> {
              rows.add(entry.values());
              places.add(entry.where());
            });
    List<String> columns = layout.columns().stream().map(SheetLayout.Column::name).toList();
    return Optional.of(EntryTable.of(over.get().where(), columns, rows, places));
  }

  private Optional<EntryTable> stated(SheetLayout layout, Json json) {
    Json.Members top =
        new Json.Members(json.where(), Map.of(DescriptionKeys.of(layout.name()), json));
    return new DescribedTables(top, findings).table(layout);
  }

  private static boolean isBlank(SheetLayout layout, EntryTable.Entry entry) {
    return layout.equals(SheetLayout.OPTIONS) && entry.get("Entry").isBlank();
  }

  private static String shown(EntryTable.Entry entry) {
    return entry.get("Entry").text();
  }

  private static String name(SheetLayout layout, EntryTable.Entry entry) {
    if (layout.equals(SheetLayout.LIMITS)) {
      return EntryCells.text(entry, "Limit");
    }
    String gauge = EntryCells.text(entry, "Gauge");
    return EntryCells.text(entry, "Item") + (gauge.isEmpty() ? "" : " of " + gauge);
  }

  /** What makes two entries say the same thing; rows without a name stay apart by their places. */
  private static String key(SheetLayout layout, EntryTable.Entry entry) {
    String name = name(layout, entry).toLowerCase(Locale.ROOT);
    return name.isEmpty() ? entry.where().toString() : name;
  }
}
