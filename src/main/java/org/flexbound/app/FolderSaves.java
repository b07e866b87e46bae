package org.flexbound.app;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.ClosedWatchServiceException;
import java.nio.file.Path;
import java.nio.file.StandardWatchEventKinds;
import java.nio.file.WatchEvent;
import java.nio.file.WatchKey;
import java.nio.file.WatchService;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.TimeUnit;

/**
 * Watches the folders of the files. Programs save in many ways (in place, or under another name that
 * is then moved): whatever happens to a file's name counts, once it has been quiet for a moment.
 */
final class FolderSaves implements SaveEvents {
  /** A save is a burst of events; this long without any it is over. */
  private static final long QUIET_MILLISECONDS = 300;

  private final WatchService service;
  private final Map<Path, WatchKey> keys = new LinkedHashMap<>();

  /** Begins to listen at once, so that no save is missed while a log is being reduced. */
  FolderSaves(Path file) {
    try {
      service = file.getFileSystem().newWatchService();
    } catch (IOException refused) {
      throw new UncheckedIOException("the system lets no folder be watched", refused);
    }
    listen(Set.of(file));
  }

  /** Begins to listen, so that nothing is missed between a reading and the waiting after it. */
  private void listen(Set<Path> files) {
    for (Path file : files) {
      Path folder = Optional.ofNullable(file.getParent()).orElse(file);
      keys.computeIfAbsent(folder, this::register);
    }
  }

  private WatchKey register(Path folder) {
    try {
      return folder.register(
          service,
          StandardWatchEventKinds.ENTRY_CREATE,
          StandardWatchEventKinds.ENTRY_MODIFY,
          StandardWatchEventKinds.ENTRY_DELETE);
    } catch (IOException refused) {
      throw new UncheckedIOException("the folder " + folder + " cannot be watched", refused);
    }
  }

  @Override
  public boolean await(Set<Path> files) {
    listen(files);
    try {
      boolean saved = false;
      while (true) {
        WatchKey key = saved ? service.poll(QUIET_MILLISECONDS, TimeUnit.MILLISECONDS) : service.take();
        if (key == null) {
          return true;
        }
        Path folder = (Path) key.watchable();
        for (WatchEvent<?> event : key.pollEvents()) {
          // an overflow names no file: something happened that was not seen
          saved |=
              !(event.context() instanceof Path name) || files.contains(folder.resolve(name));
        }
        if (!key.reset()) {
          keys.remove(folder);
        }
      }
    } catch (ClosedWatchServiceException ended) {
      return false;
    } catch (InterruptedException stop) {
      Thread.currentThread().interrupt();
      return false;
    }
  }

  @Override
  public void close() {
    try {
      service.close();
    } catch (IOException refused) {
      throw new UncheckedIOException(refused);
    }
  }
}
