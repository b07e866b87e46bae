package org.flexbound.testlog;

import java.nio.charset.Charset;
import java.nio.charset.IllegalCharsetNameException;
import java.nio.charset.UnsupportedCharsetException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.Set;
import org.flexbound.document.CsvLayout;
import org.flexbound.document.DocumentFinding;
import org.flexbound.document.InputFolder;
import org.flexbound.document.Json;
import org.flexbound.document.JsonKeys;
import org.flexbound.document.ReadLimits;
import org.flexbound.document.Sheet;
import org.flexbound.document.SheetFile;
import org.flexbound.document.TableFile;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Where;
import org.flexbound.quantity.NearestWord;
import org.flexbound.quantity.Unit;
import org.flexbound.quantity.UnitException;
import org.flexbound.quantity.Units;

/** Opens the files that a description of a log names under {@code readings}. */
final class DescribedFiles {
  private static final List<String> OF_TEXT = List.of("separator", "decimalSign", "encoding");

  /** The keys of a table of entries that stands in a file of its own. */
  static final List<String> OF_A_TABLE =
      List.of("file", "sheet", "separator", "decimalSign", "encoding");

  private final InputFolder folder;
  private final JsonKeys keys;
  private final Findings findings;
  private final Map<String, Checksum> sums = new LinkedHashMap<>();
  private final List<ReadingsSource> sources = new ArrayList<>();

  DescribedFiles(InputFolder folder, JsonKeys keys, Findings findings) {
    this.folder = folder;
    this.keys = keys;
    this.findings = findings;
  }

  /** The files that were opened. */
  List<InputFile> inputs() {
    return sums.entrySet().stream()
        .map(entry -> new InputFile(entry.getKey(), entry.getValue().digits()))
        .toList();
  }

  /** The sheets that hold readings, in the order of the description. */
  List<ReadingsSource> sources(Json.Members top) {
    Optional<Json> readings = top.get(DescriptionKeys.READINGS);
    if (readings.isEmpty() && top.get(DescriptionKeys.of(SheetLayout.COEFFICIENTS.name())).isPresent()) {
      return List.of();
    }
    if (readings.isEmpty()) {
      keys.absent(
          top.where(),
          "the description has no key '"
              + DescriptionKeys.READINGS
              + "'; expected a list of the files with readings");
      return List.of();
    }
    for (Json item : keys.items(readings.get(), "the files with readings")) {
      keys.members(item, "a file with readings").ifPresent(this::entry);
    }
    return named(sources);
  }

  /** A file or a sheet of one that holds a table of entries. */
  Optional<Sheet> table(Json.Members entry) {
    keys.refuseOthers(entry, OF_A_TABLE);
    Optional<String> name = keys.text(entry, "file");
    if (name.isEmpty()) {
      keys.absent(entry.where(), "found no key 'file'; expected the name of a file");
      return Optional.empty();
    }
    Json.Text file = new Json.Text(entry.get("file").orElse(entry).where(), name.get());
    CsvLayout written = written(entry);
    return folder
        .resolve(file.text(), file.where(), findings)
        .flatMap(path -> open(entry, path, file, written))
        .flatMap(
            sheets ->
                keys.texts(entry, "sheet").stream()
                    .findFirst()
                    .map(wanted -> sheet(sheets, wanted, file))
                    .orElseGet(() -> sheets.sheets().stream().findFirst()));
  }

  private void entry(Json.Members entry) {
    keys.refuseOthers(entry, DescriptionKeys.OF_READINGS.keySet());
    List<Json.Text> files = new ArrayList<>(keys.texts(entry, "file"));
    files.addAll(keys.texts(entry, "files"));
    if (files.isEmpty() && entry.get("file").isEmpty()) {
      keys.absent(entry.where(), "found no key 'file' or 'files'; expected the name of a file");
    }
    CsvLayout written = written(entry);
    ReadingsLayout layout = layout(entry);
    List<Json.Text> sheets = new ArrayList<>(keys.texts(entry, "sheet"));
    sheets.addAll(keys.texts(entry, "sheets"));
    for (Json.Text name : files) {
      folder
          .resolve(name.text(), name.where(), findings)
          .ifPresent(path -> file(entry, path, name, written, layout, sheets));
    }
  }

