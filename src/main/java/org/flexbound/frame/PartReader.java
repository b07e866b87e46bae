package org.flexbound.frame;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.document.Json;
import org.flexbound.setup.Vector;

/** Reads members, joints, connections, supports, rigid links and masses. */
final class PartReader {
  private static final List<String> MEMBER_KEYS =
      List.of(
          "nodes",
          "section",
          "endSection",
          "material",
          "reference",
          "offsets",
          "joints",
          "massPerLength",
          "factors");

  private final Entries entries;
  private final SpringReader springs;
  private final Map<String, Node> nodes;
  private final Map<String, Joint> joints = new LinkedHashMap<>();

  PartReader(Entries entries, SpringReader springs, Map<String, Node> nodes) {
    this.entries = entries;
    this.springs = springs;
    this.nodes = nodes;
  }

  Map<String, Joint> joints(Json.Members top) {
    List<String> keys = new ArrayList<>(SpringReader.keys());
    keys.add("matrix");
    keys.add("factors");
    entries
        .table(top, "joints")
        .forEach(
            (name, entry) -> {
              String owner = "the joint '" + name + "'";
              entries.refuseOtherKeys(entry, owner, keys);
              Optional<SpringSet> set =
                  entry.get("matrix").isPresent()
                      ? matrix(owner, entry)
                      : Optional.of(
                          springs.components(entry, SpringReader.RIGID, Stiffness.RIGID));
              // An entry in error still counts as a name, so that members which use it are not
              // found fault with as well.
              SpringSet read =
                  set.orElseGet(
                      () ->
                          springs.components(
                              new Json.Members(entry.where(), Map.of()),
                              SpringReader.RIGID,
                              Stiffness.RIGID));
              Map<Spring, StiffnessSetting> factors =
                  springs.springFactors(entry, owner, SpringReader.RIGID);
              joints.put(name, new Joint(name, read.with(factors), entry.where()));
            });
    return joints;
  }

  private Optional<SpringSet> matrix(String owner, Json.Members entry) {
    for (String key : SpringReader.keys()) {
      if (entry.get(key).isPresent()) {
        entries.add(
            FrameFinding.UNKNOWN_KEY,
            entry.where(),
            owner + " has both a 'matrix' and the component '" + key + "'; one of them must go");
        break;
      }
    }
    return entry.get("matrix").flatMap(springs::matrix);
  }

  Map<String, Member> members(
      Json.Members top, Map<String, Section> sections, Map<String, Material> materials,
      java.util.Set<String> sectionNames, java.util.Set<String> materialNames) {
    Map<String, Member> result = new LinkedHashMap<>();
    entries
        .table(top, "members")
        .forEach(
            (name, entry) ->
                member(name, entry, sections, sectionNames, materialNames)
                    .filter(
                        member ->
                            sections.containsKey(member.section())
                                && member.endSection().map(sections::containsKey).orElse(true)
                                && materials.containsKey(member.material()))
                    .ifPresent(member -> result.put(name, member)));
    return result;
  }

