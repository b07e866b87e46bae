/**
 * The structure as the user describes it: nodes, members, sections, materials, joints, connections,
 * supports, rigid links and masses; how it is read and written, and named changes to it.
 *
 * <p><b>In:</b> a frame model as JSON, or as a workbook with one sheet per key. <b>Out:</b> {@link
 * org.flexbound.frame.FrameModel}, every value in SI units (m, N, kg, rad), every entry with its
 * place in the user's file; and the same model written back, with the user's own entries and units
 * as they were and factors added.
 *
 * <p><b>Axes and signs:</b> right-handed throughout. Member axes follow EN 1993-1-1, 1.7: x from the
 * first to the second node, z along the depth of the section, y along its width; Iy is bending about
 * y, with deflection along z. z lies in the plane of x and the reference direction. A rotation is
 * positive by the right-hand rule. A positive moment My pulls at positive z, a positive Mz at
 * negative y.
 *
 * <ol>
 *   <li>A workbook becomes the same tree of values as a JSON file, each value with its cell.
 *   <li>The tree is read entry by entry; every problem becomes a finding, all in one go.
 *   <li>Names are resolved, with the nearest name offered for one that is not found.
 *   <li>A stiffness of the model is named by a {@link org.flexbound.frame.StiffnessPath}; settings
 *       for paths give a changed model.
 * </ol>
 */
@NullMarked
package org.flexbound.frame;

import org.jspecify.annotations.NullMarked;
