package org.flexbound.acceptance;

import java.util.Locale;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;

/**
 * What would settle a limit that could not be decided.
 *
 * @param moreRuns how many more runs with the same instruments; empty where no number can be relied
 *     on
 * @param assurance the probability that so many runs (or, where there is no such number, ever so
 *     many) settle it
 * @param dominant the largest source of uncertainty that runs do not make smaller
 * @param dominantShare its share of the variance
 * @param relative that source's standard uncertainty as a share of the reading; empty where it is no
 *     gain
 * @param neededFactor the factor by which its uncertainty would have to come down, 0 to 1; empty where
 *     even taking it away would not do
 * @param reason why neither can help, or what must be done first; empty otherwise
 */
public record Advice(
    OptionalInt moreRuns,
    double assurance,
    Optional<String> dominant,
    double dominantShare,
    OptionalDouble relative,
    OptionalDouble neededFactor,
    String reason) {

  static Advice because(String reason) {
    return new Advice(
        OptionalInt.empty(),
        0,
        Optional.empty(),
        0,
        OptionalDouble.empty(),
        OptionalDouble.empty(),
        reason);
  }

  /**
   * The advice as a sentence or two.
   *
   * @return for the reader
   */
  public String words() {
    if (!reason.isEmpty()) {
      return reason;
    }
    if (moreRuns.isPresent()) {
      return String.format(
          Locale.ROOT,
          "%d more %s would settle it with a probability of %.0f %%, if the scatter stays as it is",
          moreRuns.getAsInt(),
          moreRuns.getAsInt() == 1 ? "run" : "runs",
          100 * assurance);
    }
    StringBuilder text = new StringBuilder();
    text.append(
        String.format(
            Locale.ROOT,
            "no number of runs can be relied on: ever so many would settle it with a probability"
                + " of %.0f %%",
            100 * assurance));
    dominant.ifPresent(
        source ->
            text.append(
                String.format(
                    Locale.ROOT,
                    "; %.0f %% of the variance comes from %s",
                    100 * dominantShare,
                    source)));
    if (neededFactor.isEmpty()) {
      text.append("; the value lies too near the limit for a better one to be relied on either");
    } else if (relative.isPresent()) {
      text.append(
          String.format(
              Locale.ROOT,
              "; known within %.2g %% (k = 1) instead of %.2g %%, it would settle it with a"
                  + " probability of %.0f %%",
              100 * relative.getAsDouble() * neededFactor.getAsDouble(),
              100 * relative.getAsDouble(),
              100 * Settling.ASSURANCE));
    } else {
      text.append(
          String.format(
              Locale.ROOT,
              "; brought down to %.0f %% of its size, it would settle it with a probability of"
                  + " %.0f %%",
              100 * neededFactor.getAsDouble(),
              100 * Settling.ASSURANCE));
    }
    return text.toString();
  }
}
