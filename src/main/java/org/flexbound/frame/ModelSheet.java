package org.flexbound.frame;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.TreeSet;

/**
 * How one key of a frame model stands on a sheet of that name: a row for each entry, a column for
 * each value in it. Reader and writer of workbooks both follow these definitions.
 *
 * @param key the model's key, and the sheet's name
 * @param name the header of the column with the entry's name; empty for a list without names
 * @param columns the other columns
 */
record ModelSheet(String key, Optional<String> name, List<Column> columns) {
  /** What a cell of a column holds. */
  enum Form {
    /** A number in the unit of its header, or a text with its own unit, or a word such as free. */
    VALUE,
    /** A name. */
    NAME,
    /** A direction: +z, or three numbers in round brackets. */
    DIRECTION
  }

  /**
   * A column.
   *
   * @param header its name
   * @param path where its value stands in the entry; a number is a place in a list
   * @param form what a cell holds
   * @param measure what a number measures
   * @param choices what a drop-down list offers
   */
  record Column(
      String header, List<String> path, Form form, Measure measure, List<String> choices) {}

  /** The sheet with the keys that are no tables: units, up, title and notes. */
  static final String UNITS = "units";

  static final String ITEM = "Item";
  static final String ENTRY = "Entry";

  /** The items of that sheet that stand within the key 'units'. */
  static final List<String> UNIT_ITEMS = List.of("length", "force", "mass", "angle");

  /** The other items. */
  static final List<String> OTHER_ITEMS = List.of("up", "title", "notes", "$schema");

  /** The header of the column that makes a row of the sheet joints one of a full matrix. */
  static final String MATRIX_ROW = "matrix row";

  static final List<ModelSheet> ALL =
      List.of(
          nodes(),
          materials(),
          sections(),
          joints(),
          members(),
          connections(),
          supports(),
          new ModelSheet(
              "rigidLinks",
              Optional.empty(),
              List.of(name("from", "from"), name("to", "to"))),
          masses());

  private static Column value(String header, Measure measure, String... path) {
    return new Column(header, List.of(path), Form.VALUE, measure, List.of());
  }

  private static Column name(String header, String... path) {
    return new Column(header, List.of(path), Form.NAME, Measure.NUMBER, List.of());
  }

  private static Column direction(String header, String... path) {
    return new Column(
        header,
        List.of(path),
        Form.DIRECTION,
        Measure.NUMBER,
        List.of("+x", "-x", "+y", "-y", "+z", "-z"));
  }

  private static List<Column> place(String prefix, String... path) {
    List<Column> result = new ArrayList<>();
    String[] axes = {"x", "y", "z"};
    for (int i = 0; i < 3; i++) {
      List<String> whole = new ArrayList<>(List.of(path));
      whole.add(String.valueOf(i));
      result.add(new Column(prefix + axes[i], whole, Form.VALUE, Measure.LENGTH, List.of()));
    }
    return result;
  }

  private static ModelSheet nodes() {
    return new ModelSheet("nodes", Optional.of("node"), place(""));
  }

  private static ModelSheet materials() {
    return new ModelSheet(
        "materials",
        Optional.of("material"),
        List.of(
            value("E", Measure.STRESS, "E"),
            value("nu", Measure.NUMBER, "nu"),
            value("G", Measure.STRESS, "G"),
            value("density", Measure.DENSITY, "density"),
            value("factor E", Measure.NUMBER, "factors", "E")));
  }

  private static ModelSheet sections() {
    List<Column> columns = new ArrayList<>();
    List<String> shapes = new ArrayList<>();
    TreeSet<String> sizes = new TreeSet<>();
    for (Shape shape : Shape.values()) {
      shapes.add(shape.key());
      sizes.addAll(shape.needed());
      sizes.addAll(shape.optional());
    }
    columns.add(new Column("shape", List.of("shape"), Form.NAME, Measure.NUMBER, shapes));
    sizes.forEach(size -> columns.add(value(size, Measure.LENGTH, size)));
    columns.add(value("A", Measure.AREA, "A"));
    for (String key : List.of("Iy", "Iz", "J")) {
      columns.add(value(key, Measure.SECOND_MOMENT, key));
    }
    columns.add(value("Ay", Measure.AREA, "Ay"));
    columns.add(value("Az", Measure.AREA, "Az"));
    return new ModelSheet("sections", Optional.of("section"), columns);
  }

