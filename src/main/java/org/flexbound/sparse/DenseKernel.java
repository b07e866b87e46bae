package org.flexbound.sparse;

import java.lang.reflect.InvocationTargetException;
import java.util.Optional;

/**
 * The innermost product of all dense work: a tile of {@link #WIDTH} by four entries of {@code C}, from which the product of a strip of A and
 * four columns of B is subtracted. Every sum runs over the depth in ascending order with one fused multiply-add a term, so that kernels agree
 * to the last bit.
 */
interface DenseKernel {
  /** Entries of a tile along the contiguous direction of A and C. */
  int WIDTH = 24;
  /** Entries of a narrow tile. */
  int NARROW = 8;

  /**
   * {@code c[ct + i] -= sum over k < depth of a[ao + k·as + i] · b[bt + k·bs]} for i from 0 to {@link #WIDTH} - 1 and t from 0 to 3.
   */
  void subtract(double[] a, int ao, int as, double[] b, int b0, int b1, int b2, int b3, int bs, int depth, double[] c, int c0, int c1, int c2,
      int c3);

  /** The same for i from 0 to {@link #NARROW} - 1. */
  void subtractNarrow(double[] a, int ao, int as, double[] b, int b0, int b1, int b2, int b3, int bs, int depth, double[] c, int c0, int c1,
      int c2, int c3);

  /** A short name for reports. */
  String name();

  /**
   * The fastest kernel this virtual machine offers: that on the Vector API if the machine was started with its module, else plain Java.
   */
  static DenseKernel fastest() {
    return vector().orElseGet(PlainKernel::new);
  }

  /** The kernel on the Vector API, if the virtual machine was started with {@code --add-modules jdk.incubator.vector}. */
  static Optional<DenseKernel> vector() {
    if (ModuleLayer.boot().findModule("jdk.incubator.vector").isEmpty()) {
      return Optional.empty();
    }
    try {
      Class<?> found = Class.forName("org.flexbound.sparse.VectorKernel");
      return Optional.of(found.asSubclass(DenseKernel.class).getDeclaredConstructor().newInstance());
    } catch (ClassNotFoundException e) {
      return Optional.empty();
    } catch (NoSuchMethodException | InstantiationException | IllegalAccessException | InvocationTargetException e) {
      throw new IllegalStateException("the vector kernel cannot be made", e);
    }
  }
}
