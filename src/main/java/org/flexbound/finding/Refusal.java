package org.flexbound.finding;

import java.util.List;
import java.util.stream.Collectors;

/**
 * The user's data is refused; carries every finding that led to it.
 *
 * <p>Unchecked, since only the command line can do anything about it.
 */
public final class Refusal extends RuntimeException {
  private static final long serialVersionUID = 1L;

  private final transient List<Finding> findings;

  /**
   * Refuses with these findings.
   *
   * @param findings all findings, at least one of them an error
   */
  public Refusal(List<Finding> findings) {
    super(findings.stream().map(Finding::toString).collect(Collectors.joining("\n")));
    this.findings = List.copyOf(findings);
  }

  /**
   * What led to the refusal.
   *
   * @return all findings, errors and others, in order
   */
  public List<Finding> findings() {
    return findings;
  }
}
