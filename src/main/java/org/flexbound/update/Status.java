package org.flexbound.update;

/** What the tests can tell of a parameter. */
public enum Status {
  /** Not reached from below within the bounds: only a lower limit can be claimed. */
  LOWER_LIMIT_ONLY("lower limit only"),
  /** Not reached from above within the bounds: only an upper limit can be claimed. */
  UPPER_LIMIT_ONLY("upper limit only"),
  /** More than 90 % of the prior variance removed, and by the data more than by the prior. */
  IDENTIFIED("identified"),
  /** Identified only together with others of its collinear group. */
  IDENTIFIED_ONLY_IN_COMBINATION("identified only in combination"),
  /** Less than 5 % of the prior variance removed. */
  NOT_IDENTIFIABLE("not identifiable from this test"),
  /** Anything between. */
  WEAKLY_IDENTIFIED("weakly identified");

  private final String words;

  Status(String words) {
    this.words = words;
  }

  /**
   * The words for people.
   *
   * @return as in reports and results
   */
  public String words() {
    return words;
  }
}