  private Optional<Member> member(
      String name,
      Json.Members entry,
      Map<String, Section> sections,
      java.util.Set<String> sectionNames,
      java.util.Set<String> materialNames) {
    String owner = "the member '" + name + "'";
    entries.refuseOtherKeys(entry, owner, MEMBER_KEYS);
    Optional<List<String>> ends = twoNodes(entry, owner);
    Optional<String> section = entries.name(entry, "section", owner, "sections", sectionNames);
    Optional<String> endSection =
        entries.optionalName(entry, "endSection", "sections", sectionNames);
    Optional<String> material =
        entries.name(entry, "material", owner, "materials", materialNames);
    Optional<Vector> reference = entries.direction(entry, "reference");
    Optional<Json.Members> offsets = entries.members(entry, "offsets");
    offsets.ifPresent(
        o -> entries.refuseOtherKeys(o, "the offsets of " + owner, List.of("start", "end")));
    Optional<Json.Members> jointNames = entries.members(entry, "joints");
    jointNames.ifPresent(
        o -> entries.refuseOtherKeys(o, "the joints of " + owner, List.of("start", "end")));
    double massPerLength =
        entries.number(entry, "massPerLength", Measure.MASS_PER_LENGTH).orElse(0);
    if (massPerLength < 0) {
      entries.add(
          FrameFinding.OUT_OF_RANGE, entry.where(), owner + " has a negative 'massPerLength'");
    }
    if (ends.isEmpty() || section.isEmpty() || material.isEmpty()) {
      return Optional.empty();
    }
    checkTaper(owner, entry, sections, section.get(), endSection);
    Member member =
        new Member(
            name,
            ends.get().get(0),
            ends.get().get(1),
            section.get(),
            endSection,
            material.get(),
            reference,
            offset(offsets, "start"),
            offset(offsets, "end"),
            jointNames.flatMap(o -> entries.optionalName(o, "start", "joints", joints.keySet())),
            jointNames.flatMap(o -> entries.optionalName(o, "end", "joints", joints.keySet())),
            massPerLength,
            springs.memberFactors(entry, owner),
            entry.where());
    return Optional.of(member);
  }

  private Vector offset(Optional<Json.Members> offsets, String key) {
    return offsets.flatMap(o -> entries.vector(o, key, Measure.LENGTH)).orElse(Vector.ZERO);
  }

  private void checkTaper(
      String owner,
      Json.Members entry,
      Map<String, Section> sections,
      String start,
      Optional<String> end) {
    Section first = sections.get(start);
    Section last = end.map(sections::get).orElse(first);
    if (first == null || last == null || end.isEmpty()) {
      return;
    }
    boolean same =
        first.shape() instanceof SectionShape.ByShape a
            && last.shape() instanceof SectionShape.ByShape b
            && a.shape() == b.shape();
    if (!same) {
      entries.add(
          FrameFinding.NOT_SUPPORTED,
          entry.where(),
          owner
              + " tapers from '"
              + start
              + "' to '"
              + last.name()
              + "', which are not two sections of one shape with dimensions");
    }
  }

  private Optional<List<String>> twoNodes(Json.Members entry, String owner) {
    Optional<Json> value = entry.get("nodes");
    if (value.isEmpty()) {
      entries.missing(entry, "nodes", owner);
      return Optional.empty();
    }
    if (!(value.get() instanceof Json.Items items) || items.items().size() != 2) {
      entries.wrong(value.get(), "two nodes in brackets: [\"a\", \"b\"]");
      return Optional.empty();
    }
    List<String> names = new ArrayList<>();
    for (Json item : items.items()) {
      entries.nameIn(item, "nodes", "nodes", nodes.keySet()).ifPresent(names::add);
    }
    if (names.size() == 2 && names.get(0).equals(names.get(1))) {
      entries.add(
          FrameFinding.BAD_GEOMETRY,
          value.get().where(),
          owner + " goes from the node '" + names.get(0) + "' to itself");
      return Optional.empty();
    }
    return names.size() == 2 ? Optional.of(names) : Optional.empty();
  }

  Map<String, Connection> connections(Json.Members top) {
    Map<String, Connection> result = new LinkedHashMap<>();
    entries
        .table(top, "connections")
        .forEach(
            (name, entry) -> {
              String owner = "the connection '" + name + "'";
              entries.refuseOtherKeys(
                  entry, owner, List.of("nodes", "joint", "axes", "at", "factors"));
              Optional<List<String>> ends = twoNodes(entry, owner);
              Optional<String> joint =
                  entries.name(entry, "joint", owner, "joints", joints.keySet());
              Axes axes = entries.axes(entry, owner);
              Optional<Vector> at = entries.vector(entry, "at", Measure.LENGTH);
              Map<Spring, StiffnessSetting> factors =
                  springs.springFactors(entry, owner, SpringReader.RIGID);
              if (ends.isPresent() && joint.isPresent()) {
                result.put(
                    name,
                    new Connection(
                        name,
                        ends.get().get(0),
                        ends.get().get(1),
                        joint.get(),
                        axes,
                        at,
                        factors,
                        entry.where()));
              }
            });
    return result;
  }

