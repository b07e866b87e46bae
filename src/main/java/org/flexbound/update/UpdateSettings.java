package org.flexbound.update;

/**
 * How much of the evidence is worked out.
 *
 * @param curve whether the curve of misfit against change is, and the table of coefficients
 * @param tracedProfiles how many profiles may be found by minimisation; the others come from the
 *     linearised model
 * @param refits how many load cases may be left out in turn with the model fitted anew; the others
 *     are left out in the linearised model
 */
public record UpdateSettings(boolean curve, int tracedProfiles, int refits) {
  /** Everything, for a study of usual size. */
  public static final UpdateSettings FULL = new UpdateSettings(true, 40, 40);

  /** Estimates, intervals and statuses alone, for simulations. */
  public static final UpdateSettings ESTIMATES = new UpdateSettings(false, 40, 0);
}
