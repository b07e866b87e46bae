package org.flexbound.report;

import java.io.IOException;
import java.io.InputStream;
import java.util.Locale;
import org.apache.fontbox.ttf.CmapLookup;
import org.apache.fontbox.ttf.TTFParser;
import org.apache.fontbox.ttf.TrueTypeFont;
import org.apache.pdfbox.io.RandomAccessReadBuffer;

/**
 * Says which characters the font of the print has. A character it lacks (Chinese, Japanese and Korean signs, most pictographs) would come out
 * as an empty mark that hides which name was meant; it is printed as its code point instead, {@code [U+6881]}.
 */
final class PrintGlyphs {
  private final CmapLookup glyphs;

  private PrintGlyphs(CmapLookup glyphs) {
    this.glyphs = glyphs;
  }

  /**
   * Reads which characters a font has.
   *
   * @param font the bytes of a TrueType font; closed here
   * @throws IOException when the font cannot be read
   */
  static PrintGlyphs of(InputStream font) throws IOException {
    try (InputStream stream = font;
        TrueTypeFont read = new TTFParser(true).parse(new RandomAccessReadBuffer(stream))) {
      return new PrintGlyphs(read.getUnicodeCmapLookup());
    }
  }

  /**
   * Text that the font can show.
   *
   * @param text any text, markup included
   * @return the text with each character that has no glyph as {@code [U+xxxx]}
   */
  String printable(String text) {
    StringBuilder result = new StringBuilder(text.length());
    text.codePoints().forEach(point -> {
      if (has(point)) {
        result.appendCodePoint(point);
      } else {
        result.append(String.format(Locale.ROOT, "[U+%04X]", point));
      }
    });
    return result.toString();
  }

  private boolean has(int point) {
    int type = Character.getType(point);
    return Character.isWhitespace(point) || type == Character.FORMAT || type == Character.CONTROL || glyphs.getGlyphId(point) != 0;
  }
}