  Map<String, Support> supports(Json.Members top) {
    Map<String, Support> result = new LinkedHashMap<>();
    List<String> keys = new ArrayList<>(SpringReader.keys());
    keys.add("axes");
    keys.add("factors");
    entries
        .table(top, "supports")
        .forEach(
            (node, entry) -> {
              String owner = "the support at '" + node + "'";
              entries.refuseOtherKeys(entry, owner, keys);
              if (!nodes.containsKey(node)) {
                entries.add(
                    FrameFinding.UNKNOWN_NAME,
                    entry.where(),
                    "found a support at '"
                        + node
                        + "', which is not one of the nodes"
                        + NearestName.hint(node, nodes.keySet()));
                return;
              }
              SpringSet set =
                  springs.components(entry, SpringReader.FIXED, Stiffness.FREE);
              Map<Spring, StiffnessSetting> factors =
                  springs.springFactors(entry, owner, SpringReader.FIXED);
              result.put(
                  node,
                  new Support(
                      node, set.with(factors), entries.axes(entry, owner), entry.where()));
            });
    return result;
  }

  List<RigidLink> rigidLinks(Json.Members top) {
    List<RigidLink> result = new ArrayList<>();
    for (Json.Members entry : entries.list(top, "rigidLinks")) {
      entries.refuseOtherKeys(entry, "a rigid link", List.of("from", "to"));
      Optional<String> from = entries.name(entry, "from", "a rigid link", "nodes", nodes.keySet());
      Optional<String> to = entries.name(entry, "to", "a rigid link", "nodes", nodes.keySet());
      if (from.isPresent() && to.isPresent()) {
        result.add(new RigidLink(from.get(), to.get(), entry.where()));
      }
    }
    return result;
  }

  List<PointMass> masses(Json.Members top) {
    List<PointMass> result = new ArrayList<>();
    for (Json.Members entry : entries.list(top, "masses")) {
      entries.refuseOtherKeys(entry, "a mass", List.of("node", "mass", "inertia", "offset"));
      Optional<String> node = entries.name(entry, "node", "a mass", "nodes", nodes.keySet());
      OptionalDouble mass = entries.needed(entry, "mass", "a mass", Measure.MASS);
      if (mass.isPresent() && mass.getAsDouble() < 0) {
        entries.add(FrameFinding.OUT_OF_RANGE, entry.where(), "a mass is not negative");
      }
      List<Vector> inertia =
          entry.get("inertia").map(this::inertia).orElseGet(() -> diagonal(Vector.ZERO));
      Vector offset = entries.vector(entry, "offset", Measure.LENGTH).orElse(Vector.ZERO);
      if (node.isPresent() && mass.isPresent()) {
        result.add(
            new PointMass(node.get(), mass.getAsDouble(), inertia, offset, entry.where()));
      }
    }
    return result;
  }

  /** One number, three numbers on the diagonal, or three rows of three. */
  private List<Vector> inertia(Json value) {
    if (value instanceof Json.Items items
        && items.items().size() == 3
        && items.items().get(0) instanceof Json.Items) {
      List<Vector> rows = new ArrayList<>();
      for (Json row : items.items()) {
        rows.add(entries.vector(row, Measure.INERTIA).orElse(Vector.ZERO));
      }
      return rows;
    }
    if (value instanceof Json.Items) {
      return diagonal(entries.vector(value, Measure.INERTIA).orElse(Vector.ZERO));
    }
    double number = entries.number(value, Measure.INERTIA).orElse(0);
    return diagonal(new Vector(number, number, number));
  }

  private static List<Vector> diagonal(Vector d) {
    return List.of(
        new Vector(d.x(), 0, 0), new Vector(0, d.y(), 0), new Vector(0, 0, d.z()));
  }
}
