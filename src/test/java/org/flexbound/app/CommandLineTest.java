package org.flexbound.app;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;

/** The words of the command line and the exit codes. */
class CommandLineTest {
  private final StringWriter out = new StringWriter();
  private final StringWriter err = new StringWriter();

  private int run(String... words) {
    return Flexbound.run(words, new PrintWriter(out), new PrintWriter(err));
  }

  @Test
  void helpNamesEveryCommandAndEveryExitCode() {
    assertThat(run("--help")).isZero();
    assertThat(out.toString())
        .contains("reduce", "compare", "update", "template", "check", "recheck", "trend")
        .contains("First steps", "  0  done", "  6  the system")
        .doesNotContain("\u001b[");
    assertThat(out.toString().lines().mapToInt(String::length).max().orElse(0))
        .isLessThanOrEqualTo(80);
    assertThat(err.toString()).isEmpty();
  }

  @Test
  void versionIsThatOfTheBuildFile() throws Exception {
    assertThat(run("--version")).isZero();
    assertThat(Files.readString(Path.of("pom.xml")))
        .contains("<version>" + out.toString().strip().replace("flexbound ", "") + "</version>");
  }

  @Test
  void noCommandIsAWrongCommandLine() {
    assertThat(run()).isEqualTo(2);
    assertThat(err.toString()).contains("no command given").contains("flexbound --help");
  }

  @Test
  void anUnknownCommandGetsTheNearestOnes() {
    assertThat(run("updat", "study.json")).isEqualTo(2);
    assertThat(err.toString()).contains("updat").contains("flexbound update");
  }

  @Test
  void unknownUnitsGetTheKnownOnes() {
    assertThat(run("update", "study.json", "--units", "furlong")).isEqualTo(2);
    assertThat(err.toString()).contains("furlong").contains("si, mm-kn or in-lbf");
  }

  @Test
  void completionPrintsAScriptThatKnowsTheCommands() {
    assertThat(run("completion")).isZero();
    assertThat(out.toString()).startsWith("#!").contains("reduce").contains("--units");
  }

  @Test
  void theWorstExitCodeTakesPrecedence() {
    assertThat(ExitCode.of(List.of())).isEqualTo(ExitCode.DONE);
    assertThat(ExitCode.of(List.of(ExitCode.DONE, ExitCode.UNDECIDED, ExitCode.LIMIT_FAILED)))
        .isEqualTo(ExitCode.LIMIT_FAILED);
    assertThat(ExitCode.of(List.of(ExitCode.LIMIT_FAILED, ExitCode.REFUSED)))
        .isEqualTo(ExitCode.REFUSED);
    assertThat(ExitCode.of(List.of(ExitCode.REFUSED, ExitCode.COMMAND_LINE, ExitCode.FAULT)))
        .isEqualTo(ExitCode.FAULT);
    assertThat(ExitCode.of(List.of(ExitCode.FAULT, ExitCode.SYSTEM))).isEqualTo(ExitCode.SYSTEM);
    assertThat(java.util.Arrays.stream(ExitCode.values()).map(ExitCode::number))
        .containsExactly(6, 4, 2, 3, 1, 5, 0);
  }

  @Test
  void controlCharactersInAUsersTextAreShownAndNotObeyed() {
    assertThat(PlainText.of("a\nb\u001b[31mc\u202Ed")).isEqualTo("a\\nb<U+001B>[31mc<U+202E>d");
    assertThat(PlainText.of("Träger 梁")).isEqualTo("Träger 梁");
    assertThat(PlainText.width("梁1")).isEqualTo(3);
  }

  @Test
  void columnsOfATableStayAlignedWithWideCharacters() {
    TextTable table = new TextTable().text("name").number("value");
    table.row("梁", "1");
    table.row("post", "23");
    table.print(new PrintWriter(out, true));
    assertThat(out.toString().lines())
        .containsExactly("  name  value", "  梁        1", "  post     23");
  }
}
