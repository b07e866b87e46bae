package org.flexbound.report;

import gg.jte.ContentType;
import gg.jte.TemplateEngine;
import gg.jte.TemplateOutput;
import gg.jte.output.StringOutput;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Map;
import org.flexbound.report.figures.XmlText;
import org.flexbound.report.page.ReportPage;

/**
 * Lays a report out as one HTML file that needs no network: style, script and figures stand in it.
 * It is well-formed XML as well, so that the PDF is made from the same template.
 */
final class ReportHtml {
  private ReportHtml() {}

  /** The web page. */
  static String page(ReportPage content) {
    return render(content, resource("report.css"), resource("report.js"), false);
  }

  /** The page for print: paged style, bookmarks, no script. */
  static String print(ReportPage content) {
    return render(content, resource("print.css"), "", true);
  }

  /** A certificate for print: everything smaller, so that it fits one page. */
  static String certificate(ReportPage content) {
    return render(content, resource("print.css") + resource("certificate.css"), "", true);
  }

  private static String render(ReportPage content, String style, String script, boolean print) {
    TemplateEngine engine =
        TemplateEngine.createPrecompiled(
            null, ContentType.Html, null, "org.flexbound.report.templates");
    TemplateOutput output = new StringOutput();
    engine.render(
        "report.jte",
        Map.of("page", content, "style", style, "script", script, "print", print),
        output);
    return XmlText.clean(output.toString());
  }

  private static String resource(String name) {
    try (InputStream stream = ReportHtml.class.getResourceAsStream("/report/" + name)) {
      if (stream == null) {
        throw new IllegalStateException("the program's file report/" + name + " is missing");
      }
      return new String(stream.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException unreadable) {
      throw new UncheckedIOException(unreadable);
    }
  }
}
