package org.flexbound.app;

/** The command line. */
public final class Flexbound {
  private Flexbound() {}

  /**
   * Runs one command.
   *
   * @param arguments the words of the command line
   */
  public static void main(String[] arguments) {
    System.exit(2);
  }
}
