package org.flexbound.samples;

import java.util.List;
import java.util.Map;
import org.flexbound.frame.Axes;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.Member;
import org.flexbound.frame.SectionProperties;
import org.flexbound.setup.Vector;

/**
 * The exact flexibility of a statically determinate chain of members by the unit-load theorem: the
 * sum over members of ∫ (N n/EA + V v/GA_s + M m/EI + T t/GJ) dx and over springs of n n/k, with the
 * section forces from statics alone. It shares nothing with the program's solver.
 */
final class CantileverTruth {
  /** Two-point Gauss quadrature is exact for the product of two linear section forces. */
  private static final double[] GAUSS = {0.5 - 0.5 / Math.sqrt(3), 0.5 + 0.5 / Math.sqrt(3)};

  private final FrameModel model;
  private final List<String> chain;
  private final Map<String, Double> factors;

  /**
   * A chain from the support on.
   *
   * @param model the nominal model
   * @param chain its members from the foot to the tip
   * @param factors the true factors on nominal stiffnesses, by path
   */
  CantileverTruth(FrameModel model, List<String> chain, Map<String, Double> factors) {
    this.model = model;
    this.chain = chain;
    this.factors = factors;
  }

  /**
   * Something that acts on the chain.
   *
   * @param member the member it acts on
   * @param at the share of the member's length
   * @param force the force, or zero
   * @param moment the moment, or zero
   */
  record Action(String member, double at, Vector force, Vector moment) {}

  /** The motion along one unit action caused by another. */
  double flexibility(Action gauge, Action load) {
    double sum = support(gauge, load);
    for (int k = 0; k < chain.size(); k++) {
      Member member = model.members().get(chain.get(k));
      sum += joint(member, k, gauge, load);
      double end = Math.min(reach(gauge, k), reach(load, k));
      for (double point : GAUSS) {
        sum += 0.5 * end * length(member) * section(member, point * end, gauge, load);
      }
    }
    return sum;
  }

  /** How far along a member of the chain an action's section forces reach. */
  private double reach(Action action, int k) {
    int where = chain.indexOf(action.member());
    return k < where ? 1 : k == where ? action.at() : 0;
  }

  private double length(Member member) {
    return model.end(member).minus(model.start(member)).norm();
  }

  private Vector place(Member member, double at) {
    Vector start = model.start(member);
    return start.plus(model.end(member).minus(start).times(at));
  }

  private Vector moment(Action action, Vector about) {
    Vector arm = place(model.members().get(action.member()), action.at()).minus(about);
    return arm.cross(action.force()).plus(action.moment());
  }

  private double section(Member member, double at, Action gauge, Action load) {
    Axes axes = model.axes(member);
    Vector here = place(member, at);
    Vector f = gauge.force();
    Vector g = load.force();
    Vector m = moment(gauge, here);
    Vector n = moment(load, here);
    SectionProperties s = model.startSection(member);
    double e = model.material(member.material()).youngsModulus();
    double shear = model.material(member.material()).shearModulus();
    return f.dot(axes.x()) * g.dot(axes.x()) / (e * s.area())
        + f.dot(axes.y()) * g.dot(axes.y()) / (shear * s.ay())
        + f.dot(axes.z()) * g.dot(axes.z()) / (shear * s.az())
        + m.dot(axes.x()) * n.dot(axes.x()) / (shear * s.j())
        + m.dot(axes.y()) * n.dot(axes.y()) / (e * s.iy())
        + m.dot(axes.z()) * n.dot(axes.z()) / (e * s.iz());
  }

  private double joint(Member member, int k, Action gauge, Action load) {
    if (member.startJoint().isEmpty() || reach(gauge, k) == 0 || reach(load, k) == 0) {
      return 0;
    }
    return springs(
        "joints." + member.startJoint().get(), model.axes(member), model.start(member), gauge, load);
  }

  private double support(Action gauge, Action load) {
    Member first = model.members().get(chain.get(0));
    return springs(
        "supports." + first.startNode(), Axes.GLOBAL, model.start(first), gauge, load);
  }

  private double springs(String owner, Axes axes, Vector here, Action gauge, Action load) {
    Vector m = moment(gauge, here);
    Vector n = moment(load, here);
    double sum = 0;
    List<Vector> directions = List.of(axes.x(), axes.y(), axes.z());
    for (int k = 0; k < 3; k++) {
      Vector d = directions.get(k);
      String name = String.valueOf("xyz".charAt(k));
      sum += gauge.force().dot(d) * load.force().dot(d) * compliance(owner + "." + name);
      sum += m.dot(d) * n.dot(d) * compliance(owner + ".r" + name);
    }
    return sum;
  }

  private double compliance(String path) {
    org.flexbound.frame.StiffnessPath parsed =
        org.flexbound.frame.StiffnessPath.parse(path).orElseThrow();
    double nominal = model.stiffness(parsed).orElseThrow().value();
    return 1 / (nominal * factors.getOrDefault(path, 1.0));
  }
}
