package org.flexbound.document;

import java.io.BufferedReader;
import java.io.BufferedWriter;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.Random;
import java.util.zip.ZipEntry;
import java.util.zip.ZipFile;
import java.util.zip.ZipOutputStream;
import javax.xml.parsers.SAXParserFactory;
import org.xml.sax.helpers.DefaultHandler;

/**
 * Times the reading of a long workbook and a long CSV file, every number summed, beside the
 * baselines in the same run: the JDK's SAX parser with an empty handler for .xlsx, {@code split} and
 * {@code parseDouble} for .csv. Best of five, in turn; prints a Markdown table with the goals.
 *
 * <p>Arguments: {@code [xlsx rows] [csv rows]}, 200 000 and 1 000 000 where not given; 24 columns.
 * Run it with {@code -Xmx256m}: it must do with that.
 */
public final class ReadingBenchmark {
  private static final int COLUMNS = 24;
  private static final int REPEATS = 5;

  private ReadingBenchmark() {}

  /** Something that reads a file and gives the sum of its numbers. */
  private interface Work {
    double sum(Path file) throws Exception;
  }

  /**
   * Runs the benchmark.
   *
   * @param arguments rows of the workbook and of the CSV file
   */
  public static void main(String[] arguments) throws Exception {
    int xlsxRows = arguments.length > 0 ? Integer.parseInt(arguments[0]) : 200_000;
    int csvRows = arguments.length > 1 ? Integer.parseInt(arguments[1]) : 1_000_000;
    Path folder = Files.createTempDirectory("reading");
    Path xlsx = folder.resolve("log.xlsx");
    Path csv = folder.resolve("log.csv");
    try {
      System.out.println(
          "Heap at most " + (Runtime.getRuntime().maxMemory() >> 20) + " MB; seconds, best of " + REPEATS);
      System.out.println();
      System.out.println("| file | this program | baseline | ratio | goal |");
      System.out.println("| --- | --- | --- | --- | --- |");
      writeXlsx(xlsx, xlsxRows);
      compare(xlsxRows + " × 24 .xlsx", xlsx, ReadingBenchmark::workbook, ReadingBenchmark::sax, 1.5);
      Files.delete(xlsx);
      writeCsv(csv, csvRows);
      compare(csvRows + " × 24 .csv", csv, ReadingBenchmark::csv, ReadingBenchmark::split, 1.0);
    } finally {
      Files.deleteIfExists(xlsx);
      Files.deleteIfExists(csv);
      Files.delete(folder);
    }
  }

  private static void compare(String name, Path file, Work ours, Work baseline, double goal)
      throws Exception {
    double best = Double.POSITIVE_INFINITY;
    double bestBaseline = Double.POSITIVE_INFINITY;
    double sum = 0;
    double other = 0;
    for (int i = 0; i <= REPEATS; i++) {
      long start = System.nanoTime();
      sum = ours.sum(file);
      long between = System.nanoTime();
      other = baseline.sum(file);
      long end = System.nanoTime();
      if (i > 0) {
        best = Math.min(best, (between - start) * 1e-9);
        bestBaseline = Math.min(bestBaseline, (end - between) * 1e-9);
      }
    }
    if (other != 0 && sum != other) {
      throw new IllegalStateException("sums differ: " + sum + " and " + other);
    }
    System.out.printf(
        Locale.ROOT, "| %s | %.2f | %.2f | %.2f | %.1f |%n", name, best, bestBaseline, best / bestBaseline, goal);
  }

  private static double sum(SheetFile file) {
    double[] sum = {0};
    file.sheets().get(0)
        .forEachRow(
            row -> {
              for (int column = 0; column < row.width(); column++) {
                if (row.kind(column) == CellKind.NUMBER) {
                  sum[0] += row.number(column);
                }
              }
              return true;
            });
    return sum[0];
  }

  private static double workbook(Path file) {
    return sum(WorkbookFile.open(file, "log.xlsx").orRefuse());
  }

  private static double csv(Path file) {
    return sum(CsvFile.open(file, "log.csv", CsvLayout.FOUND_BY_ITSELF).orRefuse());
  }

