/**
 * Symmetric sparse matrices: fill-reducing orders, factors, solves and eigenpairs. Pure linear algebra; knows nothing of structures.
 *
 * <p><b>In:</b> the lower triangle of a symmetric matrix, by columns ({@link org.flexbound.sparse.SymmetricMatrix}), usually assembled
 * from small dense blocks ({@link org.flexbound.sparse.BlockAssembly}); optionally the group of every unknown (the unknowns of one node
 * are ordered together).
 *
 * <p><b>Out:</b> the factor of the matrix ({@link org.flexbound.sparse.NumericFactor}), solutions for dense or sparse right-hand sides,
 * the inertia of an indefinite matrix, and the lowest eigenpairs of {@code K phi = lambda M phi}
 * ({@link org.flexbound.sparse.EigenSolver}).
 *
 * <p><b>Units and signs:</b> none of its own; every threshold compares a number with another of the same unit (a pivot with its own
 * original diagonal entry), so that no choice of units changes a verdict.
 *
 * <p><b>Steps:</b>
 * <ol>
 * <li>order: the graph of the groups (or of the unknowns) is ordered to keep the factor sparse
 *     ({@link org.flexbound.sparse.Ordering});</li>
 * <li>analyse: elimination tree, postorder, column counts, pattern of the factor ({@link org.flexbound.sparse.SymbolicFactor}), kept for
 *     every later set of values on the same pattern;</li>
 * <li>factorize: {@code P A Pᵀ = L D Lᵀ}, all pivots D positive for a positive definite matrix, of both signs for an indefinite one;</li>
 * <li>solve: forward and backward with many right-hand sides at once, or only the part of the tree which a sparse right-hand side
 *     reaches and the wanted rows need; refine on request ({@link org.flexbound.sparse.Refinement}).</li>
 * </ol>
 *
 * <p>Everything is deterministic: the same input gives the same bytes on the same machine, for any number of threads.
 */
@NullMarked
package org.flexbound.sparse;

import org.jspecify.annotations.NullMarked;
