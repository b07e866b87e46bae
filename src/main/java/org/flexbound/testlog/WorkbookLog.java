package org.flexbound.testlog;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.DigestInputStream;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import org.flexbound.document.EntryTable;
import org.flexbound.document.Sheet;
import org.flexbound.document.SheetFile;
import org.flexbound.document.WorkbookFile;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Outcome;
import org.flexbound.finding.Where;
import org.flexbound.quantity.Unit;
import org.flexbound.setup.DecisionRule;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Instrument;
import org.flexbound.setup.LimitSpec;
import org.flexbound.setup.Load;
import org.flexbound.setup.ReductionOptions;
import org.flexbound.setup.SlopeFit;

/** Reads a load-test workbook; all its problems come in one answer. */
public final class WorkbookLog {
  private final SheetFile file;
  private final Findings findings = new Findings();
  private final EntrySheets sheets;
  private final EntryCells cells = new EntryCells(findings);

  private WorkbookLog(SheetFile file) {
    this.file = file;
    this.sheets = new EntrySheets(file, findings);
  }

  /**
   * Reads a workbook. It stays open for as long as the readings of the log are used.
   *
   * @param path where it lies
   * @param shownName its name in messages and results
   * @return the log as far as it could be made out, with everything found
   */
  public static Outcome<TestLog> read(Path path, String shownName) {
    return WorkbookFile.open(path, shownName)
        .then(file -> new WorkbookLog(file).log(new InputFile(shownName, sha256(path))));
  }

  /**
   * The checksum of a file.
   *
   * @param path the file
   * @return SHA-256 in lower-case hexadecimal digits
   */
  public static String sha256(Path path) {
    try (InputStream in = Files.newInputStream(path)) {
      MessageDigest digest = MessageDigest.getInstance("SHA-256");
      try (DigestInputStream through = new DigestInputStream(in, digest)) {
        through.transferTo(java.io.OutputStream.nullOutputStream());
      }
      return HexFormat.of().formatHex(digest.digest());
    } catch (IOException refused) {
      throw new UncheckedIOException(refused);
    } catch (NoSuchAlgorithmException impossible) {
      throw new IllegalStateException("every Java platform has SHA-256", impossible);
    }
  }

  private Outcome<TestLog> log(InputFile input) {
    TestInformation information = sheets.information();
    Unit length = sheets.lengthUnit();
    List<Instrument> instruments = sheets.instruments();
    ReductionOptions options =
        sheets
            .table(SheetLayout.OPTIONS)
            .map(table -> new OptionsReader(cells, findings).read(table))
            .orElse(ReductionOptions.USUAL);
    List<Claim> claims = new ArrayList<>();
    List<Load> loads = new ArrayList<>();
    List<Gauge> gauges = new ArrayList<>();
    sheets
        .need(SheetLayout.LOAD_POINTS)
        .ifPresent(
            table -> {
              LoadsReader reader =
                  new LoadsReader(
                      table,
                      new PlacesReader(table, length, cells, findings),
                      cells,
                      findings,
                      options.localGravity());
              loads.addAll(reader.read());
              claims.addAll(reader.claims());
            });
    sheets
        .need(SheetLayout.GAUGES)
        .ifPresent(
            table -> {
              GaugesReader reader =
                  new GaugesReader(
                      table,
                      new PlacesReader(table, length, cells, findings),
                      cells,
                      findings,
                      length);
              gauges.addAll(reader.read());
              claims.addAll(reader.claims());
            });
    checkNames(claims, instruments);
    options
        .fitRangeByGauge()
        .keySet()
        .forEach(
            gauge -> {
              if (gauges.stream().noneMatch(found -> found.name().equals(gauge))) {
                findings.add(
                    TestlogFinding.UNKNOWN_NAME,
                    Where.sheet(file.name(), SheetLayout.OPTIONS.name()),
                    "found '" + gauge + "'; expected a gauge of the sheet Gauges");
              }
            });
    List<Run> runs = runs(claims, options);
    List<LimitSpec> limits =
        sheets
            .table(SheetLayout.LIMITS)
            .map(table -> new LimitsReader(cells, findings).read(table))
            .orElse(List.of());
    file.sheets().stream()
        .filter(
            sheet ->
                isEntrySheet(sheet)
                    || runs.stream()
                        .anyMatch(run -> run.where().sheet().equals(Optional.of(sheet.name()))))
        .filter(sheet -> !key(sheet.name()).equals("examples"))
        .forEach(sheet -> sheet.notes().report(sheet.where(), findings));
    refuseLater(options, limits);
    return Outcome.of(
        new TestLog(
            information, instruments, loads, gauges, runs, options, limits, List.of(input)),
        findings.list());
  }

  /** What the format knows and the program does not do yet is refused, never passed over. */
  private void refuseLater(ReductionOptions options, List<LimitSpec> limits) {
    if (!limits.isEmpty()) {
      findings.add(
          TestlogFinding.NOT_SUPPORTED_YET,
          limits.get(0).where(),
          "acceptance limits are not supported yet");
    }
    Where sheet = Where.sheet(file.name(), SheetLayout.OPTIONS.name());
    if (options.slopeFit() == SlopeFit.BOTH_VARIABLES || options.slopeFit() == SlopeFit.ROBUST) {
      findings.add(
          TestlogFinding.NOT_SUPPORTED_YET,
          sheet,
          "the slope fits 'both variables' and 'robust' are not supported yet");
    }
    if (options.decisionRule() != DecisionRule.GUARD_BAND) {
      findings.add(
          TestlogFinding.NOT_SUPPORTED_YET,
          sheet,
          "the decision rule belongs to acceptance limits, which are not supported yet");
    }
  }

