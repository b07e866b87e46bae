package org.flexbound.app;

import java.io.PrintWriter;
import java.util.function.Function;
import org.flexbound.document.ReadProgress;

/**
 * Where a command prints.
 *
 * @param out for results
 * @param err for messages about what went wrong
 * @param colour whether colour may be used: only where a person looks and has not set NO_COLOR
 * @param watched whether a person looks, so that a line may be written over
 */
record Terminal(PrintWriter out, PrintWriter err, boolean colour, boolean watched) {
  private static final String RESET = "\u001b[0m";

  /** Where nobody looks. */
  Terminal(PrintWriter out, PrintWriter err) {
    this(out, err, false, false);
  }

  /**
   * Works with a bar for what takes long, where a person looks.
   *
   * @param work is given what it may tell its progress
   */
  <T> T withProgress(Function<ReadProgress, T> work) {
    if (!watched) {
      return work.apply(ReadProgress.NONE);
    }
    ProgressBar bar = new ProgressBar(err, System::nanoTime);
    try {
      return work.apply(bar);
    } finally {
      bar.end();
    }
  }

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
