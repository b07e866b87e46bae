package org.flexbound.testlog;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.Optional;

/**
 * Where the readings of a log are kept once they are numbers: in memory up to a bound that is common
 * to all runs of the log, and beyond it in a file of the system's folder for temporary files, which
 * goes away with the program. So the memory that a log takes does not grow with its rows, and no text
 * is read twice. Where no such file can be made, everything stays in memory.
 */
final class ReadingMemory {
  private static final int HELD = 24 << 20;

  private final long bound;
  private long held;
  private long written;
  private Optional<FileChannel> file = Optional.empty();
  private boolean refused;

  ReadingMemory() {
    this(HELD);
  }

  /** With another bound, in bytes. */
  ReadingMemory(long bound) {
    this.bound = bound;
  }

  /** A piece of readings, in memory or in the file. */
  interface Piece {
    /**
     * The bytes, in the platform's order.
     *
     * @param spare a buffer that may be filled and given back
     */
    ByteBuffer bytes(ByteBuffer spare);
  }

  /** Keeps the first bytes of a buffer, up to its position; the buffer may not be used afterwards. */
  Piece keep(ByteBuffer buffer) {
    ByteBuffer full = buffer.duplicate().flip().order(ByteOrder.nativeOrder());
    if (held + full.remaining() <= bound || !hasFile()) {
      held += full.remaining();
      return spare -> full;
    }
    long from = written;
    int length = full.remaining();
    FileChannel channel = file.orElseThrow();
    try {
      while (full.hasRemaining()) {
        written += channel.write(full, written);
      }
    } catch (IOException noSpace) {
      throw new UncheckedIOException(
          "the temporary file for readings cannot be written: " + noSpace.getMessage(), noSpace);
    }
    return spare -> read(channel, from, length, spare);
  }

  private static ByteBuffer read(FileChannel channel, long from, int length, ByteBuffer spare) {
    ByteBuffer target =
        spare.capacity() >= length
            ? spare.clear().limit(length)
            : ByteBuffer.allocate(length).order(ByteOrder.nativeOrder());
    try {
      while (target.hasRemaining()) {
        if (channel.read(target, from + target.position()) < 0) {
          throw new IOException("it is shorter than it was");
        }
      }
    } catch (IOException gone) {
      throw new UncheckedIOException(
          "the temporary file for readings cannot be read: " + gone.getMessage(), gone);
    }
    return target.flip();
  }

  private boolean hasFile() {
    if (file.isEmpty() && !refused) {
      try {
        Path path = Files.createTempFile("flexbound-", ".readings");
        file =
            Optional.of(
                FileChannel.open(
                    path,
                    StandardOpenOption.READ,
                    StandardOpenOption.WRITE,
                    StandardOpenOption.DELETE_ON_CLOSE));
      } catch (IOException noFolder) {
        refused = true;
      }
    }
    return file.isPresent();
  }
}
