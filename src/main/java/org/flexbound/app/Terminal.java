package org.flexbound.app;

import java.io.PrintWriter;

/**
 * Where a command prints.
 *
 * @param out for results
 * @param err for messages about what went wrong
 * @param colour whether colour may be used: only where a person looks and has not set NO_COLOR
 */
record Terminal(PrintWriter out, PrintWriter err, boolean colour) {
  private static final String RESET = "\u001b[0m";

  /** A heading. */
  String bold(String text) {
    return paint("1", text);
  }

  /** Something that went wrong. */
  String bad(String text) {
    return paint("31", text);
  }

  /** Something to look at. */
  String warn(String text) {
    return paint("33", text);
  }

  /** Something in order. */
  String good(String text) {
    return paint("32", text);
  }

  private String paint(String code, String text) {
    return colour ? "\u001b[" + code + "m" + text + RESET : text;
  }
}
