package org.flexbound.report;

import com.openhtmltopdf.bidi.support.ICUBidiReorderer;
import com.openhtmltopdf.bidi.support.ICUBidiSplitter;
import com.openhtmltopdf.extend.FSSupplier;
import com.openhtmltopdf.outputdevice.helper.BaseRendererBuilder.FontStyle;
import com.openhtmltopdf.outputdevice.helper.BaseRendererBuilder.TextDirection;
import com.openhtmltopdf.pdfboxout.PdfBoxRenderer;
import com.openhtmltopdf.pdfboxout.PdfRendererBuilder;
import com.openhtmltopdf.svgsupport.BatikSVGDrawer;
import com.openhtmltopdf.util.XRLog;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Objects;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.PDDocumentInformation;
import org.flexbound.report.page.ReportPage;

/** Lays a report out as a PDF with title, language and bookmarks, all fonts in it. */
final class ReportPdf {
  private static final String FONTS = "/net/sf/jasperreports/fonts/dejavu/";

  private ReportPdf() {}

  static byte[] bytes(ReportPage content) {
    return bytes(content, ReportHtml.print(content));
  }

  static byte[] certificate(ReportPage content) {
    return bytes(content, ReportHtml.certificate(content));
  }

  private static byte[] bytes(ReportPage content, String html) {
    XRLog.setLoggingEnabled(false);
    PdfRendererBuilder builder = new PdfRendererBuilder();
    builder.useFastMode();
    builder.withHtmlContent(printable(html), null);
    builder.useUnicodeBidiSplitter(new ICUBidiSplitter.ICUBidiSplitterFactory());
    builder.useUnicodeBidiReorderer(new ICUBidiReorderer());
    builder.defaultTextDirection(TextDirection.LTR);
    builder.useSVGDrawer(new BatikSVGDrawer());
    font(builder, "DejaVuSansCondensed.ttf", "DejaVu Sans Condensed", 400, FontStyle.NORMAL);
    font(builder, "DejaVuSansCondensed-Bold.ttf", "DejaVu Sans Condensed", 700, FontStyle.NORMAL);
    font(
        builder, "DejaVuSansCondensed-Oblique.ttf", "DejaVu Sans Condensed", 400, FontStyle.ITALIC);
    font(builder, "DejaVuSansMono.ttf", "DejaVu Sans Mono", 400, FontStyle.NORMAL);
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    builder.toStream(bytes);
    try (PdfBoxRenderer renderer = builder.buildPdfRenderer()) {
      renderer.layout();
      renderer.createPDFWithoutClosing();
      PDDocument document = renderer.getPdfDocument();
      describe(document, content);
      document.save(bytes);
    } catch (IOException impossible) {
      throw new UncheckedIOException("the PDF could not be put together", impossible);
    }
    return bytes.toByteArray();
  }

  private static String printable(String html) {
    try {
      return PrintGlyphs.of(file("DejaVuSansCondensed.ttf")).printable(html);
    } catch (IOException unreadable) {
      throw new UncheckedIOException("the print's font cannot be read", unreadable);
    }
  }

  private static InputStream file(String name) {
    return Objects.requireNonNull(ReportPdf.class.getResourceAsStream(FONTS + name));
  }

  private static void describe(PDDocument document, ReportPage content) {
    document.getDocumentCatalog().setLanguage("en");
    PDDocumentInformation information = new PDDocumentInformation();
    information.setTitle(content.title());
    information.setSubject(content.subtitle());
    information.setCreator(content.program());
    information.setProducer(content.program());
    document.setDocumentInformation(information);
  }

  private static void font(
      PdfRendererBuilder builder, String file, String family, int weight, FontStyle style) {
    FSSupplier<InputStream> supplier = () -> file(file);
    builder.useFont(supplier, family, weight, style, true);
  }
}
