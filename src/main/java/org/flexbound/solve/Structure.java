package org.flexbound.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.sparse.BlockAssembly;
import org.flexbound.sparse.FactorSettings;
import org.flexbound.sparse.SymbolicFactor;
import org.flexbound.sparse.SymmetricMatrix;

/**
 * The structure with its constraints eliminated: what stays the same while stiffnesses are set. Which
 * components are constrained (rigid) is part of it.
 */
final class Structure {
  private final Mesh mesh;
  private final List<Element> elements;
  private final List<Gap> gaps;
  private final Transformation transformation;
  private final BlockAssembly assembly;

  /** For elements that touch other than plain freedoms: their freedoms by unknowns, row by row. */
  private final double[][] reductions;

  private final SymbolicFactor symbolic;

  /**
   * A rigid component that may open.
   *
   * @param spring the index of the spring element
   * @param component which of its components
   * @param slot its stiffness
   * @param follows of a gap that can only open as others do: its opening by theirs; empty for one
   *     that opens by itself
   */
  record Gap(int spring, int component, int slot, Map<Integer, Double> follows) {}

  private Structure(
      Mesh mesh,
      List<Element> elements,
      List<Gap> gaps,
      Transformation transformation,
      FactorSettings settings) {
    this.mesh = mesh;
    this.elements = elements;
    this.gaps = gaps;
    this.transformation = transformation;
    this.reductions = new double[elements.size()][];
    int[][] blocks = new int[elements.size()][];
    for (int e = 0; e < blocks.length; e++) {
      blocks[e] = block(e);
    }
    assembly = BlockAssembly.of(transformation.unknowns(), blocks);
    symbolic = SymbolicFactor.analyze(assembly.pattern(), transformation.group(), settings);
  }

  /**
   * Eliminates the constraints.
   *
   * @param mesh the structure
   * @param stiffness of all slots; infinite ones of springs are constraints
   * @param mayOpen the slots that are worked by their gap
   * @param held further freedoms (or combinations) to hold
   * @param length a length of the structure
   * @param settings of the factor
   * @param redundant is told the springs that hold what is held already
   */
  static Structure of(
      Mesh mesh,
      double[] stiffness,
      boolean[] mayOpen,
      List<Map<Integer, Double>> held,
      double length,
      FactorSettings settings,
      java.util.function.IntConsumer redundant) {
    int freedoms = mesh.freedoms();
    Constraints constraints = new Constraints(freedoms, length);
    List<Gap> gaps = new ArrayList<>();
    List<Gap> following = new ArrayList<>();
    List<Element> elements = new ArrayList<>(mesh.members());
    for (Map<Integer, Double> row : held) {
      constraints.add(row, row.keySet().iterator().next());
    }
    for (Mesh.Tie tie : mesh.ties()) {
      tie(mesh, tie, constraints);
    }
    boolean[][] constrained = new boolean[mesh.springs().size()][6];
    // What may open comes last, so that it opens only where nothing else holds it.
    for (boolean open : new boolean[] {false, true}) {
      for (int s = 0; s < mesh.springs().size(); s++) {
        SpringElement spring = mesh.springs().get(s);
        boolean again = false;
        for (int c = 0; c < 6 && !spring.springs().full(); c++) {
          int slot = spring.springs().slot(c);
          if (mayOpen[slot] != open || !(open || Double.isInfinite(stiffness[slot]))) {
            continue;
          }
          constrained[s][c] = true;
          Map<Integer, Double> row = row(spring, c);
          if (!open) {
            again |= !constraints.add(row, spring.freedom(spring.freedoms() - 6 + c));
            continue;
          }
          Map<Integer, Double> opened = new HashMap<>(row);
          opened.put(freedoms + gaps.size(), -1.0);
          if (constraints.add(opened, spring.freedom(spring.freedoms() - 6 + c))) {
            gaps.add(new Gap(s, c, slot, Map.of()));
          } else {
            again = true;
            Map<Integer, Double> follows = constraints.inGaps(row);
            if (!follows.isEmpty()) {
              following.add(new Gap(s, c, slot, follows));
            }
          }
        }
        if (again) {
          redundant.accept(s);
        }
      }
    }
    for (int s = 0; s < mesh.springs().size(); s++) {
      SpringElement rest = mesh.springs().get(s).constrain(constrained[s]);
      if (!rest.whollyConstrained()) {
        elements.add(rest);
      }
    }
    elements.addAll(mesh.bodies());
    Transformation transformation = constraints.transformation(gaps.size());
    gaps.addAll(following);
    return new Structure(mesh, elements, gaps, transformation, settings);
  }


