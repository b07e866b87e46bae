package org.flexbound.sparse;

import java.io.BufferedWriter;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;

/** Writes the stiffness matrices of the benchmark in Matrix Market form, for the native reference. Arguments: folder, names. */
final class WriteMatrices {
  private WriteMatrices() {}

  public static void main(String[] arguments) throws IOException {
    Path folder = Path.of(arguments[0]);
    Files.createDirectories(folder);
    for (int a = 1; a < arguments.length; a++) {
      SymmetricMatrix k = LatticeFrame.named(arguments[a]).stiffness;
      int[] starts = k.pattern().columnStarts();
      int[] rows = k.pattern().rows();
      double[] values = k.values();
      try (BufferedWriter out = Files.newBufferedWriter(folder.resolve(arguments[a] + ".mtx"), StandardCharsets.US_ASCII)) {
        int nonzero = 0;
        for (double v : values) {
          nonzero += v != 0 ? 1 : 0;
        }
        out.write("%%MatrixMarket matrix coordinate real symmetric\n" + k.size() + " " + k.size() + " " + nonzero + "\n");
        for (int j = 0; j < k.size(); j++) {
          for (int p = starts[j]; p < starts[j + 1]; p++) {
            if (values[p] != 0) {
              out.write((rows[p] + 1) + " " + (j + 1) + " " + values[p] + "\n");
            }
          }
        }
      }
    }
  }
}
