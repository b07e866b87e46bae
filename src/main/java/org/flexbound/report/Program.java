package org.flexbound.report;

/** What the program calls itself in its outputs. */
public final class Program {
  /** The name. */
  public static final String NAME = "flexbound";

  /** The version, as in the project's build file. */
  public static final String VERSION = "0.1.0";

  private Program() {}
}
