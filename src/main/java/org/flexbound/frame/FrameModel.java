package org.flexbound.frame;

import java.util.ArrayList;
import java.util.Collection;
import java.util.Collections;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.flexbound.document.Json;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Where;
import org.flexbound.setup.Vector;

/**
 * A frame as the user describes it, in SI units. Maps keep the order of the file; every name that
 * an entry uses stands in its table.
 *
 * @param units the units of the file's numbers
 * @param up the upward direction, the usual reference of member axes
 * @param nodes by name
 * @param materials by name
 * @param sections by name
 * @param members by name
 * @param joints by name
 * @param connections by name
 * @param supports by node
 * @param rigidLinks rigid links
 * @param masses rigid bodies at nodes
 * @param source the tree of values it was read from, which writing keeps
 */
public record FrameModel(
    DeclaredUnits units,
    Vector up,
    Map<String, Node> nodes,
    Map<String, Material> materials,
    Map<String, Section> sections,
    Map<String, Member> members,
    Map<String, Joint> joints,
    Map<String, Connection> connections,
    Map<String, Support> supports,
    List<RigidLink> rigidLinks,
    List<PointMass> masses,
    Json.Members source) {
  /** Copies the maps, keeping their order, and the lists. */
  public FrameModel {
    nodes = ordered(nodes);
    materials = ordered(materials);
    sections = ordered(sections);
    members = ordered(members);
    joints = ordered(joints);
    connections = ordered(connections);
    supports = ordered(supports);
    rigidLinks = List.copyOf(rigidLinks);
    masses = List.copyOf(masses);
  }

  private static <T> Map<String, T> ordered(Map<String, T> map) {
    return Collections.unmodifiableMap(new LinkedHashMap<>(map));
  }

  /**
   * Where the model stands.
   *
   * @return the place of the whole model in the user's files
   */
  public Where where() {
    return source.where();
  }

  /**
   * The place of a node.
   *
   * @param node a name of the table
   * @return m, global axes
   */
  public Vector place(String node) {
    return entry(nodes, node, "node").place();
  }

  /**
   * A joint.
   *
   * @param name a name of the table
   * @return the joint
   */
  public Joint joint(String name) {
    return entry(joints, name, "joint");
  }

  /**
   * A material.
   *
   * @param name a name of the table
   * @return the material
   */
  public Material material(String name) {
    return entry(materials, name, "material");
  }

  /**
   * Where a member's flexible part begins.
   *
   * @param member the member
   * @return m, global axes
   */
  public Vector start(Member member) {
    return place(member.startNode()).plus(member.startOffset());
  }

  /**
   * Where a member's flexible part ends.
   *
   * @param member the member
   * @return m, global axes
   */
  public Vector end(Member member) {
    return place(member.endNode()).plus(member.endOffset());
  }

  /**
   * A member's axes.
   *
   * @param member the member, with length
   * @return the axes by its reference direction
   */
  public Axes axes(Member member) {
    Vector x = end(member).minus(start(member));
    return Axes.ofMember(x, member.reference().orElseGet(() -> usualReference(x)));
  }

  /** Up, or the first global axis that is not parallel to x. */
  Vector usualReference(Vector x) {
    if (!Axes.parallel(x, up)) {
      return up;
    }
    return Axes.parallel(x, Axes.GLOBAL.x()) ? Axes.GLOBAL.y() : Axes.GLOBAL.x();
  }

  /**
   * The properties of a member's section at its start.
   *
   * @param member the member
   * @return areas and second moments
   */
  public SectionProperties startSection(Member member) {
    return entry(sections, member.section(), "section")
        .shape()
        .properties(material(member.material()).poissonRatio());
  }

  /**
   * A stiffness of the model as it is set.
   *
   * @param path its name
   * @return the stiffness (a member's at its start, where it tapers); empty where the model has no
   *     such entry
   */
  public Optional<Stiffness> stiffness(StiffnessPath path) {
    return switch (path.group()) {
      case JOINTS ->
          Optional.ofNullable(joints.get(path.name()))
              .map(joint -> joint.springs().stiffness(spring(path)));
      case CONNECTIONS ->
          Optional.ofNullable(connections.get(path.name()))
              .map(connection -> springs(connection).stiffness(spring(path)));
      case SUPPORTS ->
          Optional.ofNullable(supports.get(path.name()))
              .map(support -> support.springs().stiffness(spring(path)));
      case MEMBERS ->
          Optional.ofNullable(members.get(path.name()))
              .map(member -> stiffness(member, path.rigidity().orElseThrow()));
      case MATERIALS ->
          Optional.ofNullable(materials.get(path.name()))
              .map(m -> m.factor().of(new Stiffness(m.youngsModulus())));
    };
  }

  private static Spring spring(StiffnessPath path) {
    return path.spring().orElseThrow();
  }

  /**
   * The springs of a connection: its joint's, with what is set for the connection alone.
   *
   * @param connection the connection
   * @return the springs
   */
  public SpringSet springs(Connection connection) {
    return joint(connection.joint()).springs().with(connection.factors());
  }

  /**
   * A stiffness of a member at its start.
   *
   * @param member the member
   * @param rigidity which
   * @return the stiffness as set
   */
  public Stiffness stiffness(Member member, Rigidity rigidity) {
    Material material = material(member.material());
    SectionProperties section = startSection(member);
    double nominal =
        section.stiffness(
            rigidity,
            material.youngsModulus() * material.scale(),
            material.shearModulus() * material.scale());
    return member.factor(rigidity).of(new Stiffness(nominal));
  }

  /**
   * What is wrong with a path.
   *
   * @param path the path
   * @param where where the user wrote it
   * @return nothing, or one finding
   */
  public List<Finding> resolve(StiffnessPath path, Where where) {
    Collection<String> names =
        switch (path.group()) {
          case JOINTS -> joints.keySet();
          case CONNECTIONS -> connections.keySet();
          case SUPPORTS -> supports.keySet();
          case MEMBERS -> members.keySet();
          case MATERIALS -> materials.keySet();
        };
    if (names.contains(path.name())) {
      return List.of();
    }
    return List.of(
        new Finding(
            FrameFinding.BAD_PATH,
            where,
            "found "
                + path
                + ", but the model has no '"
                + path.name()
                + "' under "
                + path.group().key()
                + NearestName.hint(path.name(), names)));
  }

  /**
   * The model with stiffnesses set; settings are added to those the model has.
   *
   * @param settings by path, each of an entry of the model
   * @return the changed model
   */
  public FrameModel with(Map<StiffnessPath, StiffnessSetting> settings) {
    Map<String, Material> newMaterials = new LinkedHashMap<>(materials);
    Map<String, Member> newMembers = new LinkedHashMap<>(members);
    Map<String, Joint> newJoints = new LinkedHashMap<>(joints);
    Map<String, Connection> newConnections = new LinkedHashMap<>(connections);
    Map<String, Support> newSupports = new LinkedHashMap<>(supports);
    settings.forEach(
        (path, setting) -> {
          switch (path.group()) {
            case JOINTS -> {
              Joint old = entry(newJoints, path.name(), "joint");
              SpringSet springs = old.springs().with(Map.of(spring(path), setting));
              newJoints.put(path.name(), new Joint(old.name(), springs, old.where()));
            }
            case SUPPORTS -> {
              Support old = entry(newSupports, path.name(), "support");
              SpringSet springs = old.springs().with(Map.of(spring(path), setting));
              newSupports.put(
                  path.name(), new Support(old.node(), springs, old.axes(), old.where()));
            }
            case CONNECTIONS -> {
              Connection old = entry(newConnections, path.name(), "connection");
              Map<Spring, StiffnessSetting> factors = new EnumMap<>(Spring.class);
              factors.putAll(old.factors());
              factors.merge(spring(path), setting, StiffnessSetting::then);
              newConnections.put(path.name(), old.withFactors(factors));
            }
            case MEMBERS -> {
              Member old = entry(newMembers, path.name(), "member");
              Map<Rigidity, StiffnessSetting> factors = new EnumMap<>(Rigidity.class);
              factors.putAll(old.factors());
              factors.merge(
                  path.rigidity().orElseThrow(), setting, StiffnessSetting::then);
              newMembers.put(path.name(), old.withFactors(factors));
            }
            case MATERIALS -> {
              Material old = entry(newMaterials, path.name(), "material");
              newMaterials.put(path.name(), old.withFactor(setting));
            }
          }
        });
    return new FrameModel(
        units,
        up,
        nodes,
        newMaterials,
        sections,
        newMembers,
        newJoints,
        newConnections,
        newSupports,
        rigidLinks,
        masses,
        source);
  }

  /**
   * Every stiffness that the model's parts have (of entries that are used), in a fixed order.
   *
   * @return the paths of members, then joints, connections and supports; free and rigid included
   */
  public List<StiffnessPath> stiffnesses() {
    List<StiffnessPath> result = new ArrayList<>();
    members
        .keySet()
        .forEach(
            name -> {
              for (Rigidity rigidity : Rigidity.values()) {
                result.add(StiffnessPath.of(name, rigidity));
              }
            });
    addSprings(result, StiffnessPath.Group.JOINTS, joints.keySet());
    addSprings(result, StiffnessPath.Group.CONNECTIONS, connections.keySet());
    addSprings(result, StiffnessPath.Group.SUPPORTS, supports.keySet());
    return result;
  }

  private static void addSprings(
      List<StiffnessPath> result, StiffnessPath.Group group, Collection<String> names) {
    for (String name : names) {
      for (Spring spring : Spring.values()) {
        result.add(StiffnessPath.of(group, name, spring));
      }
    }
  }

  private static <T> T entry(Map<String, T> map, String name, String what) {
    T value = map.get(name);
    if (value == null) {
      throw new IllegalArgumentException("the model has no " + what + " '" + name + "'");
    }
    return value;
  }
}
