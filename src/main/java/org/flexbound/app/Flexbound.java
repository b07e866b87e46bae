package org.flexbound.app;

import java.io.Console;
import java.io.FileDescriptor;
import java.io.FileOutputStream;
import java.io.IOException;
import java.io.OutputStreamWriter;
import java.io.PrintWriter;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.flexbound.finding.Refusal;
import picocli.CommandLine;
import picocli.CommandLine.Help.Ansi;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.UnmatchedArgumentException;

/** The command line. */
public final class Flexbound {
  private Flexbound() {}

  /**
   * Runs one command and ends the virtual machine with its exit code.
   *
   * @param arguments the words of the command line
   */
  public static void main(String[] arguments) {
    PrintWriter out = writer(FileDescriptor.out);
    PrintWriter err = writer(FileDescriptor.err);
    boolean watched = isTerminal();
    boolean colour = watched && System.getenv("NO_COLOR") == null;
    System.exit(run(List.of(arguments), new Terminal(out, err, colour, watched)));
  }

  @SuppressWarnings("SystemConsoleNull") // the check for Java 22 and later follows below
  private static boolean isTerminal() {
    Console console = System.console();
    if (console == null) {
      return false;
    }
    try {
      // Java 22 and later give a console even where the output is a file, and a method to ask it.
      return (boolean) Console.class.getMethod("isTerminal").invoke(console);
    } catch (ReflectiveOperationException olderJava) {
      return true;
    }
  }

  private static PrintWriter writer(FileDescriptor descriptor) {
    return new PrintWriter(
        new OutputStreamWriter(new FileOutputStream(descriptor), StandardCharsets.UTF_8), true);
  }

  /**
   * Runs one command without ending the virtual machine, without colour.
   *
   * @param arguments the words of the command line
   * @param out where results are printed
   * @param err where messages about what went wrong are printed
   * @return the exit code (see {@link ExitCode})
   */
  public static int run(String[] arguments, PrintWriter out, PrintWriter err) {
    return run(List.of(arguments), new Terminal(out, err));
  }

  private static int run(List<String> arguments, Terminal terminal) {
    ExitCode code;
    try {
      code = execute(arguments, terminal);
    } catch (RuntimeException | StackOverflowError | OutOfMemoryError fault) {
      code = fault(fault, arguments, terminal);
    }
    terminal.out().flush();
    terminal.err().flush();
    return code.number();
  }

  private static ExitCode execute(List<String> arguments, Terminal terminal) {
    CommandLine line = CommandTree.make(terminal);
    line.setOut(terminal.out());
    line.setErr(terminal.err());
    line.setColorScheme(
        CommandLine.Help.defaultColorScheme(terminal.colour() ? Ansi.ON : Ansi.OFF));
    line.setParameterExceptionHandler((problem, words) -> wrongLine(problem, terminal));
    line.setExecutionExceptionHandler(
        (problem, command, parsed) -> failed(problem, arguments, terminal).number());
    int number = line.execute(arguments.toArray(new String[0]));
    for (ExitCode code : ExitCode.values()) {
      if (code.number() == number) {
        return code;
      }
    }
    throw new IllegalStateException("a command ended with the unknown exit code " + number);
  }

  private static int wrongLine(ParameterException problem, Terminal terminal) {
    PrintWriter err = terminal.err();
    CommandLine command = problem.getCommandLine();
    err.println(terminal.bad("flexbound: ") + PlainText.of(String.valueOf(problem.getMessage())));
    UnmatchedArgumentException.printSuggestions(problem, err);
    err.println("Try: " + command.getCommandSpec().qualifiedName() + " --help");
    return ExitCode.COMMAND_LINE.number();
  }

  private static ExitCode failed(Exception problem, List<String> words, Terminal terminal) {
    if (problem instanceof Refusal refusal) {
      new FindingList(terminal).refusal(refusal.findings());
      return ExitCode.REFUSED;
    }
    if (problem instanceof UncheckedIOException || problem instanceof IOException) {
      terminal
          .err()
          .println(terminal.bad("flexbound: ") + PlainText.of(SystemMessage.of(problem)));
      return ExitCode.SYSTEM;
    }
    return fault(problem, words, terminal);
  }

  private static ExitCode fault(Throwable fault, List<String> words, Terminal terminal) {
    PrintWriter err = terminal.err();
    err.println(
        terminal.bad("flexbound: ")
            + "a fault of the program, not of your files: "
            + PlainText.of(fault.toString()));
    Optional<Path> file = FaultReport.write(fault, words);
    err.println(
        file.map(path -> "Please send this file to whoever looks after the program: " + path)
            .orElse("No report of it could be written."));
    return ExitCode.FAULT;
  }
}
