package org.flexbound.sparse;

import java.io.BufferedWriter;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/**
 * Times order, analysis, factor, 50 solves and 30 modes of the sparse room on lattice frames, each phase apart, the best of three after
 * warm-up; with the native reference beside it, in turn in the same run, if its program is given. Prints a Markdown table with the goals.
 *
 * <p>Arguments: {@code [--native PROGRAM] [--matrices n12,n16,n20,n20r,boom,boomr] [--threads 1] [--repeats 3] [--modes n12,n16,n20]}. See
 * the README in {@code src/bench}.
 */
public final class SparseBenchmark {
  private static final int RIGHT_HAND_SIDES = 50;
  /** At least two runs, and so many nanoseconds, go before the runs that count. */
  private static final long WARM_UP = 4_000_000_000L;

  /** Best native fill of four orders, 10⁶ entries, by matrix. */
  private static final Map<String, Double> FILL = Map.of("n12", 1.79, "n16", 8.46, "n20", 23.5, "n20r", 24.0, "n26", 71.3, "n26r", 72.6,
      "boom", 2.25, "boomr", 2.68);

  /** Seconds of factor and iteration by SciPy's eigsh on its own sparse LU, as measured once on a machine of the same kind. */
  private static final Map<String, Double> SCIPY_MODES = Map.of("n12", 1.83, "n16", 7.9, "n20", 37.2);

  private static final Map<String, double[]> FREQUENCIES = Map.of("n8", new double[] {15.957337, 124.492304}, "n12",
      new double[] {10.065282, 78.995088}, "n16", new double[] {7.348707, 57.876786}, "n20", new double[] {5.785748, 45.629075});

  private final Map<String, String> options;
  private final int repeats;
  private final int threads;

  private SparseBenchmark(Map<String, String> options) {
    this.options = options;
    repeats = Integer.parseInt(options.get("--repeats"));
    threads = Integer.parseInt(options.get("--threads"));
  }

  /** Best times of the phases, in seconds. */
  private static final class Times {
    double order = Double.POSITIVE_INFINITY;
    double analysis = Double.POSITIVE_INFINITY;
    double factor = Double.POSITIVE_INFINITY;
    double solve = Double.POSITIVE_INFINITY;
  }

  /**
   * Runs the benchmark.
   *
   * @param arguments as the class says
   */
  public static void main(String[] arguments) throws IOException, InterruptedException {
    Map<String, String> options = new LinkedHashMap<>();
    options.put("--matrices", "n12,n16,n20,n20r,boom,boomr");
    options.put("--threads", "1");
    options.put("--repeats", "3");
    options.put("--modes", "n12,n16,n20");
    for (int i = 0; i + 1 < arguments.length; i += 2) {
      options.put(arguments[i], arguments[i + 1]);
    }
    new SparseBenchmark(options).run();
  }

  private void run() throws IOException, InterruptedException {
    System.out.printf(Locale.ROOT, "%s, %d processors, Java %s, kernel: %s, %d thread(s), commit %s%n%n", processor(),
        Runtime.getRuntime().availableProcessors(), Runtime.version(), DenseKernel.fastest().name(), threads, commit());
    System.out.println("Seconds " + (threads == 1 ? "of processor time" : "elapsed") + ", best of " + repeats + "; native times in brackets, with the ratio.");
    System.out.println();
    System.out.println("| matrix | unknowns | order | order and analysis | factor | goal | 50 solves | goal 1.5 | fill 10⁶ | of the best native"
        + " order | held at once over fill |");
    System.out.println("| --- | --- | --- | --- | --- | --- | --- | --- | --- | --- | --- |");
    for (String name : list("--matrices")) {
      matrix(name);
    }
    System.out.println();
    System.out.println("| 30 modes of | factor and iteration (s) | goal (s) | vectors solved for | first, thirtieth (Hz) | known |"
        + " largest residual | outcome |");
    System.out.println("| --- | --- | --- | --- | --- | --- | --- | --- |");
    for (String name : list("--modes")) {
      modes(name);
    }
  }

  /** Nanoseconds: with one thread its own processor time, so that what else runs on the machine does not count. */
  private long now() {
    return threads == 1 ? ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime() : System.nanoTime();
  }

  private List<String> list(String option) {
    return Arrays.stream(options.get(option).split(",")).filter(s -> !s.isBlank()).toList();
  }

  private void matrix(String name) throws IOException, InterruptedException {
    LatticeFrame frame = LatticeFrame.named(name);
    SymmetricMatrix k = frame.stiffness;
    FactorSettings settings = FactorSettings.defaults().withThreads(threads);
    Optional<Path> file = options.containsKey("--native") ? Optional.of(write(name, k)) : Optional.empty();
    Times java = new Times();
    Times reference = new Times();
    SymbolicFactor symbolic = SymbolicFactor.analyze(k.pattern(), frame.group, settings);
    long begin = now();
    for (int r = -2; r < repeats; r++) {
      if (r == 0 && now() - begin < WARM_UP) {
        r = -1;
      }
      long t0 = now();
      OrderChoice choice = OrderChoice.choose(k.pattern(), frame.group, settings.ordering());
      long t1 = now();
      symbolic = SymbolicFactor.analyze(k.pattern(), frame.group, settings);
      long t2 = now();
      NumericFactor factor = symbolic.cholesky(k);
      long t3 = now();
      double[] x = new double[k.size() * RIGHT_HAND_SIDES];
      Arrays.fill(x, 1);
      factor.solve(x, RIGHT_HAND_SIDES);
      long t4 = now();
      if (r >= 0 && choice.order.length == k.size()) {
        java.order = Math.min(java.order, 1e-9 * (t1 - t0));
        java.analysis = Math.min(java.analysis, 1e-9 * (t2 - t1));
        java.factor = Math.min(java.factor, 1e-9 * (t3 - t2));
        java.solve = Math.min(java.solve, 1e-9 * (t4 - t3));
        if (file.isPresent()) {
          reference(file.get(), name, reference);
        }
      }
    }
    double goal = (name.startsWith("boom") ? 0.3 : 1.0) * (DenseKernel.vector().isPresent() ? 1 : name.startsWith("boom") ? 1 / 0.3 : 2.5);
    System.out.printf(Locale.ROOT, "| %s | %d | %s | %.3f | %s | %.1f | %s | %.1f | %.2f | %.2f | %.2f |%n", name, k.size(),
        with(java.order, reference.order), java.analysis, with(java.factor, reference.factor), goal, with(java.solve, reference.solve), 1.5,
        symbolic.nonzeros() / 1e6, symbolic.nonzeros() / 1e6 / FILL.getOrDefault(name, Double.NaN),
        symbolic.peakNumbers() / (double) symbolic.nonzeros());
    if (file.isPresent()) {
      Files.delete(file.get());
    }
  }

