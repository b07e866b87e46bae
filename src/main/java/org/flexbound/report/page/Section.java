package org.flexbound.report.page;

import java.util.List;

/**
 * A section of a report.
 *
 * @param id its name in the page, of letters and hyphens
 * @param heading its heading
 * @param blocks what stands in it
 */
public record Section(String id, String heading, List<Block> blocks) {
  /** Copies the list. */
  public Section {
    blocks = List.copyOf(blocks);
  }
}
