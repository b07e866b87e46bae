package org.flexbound.testlog;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.flexbound.document.Json;
import org.flexbound.document.Sheet;
import org.flexbound.finding.Where;

/**
 * The readings of a run as numbers in SI, row after row: made once while the sheet is read, and shown
 * as often as somebody asks.
 *
 * <p>A row is: its number, a code of its step label, a code of its remark with the bit for Use (4
 * bytes each, 4 unused), then as doubles the time, a step label that is a number, loads and gauges.
 */
final class ReadingStore implements Readings {
  private static final int HEAD = 16;
  private static final int NONE = -1;
  private static final int SMALLEST = 1 << 13;
  private static final int LARGEST = 1 << 18;

  private final Sheet sheet;
  private final ReadingColumns columns;
  private final ReadingMemory memory;
  private final int rowBytes;
  private final List<ReadingMemory.Piece> pieces = new ArrayList<>();
  private final Map<String, Integer> codes = new LinkedHashMap<>();
  private final List<String> texts = new ArrayList<>();
  private ByteBuffer filling;
  private int largest;

  ReadingStore(Sheet sheet, ReadingColumns columns, ReadingMemory memory) {
    this.sheet = sheet;
    this.columns = columns;
    this.memory = memory;
    this.rowBytes = HEAD + 8 * (2 + columns.loads().size() + columns.gauges().size());
    this.filling = buffer(SMALLEST);
  }

  private ByteBuffer buffer(int size) {
    return ByteBuffer.allocate(size / rowBytes * rowBytes + rowBytes)
        .order(ByteOrder.nativeOrder());
  }

  /**
   * Adds a row.
   *
   * @param number the row's number
   * @param time s; NaN where there is none
   * @param stepNumber the step label, where it is a number; else NaN
   * @param stepText the step label, where it is a text; else empty
   * @param use whether the user wants it used
   * @param remark the remark, or empty
   * @param values loads, then gauges, SI; NaN for a blank cell
   */
  void add(
      int number,
      double time,
      double stepNumber,
      String stepText,
      boolean use,
      String remark,
      double[] values) {
    ByteBuffer buffer = filling;
    buffer.putInt(number);
    buffer.putInt(code(stepText));
    buffer.putInt(2 * code(remark) + (use ? 1 : 0));
    buffer.putInt(0);
    buffer.putDouble(time);
    buffer.putDouble(stepNumber);
    for (double value : values) {
      buffer.putDouble(value);
    }
    if (buffer.remaining() < rowBytes) {
      next();
    }
  }

  private int code(String text) {
    if (text.isEmpty()) {
      return NONE;
    }
    Integer known = codes.get(text);
    if (known != null) {
      return known;
    }
    codes.put(text, texts.size());
    texts.add(text);
    return texts.size() - 1;
  }

  private void next() {
    largest = Math.max(largest, filling.position());
    pieces.add(memory.keep(filling));
    filling = buffer(Math.min(LARGEST, 2 * filling.capacity()));
  }

  /** Ends the run; no row may be added afterwards. */
  void close() {
    if (filling.position() > 0) {
      next();
    }
    filling = ByteBuffer.allocate(0);
    codes.clear();
  }

  @Override
  public void forEach(ReadingVisitor visitor) {
    Cursor cursor = new Cursor();
    ByteBuffer spare = ByteBuffer.allocate(largest).order(ByteOrder.nativeOrder());
    for (ReadingMemory.Piece piece : pieces) {
      ByteBuffer bytes = piece.bytes(spare);
      cursor.bytes = bytes;
      for (int at = 0; at < bytes.limit(); at += rowBytes) {
        cursor.at = at;
        visitor.visit(cursor);
      }
    }
  }

  /** One row; lives as long as its visit. */
  private final class Cursor implements Reading {
    private final int firstLoad = HEAD + 16;
    private final int firstGauge = firstLoad + 8 * columns.loads().size();
    private ByteBuffer bytes = ByteBuffer.allocate(0);
    private int at;
    private double lastStep = Double.NaN;
    private String lastLabel = "";

    @Override
    public int row() {
      return bytes.getInt(at);
    }

    @Override
    public double load(int channel) {
      return bytes.getDouble(at + firstLoad + 8 * channel);
    }

    @Override
    public double gauge(int channel) {
      return bytes.getDouble(at + firstGauge + 8 * channel);
    }

    @Override
    public double time() {
      return bytes.getDouble(at + HEAD);
    }

    @Override
    public String step() {
      int code = bytes.getInt(at + 4);
      if (code != NONE) {
        return texts.get(code);
      }
      double number = bytes.getDouble(at + HEAD + 8);
      if (Double.isNaN(number)) {
        return "";
      }
      if (number != lastStep) {
        lastStep = number;
        lastLabel = Json.plain(number);
      }
      return lastLabel;
    }

    @Override
    public boolean use() {
      return (bytes.getInt(at + 8) & 1) == 1;
    }

    @Override
    public String remark() {
      int code = bytes.getInt(at + 8) >> 1;
      return code == NONE ? "" : texts.get(code);
    }

    @Override
    public Where whereLoad(int channel) {
      return sheet.cell(row(), columns.loads().get(channel).header().index());
    }

    @Override
    public Where whereGauge(int channel) {
      return sheet.cell(row(), columns.gauges().get(channel).header().index());
    }
  }
}
