package org.flexbound.update;

import java.util.Optional;
import org.flexbound.finding.Findings;
import org.flexbound.study.Level;
import org.flexbound.study.Parameter;
import org.flexbound.study.Spread;
import org.flexbound.study.StudyFinding;
import org.flexbound.study.Working;

/**
 * A parameter with its numbers in the working variable x: ln(k/k₀), the compliance 1/k, or the fixity
 * factor 1/(1 + k_r/k) with k_r = 3EI/L of the reference member.
 *
 * @param parameter as the study has it
 * @param nominalStiffness k₀, SI; infinite for rigid, 0 for free; 1 where several unlike stiffnesses
 *     are tied, and values are factors
 * @param unit SI unit of the stiffness; {@code 1} where values are factors
 * @param referenceStiffness k_r; NaN where no fixity factor is worked
 * @param nominal x of the nominal model, the mean of the prior
 * @param lower the lower bound of x
 * @param upper the upper bound of x
 * @param priorStandardDeviation of x, above 0
 */
public record WorkingParameter(
    Parameter parameter,
    double nominalStiffness,
    String unit,
    double referenceStiffness,
    double nominal,
    double lower,
    double upper,
    double priorStandardDeviation) {
  /** Checks the order of the numbers. */
  public WorkingParameter {
    if (!(lower < upper) || !(priorStandardDeviation > 0)) {
      throw new IllegalArgumentException(
          "parameter " + parameter.name() + " has no room: " + lower + " to " + upper);
    }
  }

  /**
   * Works out the numbers of a parameter.
   *
   * @param parameter as the study has it
   * @param nominalStiffness k₀; infinite for rigid, 0 for free; 1 with unit {@code 1} for factors
   * @param unit its SI unit
   * @param referenceStiffness 3EI/L of the reference member; NaN where there is none
   * @param findings takes what is wrong
   * @return the parameter; empty where it cannot be worked
   */
  public static Optional<WorkingParameter> of(
      Parameter parameter,
      double nominalStiffness,
      String unit,
      double referenceStiffness,
      Findings findings) {
    boolean end = nominalStiffness == 0 || Double.isInfinite(nominalStiffness);
    String nominalWord = nominalStiffness == 0 ? "free" : "rigid";
    if (end && parameter.working() == Working.LN) {
      return refuse(
          parameter,
          findings,
          "is "
              + nominalWord
              + " in the model, which has no logarithm; expected \"working\": \"compliance\" or"
              + " \"fixity\" with a prior standard deviation of its own");
    }
    if (nominalStiffness == 0 && parameter.working() == Working.COMPLIANCE) {
      return refuse(
          parameter,
          findings,
          "is free in the model, which has no compliance; expected \"working\": \"fixity\"");
    }
    if (end
        && (parameter.lower() instanceof Level.OfNominal
            || parameter.upper() instanceof Level.OfNominal)) {
      return refuse(
          parameter,
          findings,
          "is "
              + nominalWord
              + " in the model, so that a multiple of it says nothing; expected bounds as"
              + " stiffnesses with their unit, rigid or free");
    }
    if (end && parameter.priorStandardDeviation().isEmpty()) {
      return refuse(
          parameter,
          findings,
          "is "
              + nominalWord
              + " in the model; expected a 'priorStandardDeviation' of its own, since none can be"
              + " taken from it");
    }
    Variable variable =
        new Variable(parameter.working(), nominalStiffness, referenceStiffness);
    double one = variable.of(level(parameter.lower(), nominalStiffness));
    double other = variable.of(level(parameter.upper(), nominalStiffness));
    double lower = Math.min(one, other);
    double upper = Math.max(one, other);
    double nominal = variable.of(nominalStiffness);
    double spread =
        parameter
            .priorStandardDeviation()
            .map(s -> spread(s, parameter.working(), nominal))
            .orElse((upper - lower) / 4);
    if (!(lower < upper) || !Double.isFinite(lower) || !Double.isFinite(upper)) {
      return refuse(
          parameter,
          findings,
          "has no room between its bounds, or none that its working variable can express");
    }
    if (!(nominal >= lower && nominal <= upper)) {
      return refuse(parameter, findings, "is not between its bounds in the nominal model");
    }
    if (!(spread > 0) || !Double.isFinite(spread)) {
      return refuse(
          parameter,
          findings,
          "has a prior standard deviation that is a share of a compliance of 0; expected a"
              + " compliance with its unit");
    }
    return Optional.of(
        new WorkingParameter(
            parameter, nominalStiffness, unit, referenceStiffness, nominal, lower, upper, spread));
  }

  private static Optional<WorkingParameter> refuse(
      Parameter parameter, Findings findings, String why) {
    findings.add(
        StudyFinding.BAD_BOUNDS,
        parameter.where(),
        "what the parameter '" + parameter.name() + "' scales " + why);
    return Optional.empty();
  }

  private static double level(Level level, double nominal) {
    if (level instanceof Level.OfNominal of) {
      return of.factor() * nominal;
    }
    if (level instanceof Level.Stiffness stiffness) {
      return stiffness.value();
    }
    return level instanceof Level.Rigid ? Double.POSITIVE_INFINITY : 0;
  }

  private static double spread(Spread spread, Working working, double nominal) {
    if (spread instanceof Spread.InWorkingVariable own) {
      return working == Working.COMPLIANCE ? own.value() * nominal : own.value();
    }
    return ((Spread.OfCompliance) spread).value();
  }

  /** A working variable as a function of the stiffness. */
  private record Variable(Working working, double nominal, double reference) {
    double of(double stiffness) {
      return switch (working) {
        case LN -> Math.log(stiffness / nominal);
        case COMPLIANCE -> 1 / stiffness;
        case FIXITY -> 1 / (1 + reference / stiffness);
      };
    }
  }

  /**
   * The parameter's name.
   *
   * @return as in the study
   */
  public String name() {
    return parameter.name();
  }

  /**
   * Whether the stiffness grows with x (it falls with a compliance).
   *
   * @return true if so
   */
  public boolean growing() {
    return parameter.working() != Working.COMPLIANCE;
  }

  /**
   * The stiffness at a value of the working variable.
   *
   * @param x the working variable
   * @return the stiffness in {@link #unit()}, 0 to infinite
   */
  public double stiffness(double x) {
    return switch (parameter.working()) {
      case LN -> nominalStiffness * Math.exp(x);
      case COMPLIANCE -> 1 / Math.max(x, 0);
      case FIXITY -> x >= 1 ? Double.POSITIVE_INFINITY : referenceStiffness * x / (1 - x);
    };
  }

  /**
   * The stiffness over the nominal one.
   *
   * @param x the working variable
   * @return the factor; NaN where nominal is rigid or free
   */
  public double factor(double x) {
    return nominalStiffness == 0 || Double.isInfinite(nominalStiffness)
        ? Double.NaN
        : stiffness(x) / nominalStiffness;
  }
}
