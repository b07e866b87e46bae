/**
 * The computed flexibility of a frame: element matrices, assembly, constraints, static flexibility,
 * sensitivities and contributions, modes and truncated flexibility; and the cross-check of gauges
 * and load points against the model.
 *
 * <p><b>In:</b> a {@link org.flexbound.frame.FrameModel}, gauges and loads, and the paths of the
 * stiffnesses that may be set. <b>Out:</b> {@link org.flexbound.solve.FlexibilitySolution}: the
 * coefficients a_ij (motion at gauge i per unit of load j), their derivatives by every stiffness,
 * what every part contributes, the deflected shapes, and the evidence for all of it.
 *
 * <p><b>Units and signs:</b> SI (m, rad, N, N·m, kg); a gauge reads positive along (about) its
 * direction, a load acts along (about) its own; a strain is positive in tension. Section forces act
 * on the face that looks along the member's x.
 *
 * <ol>
 *   <li>Gauges and loads are placed on the model; members are divided where one stands between
 *       their ends.
 *   <li>Every member piece is a 6 × 6 flexibility (cantilever from its start, forces at its end):
 *       the sum of axial force, bending, shear, torsion and end joints, each the inverse of one
 *       stiffness. Joints that are rigid add nothing, joints that are free take their force out.
 *   <li>Rigid links, rigid components of connections and fixed components of supports are linear
 *       constraints and are eliminated; none is ever a large number.
 *   <li>K is assembled, factorized once, and solved for every gauge and every load.
 *   <li>A rigid component that may be set is worked by its gap: G(c) = G_rigid + N C (I + S C)⁻¹ Nᵀ.
 *   <li>The contribution of a part to a_ij is the work of the forces of gauge i on its deformation
 *       under load j; it is −∂a_ij/∂ln θ, and all contributions sum to a_ij.
 * </ol>
 */
@NullMarked
package org.flexbound.solve;

import org.jspecify.annotations.NullMarked;
