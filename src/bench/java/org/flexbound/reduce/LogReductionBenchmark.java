package org.flexbound.reduce;

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
import org.flexbound.testlog.LogFile;
import org.xml.sax.helpers.DefaultHandler;

/**
 * Times the way from a long log to its reduced readings (a time column, a load, 22 gauges; three load
 * cycles of held steps), beside the baselines in the same run: the JDK's SAX parser with an empty
 * handler for .xlsx, {@code split} and {@code parseDouble} for .csv. Best of five, in turn; prints a
 * Markdown table with the goals.
 *
 * <p>Arguments: {@code [xlsx rows] [csv rows]}, 200 000 and 1 000 000 where not given; 0 leaves one
 * out. Run it with {@code -Xmx256m}: it must do with that.
 */
public final class LogReductionBenchmark {
  private static final int GAUGES = 22;
  private static final int REPEATS = 5;
  private static final int STEPS = 60;

  private LogReductionBenchmark() {}

  /** Something that works on a file and gives a number that depends on all of it. */
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
    Path folder = Files.createTempDirectory("reducing");
    try {
      System.out.println(
          "Heap at most " + (Runtime.getRuntime().maxMemory() >> 20) + " MB; seconds, best of " + REPEATS);
      System.out.println();
      System.out.println("| file, to reduced readings | this program | baseline | ratio | goal |");
      System.out.println("| --- | --- | --- | --- | --- |");
      if (xlsxRows > 0) {
        Path xlsx = folder.resolve("log.xlsx");
        writeXlsx(xlsx, xlsxRows);
        describe(folder, "log.xlsx");
        compare(xlsxRows + " × 24 .xlsx", xlsx, LogReductionBenchmark::sax, 1.5);
        Files.delete(xlsx);
      }
      if (csvRows > 0) {
        Path csv = folder.resolve("log.csv");
        writeCsv(csv, csvRows);
        describe(folder, "log.csv");
        compare(csvRows + " × 24 .csv", csv, LogReductionBenchmark::split, 1.0);
      }
    } finally {
      for (String name : new String[] {"log.xlsx", "log.csv", "log.json"}) {
        Files.deleteIfExists(folder.resolve(name));
      }
      Files.delete(folder);
    }
  }

  private static void describe(Path folder, String file) throws IOException {
    StringBuilder text = new StringBuilder();
    text.append("{\"loadPoints\": [{\"load\": \"P\", \"node\": \"n\", \"direction\": \"-z\",")
        .append(" \"column\": \"Force\", \"unit\": \"kN\"}], \"gauges\": [");
    for (int gauge = 1; gauge <= GAUGES; gauge++) {
      text.append(gauge == 1 ? "" : ", ")
          .append("{\"gauge\": \"g" + gauge + "\", \"node\": \"n" + gauge + "\", \"direction\": \"-z\",")
          .append(" \"column\": \"D" + gauge + "\", \"unit\": \"mm\"}");
    }
    text.append("], \"readings\": [{\"file\": \"" + file + "\"}]}");
    Files.writeString(folder.resolve("log.json"), text);
  }

  private static double reduced(Path file) {
    Path description = file.resolveSibling("log.json");
    Reduction reduction =
        Reducer.reduce(
                new ReductionProblem(
                    "as tested", LogFile.read(description, "log.json").orRefuse(), Places.STATED))
            .orRefuse();
    double sum = 0;
    for (double value : reduction.flexibility().values()) {
      sum += value;
    }
    return sum;
  }

  private static void compare(String name, Path file, Work baseline, double goal)
      throws Exception {
    double best = Double.POSITIVE_INFINITY;
    double bestBaseline = Double.POSITIVE_INFINITY;
    double sum = 0;
    for (int i = 0; i <= REPEATS; i++) {
      long start = System.nanoTime();
      sum = reduced(file);
      long between = System.nanoTime();
      baseline.sum(file);
      long end = System.nanoTime();
      if (i > 0) {
        best = Math.min(best, (between - start) * 1e-9);
        bestBaseline = Math.min(bestBaseline, (end - between) * 1e-9);
      }
    }
    // gauge g was given g µm/kN and some noise
    double expected = 1e-9 * GAUGES * (GAUGES + 1) / 2;
    if (!(Math.abs(sum / expected - 1) < 1e-3)) {
      throw new IllegalStateException("found " + sum + " for the sum of the slopes, not " + expected);
    }
    System.out.printf(
        Locale.ROOT, "| %s | %.2f | %.2f | %.2f | %.1f |%n", name, best, bestBaseline, best / bestBaseline, goal);
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

  /** The load of a row, kN: three cycles of ten steps up and ten down, each held. */
  private static double load(int row, int rows) {
    int step = (int) ((long) row * STEPS / rows) % 20;
    return step <= 10 ? step : 20 - step;
  }

  /** The numbers of a row as texts: time, load, gauges. */
  private static String[] row(int row, int rows, Random random) {
    String[] texts = new String[GAUGES + 2];
    texts[0] = Integer.toString(row / 10) + "." + row % 10;
    double load = load(row, rows) + 0.002 * random.nextDouble();
    texts[1] = thousandths(load);
    for (int gauge = 1; gauge <= GAUGES; gauge++) {
      texts[gauge + 1] = thousandths(11 + 1e-3 * gauge * load + 1e-4 * random.nextDouble());
    }
    return texts;
  }

  private static String thousandths(double value) {
    long units = Math.round(value * 1e5);
    String digits = Long.toString(Math.abs(units));
    String padded = digits.length() < 6 ? "000000".substring(digits.length()) + digits : digits;
    int point = padded.length() - 5;
    return (units < 0 ? "-" : "") + padded.substring(0, point) + "." + padded.substring(point);
  }

  private static void writeCsv(Path file, int rows) throws IOException {
    Random random = new Random(1);
    try (BufferedWriter out = Files.newBufferedWriter(file)) {
      out.write("Time,Force");
      for (int gauge = 1; gauge <= GAUGES; gauge++) {
        out.write(",D" + gauge);
      }
      out.write("\n");
      for (int row = 0; row < rows; row++) {
        out.write(String.join(",", row(row, rows, random)));
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
      StringBuilder text = new StringBuilder(head + "<worksheet xmlns=\"" + main + "\"><sheetData><row r=\"1\">");
      for (int column = 0; column < GAUGES + 2; column++) {
        text.append("<c r=\"").append((char) ('A' + column)).append("1\" t=\"inlineStr\"><is><t>")
            .append(column == 0 ? "Time" : column == 1 ? "Force" : "D" + (column - 1))
            .append("</t></is></c>");
      }
      zip.write(text.append("</row>").toString().getBytes(StandardCharsets.UTF_8));
      for (int row = 0; row < rows; row++) {
        String[] values = row(row, rows, random);
        text.setLength(0);
        text.append("<row r=\"").append(row + 2).append("\">");
        for (int column = 0; column < values.length; column++) {
          text.append("<c r=\"").append((char) ('A' + column)).append(row + 2).append("\"><v>")
              .append(values[column]).append("</v></c>");
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
