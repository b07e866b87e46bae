package org.flexbound.finding;

import java.util.ArrayList;
import java.util.List;

/**
 * Collects findings while a file is read or a step is worked, so that all problems come in one
 * answer. Not for use by several threads.
 */
public final class Findings {
  private final List<Finding> list = new ArrayList<>();

  /**
   * Adds one finding.
   *
   * @param kind its kind
   * @param where its place
   * @param message what was found and what was expected
   */
  public void add(FindingKind kind, Where where, String message) {
    list.add(new Finding(kind, where, message));
  }

  /**
   * Adds findings made elsewhere.
   *
   * @param findings the findings, in their order
   */
  public void addAll(Iterable<Finding> findings) {
    findings.forEach(list::add);
  }

  /**
   * Whether anything so far is an error.
   *
   * @return true if the input must be refused
   */
  public boolean hasErrors() {
    return list.stream().anyMatch(finding -> finding.severity() == Severity.ERROR);
  }

  /**
   * All findings so far.
   *
   * @return a copy, in the order in which they were added
   */
  public List<Finding> list() {
    return List.copyOf(list);
  }

  /**
   * Refuses the input if anything so far is an error.
   *
   * @throws Refusal with every finding so far, when at least one is an error
   */
  public void refuseIfErrors() {
    if (hasErrors()) {
      throw new Refusal(list());
    }
  }
}
