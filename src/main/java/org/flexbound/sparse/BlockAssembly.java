package org.flexbound.sparse;

import java.util.Arrays;

/**
 * Adds small dense symmetric blocks into a sparse symmetric matrix. Built once from the unknowns of every block: it finds the pattern and,
 * for every entry of every block, the place of its value; afterwards each new set of block values is scattered without any searching.
 *
 * <p>A block of m unknowns is an m × m symmetric matrix. An unknown of {@code -1} is eliminated (fixed): its row and column are left out.
 * An unknown may stand more than once in a block; the entries are then added as the symmetric matrix demands.
 */
public final class BlockAssembly {
  /** Gives the values of a block. */
  @FunctionalInterface
  public interface BlockValues {
    /**
   * Writes the values of a block.
   *
   * @param block the number of the block
   * @param values m × m, row by row, to be overwritten whole; only the lower triangle is read
   */
    void write(int block, double[] values);
  }

  private final SparsePattern pattern;
  private final int[] blockSizes;
  /** Where each block's part of {@link #places} begins. */
  private final int[] placeStarts;
  /** Position of each lower-triangle entry of each block (row by row), -1 for an eliminated one. */
  private final int[] places;
  /** Blocks in which an unknown stands more than once. */
  private final boolean[] repeats;

  private BlockAssembly(SparsePattern pattern, int[] blockSizes, int[] placeStarts, int[] places, boolean[] repeats) {
    this.pattern = pattern;
    this.blockSizes = blockSizes;
    this.placeStarts = placeStarts;
    this.places = places;
    this.repeats = repeats;
  }

  /**
   * Finds pattern and places.
   *
   * @param size number of unknowns of the matrix
   * @param blocks for each block its unknowns, each from -1 (eliminated) to size - 1
   * @throws IllegalArgumentException if an unknown lies outside that range
   */
  public static BlockAssembly of(int size, int[][] blocks) {
    int[] touching = new int[size + 1];
    for (int b = 0; b < blocks.length; b++) {
      for (int unknown : blocks[b]) {
        if (unknown < -1 || unknown >= size) {
          throw new IllegalArgumentException("block " + b + " names unknown " + unknown + " of " + size);
        }
        if (unknown >= 0) {
          touching[unknown + 1]++;
        }
      }
    }
    for (int j = 0; j < size; j++) {
      touching[j + 1] = Math.addExact(touching[j], touching[j + 1]);
    }
    int[] blockOf = new int[touching[size]];
    int[] next = Arrays.copyOf(touching, size);
    for (int b = 0; b < blocks.length; b++) {
      for (int unknown : blocks[b]) {
        if (unknown >= 0) {
          blockOf[next[unknown]++] = b;
        }
      }
    }
    SparsePattern pattern = pattern(size, blocks, touching, blockOf);
    return places(pattern, blocks);
  }

  private static SparsePattern pattern(int size, int[][] blocks, int[] touching, int[] blockOf) {
    int[] starts = new int[size + 1];
    int[] rows = new int[Math.max(16, size * 8)];
    int[] seen = new int[size];
    Arrays.fill(seen, -1);
    int count = 0;
    for (int j = 0; j < size; j++) {
      int from = count;
      seen[j] = j;
      rows = withRoom(rows, count);
      rows[count++] = j;
      for (int t = touching[j]; t < touching[j + 1]; t++) {
        for (int i : blocks[blockOf[t]]) {
          if (i > j && seen[i] != j) {
            seen[i] = j;
            rows = withRoom(rows, count);
            rows[count++] = i;
          }
        }
      }
      Arrays.sort(rows, from, count);
      starts[j + 1] = count;
    }
    return new SparsePattern(starts, Arrays.copyOf(rows, count));
  }

  private static int[] withRoom(int[] array, int count) {
    return count < array.length ? array : Arrays.copyOf(array, Math.addExact(count, count / 2 + 16));
  }

  private static BlockAssembly places(SparsePattern pattern, int[][] blocks) {
    int[] sizes = new int[blocks.length];
    int[] starts = new int[blocks.length + 1];
    for (int b = 0; b < blocks.length; b++) {
      sizes[b] = blocks[b].length;
      starts[b + 1] = Math.addExact(starts[b], Math.multiplyExact(sizes[b], sizes[b] + 1) / 2);
    }
    int[] places = new int[starts[blocks.length]];
    boolean[] repeats = new boolean[blocks.length];
    for (int b = 0; b < blocks.length; b++) {
      int p = starts[b];
      for (int r = 0; r < sizes[b]; r++) {
        int i = blocks[b][r];
        for (int c = 0; c <= r; c++) {
          int j = blocks[b][c];
          places[p++] = i < 0 || j < 0 ? -1 : pattern.position(i, j);
          repeats[b] |= r != c && i == j && i >= 0;
        }
      }
    }
    return new BlockAssembly(pattern, sizes, starts, places, repeats);
  }

  /** The pattern of every matrix assembled here. */
  public SparsePattern pattern() {
    return pattern;
  }

  /** Number of blocks. */
  public int blockCount() {
    return blockSizes.length;
  }

  /**
   * Assembles a matrix from the values of all blocks, in the order of the blocks.
   *
   * @param source called once for each block that has unknowns
   */
  public SymmetricMatrix assemble(BlockValues source) {
    double[] sum = new double[pattern.entryCount()];
    double[] values = new double[0];
    for (int b = 0; b < blockSizes.length; b++) {
      int m = blockSizes[b];
      if (m == 0) {
        continue;
      }
      if (values.length != m * m) {
        values = new double[m * m];
      }
      source.write(b, values);
      add(b, values, sum);
    }
    return new SymmetricMatrix(pattern, sum);
  }

  private void add(int block, double[] values, double[] sum) {
    int m = blockSizes[block];
    int p = placeStarts[block];
    for (int r = 0; r < m; r++) {
      for (int c = 0; c <= r; c++) {
        int place = places[p++];
        if (place >= 0) {
          boolean twice = repeats[block] && r != c && isDiagonal(place);
          sum[place] += twice ? 2 * values[r * m + c] : values[r * m + c];
        }
      }
    }
  }

  private boolean isDiagonal(int place) {
    return pattern.starts()[pattern.rowIndices()[place]] == place;
  }
}