  private void file(
      Json.Members entry,
      Path path,
      Json.Text name,
      CsvLayout written,
      ReadingsLayout layout,
      List<Json.Text> sheets) {
    Optional<SheetFile> opened = open(entry, path, name, written);
    if (opened.isEmpty()) {
      return;
    }
    SheetFile file = opened.get();
    boolean text = TableFile.isText(file);
    if (text || sheets.isEmpty()) {
      boolean only = file.sheets().size() == 1;
      file.sheets().forEach(sheet -> source(sheet, name, layout, only));
      return;
    }
    for (Json.Text wanted : sheets) {
      sheet(file, wanted, name).ifPresent(sheet -> source(sheet, name, layout, true));
    }
  }

  private Optional<SheetFile> open(
      Json.Members entry, Path path, Json.Text name, CsvLayout written) {
    String shown = folder.shown(name.text());
    Outcome<SheetFile> opened = TableFile.open(path, shown, written, ReadLimits.USUAL);
    findings.addAll(opened.findings());
    if (opened.value().isEmpty()) {
      return Optional.empty();
    }
    sums.computeIfAbsent(shown, key -> Checksum.begin(path));
    SheetFile file = opened.value().get();
    boolean text = TableFile.isText(file);
    for (String key : text ? List.of("sheet", "sheets") : OF_TEXT) {
      entry
          .get(key)
          .ifPresent(
              value ->
                  findings.add(
                      DocumentFinding.WRONG_KIND,
                      value.where(),
                      "found the key '"
                          + key
                          + "' for '"
                          + name.text()
                          + "', which is a "
                          + (text ? "text file without sheets" : "workbook and no text file")));
    }
    return Optional.of(file);
  }

  private Optional<Sheet> sheet(SheetFile file, Json.Text wanted, Json.Text name) {
    Optional<Sheet> sheet = file.sheet(wanted.text());
    if (sheet.isEmpty()) {
      List<String> there = file.sheets().stream().map(Sheet::name).toList();
      findings.add(
          TestlogFinding.MISSING_SHEET,
          wanted.where(),
          "found no sheet '"
              + wanted.text()
              + "' in '"
              + name.text()
              + "'; it has "
              + String.join(", ", there)
              + NearestWord.question(wanted.text(), there));
    }
    return sheet;
  }

  private void source(Sheet sheet, Json.Text name, ReadingsLayout layout, boolean expected) {
    boolean twice =
        sources.stream()
            .anyMatch(
                known ->
                    known.file().equals(name.text()) && known.sheet().name().equals(sheet.name()));
    if (twice) {
      findings.add(
          TestlogFinding.TWICE,
          name.where(),
          "found the file '"
              + name.text()
              + "' again; where it holds several runs, name them under 'runs' with firstRow and"
              + " lastRow");
    } else {
      sources.add(new ReadingsSource(sheet, name.text(), sheet.name(), layout, expected));
    }
  }

  /** Gives each sheet's readings a name of their own: the sheet's, where no other has the same. */
  private static List<ReadingsSource> named(List<ReadingsSource> sources) {
    List<ReadingsSource> named = new ArrayList<>();
    for (ReadingsSource source : sources) {
      long same =
          sources.stream().filter(other -> other.runName().equals(source.runName())).count();
      String own =
          same == 1
              ? source.runName()
              : source.sheet().where().sheet().isPresent()
                  ? source.file() + " " + source.runName()
                  : source.file();
      named.add(
          new ReadingsSource(
              source.sheet(), source.file(), own, source.layout(), source.expected()));
    }
    return named;
  }

  private CsvLayout written(Json.Members entry) {
    Optional<Character> separator =
        keys.text(entry, "separator")
            .flatMap(
                text -> {
                  char sign = text.equalsIgnoreCase("tab") ? '\t' : text.length() == 1 ? text.charAt(0) : '\n';
                  return sign == '\n' || sign == '"' || sign >= 128
                      ? refused(entry, "separator", "one sign such as ; or the word tab")
                      : Optional.of(sign);
                });
    Optional<Character> decimal =
        keys.text(entry, "decimalSign")
            .flatMap(
                text ->
                    text.equals(".") || text.equals(",")
                        ? Optional.of(text.charAt(0))
                        : refused(entry, "decimalSign", "a point or a comma"));
    Optional<Charset> charset = keys.text(entry, "encoding").flatMap(text -> charset(entry, text));
    if (separator.isPresent() && separator.equals(decimal)) {
      findings.add(
          DocumentFinding.WRONG_KIND,
          entry.get("decimalSign").orElse(entry).where(),
          "found '" + decimal.get() + "' both as separator and as decimal sign");
      return CsvLayout.FOUND_BY_ITSELF;
    }
    return new CsvLayout(separator, decimal, charset);
  }

