package org.flexbound.app;

import java.io.PrintWriter;
import java.util.Locale;
import java.util.function.LongSupplier;
import org.flexbound.document.ReadProgress;

/**
 * A bar that shows how far the reading of a long file has come: one line that is written over, shown
 * only to a person at a terminal and only once the reading has taken a second.
 */
final class ProgressBar implements ReadProgress {
  private static final long PATIENCE = 1_000_000_000L;
  private static final long BETWEEN = 100_000_000L;
  private static final int WIDTH = 30;

  private final PrintWriter err;
  private final LongSupplier nanoseconds;
  private final long begun;
  private long shown;
  private int length;

  /**
   * A bar.
   *
   * @param err where it is shown
   * @param nanoseconds a clock
   */
  ProgressBar(PrintWriter err, LongSupplier nanoseconds) {
    this.err = err;
    this.nanoseconds = nanoseconds;
    this.begun = nanoseconds.getAsLong();
    this.shown = begun - BETWEEN;
  }

  @Override
  public void read(String file, double share) {
    long now = nanoseconds.getAsLong();
    if (now - begun < PATIENCE || now - shown < BETWEEN) {
      return;
    }
    shown = now;
    double done = Math.max(0, Math.min(1, share));
    int full = (int) Math.round(WIDTH * done);
    String line =
        "reading "
            + PlainText.of(file)
            + " ["
            + "#".repeat(full)
            + " ".repeat(WIDTH - full)
            + String.format(Locale.ROOT, "] %3.0f %%", 100 * done);
    over(line);
  }

  /** Takes the bar away. */
  void end() {
    if (length > 0) {
      over("");
      err.print('\r');
      err.flush();
    }
  }

  private void over(String line) {
    int width = PlainText.width(line);
    err.print('\r' + line + " ".repeat(Math.max(0, length - width)));
    err.flush();
    length = width;
  }
}
