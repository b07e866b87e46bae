package org.flexbound.solve;

import java.util.Arrays;
import java.util.Locale;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.Member;
import org.flexbound.setup.Vector;
import org.flexbound.sparse.FactorSettings;
import org.flexbound.sparse.NumericFactor;
import org.flexbound.sparse.PivotBreakdownException;
import org.flexbound.sparse.SymbolicFactor;
import org.flexbound.sparse.SymmetricMatrix;

/** Describes a motion that nothing resists, found by inverse iteration on the stiffness matrix. */
final class Mechanism {
  /** The stiffness added to make the matrix regular, of its own diagonal. */
  private static final double PROP = 1e-9;

  /** Motions below this share of the largest count as none. */
  private static final double STILL = 1e-3;

  private final FrameModel model;
  private final Structure structure;
  private final State state;
  private final double length;

  Mechanism(FrameModel model, Structure structure, State state) {
    this.model = model;
    this.structure = structure;
    this.state = state;
    this.length = PlaceFinder.extent(model);
  }

  String describe(int unknown) {
    int freedom = structure.transformation().freedomOf(unknown);
    double[] motions;
    try {
      motions = motion(unknown);
    } catch (PivotBreakdownException stubborn) {
      return "nothing resists the motion of " + name(freedom);
    }
    int point = largest(motions);
    Vector u = vector(motions, 6 * point);
    Vector turn = vector(motions, 6 * point + 3);
    boolean turns = turn.norm() * length > u.norm() * (1 + 1e-6);
    int moving = 0;
    for (int p = 0; p < structure.mesh().pointCount(); p++) {
      moving += size(motions, p) > STILL * size(motions, point) ? 1 : 0;
    }
    String label = structure.mesh().labels().get(point);
    if (moving == structure.mesh().pointCount() && moving > 1 && isRigid(motions, point)) {
      return "the whole structure can move without resistance as one rigid body: "
          + (rotationOf(motions).norm() * length < STILL * size(motions, point)
              ? "it can shift along " + direction(u)
              : "it can turn about " + direction(rotationOf(motions)))
          + " (" + label + ")";
    }
    if (moving == 1 && u.norm() <= STILL * turn.norm() * length) {
      return spinning(point, turn, label);
    }
    String how =
        turns && u.norm() <= STILL * turn.norm() * length
            ? "turn about " + direction(turn)
            : "move along " + direction(u);
    return label
        + " can "
        + how
        + " without resistance"
        + (moving > 1 ? ", and " + (moving - 1) + " other points with it" : "");
  }

  private String spinning(int point, Vector turn, String label) {
    for (Member member : model.members().values()) {
      boolean here =
          structure.mesh().point(member.startNode()) == point
              || structure.mesh().point(member.endNode()) == point;
      Vector axis = model.end(member).minus(model.start(member)).unit();
      if (here && axis.cross(turn.unit()).norm() < 1e-3) {
        return "the member '" + member.name() + "' can spin about its own axis at " + label;
      }
    }
    return label + " can turn about " + direction(turn) + " without resistance";
  }

  private String name(int freedom) {
    String[] directions = {"along x", "along y", "along z", "about x", "about y", "about z"};
    return structure.mesh().labels().get(freedom / 6) + " " + directions[freedom % 6];
  }

  private double[] motion(int unknown) {
    SymmetricMatrix k =
        structure.assemble(
            (e, values) -> structure.elements().get(e).stiffness(state.basic(e), values));
    Transformation t = structure.transformation();
    double[] diagonal = k.diagonal();
    double translation = 0;
    double rotation = 0;
    for (int i = 0; i < diagonal.length; i++) {
      if (t.freedomOf(i) % 6 < 3) {
        translation = Math.max(translation, diagonal[i]);
      } else {
        rotation = Math.max(rotation, diagonal[i]);
      }
    }
    translation = Math.max(translation, rotation / length / length);
    rotation = Math.max(rotation, translation * length * length * 1e-6);
    double[] added = new double[diagonal.length];
    for (int i = 0; i < added.length; i++) {
      double usual = t.freedomOf(i) % 6 < 3 ? translation : rotation;
      added[i] = -Math.max(diagonal[i], 1e-6 * usual);
    }
    SymmetricMatrix props = diagonalMatrix(added);
    SymbolicFactor symbolic =
        SymbolicFactor.analyze(
            k.pattern(), t.group(), FactorSettings.defaults().withPivotLimit(0));
    NumericFactor factor = symbolic.shifted(k, PROP, props);
    double[] x = new double[diagonal.length];
    x[unknown] = 1;
    for (int step = 0; step < 4; step++) {
      factor.solve(x, 1);
      double largest = 0;
      for (double value : x) {
        largest = Math.max(largest, Math.abs(value));
      }
      for (int i = 0; i < x.length; i++) {
        x[i] /= largest;
      }
      if (step < 3) {
        for (int i = 0; i < x.length; i++) {
          x[i] *= -added[i];
        }
      }
    }
    double[] motions = new double[t.freedoms()];
    t.expand(x, 0, motions, 0);
    return motions;
  }

  private static SymmetricMatrix diagonalMatrix(double[] diagonal) {
    int[] starts = new int[diagonal.length + 1];
    int[] rows = new int[diagonal.length];
    for (int i = 0; i < diagonal.length; i++) {
      starts[i + 1] = i + 1;
      rows[i] = i;
    }
    return SymmetricMatrix.of(
        org.flexbound.sparse.SparsePattern.of(starts, rows),
        Arrays.copyOf(diagonal, diagonal.length));
  }

  private static Vector vector(double[] motions, int at) {
    return new Vector(motions[at], motions[at + 1], motions[at + 2]);
  }

  private double size(double[] motions, int point) {
    return Math.max(
        vector(motions, 6 * point).norm(), vector(motions, 6 * point + 3).norm() * length);
  }

  private int largest(double[] motions) {
    int largest = 0;
    for (int p = 1; p < structure.mesh().pointCount(); p++) {
      if (size(motions, p) > size(motions, largest) * (1 + 1e-6)) {
        largest = p;
      }
    }
    return largest;
  }

  private Vector rotationOf(double[] motions) {
    return vector(motions, 6 * largest(motions) + 3);
  }

  private boolean isRigid(double[] motions, int point) {
    Vector u = vector(motions, 6 * point);
    Vector turn = vector(motions, 6 * point + 3);
    for (int p = 0; p < structure.mesh().pointCount(); p++) {
      Vector arm = structure.mesh().places().get(p).minus(structure.mesh().places().get(point));
      Vector expected = u.plus(turn.cross(arm));
      if (vector(motions, 6 * p).minus(expected).norm() > STILL * size(motions, point)) {
        return false;
      }
    }
    return true;
  }

  private static String direction(Vector v) {
    if (!(v.norm() > 0)) {
      return "no direction";
    }
    Vector d = v.unit();
    double[] c = {d.x(), d.y(), d.z()};
    String[] names = {"x", "y", "z"};
    for (int i = 0; i < 3; i++) {
      if (Math.abs(c[i]) > 1 - 1e-4) {
        return names[i];
      }
    }
    return String.format(Locale.ROOT, "(%.2f, %.2f, %.2f)", d.x(), d.y(), d.z());
  }
}
