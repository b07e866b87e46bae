package org.flexbound.report;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayInputStream;
import java.io.StringReader;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import javax.xml.parsers.DocumentBuilder;
import javax.xml.parsers.DocumentBuilderFactory;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.interactive.documentnavigation.outline.PDOutlineItem;
import org.apache.pdfbox.text.PDFTextStripper;
import org.apache.poi.ss.usermodel.Cell;
import org.apache.poi.ss.usermodel.CellType;
import org.apache.poi.ss.usermodel.Row;
import org.apache.poi.ss.usermodel.Sheet;
import org.apache.poi.xssf.usermodel.XSSFSheet;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;
import org.flexbound.report.page.ReportMaker;
import org.flexbound.report.page.ReportPage;
import org.flexbound.report.results.Results;
import org.flexbound.report.workbook.ResultsWorkbook;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;
import org.xml.sax.InputSource;

/** The web page, the PDF and the workbook. */
class ReportOutputsTest {
  static final String HOSTILE =
      "=1+1 <script>alert(1)</script> \"q\" 'a' & \n \u202Eabc\u202C שלום 梁 \u0001 ]]> ";

  private static ReportPage small;
  private static ReportPage hostile;
  private static String smallHtml;

  private static Results hostileResults() {
    return InventedResults.named(text -> HOSTILE + text);
  }

  @BeforeAll
  static void draw() {
    small = ReportMaker.make(InventedResults.small(), UnitSystem.MM_KN);
    hostile = ReportMaker.make(hostileResults(), UnitSystem.MM_KN);
    smallHtml = ReportHtml.page(small);
  }

  private static Document parse(String html) throws Exception {
    DocumentBuilder builder = DocumentBuilderFactory.newInstance().newDocumentBuilder();
    builder.setEntityResolver((publicId, systemId) -> new InputSource(new StringReader("")));
    builder.setErrorHandler(null);
    return builder.parse(new InputSource(new StringReader(html)));
  }

  private static List<Element> elements(Document document, String name) {
    NodeList nodes = document.getElementsByTagName(name);
    List<Element> result = new ArrayList<>();
    for (int k = 0; k < nodes.getLength(); k++) {
      result.add((Element) nodes.item(k));
    }
    return result;
  }

  @Test
  void namesComeOutAsTextInTheWebPageWhateverTheyHold() throws Exception {
    String html = ReportHtml.page(hostile);
    assertThat(html).doesNotContain("<script>alert").doesNotContain("\u0001");
    // The page is parsed without its own style and script, which need not be XML.
    String body = html.replaceAll("(?s)<(style|script)>.*?</\\1>", "");
    Document document = parse(body);
    assertThat(elements(document, "script")).isEmpty();
    assertThat(elements(document, "h1").get(0).getTextContent())
        .contains("<script>alert(1)</script>")
        .contains("שלום 梁")
        .contains("Bracket study (invented)");
  }

  @Test
  void noRequestLeavesThePage() {
    String html = smallHtml;
    Matcher matcher =
        Pattern.compile("(?:src|href|url|action|data)\\s*[=(]\\s*[\"']?([^\"')\\s>]+)").matcher(html);
    List<String> outside = new ArrayList<>();
    while (matcher.find()) {
      String target = matcher.group(1);
      if (!target.startsWith("#")) {
        outside.add(target);
      }
    }
    assertThat(outside).isEmpty();
    assertThat(html).doesNotContain("@import").doesNotContain("fetch(").doesNotContain("<link");
  }

  @Test
  void everyFigureHasATextForThoseWhoDoNotSeeItAndIdsOfItsOwn() throws Exception {
    String html = smallHtml;
    Document document = parse(html.replaceAll("(?s)<(style|script)>.*?</\\1>", ""));
    List<Element> graphics = elements(document, "svg");
    assertThat(graphics).hasSizeGreaterThan(10);
    for (Element svg : graphics) {
      assertThat(svg.getAttribute("role")).isEqualTo("img");
      assertThat(svg.getElementsByTagName("title").item(0).getTextContent()).isNotBlank();
      assertThat(svg.getElementsByTagName("desc").item(0).getTextContent()).isNotBlank();
    }
    Matcher ids = Pattern.compile("\\sid=\"([^\"]+)\"").matcher(html);
    List<String> all = new ArrayList<>();
    while (ids.find()) {
      all.add(ids.group(1));
    }
    assertThat(all).doesNotHaveDuplicates();
  }

