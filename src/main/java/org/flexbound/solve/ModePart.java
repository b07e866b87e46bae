package org.flexbound.solve;

import java.util.Arrays;
import org.flexbound.sparse.EigenPairs;

/**
 * The modes of a frame split at a cut: those that make the flexibility, and those known beyond it
 * (rigid-body modes among them).
 */
final class ModePart {
  private final ModalModel modal;
  private final int unknowns;
  private final int rigid;
  private final int cut;
  private final double[] eigenvalues;

  /** Unknowns × modes, rigid-body modes first. */
  private final double[] vectors;

  private final double shift;

  /** By mode below the cut, at all freedoms. */
  private final double[][] motions;

  /** By gauge or load (gauges first), then mode: b · φ for every known mode. */
  private final double[][] projections;

  /** Forces of gauges and loads at the unknowns, one column after another. */
  private final double[] columns;

  private final int columnCount;

  ModePart(ModalModel modal, EigenPairs pairs, int rigid, int cut) {
    this.modal = modal;
    this.unknowns = pairs.size();
    this.rigid = rigid;
    this.cut = Math.min(cut, pairs.count() - rigid);
    this.eigenvalues = pairs.values();
    this.vectors = pairs.vectors();
    this.shift = Math.min(0, pairs.shift());
    Transformation t = modal.structure().transformation();
    motions = new double[this.cut][t.freedoms()];
    for (int k = 0; k < this.cut; k++) {
      t.expand(vectors, (rigid + k) * unknowns, motions[k], 0);
    }
    Functional[] all = modal.frame().columns();
    columnCount = all.length;
    columns = new double[Math.multiplyExact(unknowns, columnCount)];
    double[] forces = new double[t.freedoms()];
    for (int c = 0; c < columnCount; c++) {
      Arrays.fill(forces, 0);
      all[c].addTo(forces, 0, modal.structure(), modal.state());
      t.reduce(forces, 0, columns, c * unknowns);
    }
    projections = new double[columnCount][eigenvalues.length];
    for (int c = 0; c < columnCount; c++) {
      for (int k = 0; k < eigenvalues.length; k++) {
        double sum = 0;
        for (int i = 0; i < unknowns; i++) {
          sum += columns[c * unknowns + i] * vectors[k * unknowns + i];
        }
        projections[c][k] = sum;
      }
    }
  }

  /** Σ φ (φ·b)/λ over the modes below the cut, at all freedoms, one column after another. */
  double[] fields() {
    int size = modal.structure().transformation().freedoms();
    double[] result = new double[Math.multiplyExact(size, columnCount)];
    for (int c = 0; c < columnCount; c++) {
      for (int k = 0; k < cut; k++) {
        double share = projections[c][rigid + k] / eigenvalues[rigid + k];
        for (int f = 0; f < size; f++) {
          result[c * size + f] += share * motions[k][f];
        }
      }
    }
    return result;
  }

  double[] frequencies() {
    return Arrays.stream(eigenvalues, rigid, eigenvalues.length)
        .map(v -> Math.sqrt(Math.max(0, v)) / (2 * Math.PI))
        .toArray();
  }

  int unknowns() {
    return unknowns;
  }

  int cut() {
    return cut;
  }

  int known() {
    return eigenvalues.length;
  }

  /** Whether a known mode is one of those below the cut. */
  boolean isIn(int mode) {
    return mode >= rigid && mode < rigid + cut;
  }

  double eigenvalue(int mode) {
    return eigenvalues[mode];
  }

  /** The eigenvalue of a mode below the cut. */
  double below(int k) {
    return eigenvalues[rigid + k];
  }

  /** The motions of a mode below the cut at all freedoms; not copied. */
  double[] motions(int k) {
    return motions[k];
  }

  /** b · φ of a mode below the cut. */
  double projection(int column, int k) {
    return projections[column][rigid + k];
  }

  /** b · φ of any known mode. */
  double projectionOfKnown(int column, int mode) {
    return projections[column][mode];
  }

  /** Unknowns × known modes; not copied. */
  double[] vectors() {
    return vectors;
  }

  /** Unknowns × columns; not copied. */
  double[] columns() {
    return columns;
  }

  int columnCount() {
    return columnCount;
  }

  /** A point at or below zero at which K − shift M has a factor. */
  double shift() {
    return shift;
  }
}
