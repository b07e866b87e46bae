package org.flexbound.frame;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import org.flexbound.document.CellKind;
import org.flexbound.document.EntryTable;
import org.flexbound.document.Json;
import org.flexbound.document.Sheet;
import org.flexbound.document.SheetFile;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Unit;
import org.flexbound.quantity.UnitException;
import org.flexbound.quantity.Units;
import org.jspecify.annotations.Nullable;

/**
 * Makes of a workbook the tree of values that a model file would hold; every value knows its cell, so
 * that whatever {@link FrameReader} finds is told with sheet and cell. A number under a header with a
 * unit that is not the declared one becomes a text with that unit.
 */
final class FrameWorkbookReader {
  /** Sheets that are not read and not told. */
  private static final List<String> PASSED = List.of("examples", "about");

  private final Findings findings;
  private final SheetFile file;
  private DeclaredUnits units = DeclaredUnits.SI;

  FrameWorkbookReader(SheetFile file, Findings findings) {
    this.file = file;
    this.findings = findings;
  }

  Json.Members read() {
    Map<String, Json> top = new LinkedHashMap<>();
    for (Sheet sheet : file.sheets()) {
      if (ModelSheet.plain(sheet.name()).equals(ModelSheet.UNITS)) {
        units(sheet, top);
      }
    }
    for (Sheet sheet : file.sheets()) {
      Optional<ModelSheet> known = ModelSheet.of(sheet.name());
      if (known.isPresent()) {
        table(sheet, known.get()).ifPresent(table -> top.put(known.get().key(), table));
      } else if (!ModelSheet.plain(sheet.name()).equals(ModelSheet.UNITS)
          && !PASSED.contains(ModelSheet.plain(sheet.name()))) {
        List<String> keys = new ArrayList<>(List.of(ModelSheet.UNITS));
        ModelSheet.ALL.forEach(s -> keys.add(s.key()));
        findings.add(
            FrameFinding.SHEET_NOT_READ,
            sheet.where(),
            "found the sheet '" + sheet.name() + "'" + NearestName.hint(sheet.name(), keys));
      }
    }
    return new Json.Members(Where.file(file.name()), top);
  }

  private Optional<EntryTable> entries(Sheet sheet, List<String> required, List<String> optional) {
    boolean[] any = new boolean[1];
    sheet.forEachRow(
        row -> {
          any[0] = true;
          return false;
        });
    return any[0] ? EntryTable.read(sheet, required, optional, findings) : Optional.empty();
  }

  private void units(Sheet sheet, Map<String, Json> top) {
    Map<String, Json> stated = new LinkedHashMap<>();
    Map<String, String> seen = new HashMap<>();
    Optional<EntryTable> table =
        entries(sheet, List.of(ModelSheet.ITEM, ModelSheet.ENTRY), List.of());
    if (table.isEmpty()) {
      return;
    }
    for (EntryTable.Entry row : table.get().entries()) {
      EntryTable.Value item = row.get(ModelSheet.ITEM);
      EntryTable.Value entry = row.get(ModelSheet.ENTRY);
      if (entry.isBlank()) {
        continue;
      }
      String key = item.text().toLowerCase(Locale.ROOT);
      List<String> known = new ArrayList<>(ModelSheet.UNIT_ITEMS);
      known.addAll(ModelSheet.OTHER_ITEMS);
      if (!known.contains(key)) {
        findings.add(
            FrameFinding.UNKNOWN_KEY,
            item.where(),
            "found the item '" + item.text() + "'" + NearestName.hint(item.text(), known));
      } else if (seen.put(key, key) != null) {
        twice(item.where(), key);
      } else if (ModelSheet.UNIT_ITEMS.contains(key)) {
        stated.put(key, new Json.Text(entry.where(), entry.text()));
      } else if (key.equals("up")) {
        top.put(key, direction(entry));
      } else {
        top.put(key, new Json.Text(entry.where(), entry.text()));
      }
    }
    if (!stated.isEmpty()) {
      top.put(ModelSheet.UNITS, new Json.Members(sheet.where(), stated));
      units =
          new DeclaredUnits(
              unit(stated, "length", units.length()),
              unit(stated, "force", units.force()),
              unit(stated, "mass", units.mass()),
              unit(stated, "angle", units.angle()));
    }
  }

