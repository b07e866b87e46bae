package org.flexbound.finding;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;

class CatalogueTest {
  private static final Catalogue ALL = Catalogue.ofTheProgram();

  private static List<FindingKind> kinds() {
    return ALL.rooms().stream().flatMap(room -> room.kinds().stream()).toList();
  }

  @Test
  void everyRoomThatTellsTheUserAnythingIsThere() {
    assertThat(ALL.rooms()).extracting(Catalogue.Room::name)
        .contains("document", "testlog", "frame", "study", "reduce", "update");
  }

  @Test
  void codesAreUniqueAndWellFormed() {
    assertThat(kinds()).extracting(FindingKind::code).doesNotHaveDuplicates()
        .allMatch(code -> code.matches("[A-Z][A-Z0-9]*(-[A-Z0-9]+)+"));
  }

  @Test
  void everyKindSaysWhatItMeansAndWhatToDo() {
    assertThat(kinds())
        .allSatisfy(
            kind -> {
              assertThat(kind.meaning()).as(kind.code()).isNotBlank();
              assertThat(kind.remedy()).as(kind.code()).isNotBlank();
            });
  }

  @Test
  void thePageListsEveryCodeOnce() {
    String page = ALL.page();
    for (FindingKind kind : kinds()) {
      assertThat(page).containsOnlyOnce("| " + kind.code() + " |");
    }
  }

  /** After a change of a kind: {@code mvn -q test -Dtest=CatalogueTest -Dcatalogue.write=true}. */
  @Test
  void thePageOfTheDocumentationIsTheOneTheProgramWrites() throws IOException {
    Path page = Path.of("src/site/findings.md");
    if (Boolean.getBoolean("catalogue.write")) {
      Files.writeString(page, ALL.page());
    }
    assertThat(page).hasContent(ALL.page());
  }
}
