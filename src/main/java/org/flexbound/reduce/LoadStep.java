package org.flexbound.reduce;

import org.flexbound.finding.Where;

/**
 * A load step: the readings at one held load, as their mean. Twenty rows at a held load are one
 * step.
 *
 * @param load mean of the varied load, N or N·m
 * @param motion mean of the gauge, SI; NaN where nothing was read
 * @param readings how many readings the step is the mean of
 * @param scatter standard deviation of the gauge's readings within the step, SI; 0 for one reading
 * @param rising true where the load's magnitude grew towards it
 * @param cycle the load cycle, from 1
 * @param branch the branch, counted through the run from 0
 * @param fate whether it went into the fit, or why not
 * @param where the gauge's cell of its first reading
 */
public record LoadStep(
    double load,
    double motion,
    int readings,
    double scatter,
    boolean rising,
    int cycle,
    int branch,
    Fate fate,
    Where where) {
  /** Whether a step went into the fit, or why not. */
  public enum Fate {
    /** In the fit. */
    FITTED("used"),
    /** Outside the fit range. */
    OUTSIDE_RANGE("outside the fit range"),
    /** In the first cycle, while the structure beds in. */
    BEDDING_IN("first cycle: bedding-in"),
    /** The gauge was not read. */
    NOT_READ("not read"),
    /** The user said no. */
    LEFT_OUT("left out by the user");

    private final String words;

    Fate(String words) {
      this.words = words;
    }

    /**
     * The fate in words.
     *
     * @return a short phrase
     */
    public String words() {
      return words;
    }
  }

  /** The same step with another fate. */
  LoadStep withFate(Fate other) {
    return new LoadStep(load, motion, readings, scatter, rising, cycle, branch, other, where);
  }
}