  private static Map<Integer, Double> row(SpringElement spring, int component) {
    Map<Integer, Double> row = new HashMap<>();
    int m = spring.freedoms();
    for (int k = 0; k < m; k++) {
      double coefficient = spring.shape[component * m + k];
      if (coefficient != 0) {
        row.merge(spring.freedom(k), coefficient, Double::sum);
      }
    }
    return row;
  }

  private static void tie(Mesh mesh, Mesh.Tie tie, Constraints constraints) {
    double[] b =
        Mesh.shape(
            org.flexbound.frame.Axes.GLOBAL,
            mesh.places().get(tie.follower()).minus(mesh.places().get(tie.leader())),
            org.flexbound.setup.Vector.ZERO);
    SpringElement rigid =
        new SpringElement(
            new int[] {tie.leader(), tie.follower()},
            b,
            new EndSprings(new int[6], java.util.Optional.empty()));
    for (int c = 0; c < 6; c++) {
      constraints.add(row(rigid, c), 6 * tie.follower() + c);
    }
  }

  private int[] block(int e) {
    Element element = elements.get(e);
    int m = element.freedoms();
    int[] plain = new int[m];
    boolean all = true;
    for (int k = 0; k < m; k++) {
      int freedom = element.freedom(k);
      all &= transformation.isPlain(freedom);
      plain[k] = all ? transformation.unknown(freedom) : 0;
    }
    if (all) {
      return plain;
    }
    int[] unknowns = new int[0];
    for (int k = 0; k < m; k++) {
      int freedom = element.freedom(k);
      for (int t = transformation.start(freedom); t < transformation.start(freedom + 1); t++) {
        if (transformation.term(t) < transformation.unknowns()) {
          unknowns = Arrays.copyOf(unknowns, unknowns.length + 1);
          unknowns[unknowns.length - 1] = transformation.term(t);
        }
      }
    }
    unknowns = Arrays.stream(unknowns).sorted().distinct().toArray();
    double[] reduction = new double[m * unknowns.length];
    for (int k = 0; k < m; k++) {
      int freedom = element.freedom(k);
      for (int t = transformation.start(freedom); t < transformation.start(freedom + 1); t++) {
        int at = Arrays.binarySearch(unknowns, transformation.term(t));
        if (at >= 0) {
          reduction[k * unknowns.length + at] += transformation.coefficient(t);
        }
      }
    }
    reductions[e] = reduction;
    return unknowns;
  }

  Mesh mesh() {
    return mesh;
  }

  List<Element> elements() {
    return elements;
  }

  /** Those that open by themselves first, then those that follow. */
  List<Gap> gaps() {
    return gaps;
  }

  Transformation transformation() {
    return transformation;
  }

  SymbolicFactor symbolic() {
    return symbolic;
  }

  /**
   * Assembles a matrix from matrices of the elements.
   *
   * @param source writes the m × m matrix of an element at its freedoms
   */
  SymmetricMatrix assemble(ElementMatrix source) {
    double[] full = new double[144];
    return assembly.assemble(
        (block, values) -> {
          double[] reduction = reductions[block];
          if (reduction == null) {
            source.write(block, values);
            return;
          }
          int m = elements.get(block).freedoms();
          source.write(block, full);
          congruence(full, m, reduction, reduction.length / m, values);
        });
  }

  /** Rᵀ A R. */
  private static void congruence(double[] a, int m, double[] r, int n, double[] result) {
    double[] ar = new double[m * n];
    for (int i = 0; i < m; i++) {
      for (int k = 0; k < m; k++) {
        double factor = a[i * m + k];
        if (factor != 0) {
          for (int j = 0; j < n; j++) {
            ar[i * n + j] += factor * r[k * n + j];
          }
        }
      }
    }
    for (int i = 0; i < n; i++) {
      for (int j = 0; j <= i; j++) {
        double sum = 0;
        for (int k = 0; k < m; k++) {
          sum += r[k * n + i] * ar[k * n + j];
        }
        result[i * n + j] = sum;
        result[j * n + i] = sum;
      }
    }
  }

  /** Writes the matrix of an element. */
  @FunctionalInterface
  interface ElementMatrix {
    /**
     * Writes m × m numbers, row by row.
     *
     * @param element the element's index
     * @param values to be overwritten
     */
    void write(int element, double[] values);
  }
}