  /** A unit that cannot be read is found fault with by the reader of the model. */
  private static Unit unit(Map<String, Json> stated, String key, Unit usual) {
    try {
      return stated.get(key) instanceof Json.Text text ? Units.parse(text.text()) : usual;
    } catch (UnitException bad) {
      return usual;
    }
  }

  private void twice(Where where, String name) {
    findings.add(
        FrameFinding.STATED_TWICE, where, "found a second row for '" + name + "'; expected one");
  }

  private Optional<Json> table(Sheet sheet, ModelSheet layout) {
    List<String> required =
        layout.name().map(List::of).orElseGet(() -> List.of(layout.columns().get(0).header()));
    List<String> optional = new ArrayList<>(layout.headers());
    optional.removeAll(required);
    Optional<EntryTable> found = entries(sheet, required, optional);
    if (found.isEmpty() || found.get().entries().isEmpty()) {
      return Optional.empty();
    }
    EntryTable table = found.get();
    Map<String, Unit> otherUnits = otherUnits(table, layout);
    if (layout.name().isEmpty()) {
      List<Json> items = new ArrayList<>();
      for (EntryTable.Entry row : table.entries()) {
        items.add(entry(row, layout, otherUnits, row.where()));
      }
      return Optional.of(new Json.Items(sheet.where(), items));
    }
    Map<String, Json> result = new LinkedHashMap<>();
    Map<String, Matrix> matrices = new LinkedHashMap<>();
    for (EntryTable.Entry row : table.entries()) {
      EntryTable.Value name = row.get(layout.name().get());
      if (name.isBlank()) {
        findings.add(
            FrameFinding.MISSING_KEY,
            name.where(),
            "the row has no name; expected one in the column '" + layout.name().get() + "'");
      } else if (layout.holdsMatrices() && !row.get(ModelSheet.MATRIX_ROW).isBlank()) {
        matrices
            .computeIfAbsent(name.text(), n -> new Matrix(name.where(), new TreeMap<>()))
            .add(row, this, otherUnits);
      } else if (result.containsKey(name.text())) {
        twice(name.where(), name.text());
      } else {
        result.put(name.text(), entry(row, layout, otherUnits, name.where()));
      }
    }
    matrices.forEach((name, matrix) -> result.put(name, matrix.into(result.get(name), this)));
    return Optional.of(new Json.Members(sheet.where(), result));
  }

  /** The units of headers that are not the declared ones, by column. */
  private Map<String, Unit> otherUnits(EntryTable table, ModelSheet layout) {
    Map<String, Unit> result = new HashMap<>();
    for (ModelSheet.Column column : layout.columns()) {
      Optional<EntryTable.Header> header = table.header(column.header());
      if (header.isEmpty() || header.get().unit().isEmpty()) {
        continue;
      }
      try {
        Unit unit = Units.parse(header.get().unit());
        double declared = column.measure().factor(units);
        if (!unit.dimension().fits(column.measure().dimension())) {
          findings.add(
              FrameFinding.WRONG_UNIT,
              header.get().where(),
              "found the unit '" + header.get().unit() + "'; expected that of "
                  + column.measure().words());
        } else if (Math.abs(unit.siFactor() - declared) > 1e-12 * declared) {
          result.put(column.header(), unit);
        }
      } catch (UnitException bad) {
        findings.add(
            FrameFinding.WRONG_UNIT, header.get().where(), String.valueOf(bad.getMessage()));
      }
    }
    return result;
  }

  private Json entry(
      EntryTable.Entry row, ModelSheet layout, Map<String, Unit> otherUnits, Where where) {
    Branch entry = new Branch(where);
    for (ModelSheet.Column column : layout.columns()) {
      EntryTable.Value cell = row.get(column.header());
      if (!cell.isBlank()) {
        Json value =
            column.form() == ModelSheet.Form.DIRECTION
                ? direction(cell)
                : value(cell, Optional.ofNullable(otherUnits.get(column.header())));
        if (!entry.put(column.path(), value)) {
          findings.add(
              FrameFinding.WRONG_KIND,
              cell.where(),
              "the column '" + column.header() + "' cannot stand beside another of its kind; keep"
                  + " one of them");
        }
      }
    }
    blanks(row, layout, entry);
    return entry.json();
  }

