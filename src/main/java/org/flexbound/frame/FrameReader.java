package org.flexbound.frame;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.flexbound.document.Json;
import org.flexbound.document.JsonFile;
import org.flexbound.document.SheetFile;
import org.flexbound.document.WorkbookFile;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.quantity.Dimension;
import org.flexbound.quantity.Unit;
import org.flexbound.quantity.UnitException;
import org.flexbound.quantity.Units;
import org.flexbound.setup.Vector;

/**
 * Reads a frame model. All problems come as findings in one go; what could be made out is returned
 * beside them.
 */
public final class FrameReader {
  /** The keys of a model, in the order in which they are written and shown. */
  static final List<String> KEYS =
      List.of(
          "units",
          "up",
          "nodes",
          "materials",
          "sections",
          "joints",
          "members",
          "connections",
          "supports",
          "rigidLinks",
          "masses");

  private static final List<String> ASIDE = List.of("$schema", "title", "notes");

  private final Findings findings = new Findings();

  private FrameReader() {}

  /**
   * Reads a model from a JSON file, or from a workbook where the file's name ends as one.
   *
   * @param file where it lies
   * @param shownName its name in messages
   * @return the model as far as it could be made out, with all findings
   */
  public static Outcome<FrameModel> read(Path file, String shownName) {
    if (!isWorkbook(file)) {
      return JsonFile.read(file, shownName).then(FrameReader::read);
    }
    return WorkbookFile.open(file, shownName)
        .then(
            sheets -> {
              try (SheetFile open = sheets) {
                return read(open);
              }
            });
  }

  /**
   * Whether a file's name ends as that of a workbook.
   *
   * @param file the file
   * @return true for .xlsx, .xlsm and .xls
   */
  public static boolean isWorkbook(Path file) {
    String name = String.valueOf(file.getFileName()).toLowerCase(Locale.ROOT);
    return name.endsWith(".xlsx") || name.endsWith(".xlsm") || name.endsWith(".xls");
  }

  /**
   * Reads a model from a workbook: one sheet for each key of a model file, see {@link FrameWorkbook}.
   *
   * @param sheets the workbook, not closed here
   * @return the model as far as it could be made out, with all findings by sheet and cell
   */
  public static Outcome<FrameModel> read(SheetFile sheets) {
    FrameReader reader = new FrameReader();
    return reader.model(new FrameWorkbookReader(sheets, reader.findings).read());
  }

  /**
   * Reads a model.
   *
   * @param json the whole file
   * @return the model as far as it could be made out, with all findings
   */
  public static Outcome<FrameModel> read(Json json) {
    return new FrameReader().model(json);
  }

  private Outcome<FrameModel> model(Json json) {
    if (!(json instanceof Json.Members top)) {
      new Entries(findings, DeclaredUnits.SI).wrong(json, "a frame model as an object in braces");
      return Outcome.none(findings.list());
    }
    DeclaredUnits units = units(top);
    Entries entries = new Entries(findings, units);
    List<String> known = new ArrayList<>(KEYS);
    known.addAll(ASIDE);
    entries.refuseOtherKeys(top, "a frame model", known);
    Vector up = entries.direction(top, "up").orElse(Axes.GLOBAL.z()).unit();
    Map<String, Node> nodes = nodes(entries, top);
    SpringReader springs = new SpringReader(entries);
    SectionReader sectionReader = new SectionReader(entries, springs);
    Map<String, Material> materials = sectionReader.materials(top);
    Map<String, Section> sections = sectionReader.sections(top);
    PartReader parts = new PartReader(entries, springs, nodes);
    Map<String, Joint> joints = parts.joints(top);
    Map<String, Member> members =
        parts.members(
            top, sections, materials, names(top, "sections"), names(top, "materials"));
    FrameModel model =
        new FrameModel(
            units,
            up,
            nodes,
            materials,
            sections,
            members,
            joints,
            parts.connections(top),
            parts.supports(top),
            parts.rigidLinks(top),
            parts.masses(top),
            top);
    return Outcome.of(new ModelCheck(findings, model).checked(), findings.list());
  }

  /** The names of a table as written, entries in error included. */
  private static Set<String> names(Json.Members top, String key) {
    return top.members().get(key) instanceof Json.Members table
        ? table.members().keySet()
        : Set.of();
  }

  private static Map<String, Node> nodes(Entries entries, Json.Members top) {
    Map<String, Node> nodes = new LinkedHashMap<>();
    Json value = top.members().get("nodes");
    if (value == null) {
      entries.missing(top, "nodes", "the frame model");
    } else if (value instanceof Json.Members table) {
      if (table.members().isEmpty()) {
        entries.add(FrameFinding.MISSING_KEY, table.where(), "the frame model has no node");
      }
      table
          .members()
          .forEach(
              (name, place) ->
                  // A node in error still counts as a name.
                  nodes.put(
                      name,
                      new Node(
                          name,
                          entries.vector(place, Measure.LENGTH).orElse(Vector.ZERO),
                          place.where())));
    } else {
      entries.wrong(value, "an object with one entry a node: \"name\": [x, y, z]");
    }
    return nodes;
  }

  private DeclaredUnits units(Json.Members top) {
    Entries entries = new Entries(findings, DeclaredUnits.SI);
    Optional<Json.Members> stated = entries.members(top, "units");
    if (stated.isEmpty()) {
      if (top.get("units").isEmpty()) {
        findings.add(
            FrameFinding.UNITS_ASSUMED,
            top.where(),
            "the model has no key 'units'; numbers without a unit are taken in m, N, kg and rad");
      }
      return DeclaredUnits.SI;
    }
    entries.refuseOtherKeys(
        stated.get(), "'units'", List.of("length", "force", "mass", "angle"));
    DeclaredUnits si = DeclaredUnits.SI;
    return new DeclaredUnits(
        unit(entries, stated.get(), "length", Dimension.LENGTH, si.length()),
        unit(entries, stated.get(), "force", Dimension.FORCE, si.force()),
        unit(entries, stated.get(), "mass", Dimension.MASS, si.mass()),
        unit(entries, stated.get(), "angle", Dimension.ANGLE, si.angle()));
  }

  private static Unit unit(
      Entries entries, Json.Members stated, String key, Dimension dimension, Unit usual) {
    Optional<String> text = entries.text(stated, key);
    if (text.isEmpty()) {
      if (stated.get(key).isEmpty()) {
        entries.add(
            FrameFinding.UNITS_ASSUMED,
            stated.where(),
            "'units' has no key '" + key + "'; " + usual.symbol() + " is taken");
      }
      return usual;
    }
    Json value = stated.get(key).orElse(stated);
    try {
      Unit unit = Units.parse(text.get());
      if (unit.dimension().equals(dimension)) {
        return unit;
      }
      entries.add(
          FrameFinding.WRONG_UNIT,
          value.where(),
          "found '" + text.get() + "'; expected a unit of " + key);
    } catch (UnitException bad) {
      entries.add(FrameFinding.WRONG_UNIT, value.where(), String.valueOf(bad.getMessage()));
    }
    return usual;
  }
}