  private Optional<Charset> charset(Json.Members entry, String text) {
    String name = text.strip().toLowerCase(Locale.ROOT);
    try {
      return Optional.of(
          Charset.forName(name.startsWith("latin-") ? "latin" + name.substring(6) : name));
    } catch (IllegalCharsetNameException | UnsupportedCharsetException unknown) {
      return refused(
          entry, "encoding", "the name of an encoding such as utf-8, utf-16 or windows-1252");
    }
  }

  private <T> Optional<T> refused(Json.Members entry, String key, String expected) {
    entry.get(key).ifPresent(value -> keys.wrong(value, expected));
    return Optional.empty();
  }

  private ReadingsLayout layout(Json.Members entry) {
    OptionalInt header = keys.row(entry, "headerRow");
    OptionalInt units = keys.row(entry, "unitsRow");
    OptionalInt first = keys.row(entry, "firstRow");
    OptionalInt last = keys.row(entry, "lastRow");
    if (header.isPresent() && units.isPresent() && units.getAsInt() <= header.getAsInt()) {
      refused(entry, "unitsRow", "a row below the header (row " + header.getAsInt() + ")");
    }
    if (first.isPresent() && last.isPresent() && first.getAsInt() > last.getAsInt()) {
      refused(entry, "lastRow", "a row below firstRow (" + first.getAsInt() + ")");
    }
    List<String> names = keys.texts(entry, "columnNames").stream().map(Json.Text::text).toList();
    if (!names.isEmpty() && (header.isPresent() || units.isPresent())) {
      refused(entry, "columnNames", "no such key beside headerRow or unitsRow");
    }
    Map<String, String> extras = new LinkedHashMap<>();
    for (String word : SheetLayout.READING_COLUMNS) {
      keys.text(entry, DescriptionKeys.of(word)).ifPresent(text -> extras.put(word, text));
    }
    Set<String> noReading = new LinkedHashSet<>();
    entry
        .get("noReading")
        .ifPresent(
            value -> {
              List<Json> items = value instanceof Json.Items list ? list.items() : List.of(value);
              for (Json item : items) {
                if (item instanceof Json.Text text) {
                  noReading.add(HeaderText.key(text.text()));
                } else if (item instanceof Json.Numeral numeral) {
                  noReading.add(Json.plain(numeral.value()));
                } else {
                  keys.wrong(item, "a text or a number that stands for a missing reading");
                }
              }
            });
    return new ReadingsLayout(
        header, units, first, last, names, columns(entry), extras, noReading, entry.where());
  }

  private Map<String, ReadingsLayout.StatedColumn> columns(Json.Members entry) {
    Map<String, ReadingsLayout.StatedColumn> columns = new LinkedHashMap<>();
    entry
        .get(DescriptionKeys.COLUMNS)
        .flatMap(value -> keys.members(value, "columns by their headers"))
        .ifPresent(
            members ->
                members
                    .members()
                    .forEach(
                        (name, value) ->
                            columns.put(HeaderText.claimedKey(name), column(name, value))));
    return columns;
  }

  private ReadingsLayout.StatedColumn column(String name, Json value) {
    if (value instanceof Json.Text unit) {
      return new ReadingsLayout.StatedColumn(name, unit(unit.text(), value.where()), 1, value.where());
    }
    Optional<Json.Members> members = keys.members(value, "unit and scale, or a unit as text,");
    if (members.isEmpty()) {
      return new ReadingsLayout.StatedColumn(name, Optional.empty(), 1, value.where());
    }
    keys.refuseOthers(members.get(), List.of("unit", "scale"));
    OptionalDouble scale = keys.number(members.get(), "scale");
    if (scale.isPresent() && scale.getAsDouble() == 0) {
      refused(members.get(), "scale", "a number other than 0");
      scale = OptionalDouble.empty();
    }
    Optional<Unit> unit =
        keys.text(members.get(), "unit")
            .flatMap(
                text -> unit(text, members.get().get("unit").orElse(value).where()));
    double factor = scale.orElse(1);
    if (factor != 1) {
      findings.add(
          TestlogFinding.SCALED,
          value.where(),
          "the numbers of the column '"
              + name
              + "' are multiplied by "
              + Json.plain(factor)
              + unit.map(found -> " and are then in " + found.symbol()).orElse(""));
    }
    return new ReadingsLayout.StatedColumn(name, unit, factor, value.where());
  }

  private Optional<Unit> unit(String text, Where where) {
    try {
      return Optional.of(Units.parse(text));
    } catch (UnitException unknown) {
      findings.add(TestlogFinding.UNIT, where, String.valueOf(unknown.getMessage()));
      return Optional.empty();
    }
  }
}
