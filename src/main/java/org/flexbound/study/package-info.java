/**
 * The study: which model is held against which tests, what may change in it, and by what rule.
 *
 * <p>In: the study file (JSON). Out: {@link org.flexbound.study.Study}. Stiffnesses in N/m or
 * N·m/rad, bounds as multipliers of the nominal stiffness or as stiffnesses; file names as they
 * stand in the study, relative to the folder that it lies in.
 *
 * <ol>
 *   <li>{@link org.flexbound.study.StudyReader} reads every key, with a finding for each problem; a
 *       key that is not known is a problem too.
 *   <li>What needs the model (whether a scaled part exists, what its nominal stiffness is) is
 *       checked by the rooms that know the model.
 * </ol>
 */
@NullMarked
package org.flexbound.study;

import org.jspecify.annotations.NullMarked;