  @Test
  void aPointOfACurveNamesItsReadingItsCellAndItsResidual() {
    assertThat(smallHtml)
        .containsPattern(
            "<title>R00, loading\\s+load [0-9.]+ kN\\s+motion [0-9.−e-]+ mm\\s+residual"
                + " [0-9.−e-]+ mm\\s+log.xlsx, sheet R00, cell C2</title>");
  }

  @Test
  void thePdfHasTitleLanguageBookmarksAndItsText() throws Exception {
    try (PDDocument pdf = Loader.loadPDF(ReportPdf.bytes(small))) {
      assertThat(pdf.getDocumentInformation().getTitle()).isEqualTo("Bracket study (invented)");
      assertThat(pdf.getDocumentCatalog().getLanguage()).isEqualTo("en");
      List<String> bookmarks = new ArrayList<>();
      for (PDOutlineItem item : pdf.getDocumentCatalog().getDocumentOutline().children()) {
        bookmarks.add(item.getTitle());
      }
      assertThat(bookmarks).startsWith(
              "The answer", "Change since the earlier test", "Limits and decisions", "Findings").contains("Cautions");
      String text = new PDFTextStripper().getText(pdf);
      assertThat(text).contains("What remains unknown?", "kN·m/rad", "Signature", "ν");
    }
  }

  @Test
  void hostileNamesDoNotBreakThePdf() throws Exception {
    try (PDDocument pdf = Loader.loadPDF(ReportPdf.bytes(hostile))) {
      String text = new PDFTextStripper().getText(pdf);
      assertThat(text).contains("<script>alert(1)</script>").contains("שלום").contains("[U+6881]");
      assertThat(pdf.getDocumentCatalog().getNames()).isNull();
    }
  }

  @Test
  void theWorkbookHoldsNumbersAsNumbersAndNamesAsTexts() throws Exception {
    byte[] bytes = ResultsWorkbook.bytes(hostileResults(), UnitSystem.MM_KN);
    try (XSSFWorkbook workbook = new XSSFWorkbook(new ByteArrayInputStream(bytes))) {
      for (Sheet sheet : workbook) {
        for (Row row : sheet) {
          for (Cell cell : row) {
            assertThat(cell.getCellType()).isNotEqualTo(CellType.FORMULA);
          }
        }
      }
      XSSFSheet sheet = workbook.getSheet("Coefficients");
      assertThat(sheet.getPaneInformation().isFreezePane()).isTrue();
      assertThat(sheet.getRow(1).getCell(1).getStringCellValue()).startsWith("=1+1 <script>");
      assertThat(sheet.getRow(1).getCell(1).getCellStyle().getQuotePrefixed()).isTrue();
      assertThat(sheet.getRow(1).getCell(3).getCellType()).isEqualTo(CellType.NUMERIC);
      assertThat(workbook.getName("coefficients")).isNotNull();
    }
  }

  @Test
  void theWorkbookHasItsSheetsAndAChartForEachGaugeAndLoad() throws Exception {
    byte[] bytes = ResultsWorkbook.bytes(InventedResults.small(), UnitSystem.SI);
    try (XSSFWorkbook workbook = new XSSFWorkbook(new ByteArrayInputStream(bytes))) {
      List<String> names = new ArrayList<>();
      workbook.forEach(sheet -> names.add(sheet.getSheetName()));
      assertThat(names)
          .containsExactly(
              "Runs", "Coefficients", "Covariance", "Reciprocity", "Matrix checks", "Limits", "Fixture",
              "Changes", "Comparison", "Parameters", "Update", "Combinations", "Without each case",
              "Influence", "Trade-off", "Configurations", "Gains", "Held out",
              "Findings", "Readings used", "Charts", "Left out");
      assertThat(workbook.getSheet("Charts").getDrawingPatriarch().getCharts()).hasSize(15);
      double value = InventedResults.small().coefficients().get(0).value();
      assertThat(workbook.getSheet("Coefficients").getRow(1).getCell(3).getNumericCellValue())
          .isEqualTo(value);
    }
  }
}
