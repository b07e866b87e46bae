package org.flexbound.frame;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * The name of one stiffness of a model: {@code joints.knee.rz}, {@code connections.splice.y}, {@code
 * supports.base.z}, {@code members.post.EIy} or {@code materials.steel.E}.
 *
 * @param group the table it stands in
 * @param name the entry's name (for supports the node's), which may itself contain points
 * @param component the component's key
 */
public record StiffnessPath(Group group, String name, String component)
    implements Comparable<StiffnessPath> {
  private static final List<String> SPRINGS =
      Arrays.stream(Spring.values()).map(Spring::key).toList();
  private static final List<String> RIGIDITIES =
      Arrays.stream(Rigidity.values()).map(Rigidity::key).toList();

  /** A table of the model whose entries have stiffnesses. */
  public enum Group {
    /** Joints: a change acts wherever the joint is used. */
    JOINTS(SPRINGS),
    /** Connections: a change acts on this connection alone. */
    CONNECTIONS(SPRINGS),
    /** Supports, by node. */
    SUPPORTS(SPRINGS),
    /** Members. */
    MEMBERS(RIGIDITIES),
    /** Materials: E, which carries G with it at constant Poisson's ratio. */
    MATERIALS(List.of("E"));

    @SuppressWarnings("ImmutableEnumChecker") // an unmodifiable list
    private final List<String> components;

    Group(List<String> components) {
      this.components = components;
    }

    /**
     * The table's key in a model file.
     *
     * @return {@code joints} …
     */
    public String key() {
      return name().toLowerCase(Locale.ROOT);
    }

    /**
     * The components that an entry has.
     *
     * @return their keys
     */
    public List<String> components() {
      return components;
    }
  }

  /** Checks that the group has the component. */
  public StiffnessPath {
    if (!group.components().contains(component)) {
      throw new IllegalArgumentException(group.key() + " have no stiffness " + component);
    }
  }

  /**
   * A component of a joint, connection or support.
   *
   * @param group the table
   * @param name the entry
   * @param spring the component
   * @return the path
   */
  public static StiffnessPath of(Group group, String name, Spring spring) {
    return new StiffnessPath(group, name, spring.key());
  }

  /**
   * A stiffness of a member.
   *
   * @param member the member's name
   * @param rigidity which
   * @return the path
   */
  public static StiffnessPath of(String member, Rigidity rigidity) {
    return new StiffnessPath(Group.MEMBERS, member, rigidity.key());
  }

  /**
   * Reads a path.
   *
   * @param text such as {@code joints.knee.rz}
   * @return the path; empty where the text is not of that form
   */
  public static Optional<StiffnessPath> parse(String text) {
    int first = text.indexOf('.');
    int last = text.lastIndexOf('.');
    if (first <= 0 || last <= first + 1) {
      return Optional.empty();
    }
    String component = text.substring(last + 1);
    return Arrays.stream(Group.values())
        .filter(group -> group.key().equals(text.substring(0, first)))
        .filter(group -> group.components().contains(component))
        .findFirst()
        .map(group -> new StiffnessPath(group, text.substring(first + 1, last), component));
  }

  /**
   * The component, where it is one of a joint, connection or support.
   *
   * @return the spring; empty for members and materials
   */
  public Optional<Spring> spring() {
    return Spring.of(component);
  }

  /**
   * The component, where it is one of a member.
   *
   * @return the stiffness; empty for all others
   */
  public Optional<Rigidity> rigidity() {
    return Rigidity.of(component);
  }

  @Override
  public int compareTo(StiffnessPath other) {
    int byGroup = group.compareTo(other.group);
    if (byGroup != 0) {
      return byGroup;
    }
    int byName = name.compareTo(other.name);
    return byName != 0
        ? byName
        : Integer.compare(
            group.components().indexOf(component), group.components().indexOf(other.component));
  }

  /** The path as files spell it. */
  @Override
  public String toString() {
    return group.key() + "." + name + "." + component;
  }
}
