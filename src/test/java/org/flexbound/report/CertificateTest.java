package org.flexbound.report;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.util.function.UnaryOperator;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.text.PDFTextStripper;
import org.flexbound.report.page.CertificateMaker;
import org.flexbound.report.results.Results;
import org.junit.jupiter.api.Test;

class CertificateTest {
  private static String text(Results results) throws IOException {
    byte[] bytes = ReportPdf.certificate(CertificateMaker.make(results));
    try (PDDocument pdf = Loader.loadPDF(bytes)) {
      assertThat(pdf.getNumberOfPages()).isEqualTo(1);
      return new PDFTextStripper().getText(pdf);
    }
  }

  @Test
  void aCertificateIsOnePageThatNamesLimitsInstrumentsRuleAndCautions() throws IOException {
    assertThat(text(InventedResults.small()))
        .contains("stiff enough", "cert 1", "JCGM 106:2012", "no proof of strength", "Released by")
        .contains("2 more runs would settle it");
  }

  @Test
  void manyLimitsStillMakeOnePageWithTheGravestOnIt() throws IOException {
    assertThat(text(InventedResults.limited(UnaryOperator.identity(), 9)))
        .contains("13 more limits stand in the report")
        .contains("fail");
  }

  @Test
  void hostileNamesStillMakeOnePage() throws IOException {
    assertThat(text(InventedResults.limited(ReportOutputsTest.HOSTILE::concat, 9))).contains("Cautions");
  }
}
