package org.flexbound.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.channels.FileChannel;
import java.nio.channels.FileLock;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class OutputFolderTest {
  @TempDir Path folder;

  private static long files(Path folder) throws IOException {
    try (Stream<Path> list = Files.list(folder)) {
      return list.count();
    }
  }

  private static byte[] bytes(String text) {
    return text.getBytes(StandardCharsets.UTF_8);
  }

  @Test
  void filesAppearAndNothingElseIsLeft() throws IOException {
    OutputFolder output = new OutputFolder(folder.resolve("out"));
    output.add("a.txt", bytes("first")).add("b.txt", bytes("second"));
    assertThat(folder.resolve("out")).doesNotExist();
    assertThat(output.write()).hasSize(2);
    assertThat(folder.resolve("out/a.txt")).hasContent("first");
    assertThat(files(folder.resolve("out"))).isEqualTo(2);
  }

  @Test
  void twoRunsDoNotWriteToOneFolder() throws IOException {
    Files.writeString(folder.resolve("a.txt"), "old");
    try (FileChannel channel =
            FileChannel.open(
                folder.resolve(".flexbound-lock"),
                StandardOpenOption.CREATE,
                StandardOpenOption.WRITE);
        FileLock held = channel.lock()) {
      assertThat(held.isValid()).isTrue();
      OutputFolder output = new OutputFolder(folder).add("a.txt", bytes("new"));
      assertThatThrownBy(output::write)
          .isInstanceOf(UncheckedIOException.class)
          .hasMessageContaining("another run is writing to this folder");
    }
    assertThat(folder.resolve("a.txt")).hasContent("old");
  }

  @Test
  void aFileThatCannotBeWrittenLeavesTheOldOnesAndNoLitter() throws IOException {
    Files.writeString(folder.resolve("a.txt"), "old");
    OutputFolder output =
        new OutputFolder(folder)
            .add("a.txt", bytes("new"))
            .add("no such folder/b.txt", bytes("new"));
    assertThatThrownBy(output::write).isInstanceOf(UncheckedIOException.class);
    assertThat(folder.resolve("a.txt")).hasContent("old");
    assertThat(files(folder)).isEqualTo(2);
  }
}