  /** A list of which some cells are blank is not closed up: that would be a silent guess. */
  private void blanks(EntryTable.Entry row, ModelSheet layout, Branch entry) {
    for (ModelSheet.Column column : layout.columns()) {
      List<String> list = column.path().subList(0, column.path().size() - 1);
      boolean inList = Branch.isPlace(column.path().get(column.path().size() - 1));
      boolean needed = layout.key().equals("nodes");
      if (inList && row.get(column.header()).isBlank() && (needed || entry.holdsLeaves(list))) {
        Where where = row.get(column.header()).where();
        findings.add(
            FrameFinding.MISSING_KEY,
            where,
            "the cell '" + column.header() + "' is blank; expected "
                + (column.form() == ModelSheet.Form.NAME ? "a name" : "a number (0 for none)"));
        entry.put(column.path(), new Json.Numeral(where, 0));
      }
    }
  }

  private Json value(EntryTable.Value cell, Optional<Unit> unit) {
    if (cell.kind() == CellKind.NUMBER) {
      return unit.isPresent()
          ? new Json.Text(cell.where(), Json.plain(cell.number()) + " " + unit.get().symbol())
          : new Json.Numeral(cell.where(), cell.number());
    }
    if (cell.kind() != CellKind.TEXT) {
      findings.add(
          FrameFinding.WRONG_KIND,
          cell.where(),
          "found "
              + switch (cell.kind()) {
                case DATE -> "a date";
                case TRUTH -> "a truth value";
                default -> "the error value " + cell.text();
              }
              + "; expected a number or a text");
    }
    return new Json.Text(cell.where(), cell.text());
  }

  private Json direction(EntryTable.Value cell) {
    String text = cell.text().strip();
    if (!text.startsWith("(") || !text.endsWith(")")) {
      return value(cell, Optional.empty());
    }
    List<Json> items = new ArrayList<>();
    for (String part : text.substring(1, text.length() - 1).split(",", -1)) {
      try {
        items.add(new Json.Numeral(cell.where(), Double.parseDouble(part.strip())));
      } catch (NumberFormatException notANumber) {
        items.add(new Json.Text(cell.where(), part.strip()));
      }
    }
    return new Json.Items(cell.where(), items);
  }

  /** The rows of a joint's full matrix. */
  private record Matrix(Where where, TreeMap<Integer, Json> rows) {
    void add(EntryTable.Entry row, FrameWorkbookReader reader, Map<String, Unit> otherUnits) {
      EntryTable.Value which = row.get(ModelSheet.MATRIX_ROW);
      int index = SpringReader.keys().indexOf(which.text().toLowerCase(Locale.ROOT));
      if (index < 0) {
        reader.findings.add(
            FrameFinding.WRONG_KIND,
            which.where(),
            "found '" + which.text() + "'; expected one of "
                + String.join(", ", SpringReader.keys()));
        return;
      }
      List<Json> cells = new ArrayList<>();
      for (String key : SpringReader.keys()) {
        EntryTable.Value cell = row.get(key);
        if (cell.isBlank()) {
          reader.findings.add(
              FrameFinding.MISSING_KEY,
              cell.where(),
              "the cell '" + key + "' of a matrix row is blank; expected a number (0 for none)");
          cells.add(new Json.Numeral(cell.where(), 0));
        } else {
          cells.add(reader.value(cell, Optional.empty()));
        }
        if (otherUnits.containsKey(key)) {
          reader.findings.add(
              FrameFinding.WRONG_UNIT,
              cell.where(),
              "a matrix row is in the declared units, but the header states another; state the"
                  + " unit in the cell, or take it out of the header");
        }
      }
      if (rows.put(index, new Json.Items(which.where(), cells)) != null) {
        reader.twice(which.where(), "matrix row " + which.text());
      }
    }

    /** The entry of the joint with the matrix; its factors stand in a row of their own. */
    Json into(@Nullable Json own, FrameWorkbookReader reader) {
      if (rows.size() != 6) {
        reader.findings.add(
            FrameFinding.MISSING_KEY,
            where,
            "the matrix has " + rows.size() + " rows; expected six: "
                + String.join(", ", SpringReader.keys()));
      }
      Map<String, Json> entry = new LinkedHashMap<>();
      entry.put("matrix", new Json.Items(where, new ArrayList<>(rows.values())));
      if (own instanceof Json.Members members) {
        entry.putAll(members.members());
      }
      return new Json.Members(where, entry);
    }
  }
}