  private static double sax(Path file) throws Exception {
    try (ZipFile zip = new ZipFile(file.toFile());
        InputStream in = zip.getInputStream(zip.getEntry("xl/worksheets/sheet1.xml"))) {
      SAXParserFactory.newDefaultInstance().newSAXParser().parse(in, new DefaultHandler());
    }
    return 0;
  }

  private static double split(Path file) throws IOException {
    double sum = 0;
    try (BufferedReader reader = Files.newBufferedReader(file)) {
      reader.readLine();
      for (String line = reader.readLine(); line != null; line = reader.readLine()) {
        for (String field : line.split(",", -1)) {
          sum += Double.parseDouble(field);
        }
      }
    }
    return sum;
  }

  private static String value(Random random) {
    return String.format(Locale.ROOT, "%.5f", random.nextGaussian() * 10);
  }

  private static void writeCsv(Path file, int rows) throws IOException {
    Random random = new Random(1);
    String[] values = new String[10_007];
    for (int i = 0; i < values.length; i++) {
      values[i] = value(random);
    }
    try (BufferedWriter out = Files.newBufferedWriter(file)) {
      out.write("c1");
      for (int column = 2; column <= COLUMNS; column++) {
        out.write(",c" + column);
      }
      out.write("\n");
      for (int row = 0, next = 0; row < rows; row++) {
        for (int column = 0; column < COLUMNS; column++, next++) {
          out.write(column == 0 ? "" : ",");
          out.write(values[next % values.length]);
        }
        out.write("\n");
      }
    }
  }

  private static void writeXlsx(Path file, int rows) throws IOException {
    Random random = new Random(2);
    try (OutputStream raw = Files.newOutputStream(file);
        ZipOutputStream zip = new ZipOutputStream(raw)) {
      String head = "<?xml version=\"1.0\" encoding=\"UTF-8\"?>";
      String main = "http://schemas.openxmlformats.org/spreadsheetml/2006/main";
      String rel = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";
      String packageRel = "http://schemas.openxmlformats.org/package/2006/relationships";
      String type = "application/vnd.openxmlformats-officedocument.spreadsheetml.";
      part(zip, "[Content_Types].xml", head
          + "<Types xmlns=\"http://schemas.openxmlformats.org/package/2006/content-types\">"
          + "<Default Extension=\"rels\" ContentType=\"application/vnd.openxmlformats-package.relationships+xml\"/>"
          + "<Override PartName=\"/xl/workbook.xml\" ContentType=\"" + type + "sheet.main+xml\"/>"
          + "<Override PartName=\"/xl/worksheets/sheet1.xml\" ContentType=\"" + type + "worksheet+xml\"/></Types>");
      part(zip, "_rels/.rels", head + "<Relationships xmlns=\"" + packageRel + "\"><Relationship Id=\"r1\" Type=\""
          + rel + "/officeDocument\" Target=\"xl/workbook.xml\"/></Relationships>");
      part(zip, "xl/workbook.xml", head + "<workbook xmlns=\"" + main + "\" xmlns:r=\"" + rel
          + "\"><sheets><sheet name=\"Log\" sheetId=\"1\" r:id=\"r1\"/></sheets></workbook>");
      part(zip, "xl/_rels/workbook.xml.rels", head + "<Relationships xmlns=\"" + packageRel
          + "\"><Relationship Id=\"r1\" Type=\"" + rel
          + "/worksheet\" Target=\"worksheets/sheet1.xml\"/></Relationships>");
      zip.putNextEntry(new ZipEntry("xl/worksheets/sheet1.xml"));
      zip.write((head + "<worksheet xmlns=\"" + main + "\"><sheetData>").getBytes(StandardCharsets.UTF_8));
      for (int row = 1; row <= rows; row++) {
        StringBuilder text = new StringBuilder("<row r=\"").append(row).append("\">");
        for (int column = 0; column < COLUMNS; column++) {
          text.append("<c r=\"").append((char) ('A' + column)).append(row).append("\"><v>")
              .append(value(random)).append("</v></c>");
        }
        zip.write(text.append("</row>").toString().getBytes(StandardCharsets.UTF_8));
      }
      zip.write("</sheetData></worksheet>".getBytes(StandardCharsets.UTF_8));
    }
  }

  private static void part(ZipOutputStream zip, String name, String content) throws IOException {
    zip.putNextEntry(new ZipEntry(name));
    zip.write(content.getBytes(StandardCharsets.UTF_8));
  }
}
