package org.flexbound.document;

import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.Charset;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.regex.Pattern;

/**
 * How a CSV file is written, settled from what the user said and from the head of its text.
 *
 * <p>Separator: a tab, semicolon or bar where most lines agree on their number, else the comma.
 * Decimal sign: a comma only where the separator is another sign and every decimal number of the
 * head has one. Encoding: by byte order mark, else UTF-8 where the head is valid UTF-8, else
 * windows-1252.
 *
 * @param separator what stands between fields
 * @param decimalSign point or comma
 * @param charset the encoding
 * @param markBytes length of the byte order mark
 * @param lineEnd line feed, or carriage return where there is no line feed at all
 * @param statedInFile whether the first line is a {@code sep=} line, which holds no data
 */
record CsvDialect(
    char separator,
    char decimalSign,
    Charset charset,
    int markBytes,
    char lineEnd,
    boolean statedInFile) {
  private static final Charset WESTERN = Charset.forName("windows-1252");
  private static final Pattern COMMA = Pattern.compile("\\s*[-+]?\\d*,\\d+([eE][-+]?\\d+)?\\s*");
  private static final Pattern POINT = Pattern.compile("\\s*[-+]?\\d*\\.\\d+([eE][-+]?\\d+)?\\s*");

  /** Settles what was left open. */
  static CsvDialect of(byte[] head, boolean whole, CsvLayout layout) {
    Charset charset;
    int mark = 0;
    if (begins(head, 0xEF, 0xBB, 0xBF)) {
      charset = StandardCharsets.UTF_8;
      mark = 3;
    } else if (begins(head, 0xFF, 0xFE)) {
      charset = StandardCharsets.UTF_16LE;
      mark = 2;
    } else if (begins(head, 0xFE, 0xFF)) {
      charset = StandardCharsets.UTF_16BE;
      mark = 2;
    } else {
      charset =
          layout.charset().orElseGet(() -> isUtf8(head, whole) ? StandardCharsets.UTF_8 : WESTERN);
    }
    String text = new String(head, mark, head.length - mark, charset);
    char lineEnd = text.indexOf('\n') < 0 && text.indexOf('\r') >= 0 ? '\r' : '\n';
    List<String> lines =
        new ArrayList<>(List.of(text.split(String.valueOf(lineEnd), -1)));
    if (!whole && lines.size() > 1) {
      lines.remove(lines.size() - 1);
    }
    String first = lines.get(0).strip();
    boolean stated =
        first.toLowerCase(Locale.ROOT).startsWith("sep=") && first.length() == 5;
    char separator =
        layout.separator().orElseGet(() -> stated ? first.charAt(4) : separator(lines));
    char decimal = layout.decimalSign().orElseGet(() -> decimalSign(lines, separator));
    return new CsvDialect(separator, decimal, charset, mark, lineEnd, stated);
  }

  /** Whether every character of the ASCII set is one byte of the file. */
  boolean isByteWise() {
    return !charset.name().startsWith("UTF-16") && !charset.name().startsWith("UTF-32");
  }

  /** The encoding of the bytes that are scanned: others are turned into UTF-8 on the way in. */
  Charset byteCharset() {
    return isByteWise() ? charset : StandardCharsets.UTF_8;
  }

  /** What was settled, in words. */
  String words() {
    return "separator "
        + (separator == '\t' ? "tab" : "'" + separator + "'")
        + ", decimal "
        + (decimalSign == ',' ? "comma" : "point")
        + ", encoding "
        + charset.name();
  }

  private static boolean begins(byte[] head, int... bytes) {
    for (int i = 0; i < bytes.length; i++) {
      if (i >= head.length || (head[i] & 0xFF) != bytes[i]) {
        return false;
      }
    }
    return true;
  }

  /** Whether the head of the file is text in the encoding. */
  boolean canDecode(byte[] head, boolean whole) {
    return isText(head, markBytes, whole, charset);
  }

  private static boolean isUtf8(byte[] head, boolean whole) {
    return isText(head, 0, whole, StandardCharsets.UTF_8);
  }

  private static boolean isText(byte[] head, int from, boolean whole, Charset charset) {
    int cut = whole ? 0 : 4;
    for (int drop = 0; drop <= cut && drop < head.length - from; drop++) {
      CharsetDecoder decoder = charset.newDecoder();
      try {
        decoder.decode(ByteBuffer.wrap(head, from, head.length - from - drop));
        return true;
      } catch (CharacterCodingException cutOrOther) {
        // the head may end within a character: once more with a byte less
      }
    }
    return head.length == from;
  }

  private static char separator(List<String> lines) {
    for (char candidate : new char[] {'\t', ';', '|'}) {
      Map<Integer, Integer> linesByCount = new HashMap<>();
      int filled = 0;
      for (String line : lines) {
        if (!line.isBlank()) {
          filled++;
          linesByCount.merge(count(line, candidate), 1, Integer::sum);
        }
      }
      linesByCount.remove(0);
      int agreed = linesByCount.values().stream().mapToInt(Integer::intValue).max().orElse(0);
      if (2 * agreed >= filled && agreed > 0) {
        return candidate;
      }
    }
    return ',';
  }

  private static int count(String line, char sign) {
    int count = 0;
    boolean quoted = false;
    for (int i = 0; i < line.length(); i++) {
      char c = line.charAt(i);
      quoted ^= c == '"';
      count += c == sign && !quoted ? 1 : 0;
    }
    return count;
  }

  private static char decimalSign(List<String> lines, char separator) {
    if (separator == ',') {
      return '.';
    }
    boolean comma = false;
    for (String line : lines) {
      for (String field : line.split(Pattern.quote(String.valueOf(separator)), -1)) {
        String bare = field.replace("\"", "");
        if (POINT.matcher(bare).matches()) {
          return '.';
        }
        comma |= COMMA.matcher(bare).matches();
      }
    }
    return comma ? ',' : '.';
  }
}
