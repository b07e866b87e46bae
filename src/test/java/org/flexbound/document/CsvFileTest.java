package org.flexbound.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.flexbound.finding.Finding;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Refusal;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CsvFileTest {
  @TempDir Path folder;

  private Sheet open(byte[] content, CsvLayout layout, ReadLimits limits) throws IOException {
    Path file = Files.write(folder.resolve("Protokoll 7.csv"), content);
    return CsvFile.open(file, "logs/Protokoll 7.csv", layout, limits).orRefuse().sheets().get(0);
  }

  private Sheet open(String content) throws IOException {
    return open(
        content.getBytes(StandardCharsets.UTF_8), CsvLayout.FOUND_BY_ITSELF, ReadLimits.USUAL);
  }

  private static List<String> rows(Sheet sheet) {
    List<String> all = new ArrayList<>();
    sheet.forEachRow(
        row -> {
          StringBuilder text = new StringBuilder().append(row.number()).append(':');
          for (int column = 0; column < row.width(); column++) {
            text.append(' ')
                .append(row.kind(column).name().charAt(0))
                .append('<')
                .append(row.text(column))
                .append('>');
          }
          all.add(text.toString());
          return true;
        });
    return all;
  }

  @Test
  void semicolonsAndDecimalCommasAreFoundBelowPreambleLines() throws IOException {
    Sheet sheet =
        open(
            "Messrechner 3\r\nKanal;Wert\r\n\r\nKraft;Weg 1;Bemerkung\r\n[kN];[mm];\r\n"
                + "0,5;-1,25;\r\n 1,0 ;;\"mit; Zeichen \"\"x\"\"\"\r\n;;\r\n2;3e-2;ende");
    assertThat(sheet.name()).isEqualTo("Protokoll 7");
    assertThat(rows(sheet))
        .containsExactly(
            "1: T<Messrechner 3>",
            "2: T<Kanal> T<Wert>",
            "4: T<Kraft> T<Weg 1> T<Bemerkung>",
            "5: T<[kN]> T<[mm]>",
            "6: N<0.5> N<-1.25>",
            "7: N<1> B<> T<mit; Zeichen \"x\">",
            "9: N<2> N<0.03> T<ende>");
    List<String> places = new ArrayList<>();
    sheet.forEachRow(
        row -> {
          places.add(row.where(1).toString());
          return row.number() < 2;
        });
    assertThat(places)
        .containsExactly(
            "logs/Protokoll 7.csv, cell B1, line 1", "logs/Protokoll 7.csv, cell B2, line 2");
  }

  @Test
  void whatWasFoundOutIsAFinding() throws IOException {
    Path file =
        Files.write(
            folder.resolve("a.csv"), "Größe;b\n1,5;2,5\n".getBytes(Charset.forName("windows-1252")));
    Outcome<SheetFile> outcome = CsvFile.open(file, "a.csv", CsvLayout.FOUND_BY_ITSELF);
    assertThat(outcome.findings())
        .extracting(Finding::message)
        .containsExactly("read with separator ';', decimal comma, encoding windows-1252");
    assertThat(rows(outcome.orRefuse().sheets().get(0)))
        .containsExactly("1: T<Größe> T<b>", "2: N<1.5> N<2.5>");
    CsvLayout stated =
        new CsvLayout(
            Optional.of(';'), Optional.of(','), Optional.of(Charset.forName("windows-1252")));
    assertThat(CsvFile.open(file, "a.csv", stated).findings()).isEmpty();
  }

  @Test
  void commasTabsBarsAndTheSepLineAreFound() throws IOException {
    assertThat(rows(open("P,D\n1.5,2\n"))).containsExactly("1: T<P> T<D>", "2: N<1.5> N<2>");
    assertThat(rows(open("P\tD\n1,5\t2\n"))).containsExactly("1: T<P> T<D>", "2: N<1.5> N<2>");
    assertThat(rows(open("P|D\n1.5|2\n"))).containsExactly("1: T<P> T<D>", "2: N<1.5> N<2>");
    assertThat(rows(open("sep=;\nP;D\n1;2\n"))).containsExactly("2: T<P> T<D>", "3: N<1> N<2>");
  }

  @Test
  void thousandsSeparatorsAreLeftAsTextNotGuessedAt() throws IOException {
    assertThat(rows(open("a;b\n1.234,5;1,5\n0.5;1,000\n")))
        .containsExactly("1: T<a> T<b>", "2: T<1.234,5> T<1,5>", "3: N<0.5> T<1,000>");
  }

  @Test
  void wideEncodingsAndOldLineEndsAreRead() throws IOException {
    for (Charset charset : List.of(StandardCharsets.UTF_16LE, StandardCharsets.UTF_16BE)) {
      byte[] content = "\uFEFFµ;b\n1;2\n".getBytes(charset);
      assertThat(rows(open(content, CsvLayout.FOUND_BY_ITSELF, ReadLimits.USUAL)))
          .containsExactly("1: T<µ> T<b>", "2: N<1> N<2>");
    }
    assertThat(rows(open("\uFEFFa;b\r1;2\r"))).containsExactly("1: T<a> T<b>", "2: N<1> N<2>");
  }

  @Test
  void quotedRecordsMaySpanLinesAndTheNumberingHolds() throws IOException {
    assertThat(rows(open("a;b\n\"two\nlines\";\"1,5\"\n3;4\n")))
        .containsExactly("1: T<a> T<b>", "2: T<two\nlines> N<1.5>", "4: N<3> N<4>");
  }

  @Test
  void aQuoteNeverClosedIsRefusedWithItsLine() throws IOException {
    Sheet sheet = open("a;b\n1;2\n\"oops;3\n4;5\n");
    assertThatThrownBy(() -> sheet.forEachRow(row -> true))
        .isInstanceOf(Refusal.class)
        .hasMessageContaining(
            "logs/Protokoll 7.csv, line 3: a quote that begins in this line is never closed");
    Sheet mixed = open("a;b\n\"1\"2;3\n");
    assertThatThrownBy(() -> mixed.forEachRow(row -> true))
        .isInstanceOf(Refusal.class)
        .hasMessageContaining("line 2: found text right after a closing quote");
  }

  @Test
  void limitsAreNamed() throws IOException {
    for (String name : List.of("rows", "cells", "inflated-bytes")) {
      Sheet sheet =
          open(
              "1;2\n3;4\n".getBytes(StandardCharsets.UTF_8),
              CsvLayout.FOUND_BY_ITSELF,
              ReadLimits.USUAL.with(name, 1).orElseThrow());
      assertThatThrownBy(() -> sheet.forEachRow(row -> true))
          .isInstanceOf(Refusal.class)
          .hasMessageContaining("limit '" + name + "' = 1 ");
    }
    String endless = "x".repeat(3_000_000);
    Sheet sheet = open(endless);
    assertThatThrownBy(() -> sheet.forEachRow(row -> true))
        .isInstanceOf(Refusal.class)
        .hasMessageContaining("limit 'text-length' = 1000000 ");
  }

  @Test
  void aWorkbookNamedCsvIsRefused() throws IOException {
    Path file = Files.write(folder.resolve("a.csv"), new byte[] {'P', 'K', 3, 4, 0});
    assertThat(CsvFile.open(file, "a.csv", CsvLayout.FOUND_BY_ITSELF).findings())
        .extracting(Finding::message)
        .containsExactly(
            "found a zip archive; expected a text file of separated values (.csv). If it is a"
                + " workbook, give it its own ending (.xlsx)");
  }

  @Test
  void rowsAreTheSameWhereverTheBufferEnds() throws IOException {
    Random random = new Random(7);
    StringBuilder text = new StringBuilder("a;b;c\n");
    List<String> expected = new ArrayList<>();
    for (int i = 0; i < 40_000; i++) {
      double value = Math.scalb(random.nextDouble() - 0.5, random.nextInt(60) - 30);
      String remark = i % 7 == 0 ? "\"r;" + i + "\"" : "r" + i;
      text.append(value).append(';').append(i).append(';').append(remark).append('\n');
      expected.add(value + " " + i + " " + remark.replace("\"", ""));
    }
    List<String> read = new ArrayList<>();
    open(text.toString())
        .forEachRow(
            row -> {
              if (row.number() > 1) {
                read.add(row.number(0) + " " + row.text(1) + " " + row.text(2));
              }
              return true;
            });
    assertThat(read).isEqualTo(expected);
  }
}
