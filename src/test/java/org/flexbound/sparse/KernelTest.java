package org.flexbound.sparse;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;

class KernelTest {
  @Test
  void aTileLosesTheProduct() {
    Random random = new Random(3);
    double[] a = random.doubles(2000, -1, 1).toArray();
    double[] b = random.doubles(2000, -1, 1).toArray();
    for (int depth : new int[] {0, 1, 5, 40}) {
      double[] c = random.doubles(400, -1, 1).toArray();
      double[] before = c.clone();
      double[] expected = c.clone();
      int[] columns = {0, 100, 200, 300};
      int[] starts = {3, 60, 7, 900};
      for (int t = 0; t < 4; t++) {
        for (int i = 0; i < DenseKernel.WIDTH; i++) {
          for (int k = 0; k < depth; k++) {
            expected[columns[t] + i] -= a[11 + 30 * k + i] * b[starts[t] + 2 * k];
          }
        }
      }
      double[] narrow = c.clone();
      new PlainKernel().subtractNarrow(a, 11, 30, b, 3, 60, 7, 900, 2, depth, narrow, 0, 100, 200, 300);
      new PlainKernel().subtract(a, 11, 30, b, 3, 60, 7, 900, 2, depth, c, 0, 100, 200, 300);
      for (int i = 0; i < c.length; i++) {
        boolean inside = i % 100 < DenseKernel.NARROW;
        boolean wide = i % 100 < DenseKernel.WIDTH;
        assertThat(narrow[i]).isEqualTo(inside || !wide ? c[i] : before[i]);
      }
      for (int i = 0; i < c.length; i++) {
        assertThat(c[i]).isCloseTo(expected[i], within(1e-13));
      }
    }
  }

  @Test
  void theVectorKernelGivesTheSameBytesAsPlainJava() throws IOException, InterruptedException {
    String java = Path.of(System.getProperty("java.home"), "bin", "java").toString();
    Process process = new ProcessBuilder(java, "--add-modules", "jdk.incubator.vector", "-cp", System.getProperty("java.class.path"),
        KernelTest.class.getName()).redirectError(ProcessBuilder.Redirect.DISCARD).start();
    String printed = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
    assertThat(process.waitFor()).isZero();
    assertThat(printed).isEqualTo("Vector API " + solutionHash());
  }

  /** Prints the kernel that this virtual machine offers and a hash of a solution by it. */
  public static void main(String[] arguments) {
    System.out.print(DenseKernel.fastest().name() + " " + solutionHash());
  }

  private static int solutionHash() {
    LatticeFrame frame = LatticeFrame.of(6, 6, 6, true, true);
    double[] x = RandomMatrix.vector(frame.stiffness.size() * 30, 17);
    SymbolicFactor.analyze(frame.stiffness.pattern(), frame.group, FactorSettings.defaults()).cholesky(frame.stiffness).solve(x, 30);
    return Arrays.hashCode(x);
  }
}
