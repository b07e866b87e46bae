package org.flexbound.document;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.channels.FileLock;
import java.nio.channels.OverlappingFileLockException;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * A folder that outputs are written to, all or nothing as far as the system allows: each file is
 * written under a temporary name and forced to the disk, and only when all are complete are they
 * moved into place, each by one atomic rename. A lock file keeps two runs from writing to one folder
 * at the same time; it goes with the process that holds it.
 */
public final class OutputFolder {
  private static final String LOCK = ".flexbound-lock";

  private final Path folder;
  private final Map<String, byte[]> files = new LinkedHashMap<>();

  /**
   * A folder, made when something is written.
   *
   * @param folder where it is or will be
   */
  public OutputFolder(Path folder) {
    this.folder = folder;
  }

  /**
   * Adds a file to be written.
   *
   * @param name its name within the folder
   * @param content its content
   * @return this
   */
  public OutputFolder add(String name, byte[] content) {
    files.put(name, content.clone());
    return this;
  }

  /**
   * Writes all files that were added.
   *
   * @return where they lie, in the order in which they were added
   * @throws UncheckedIOException where the system does not let it
   */
  public List<Path> write() {
    Map<Path, Path> moves = new LinkedHashMap<>();
    try {
      Files.createDirectories(folder);
      return locked(moves);
    } catch (IOException refused) {
      throw new UncheckedIOException(refused);
    }
  }

  private List<Path> locked(Map<Path, Path> moves) throws IOException {
    Path lockFile = folder.resolve(LOCK);
    try (FileChannel channel =
            FileChannel.open(lockFile, StandardOpenOption.CREATE, StandardOpenOption.WRITE);
        FileLock lock = lock(channel)) {
      for (Map.Entry<String, byte[]> file : files.entrySet()) {
        // Not a name of the system's own making: that would be readable by its owner alone.
        Path temporary = folder.resolve("." + file.getKey() + ".part");
        moves.put(temporary, folder.resolve(file.getKey()));
        write(temporary, file.getValue());
      }
      for (Map.Entry<Path, Path> move : moves.entrySet()) {
        move(move.getKey(), move.getValue());
      }
      if (!lock.isValid()) {
        throw new IOException(folder + ": the lock on the folder was lost while writing");
      }
    } finally {
      clear(moves);
    }
    Files.deleteIfExists(lockFile);
    return new ArrayList<>(moves.values());
  }

  private FileLock lock(FileChannel channel) throws IOException {
    FileLock lock;
    try {
      lock = channel.tryLock();
    } catch (OverlappingFileLockException heldHere) {
      lock = null;
    }
    if (lock == null) {
      throw new IOException(
          folder + ": another run is writing to this folder; wait for it to end, then repeat");
    }
    return lock;
  }

  private static void write(Path file, byte[] content) throws IOException {
    try (FileChannel channel =
        FileChannel.open(
            file,
            StandardOpenOption.CREATE,
            StandardOpenOption.TRUNCATE_EXISTING,
            StandardOpenOption.WRITE)) {
      ByteBuffer buffer = ByteBuffer.wrap(content);
      while (buffer.hasRemaining()) {
        channel.write(buffer);
      }
      channel.force(true);
    }
  }

  private static void move(Path from, Path to) throws IOException {
    try {
      Files.move(
          from, to, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
    } catch (AtomicMoveNotSupportedException unsupported) {
      Files.move(from, to, StandardCopyOption.REPLACE_EXISTING);
    }
  }

  private static void clear(Map<Path, Path> moves) {
    for (Path temporary : moves.keySet()) {
      try {
        Files.deleteIfExists(temporary);
      } catch (IOException ignored) {
        // What could not be written cannot be cleared either; the first failure is reported.
      }
    }
  }
}
