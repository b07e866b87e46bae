package org.flexbound.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.fail;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Random;
import java.util.function.Function;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;
import java.util.zip.ZipOutputStream;
import org.apache.poi.hssf.usermodel.HSSFWorkbook;
import org.apache.poi.ss.usermodel.CellStyle;
import org.apache.poi.ss.usermodel.Row.MissingCellPolicy;
import org.apache.poi.ss.usermodel.Workbook;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Refusal;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Files damaged at random, by seed: each is read or refused with findings, and nothing else. */
class DamagedFilesTest {
  private static final String[] PIECES = {
    "\"", "<", ">", "&", "/", "{", "}", "[", "]", ",", ";", "\n", "\u0000", "-", "9", "1e999", "NaN",
    "&#0;", "<!DOCTYPE a>", "]]>", "r=\"A99999999999\"", "t=\"s\"", "<v>", "</c>", "\uFEFF", "é", "0x"
  };

  @TempDir Path folder;

  @Test
  void aSliceOfDamagedFilesIsReadOrRefused() throws IOException {
    run(400);
  }

  @Test
  @Tag("long")
  void manyDamagedFilesAreReadOrRefused() throws IOException {
    run(3_000);
  }

  private void run(int cases) throws IOException {
    byte[] xlsx = bytes(new XSSFWorkbook());
    byte[] xls = bytes(new HSSFWorkbook());
    byte[] csv =
        "Force;Way [mm]\n0,5;1,25\n\"a;b\";2\n".repeat(40).getBytes(StandardCharsets.UTF_8);
    byte[] json =
        "{\"nodes\": {\"a\": [0, 1.5e3, -2]}, \"t\": \"210 GPa\", \"n\": null, \"b\": [true, {}]}"
            .getBytes(StandardCharsets.UTF_8);
    int[] read = new int[5];
    for (int seed = 0; seed < cases; seed++) {
      Random random = new Random(seed);
      read[0] += read("a.xlsx", damaged(xlsx, random), this::workbook, seed);
      read[1] += read("b.xlsx", damagedParts(xlsx, random), this::workbook, seed);
      read[2] += read("c.xls", damaged(xls, random), this::workbook, seed);
      read[3] += read("d.csv", edited(csv, random), this::csv, seed);
      read[4] += read("e.json", edited(json, random), file -> JsonFile.read(file, "e.json"), seed);
    }
    for (int count : read) {
      assertThat(count).as("read in spite of the damage").isLessThan(cases);
    }
    assertThat(read[1] + read[3]).isPositive();
  }

  private int read(String name, byte[] content, Function<Path, Outcome<?>> reader, int seed)
      throws IOException {
    Path file = Files.write(folder.resolve(name), content);
    try {
      Outcome<?> outcome = reader.apply(file);
      assertThat(outcome.value().isPresent() || outcome.hasErrors()).isTrue();
      return outcome.hasErrors() ? 0 : 1;
    } catch (Refusal refused) {
      assertThat(refused.findings()).isNotEmpty();
      return 0;
    } catch (RuntimeException fault) {
      return fail(name + " with seed " + seed, fault);
    }
  }

  private Outcome<?> workbook(Path file) {
    return all(WorkbookFile.open(file, "w"));
  }

  private Outcome<?> csv(Path file) {
    return all(CsvFile.open(file, "w", CsvLayout.FOUND_BY_ITSELF));
  }

  private static Outcome<SheetFile> all(Outcome<SheetFile> outcome) {
    outcome
        .value()
        .ifPresent(
            file -> {
              for (Sheet sheet : file.sheets()) {
                sheet.forEachRow(
                    row -> {
                      for (int column = 0; column < row.width(); column++) {
                        assertThat(row.text(column)).isNotNull();
                        assertThat(row.number(column)).isNotInfinite();
                      }
                      return true;
                    });
                assertThat(sheet.notes()).isNotNull();
              }
            });
    return outcome;
  }

  private static byte[] damaged(byte[] whole, Random random) {
    byte[] content = whole.clone();
    for (int k = random.nextInt(8); k >= 0; k--) {
      content[random.nextInt(content.length)] = (byte) random.nextInt(256);
    }
    return random.nextInt(5) == 0
        ? java.util.Arrays.copyOf(content, random.nextInt(content.length))
        : content;
  }

  private static byte[] edited(byte[] whole, Random random) {
    String text = new String(whole, StandardCharsets.UTF_8);
    for (int k = random.nextInt(4); k >= 0; k--) {
      int from = random.nextInt(text.length() + 1);
      int to = Math.min(text.length(), from + random.nextInt(8));
      text = text.substring(0, from) + PIECES[random.nextInt(PIECES.length)] + text.substring(to);
    }
    return text.getBytes(StandardCharsets.UTF_8);
  }

  private static byte[] damagedParts(byte[] whole, Random random) throws IOException {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    int chosen = random.nextInt(8);
    try (ZipInputStream in = new ZipInputStream(new ByteArrayInputStream(whole));
        ZipOutputStream out = new ZipOutputStream(bytes)) {
      int part = 0;
      for (ZipEntry entry = in.getNextEntry(); entry != null; entry = in.getNextEntry(), part++) {
        boolean sheet = entry.getName().contains("sheet");
        byte[] content = in.readAllBytes();
        if (part == chosen && random.nextInt(4) == 0) {
          continue;
        }
        out.putNextEntry(new ZipEntry(entry.getName()));
        out.write(part == chosen || (sheet && chosen > 5) ? edited(content, random) : content);
      }
    }
    return bytes.toByteArray();
  }

  private static byte[] bytes(Workbook workbook) throws IOException {
    try (workbook;
        ByteArrayOutputStream out = new ByteArrayOutputStream()) {
      CellStyle date = workbook.createCellStyle();
      date.setDataFormat(workbook.createDataFormat().getFormat("yyyy-mm-dd"));
      for (String name : new String[] {"Test", "Run 1"}) {
        org.apache.poi.ss.usermodel.Sheet sheet = workbook.createSheet(name);
        for (int r = 0; r < 12; r++) {
          org.apache.poi.ss.usermodel.Row row = sheet.createRow(r);
          row.createCell(0).setCellValue("text " + r);
          row.createCell(1).setCellValue(r * 1.5);
          row.getCell(2, MissingCellPolicy.CREATE_NULL_AS_BLANK).setCellValue(45000 + r);
          row.getCell(2).setCellStyle(date);
        }
      }
      workbook.write(out);
      return out.toByteArray();
    }
  }
}
