package org.flexbound.finding;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;

/**
 * What a reader or a step could make out, with what it found on the way.
 *
 * <p>A value may be there although there are errors: later checks can then still run, so that the
 * user gets all problems in one answer.
 *
 * @param value what could be made out; empty where nothing could
 * @param findings everything found, in order
 * @param <T> the kind of value
 */
public record Outcome<T>(Optional<T> value, List<Finding> findings) {
  /** Copies the list. */
  public Outcome {
    findings = List.copyOf(findings);
  }

  /**
   * A value with findings.
   *
   * @param value the value
   * @param findings the findings
   * @param <T> the kind of value
   * @return the outcome
   */
  public static <T> Outcome<T> of(T value, List<Finding> findings) {
    return new Outcome<>(Optional.of(value), findings);
  }

  /**
   * No value at all.
   *
   * @param findings the findings, which say why
   * @param <T> the kind of value
   * @return the outcome
   */
  public static <T> Outcome<T> none(List<Finding> findings) {
    return new Outcome<>(Optional.empty(), findings);
  }

  /**
   * Whether any finding is an error.
   *
   * @return true if the input must be refused in the end
   */
  public boolean hasErrors() {
    return findings.stream().anyMatch(finding -> finding.severity() == Severity.ERROR);
  }

  /**
   * The value, where nothing is in error.
   *
   * @return the value
   * @throws Refusal with all findings, where any is an error or there is no value
   */
  public T orRefuse() {
    if (hasErrors() || value.isEmpty()) {
      throw new Refusal(findings);
    }
    return value.get();
  }

  /**
   * Goes on with the value, keeping the findings of both steps.
   *
   * @param step the next step, run only where there is a value
   * @param <U> the next kind of value
   * @return the outcome of the next step with the findings of this one before its own
   */
  public <U> Outcome<U> then(Function<? super T, Outcome<U>> step) {
    if (value.isEmpty()) {
      return none(findings);
    }
    Outcome<U> next = step.apply(value.get());
    List<Finding> all = new ArrayList<>(findings);
    all.addAll(next.findings());
    return new Outcome<>(next.value(), all);
  }
}
