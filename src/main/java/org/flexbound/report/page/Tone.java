package org.flexbound.report.page;

/** How something is to be taken; always said in words as well, never by colour alone. */
public enum Tone {
  /** Neither. */
  PLAIN("plain"),
  /** In order. */
  GOOD("good"),
  /** To be looked at. */
  WARN("warn"),
  /** Not in order. */
  BAD("bad");

  private final String style;

  Tone(String style) {
    this.style = style;
  }

  /**
   * The name of its style.
   *
   * @return a word for the style sheet
   */
  public String style() {
    return style;
  }
}
