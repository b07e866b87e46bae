/**
 * The command line: wires the rooms together, prints, and nothing else.
 *
 * <p>In: the words of a command. Out: files in the output folder, a compact summary on the
 * terminal, and an exit code ({@link org.flexbound.app.ExitCode}). Nothing in here ends the virtual
 * machine but {@code main}: {@link org.flexbound.app.Flexbound#run} returns the code, so that a
 * whole command can be tested in process.
 *
 * <ol>
 *   <li>Parse the words; a mistake in them is exit code 2.
 *   <li>Read every file the command names and collect the findings of all of them.
 *   <li>Refuse once, with all findings, where any is an error (exit code 3); nothing is written.
 *   <li>Work the steps, write each output under a temporary name and move it into place, print.
 * </ol>
 */
@NullMarked
package org.flexbound.app;

import org.jspecify.annotations.NullMarked;
