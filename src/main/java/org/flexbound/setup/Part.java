package org.flexbound.setup;

/** What a gauge measures, or what it stands on. */
public enum Part {
  /** The structure under test. */
  ARTICLE,
  /** What holds the article. */
  FIXTURE,
  /** What does not move, or is taken not to. */
  GROUND
}
