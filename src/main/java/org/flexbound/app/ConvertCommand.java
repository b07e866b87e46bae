package org.flexbound.app;

import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.Callable;
import org.flexbound.document.OutputFolder;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Refusal;
import org.flexbound.frame.FrameModel;
import org.flexbound.frame.FrameReader;
import org.flexbound.frame.FrameWorkbook;
import org.flexbound.frame.FrameWriter;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Turns a frame model from JSON into a workbook, or back. */
@Command(
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    sortOptions = false,
    description = {
      "Turns a frame model from JSON into a workbook with one sheet for each key, or back. Either "
          + "may be named as the model of a study. A file that is already there is not touched.",
      "",
      "Entries and units stay as they were written; what a cell cannot hold is told."
    })
final class ConvertCommand implements Callable<Integer> {
  private final Terminal terminal;

  @Parameters(paramLabel = "MODEL", description = "The model: a .json file, or a workbook (.xlsx).")
  @SuppressWarnings("NullAway.Init") // picocli sets it before call() is called
  private Path file;

  @Option(
      names = "--out",
      paramLabel = "DIR",
      description = "Folder to write to (default: that of the model).")
  private Optional<Path> folder = Optional.empty();

  @Spec
  @SuppressWarnings("NullAway.Init") // picocli sets it before call() is called
  private CommandSpec spec;

  ConvertCommand(Terminal terminal) {
    this.terminal = terminal;
  }

  @Override
  public Integer call() {
    String name = String.valueOf(file.getFileName());
    boolean workbook = FrameReader.isWorkbook(file);
    int dot = name.lastIndexOf('.');
    String target = (dot > 0 ? name.substring(0, dot) : name) + (workbook ? ".json" : ".xlsx");
    Path to =
        folder.orElseGet(
            () -> Optional.ofNullable(file.toAbsolutePath().getParent()).orElse(Path.of(".")));
    Path shown = folder.map(f -> f.resolve(target)).orElseGet(() -> file.resolveSibling(target));
    Outcome<FrameModel> read = FrameReader.read(file, name);
    Findings findings = new Findings();
    findings.addAll(read.findings());
    findings.refuseIfErrors();
    FrameModel model = read.value().orElseThrow(() -> new Refusal(findings.list()));
    if (Files.exists(shown)) {
      throw new ParameterException(
          spec.commandLine(),
          PlainText.of(shown.toString())
              + " is there already; name another folder with --out, or take the file away");
    }
    OutputFolder outputs = new OutputFolder(to);
    if (workbook) {
      outputs.add(target, FrameWriter.write(model).getBytes(StandardCharsets.UTF_8));
    } else {
      FrameWorkbook.Written written = FrameWorkbook.write(model);
      findings.addAll(written.findings());
      outputs.add(target, written.bytes());
    }
    outputs.write();
    new FindingList(terminal).print(findings.list(), terminal.out());
    terminal.out().println("  " + PlainText.of(shown + " written"));
    return ExitCode.DONE.number();
  }
}