  private static List<Column> springs(String held) {
    List<Column> result = new ArrayList<>();
    for (Spring spring : Spring.values()) {
      result.add(
          new Column(
              spring.key(),
              List.of(spring.key()),
              Form.VALUE,
              Measure.of(spring),
              List.of(held, SpringReader.FREE)));
    }
    return result;
  }

  private static List<Column> springFactors() {
    List<Column> result = new ArrayList<>();
    for (Spring spring : Spring.values()) {
      result.add(value("factor " + spring.key(), Measure.NUMBER, "factors", spring.key()));
    }
    return result;
  }

  private static ModelSheet joints() {
    List<Column> columns = new ArrayList<>(springs(SpringReader.RIGID));
    columns.addAll(springFactors());
    return new ModelSheet("joints", Optional.of("joint"), columns);
  }

  private static ModelSheet members() {
    List<Column> columns = new ArrayList<>();
    columns.add(name("start node", "nodes", "0"));
    columns.add(name("end node", "nodes", "1"));
    columns.add(name("section", "section"));
    columns.add(name("end section", "endSection"));
    columns.add(name("material", "material"));
    columns.add(direction("reference", "reference"));
    columns.addAll(place("start offset ", "offsets", "start"));
    columns.addAll(place("end offset ", "offsets", "end"));
    columns.add(name("start joint", "joints", "start"));
    columns.add(name("end joint", "joints", "end"));
    columns.add(value("mass per length", Measure.MASS_PER_LENGTH, "massPerLength"));
    for (Rigidity rigidity : Rigidity.values()) {
      columns.add(value("factor " + rigidity.key(), Measure.NUMBER, "factors", rigidity.key()));
    }
    return new ModelSheet("members", Optional.of("member"), columns);
  }

  private static ModelSheet connections() {
    List<Column> columns = new ArrayList<>();
    columns.add(name("first node", "nodes", "0"));
    columns.add(name("second node", "nodes", "1"));
    columns.add(name("joint", "joint"));
    columns.add(direction("axes x", "axes", "x"));
    columns.add(direction("axes y", "axes", "y"));
    columns.addAll(place("at ", "at"));
    columns.addAll(springFactors());
    return new ModelSheet("connections", Optional.of("connection"), columns);
  }

  private static ModelSheet supports() {
    List<Column> columns = new ArrayList<>(springs(SpringReader.FIXED));
    columns.add(direction("axes x", "axes", "x"));
    columns.add(direction("axes y", "axes", "y"));
    columns.addAll(springFactors());
    return new ModelSheet("supports", Optional.of("node"), columns);
  }

  private static ModelSheet masses() {
    List<Column> columns = new ArrayList<>();
    columns.add(name("node", "node"));
    columns.add(value("mass", Measure.MASS, "mass"));
    columns.add(value("inertia", Measure.INERTIA, "inertia"));
    String[] axes = {"x", "y", "z"};
    for (int i = 0; i < 3; i++) {
      columns.add(
          value("inertia " + axes[i], Measure.INERTIA, "inertia", String.valueOf(i)));
    }
    for (int i = 0; i < 3; i++) {
      for (int j = 0; j < 3; j++) {
        columns.add(
            value(
                "inertia " + axes[i] + axes[j],
                Measure.INERTIA,
                "inertia",
                String.valueOf(i),
                String.valueOf(j)));
      }
    }
    columns.addAll(place("offset ", "offset"));
    return new ModelSheet("masses", Optional.empty(), columns);
  }

  /** The sheet of a name, written with any spaces and in upper or lower case. */
  static Optional<ModelSheet> of(String sheetName) {
    return ALL.stream().filter(sheet -> plain(sheet.key).equals(plain(sheetName))).findFirst();
  }

  static String plain(String sheetName) {
    return sheetName.replaceAll("\\s+", "").toLowerCase(Locale.ROOT);
  }

  /** Whether rows may be those of a full matrix. */
  boolean holdsMatrices() {
    return key.equals("joints");
  }

  List<String> headers() {
    List<String> result = new ArrayList<>();
    name.ifPresent(result::add);
    if (holdsMatrices()) {
      result.add(MATRIX_ROW);
    }
    columns.forEach(column -> result.add(column.header));
    return result;
  }
}