  private static String with(double java, double reference) {
    return Double.isInfinite(reference) ? String.format(Locale.ROOT, "%.3f", java)
        : String.format(Locale.ROOT, "%.3f (%.3f) %.2f", java, reference, java / reference);
  }

  /** Runs the native program once; it prints words and numbers in pairs. METIS for lattices, minimum degree for booms, as is best for each. */
  private void reference(Path file, String name, Times times) throws IOException, InterruptedException {
    ProcessBuilder builder = new ProcessBuilder(options.get("--native"), file.toString(), name.startsWith("boom") ? "amd" : "metis");
    builder.environment().put("OPENBLAS_NUM_THREADS", Integer.toString(threads));
    builder.environment().put("OMP_NUM_THREADS", Integer.toString(threads));
    Process process = builder.redirectError(ProcessBuilder.Redirect.INHERIT).start();
    String printed = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
    if (process.waitFor() != 0) {
      throw new IllegalStateException("the native program failed: " + printed);
    }
    List<String> words = new ArrayList<>(Arrays.asList(printed.trim().split("\\s+")));
    times.order = Math.min(times.order, after(words, "order"));
    times.factor = Math.min(times.factor, after(words, "factor"));
    times.solve = Math.min(times.solve, after(words, "solve50"));
  }

  private static double after(List<String> words, String word) {
    return Double.parseDouble(words.get(words.indexOf(word) + 1));
  }

  private void modes(String name) {
    LatticeFrame frame = LatticeFrame.named(name);
    EigenSolver solver = new EigenSolver(EigenSettings.defaults(), FactorSettings.defaults().withThreads(threads));
    double best = Double.POSITIVE_INFINITY;
    EigenPairs pairs = solver.lowest(frame.stiffness, frame.mass, frame.group, 30);
    for (int r = 0; r < repeats; r++) {
      long t = now();
      pairs = solver.lowest(frame.stiffness, frame.mass, frame.group, 30);
      best = Math.min(best, 1e-9 * (now() - t));
    }
    double largest = Arrays.stream(pairs.residuals()).max().orElse(0);
    double[] known = FREQUENCIES.getOrDefault(name, new double[] {Double.NaN, Double.NaN});
    double[] values = pairs.values();
    System.out.printf(Locale.ROOT, "| %s | %.3f | %.2f | %d | %.6f, %.6f | %.6f, %.6f | %.1e | %s |%n", name, best,
        0.5 * SCIPY_MODES.getOrDefault(name, Double.NaN), pairs.operatorCalls(), hertz(values[0]), hertz(values[values.length - 1]), known[0],
        known[1], largest, pairs.outcome());
  }

  private static double hertz(double value) {
    return Math.sqrt(value) / (2 * Math.PI);
  }

  /** The matrix in Matrix Market form. */
  private static Path write(String name, SymmetricMatrix k) throws IOException {
    Path file = Files.createTempFile("flexbound-" + name + "-", ".mtx");
    int[] starts = k.pattern().columnStarts();
    int[] rows = k.pattern().rows();
    double[] values = k.values();
    try (BufferedWriter out = Files.newBufferedWriter(file, StandardCharsets.US_ASCII)) {
      out.write("%%MatrixMarket matrix coordinate real symmetric\n" + k.size() + " " + k.size() + " " + rows.length + "\n");
      for (int j = 0; j < k.size(); j++) {
        for (int p = starts[j]; p < starts[j + 1]; p++) {
          out.write((rows[p] + 1) + " " + (j + 1) + " " + values[p] + "\n");
        }
      }
    }
    return file;
  }

  private static String processor() throws IOException {
    Path info = Path.of("/proc/cpuinfo");
    if (!Files.isReadable(info)) {
      return System.getProperty("os.arch");
    }
    try (var lines = Files.lines(info)) {
      return lines.filter(l -> l.startsWith("model name")).map(l -> l.substring(l.indexOf(':') + 1).trim()).findFirst()
          .orElse(System.getProperty("os.arch"));
    }
  }

  private static String commit() {
    try {
      Process git = new ProcessBuilder("git", "rev-parse", "--short", "HEAD").redirectError(ProcessBuilder.Redirect.DISCARD).start();
      String printed = new String(git.getInputStream().readAllBytes(), StandardCharsets.UTF_8).trim();
      return git.waitFor() == 0 ? printed : "unknown";
    } catch (IOException e) {
      return "unknown";
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      return "unknown";
    }
  }
}
