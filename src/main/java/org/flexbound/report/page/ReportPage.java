package org.flexbound.report.page;

import java.util.List;

/**
 * A whole report.
 *
 * @param title the title
 * @param subtitle what was tested, when
 * @param program the program and its version
 * @param sections the sections in order
 */
public record ReportPage(
    String title, String subtitle, String program, List<Section> sections) {
  /** Copies the list. */
  public ReportPage {
    sections = List.copyOf(sections);
  }
}
