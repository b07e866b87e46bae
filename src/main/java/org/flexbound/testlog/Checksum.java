package org.flexbound.testlog;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.DigestInputStream;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.CompletionException;

/**
 * The SHA-256 checksum of a file. That of a long one takes a third of the time of reading it, so it is
 * made beside the reading, by a thread of its own.
 */
final class Checksum {
  /** A file below this is done sooner than a thread begins. */
  private static final long LONG = 1 << 20;

  private final CompletableFuture<String> digits;

  private Checksum(CompletableFuture<String> digits) {
    this.digits = digits;
  }

  /** Begins with a file. */
  static Checksum begin(Path file) {
    try {
      return new Checksum(
          Files.size(file) < LONG
              ? CompletableFuture.completedFuture(of(file))
              : CompletableFuture.supplyAsync(
                  () -> of(file),
                  work -> {
                    Thread thread = new Thread(work, "checksum");
                    thread.setDaemon(true);
                    thread.start();
                  }));
    } catch (IOException refused) {
      throw new UncheckedIOException(refused);
    }
  }

  /** 64 lower-case hexadecimal digits; waits for them. */
  String digits() {
    try {
      return digits.join();
    } catch (CompletionException failed) {
      if (failed.getCause() instanceof UncheckedIOException refused) {
        throw refused;
      }
      throw failed;
    }
  }

  /** The checksum of a file, at once. */
  static String of(Path path) {
    try (InputStream in = Files.newInputStream(path)) {
      MessageDigest digest = MessageDigest.getInstance("SHA-256");
      try (DigestInputStream through = new DigestInputStream(in, digest)) {
        through.transferTo(OutputStream.nullOutputStream());
      }
      return HexFormat.of().formatHex(digest.digest());
    } catch (IOException refused) {
      throw new UncheckedIOException(refused);
    } catch (NoSuchAlgorithmException impossible) {
      throw new IllegalStateException("every Java platform has SHA-256", impossible);
    }
  }
}
