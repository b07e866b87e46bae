/**
 * Findings: what the program tells the user about the input or the result, each with severity, a
 * stable code, a message, a place and a remedy.
 *
 * <p>In: whatever another room noticed. Out: {@link org.flexbound.finding.Finding} values, carried
 * by every result, and {@link org.flexbound.finding.Refusal} where the input cannot be used. A
 * message says what was found and what was expected; the place is kept apart from it, so that
 * programs can use it; what to do stands with the kind.
 *
 * <ol>
 *   <li>A reader collects its findings in {@link org.flexbound.finding.Findings}.
 *   <li>It returns an {@link org.flexbound.finding.Outcome}: what it could make out, and the
 *       findings; it does not throw for a problem in the data.
 *   <li>The command line joins the findings of all files and refuses once, with all of them.
 * </ol>
 */
@NullMarked
package org.flexbound.finding;

import org.jspecify.annotations.NullMarked;
