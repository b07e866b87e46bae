package org.flexbound.update;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.flexbound.finding.Findings;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.Member;
import org.flexbound.frame.Rigidity;
import org.flexbound.frame.Stiffness;
import org.flexbound.frame.StiffnessPath;
import org.flexbound.study.Parameter;
import org.flexbound.study.Study;
import org.flexbound.study.StudyFinding;
import org.flexbound.study.Working;

/** Gives the parameters of a study their numbers, which need the model. */
final class ParameterMaker {
  private final FrameModel model;
  private final Findings findings;

  ParameterMaker(FrameModel model, Findings findings) {
    this.model = model;
    this.findings = findings;
  }

  List<WorkingParameter> of(Study study) {
    List<WorkingParameter> result = new ArrayList<>();
    for (Parameter parameter : study.parameters()) {
      of(parameter).ifPresent(result::add);
    }
    return result;
  }

  private Optional<WorkingParameter> of(Parameter parameter) {
    List<StiffnessPath> paths = new ArrayList<>();
    for (String scale : parameter.scales()) {
      StiffnessPath.parse(scale).filter(p -> model.stiffness(p).isPresent()).ifPresent(paths::add);
    }
    if (paths.isEmpty()) {
      // The missing part itself has its own finding.
      return Optional.empty();
    }
    double nominal = model.stiffness(paths.get(0)).map(Stiffness::value).orElse(1.0);
    boolean alike =
        paths.stream()
            .allMatch(p -> model.stiffness(p).map(s -> alike(s.value(), nominal)).orElse(false)
                && unit(p).equals(unit(paths.get(0))));
    if (!alike && parameter.working() != Working.LN) {
      findings.add(
          StudyFinding.BAD_BOUNDS,
          parameter.where(),
          "the parameter '"
              + parameter.name()
              + "' ties stiffnesses that differ in the model, which only the working variable ln"
              + " can scale together");
      return Optional.empty();
    }
    boolean anyEnd =
        paths.stream()
            .map(model::stiffness)
            .flatMap(Optional::stream)
            .anyMatch(stiffness -> stiffness.isRigid() || stiffness.isFree());
    if (!alike && anyEnd) {
      findings.add(
          StudyFinding.BAD_BOUNDS,
          parameter.where(),
          "the parameter '"
              + parameter.name()
              + "' ties stiffnesses of which one is rigid or free in the model; a multiple of that"
              + " one says nothing");
      return Optional.empty();
    }
    OptionalDouble reference = reference(parameter, paths.get(0));
    if (parameter.referenceMember().isPresent() && reference.isEmpty()) {
      findings.add(
          StudyFinding.BAD_SCALE,
          parameter.where(),
          "the reference member '"
              + parameter.referenceMember().get()
              + "' of the parameter '"
              + parameter.name()
              + "' is not a member of the model");
      return Optional.empty();
    }
    return WorkingParameter.of(
        parameter,
        alike ? nominal : 1,
        alike ? unit(paths.get(0)) : "1",
        reference.orElse(Double.NaN),
        findings);
  }

  private static boolean alike(double a, double b) {
    return a == b || Math.abs(a - b) <= 1e-9 * Math.abs(b);
  }

  private static String unit(StiffnessPath path) {
    return switch (path.group()) {
      case MATERIALS -> "Pa";
      case MEMBERS -> path.component().endsWith("A") || path.component().startsWith("GA")
          ? "N"
          : "N·m²";
      case JOINTS, CONNECTIONS, SUPPORTS ->
          path.component().startsWith("r") ? "N·m/rad" : "N/m";
    };
  }

  /**
   * 3EI/L of the reference member: about its y axis for a joint's ry, about its z axis for rz; the
   * stronger of the two where the springs have axes of their own.
   */
  private OptionalDouble reference(Parameter parameter, StiffnessPath path) {
    Optional<Member> member = parameter.referenceMember().map(model.members()::get);
    if (member.isEmpty()) {
      return OptionalDouble.empty();
    }
    double aboutY = model.stiffness(member.get(), Rigidity.EI_Y).value();
    double aboutZ = model.stiffness(member.get(), Rigidity.EI_Z).value();
    double bending = Math.max(aboutY, aboutZ);
    if (path.group() == StiffnessPath.Group.JOINTS) {
      bending = path.component().equals("rz") ? aboutZ : path.component().equals("ry") ? aboutY : bending;
    }
    double length = model.end(member.get()).minus(model.start(member.get())).norm();
    return OptionalDouble.of(3 * bending / length);
  }
}
