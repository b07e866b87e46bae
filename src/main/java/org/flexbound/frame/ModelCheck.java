package org.flexbound.frame;

import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Where;
import org.flexbound.setup.Vector;

/** Looks over a model whose entries have been read one by one. */
final class ModelCheck {
  private final Findings findings;
  private final FrameModel model;

  ModelCheck(Findings findings, FrameModel model) {
    this.findings = findings;
    this.model = model;
  }

  /** The model without what has no sense of its own, so that later checks can still run. */
  FrameModel checked() {
    Map<String, Member> sound = new LinkedHashMap<>();
    model.members().forEach(
        (name, member) -> {
          if (geometry(member)) {
            sound.put(name, member);
          }
        });
    rigidCircles();
    unused();
    if (sound.size() == model.members().size()) {
      return model;
    }
    return new FrameModel(
        model.units(),
        model.up(),
        model.nodes(),
        model.materials(),
        model.sections(),
        sound,
        model.joints(),
        model.connections(),
        model.supports(),
        model.rigidLinks(),
        model.masses(),
        model.source());
  }

  private boolean geometry(Member member) {
    Vector x = model.end(member).minus(model.start(member));
    double scale =
        Math.max(
            model.place(member.endNode()).minus(model.place(member.startNode())).norm(),
            member.startOffset().norm() + member.endOffset().norm());
    if (!(x.norm() > 1e-9 * scale)) {
      findings.add(
          FrameFinding.BAD_GEOMETRY,
          member.where(),
          "the flexible part of the member '" + member.name() + "' has no length");
      return false;
    }
    if (member.reference().isPresent()) {
      if (Axes.parallel(member.reference().get(), x)) {
        findings.add(
            FrameFinding.BAD_GEOMETRY,
            member.where(),
            "the reference direction of the member '" + member.name() + "' is parallel to it");
        return false;
      }
    } else if (Axes.parallel(model.up(), x)) {
      Vector chosen = model.usualReference(x);
      SectionProperties section = model.startSection(member);
      boolean round = section.iy() == section.iz() && section.ay() == section.az();
      if (!round) {
        findings.add(
            FrameFinding.REFERENCE_CHOSEN,
            member.where(),
            "the member '"
                + member.name()
                + "' is parallel to up and states no reference direction; its z (depth) is laid"
                + " along global "
                + (chosen.x() == 1 ? "x" : "y"));
      }
    }
    if (model.startSection(member).hasOffsetShearCentre()) {
      findings.add(
          FrameFinding.WARPING_LEFT_OUT,
          member.where(),
          "the section '"
              + member.section()
              + "' of the member '"
              + member.name()
              + "' has its shear centre off its centroid; warping is not included");
    }
    return true;
  }

  /** Rigid links, and connections whose six components are all rigid, must not close a circle. */
  private void rigidCircles() {
    Map<String, String> leader = new HashMap<>();
    for (RigidLink link : model.rigidLinks()) {
      join(leader, link.from(), link.to(), link.where(), "the rigid link");
    }
    for (Connection connection : model.connections().values()) {
      boolean rigid = true;
      for (Spring spring : Spring.values()) {
        rigid &= model.springs(connection).stiffness(spring).isRigid();
      }
      if (rigid) {
        join(
            leader,
            connection.firstNode(),
            connection.secondNode(),
            connection.where(),
            "the rigid connection '" + connection.name() + "'");
      }
    }
  }

  private void join(
      Map<String, String> leader, String a, String b, Where where, String what) {
    String first = root(leader, a);
    String second = root(leader, b);
    if (first.equals(second)) {
      findings.add(
          FrameFinding.RIGID_CIRCLE,
          where,
          what
              + " from '"
              + a
              + "' to '"
              + b
              + "' closes a circle: other rigid parts tie the two together already");
      return;
    }
    leader.put(second, first);
  }

  private static String root(Map<String, String> leader, String node) {
    String at = node;
    for (String next = leader.get(at); next != null; next = leader.get(at)) {
      at = next;
    }
    return at;
  }

  private void unused() {
    Set<String> used = new TreeSet<>();
    model.members().values().forEach(
        member -> {
          used.add(member.startNode());
          used.add(member.endNode());
        });
    model.connections().values().forEach(
        connection -> {
          used.add(connection.firstNode());
          used.add(connection.secondNode());
        });
    model.rigidLinks().forEach(
        link -> {
          used.add(link.from());
          used.add(link.to());
        });
    if (findings.hasErrors()) {
      return;
    }
    model.nodes().values().forEach(
        node -> {
          if (!used.contains(node.name())) {
            findings.add(
                FrameFinding.UNUSED,
                node.where(),
                "no member, connection or rigid link reaches the node '" + node.name() + "'");
          }
        });
  }
}
