package org.flexbound.document;

import java.io.FilterInputStream;
import java.io.IOException;
import java.io.InputStream;

/** Stops a stream that gives more bytes than a limit, so that a packed bomb does no harm. */
final class LimitedStream extends FilterInputStream {
  private final long limit;
  private final String name;
  private long read;

  LimitedStream(InputStream in, long limit, String name) {
    super(in);
    this.limit = limit;
    this.name = name;
  }

  /** The limit was passed; the message names it. */
  static final class Passed extends IOException {
    private static final long serialVersionUID = 1L;

    Passed(String message) {
      super(message);
    }
  }

  @Override
  public int read() throws IOException {
    int b = super.read();
    count(b < 0 ? 0 : 1);
    return b;
  }

  @Override
  public int read(byte[] bytes, int offset, int length) throws IOException {
    int n = super.read(bytes, offset, length);
    count(Math.max(n, 0));
    return n;
  }

  /** How many bytes were read so far. */
  long count() {
    return read;
  }

  private void count(int n) throws Passed {
    read += n;
    if (read > limit) {
      throw new Passed(message(name, limit));
    }
  }

  /** The sentence for a limit that was passed. */
  static String message(String name, long limit) {
    return "found more than the limit '" + name + "' = " + limit + " lets through";
  }
}
