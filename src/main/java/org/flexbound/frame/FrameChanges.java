package org.flexbound.frame;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.document.Json;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;

/**
 * The changes that a configuration makes to a model: entries removed, added or replaced.
 *
 * <p>Form: {@code {"remove": {"members": ["brace"], "supports": ["base"]}, "add": {"supports":
 * {"tip": {"z": "fixed"}}}, "replace": {"connections": {"splice": {...}}}}}. Entries are written as
 * in a model file; numbers without a unit are in the model's units.
 */
public final class FrameChanges {
  private static final String REMOVE = "remove";
  private static final String ADD = "add";
  private static final String REPLACE = "replace";
  private static final List<String> TABLES =
      List.of("nodes", "materials", "sections", "joints", "members", "connections", "supports");

  private final Findings findings = new Findings();
  private final Entries entries;

  private FrameChanges(DeclaredUnits units) {
    entries = new Entries(findings, units);
  }

  /**
   * Makes the changes.
   *
   * @param model the model
   * @param changes the changes as the study has them
   * @return the changed model; findings of the model itself that were there before the changes are
   *     not repeated
   */
  public static Outcome<FrameModel> apply(FrameModel model, Json changes) {
    return new FrameChanges(model.units()).changed(model, changes);
  }

  private Outcome<FrameModel> changed(FrameModel model, Json changes) {
    if (!(changes instanceof Json.Members top)) {
      entries.wrong(changes, "changes as an object with remove, add or replace");
      return Outcome.of(model, findings.list());
    }
    entries.refuseOtherKeys(top, "the changes", List.of(REMOVE, ADD, REPLACE));
    Map<String, Map<String, Json>> tables = new LinkedHashMap<>();
    for (String table : TABLES) {
      Map<String, Json> copy = new LinkedHashMap<>();
      if (model.source().members().get(table) instanceof Json.Members members) {
        copy.putAll(members.members());
      }
      tables.put(table, copy);
    }
    top.get(REMOVE).ifPresent(value -> remove(value, tables));
    top.get(REPLACE).ifPresent(value -> put(value, tables, true));
    top.get(ADD).ifPresent(value -> put(value, tables, false));
    Map<String, Json> source = new LinkedHashMap<>(model.source().members());
    tables.forEach(
        (table, copy) -> {
          if (!copy.isEmpty() || source.containsKey(table)) {
            Json before = source.get(table);
            source.put(
                table,
                new Json.Members(before == null ? top.where() : before.where(), copy));
          }
        });
    Outcome<FrameModel> read =
        FrameReader.read(new Json.Members(model.source().where(), source));
    List<Finding> known = FrameReader.read(model.source()).findings();
    read.findings().stream()
        .filter(finding -> !known.contains(finding))
        .forEach(finding -> findings.addAll(List.of(finding)));
    return new Outcome<>(read.value(), findings.list());
  }

  private void remove(Json value, Map<String, Map<String, Json>> tables) {
    if (!(value instanceof Json.Members byTable)) {
      entries.wrong(value, "tables with lists of names, as {\"members\": [\"brace\"]}");
      return;
    }
    entries.refuseOtherKeys(byTable, "'remove'", TABLES);
    byTable
        .members()
        .forEach(
            (table, names) -> {
              Map<String, Json> entriesOfTable = tables.getOrDefault(table, Map.of());
              if (names instanceof Json.Items items) {
                for (Json item : items.items()) {
                  entries
                      .nameIn(item, table, table, entriesOfTable.keySet())
                      .ifPresent(entriesOfTable::remove);
                }
              } else {
                entries.wrong(names, "a list of names in brackets");
              }
            });
  }

  private void put(Json value, Map<String, Map<String, Json>> tables, boolean replace) {
    String word = replace ? REPLACE : ADD;
    if (!(value instanceof Json.Members byTable)) {
      entries.wrong(value, "tables with entries, as {\"supports\": {\"tip\": {\"z\": \"fixed\"}}}");
      return;
    }
    entries.refuseOtherKeys(byTable, "'" + word + "'", TABLES);
    byTable
        .members()
        .forEach(
            (table, added) -> {
              Map<String, Json> entriesOfTable = tables.get(table);
              if (entriesOfTable == null) {
                return;
              }
              if (!(added instanceof Json.Members members)) {
                entries.wrong(added, "an object with one entry a name");
                return;
              }
              members.members().forEach(
                  (name, entry) -> {
                    if (entriesOfTable.containsKey(name) != replace) {
                      entries.add(
                          FrameFinding.BAD_CHANGE,
                          entry.where(),
                          replace
                              ? "found '"
                                  + name
                                  + "' to replace, which is not one of the "
                                  + table
                                  + NearestName.hint(name, entriesOfTable.keySet())
                              : "found '"
                                  + name
                                  + "' to add, which is already one of the "
                                  + table);
                    }
                    entriesOfTable.put(name, entry);
                  });
            });
  }
}