  private void checkNames(List<Claim> claims, List<Instrument> instruments) {
    Set<String> known = instruments.stream().map(Instrument::name).collect(Collectors.toSet());
    for (Claim claim : claims) {
      if (claim.instrument().isEmpty()) {
        findings.add(
            TestlogFinding.NO_INSTRUMENT,
            claim.where(),
            "found no instrument for '" + claim.name() + "'");
      } else if (!known.contains(claim.instrument().get())) {
        findings.add(
            TestlogFinding.UNKNOWN_NAME,
            claim.where(),
            "found the instrument '"
                + claim.instrument().get()
                + "' for '"
                + claim.name()
                + "'; expected a name of the sheet Instruments");
      }
    }
    claims.stream()
        .filter(Claim::isLoad)
        .filter(load -> claims.stream().anyMatch(c -> !c.isLoad() && c.name().equals(load.name())))
        .forEach(
            load ->
                findings.add(
                    TestlogFinding.TWICE,
                    load.where(),
                    "found '" + load.name() + "' both as a load and as a gauge"));
  }

  private List<Run> runs(List<Claim> claims, ReductionOptions options) {
    if (claims.stream().noneMatch(Claim::isLoad) || claims.stream().allMatch(Claim::isLoad)) {
      return List.of();
    }
    Optional<EntryTable> table = sheets.table(SheetLayout.RUNS);
    List<RunRows.RunRow> described =
        table.map(found -> RunRows.read(found, cells, findings)).orElse(List.of());
    RunBuilder builder = new RunBuilder(claims, options.localGravity(), findings);
    List<Run> runs = new ArrayList<>();
    Set<String> used = described.stream().map(run -> key(run.sheet())).collect(Collectors.toSet());
    for (RunRows.RunRow run : described) {
      Optional<Sheet> sheet = file.sheet(run.sheet());
      if (sheet.isEmpty()) {
        findings.add(
            TestlogFinding.MISSING_SHEET,
            run.where(),
            "found no sheet '" + run.sheet() + "' for run '" + run.name() + "'");
        continue;
      }
      Optional<ReadingsSheet> readings = find(sheet.get(), claims, described);
      if (readings.isEmpty()) {
        findings.add(
            TestlogFinding.MISSING_COLUMN,
            sheet.get().where(),
            "found no header row that names a load column and a gauge column; expected one for run '"
                + run.name()
                + "'");
        continue;
      }
      builder.build(run, readings.get()).ifPresent(built -> add(runs, run, built, readings.get()));
    }
    for (Sheet sheet : file.sheets()) {
      if (used.contains(key(sheet.name())) || isEntrySheet(sheet)) {
        continue;
      }
      Optional<ReadingsSheet> readings = find(sheet, claims, described);
      if (readings.isEmpty()) {
        findings.add(
            TestlogFinding.SHEET_NOT_USED,
            sheet.where(),
            "the sheet is none of those known by name, and no header row of it names a load column"
                + " and a gauge column");
        continue;
      }
      RunRows.RunRow whole = RunBuilder.whole(readings.get());
      builder.build(whole, readings.get()).ifPresent(built -> add(runs, whole, built, readings.get()));
    }
    if (runs.isEmpty() && !findings.hasErrors()) {
      findings.add(
          TestlogFinding.NO_READINGS, Where.file(file.name()), "found no sheet with readings");
    }
    return runs;
  }

  private void add(List<Run> runs, RunRows.RunRow row, Run run, ReadingsSheet sheet) {
    int first = Math.max(row.firstRow(), sheet.firstDataRow());
    int rows = ReadingCheck.check(run, sheet, first, row.lastRow(), findings);
    if (rows == 0) {
      findings.add(
          TestlogFinding.NO_READINGS,
          sheet.sheet().where(),
          "found no readings for run '" + run.name() + "'");
    }
    runs.add(run);
  }

  private static Optional<ReadingsSheet> find(
      Sheet sheet, List<Claim> claims, List<RunRows.RunRow> described) {
    Set<String> loads = columns(claims, described, true);
    Set<String> gauges = columns(claims, described, false);
    return ReadingsSheet.find(sheet, loads, gauges);
  }

  private static Set<String> columns(
      List<Claim> claims, List<RunRows.RunRow> described, boolean ofLoads) {
    Set<String> columns =
        claims.stream()
            .filter(claim -> claim.isLoad() == ofLoads)
            .map(claim -> ReadingsSheet.key(claim.column()))
            .collect(Collectors.toSet());
    for (RunRows.RunRow run : described) {
      run.meanings()
          .forEach(
              (column, meaning) ->
                  claims.stream()
                      .filter(claim -> claim.name().equals(meaning.name()))
                      .filter(claim -> claim.isLoad() == ofLoads)
                      .forEach(claim -> columns.add(column)));
    }
    return columns;
  }

  private static boolean isEntrySheet(Sheet sheet) {
    String name = key(sheet.name());
    return name.equals("examples")
        || SheetLayout.ALL.stream().anyMatch(layout -> key(layout.name()).equals(name));
  }

  private static String key(String text) {
    return text.strip().toLowerCase(Locale.ROOT);
  }
}
