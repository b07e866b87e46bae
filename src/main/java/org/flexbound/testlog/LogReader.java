package org.flexbound.testlog;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Supplier;
import java.util.stream.Collectors;
import org.flexbound.document.EntryTable;
import org.flexbound.document.ReadProgress;
import org.flexbound.finding.Findings;
import org.flexbound.finding.Refusal;
import org.flexbound.finding.Where;
import org.flexbound.quantity.NearestWord;
import org.flexbound.quantity.Unit;
import org.flexbound.setup.Gauge;
import org.flexbound.setup.Instrument;
import org.flexbound.setup.LimitSpec;
import org.flexbound.setup.Load;
import org.flexbound.setup.ReductionOptions;
import org.flexbound.setup.StatedCoefficient;

/** Makes a test log of tables of entries and sheets of readings; all problems come in one answer. */
final class LogReader {
  private final LogTables tables;
  private final List<ReadingsSource> sources;
  private final LogContext context;
  private final Findings findings;
  private final EntrySheets sheets;
  private final EntryCells cells;

  /**
   * A reader.
   *
   * @param log where the entries stand
   * @param sources the sheets that may hold readings
   * @param context what is known outside of the log
   * @param findings gets everything found
   */
  LogReader(
      LogTables log, List<ReadingsSource> sources, LogContext context, Findings findings) {
    this.context = context;
    this.tables = new OverriddenTables(log, context, findings);
    this.sources = List.copyOf(sources);
    this.findings = findings;
    this.sheets = new EntrySheets(this.tables, findings);
    this.cells = new EntryCells(findings);
  }

  /** Reads the log; the files that were read are asked for at the end. */
  TestLog log(Supplier<List<InputFile>> inputs) {
    TestInformation information = sheets.information();
    Unit length = sheets.lengthUnit();
    List<Instrument> instruments = sheets.instruments();
    OptionsReader optionsReader = new OptionsReader(cells, findings);
    ReductionOptions options =
        sheets.table(SheetLayout.OPTIONS).map(optionsReader::read).orElse(ReductionOptions.USUAL);
    Optional<EntryTable> coefficients =
        sheets.table(SheetLayout.COEFFICIENTS).filter(table -> !table.entries().isEmpty());
    boolean stated = coefficients.isPresent();
    List<Claim> claims = new ArrayList<>();
    List<Load> loads = new ArrayList<>();
    List<Gauge> gauges = new ArrayList<>();
    sheets
        .need(stated ? SheetLayout.LOAD_POINTS.without("Column") : SheetLayout.LOAD_POINTS)
        .ifPresent(
            table -> {
              LoadsReader reader =
                  new LoadsReader(
                      table,
                      new PlacesReader(table, length, cells, findings),
                      cells,
                      findings,
                      options.localGravity(),
                      stated);
              loads.addAll(reader.read());
              claims.addAll(reader.claims());
            });
    sheets
        .need(stated ? SheetLayout.GAUGES.without("Column") : SheetLayout.GAUGES)
        .ifPresent(
            table -> {
              GaugesReader reader =
                  new GaugesReader(
                      table,
                      new PlacesReader(table, length, cells, findings),
                      cells,
                      findings,
                      length,
                      stated);
              gauges.addAll(reader.read());
              claims.addAll(reader.claims());
            });
    checkNames(claims, instruments);
    List<String> gaugeNames = gauges.stream().map(Gauge::name).toList();
    optionsReader
        .gauges()
        .forEach(
            (gauge, where) -> {
              if (!gaugeNames.contains(gauge)) {
                findings.add(
                    TestlogFinding.UNKNOWN_NAME,
                    where,
                    "found '"
                        + gauge
                        + "'; expected a gauge of the "
                        + tables.name(SheetLayout.GAUGES)
                        + NearestWord.question(gauge, gaugeNames));
              }
            });
    List<Run> runs = runs(claims, options, stated);
    List<StatedCoefficient> given =
        coefficients
            .map(
                table ->
                    new CoefficientsReader(
                            table, gauges, loads, options.statedRepeatability(), cells, findings)
                        .read())
            .orElse(List.of());
    if (stated && !sources.isEmpty()) {
      findings.add(
          TestlogFinding.BOTH,
          coefficients.get().where(),
          "found coefficients in place of readings, but also " + sources.get(0).sheet().where());
    }
    List<LimitSpec> limits =
        sheets
            .table(SheetLayout.LIMITS)
            .map(table -> new LimitsReader(cells, findings).read(table))
            .orElse(List.of());
    return new TestLog(
        information, instruments, loads, gauges, runs, options, limits, given, inputs.get());
  }

  private List<Run> runs(List<Claim> claims, ReductionOptions options, boolean stated) {
    if (stated) {
      return List.of();
    }
    return context.planned() ? plannedRuns(claims, options) : runs(claims, options);
  }

  /** The runs as far as they stand there already; what is missing or wrong with them is no matter. */
  private List<Run> plannedRuns(List<Claim> claims, ReductionOptions options) {
    return new LogReader(tables, sources, LogContext.NONE.with(context.progress()), new Findings()).runs(claims, options);
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
                + "'; expected a name of the "
                + tables.name(SheetLayout.INSTRUMENTS)
                + NearestWord.question(claim.instrument().get(), known));
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
    List<RunRows.RunRow> described =
        sheets
            .table(tables.runs())
            .map(found -> RunRows.read(found, !tables.runs().equals(SheetLayout.RUNS), cells, findings))
            .orElse(List.of());
    RunBuilder builder = new RunBuilder(claims, options.localGravity(), context.progress(), findings);
    HeaderSearch search =
        new HeaderSearch(
            columns(claims, described, true), columns(claims, described, false), findings);
    Map<ReadingsSource, Optional<ReadingsSheet>> headers = new LinkedHashMap<>();
    List<Run> runs = new ArrayList<>();
    Set<ReadingsSource> used = new LinkedHashSet<>();
    for (RunRows.RunRow run : described) {
      Optional<ReadingsSource> source = source(run);
      if (source.isEmpty()) {
        continue;
      }
      used.add(source.get());
      ReadingsSource sound = source.get().whereExpected();
      Optional<ReadingsSheet> readings =
          headers.computeIfAbsent(
              source.get(), key -> unlessDamaged(() -> search.find(sound)));
      readings
          .flatMap(sheet -> unlessDamaged(() -> builder.build(run, sheet)))
          .ifPresent(runs::add);
    }
    for (ReadingsSource source : sources) {
      if (used.contains(source)) {
        continue;
      }
      int before = findings.list().size();
      Optional<ReadingsSheet> readings = unlessDamaged(() -> search.find(source));
      if (readings.isPresent()) {
        RunRows.RunRow whole = RunBuilder.whole(readings.get());
        used.add(source);
        unlessDamaged(() -> builder.build(whole, readings.get())).ifPresent(runs::add);
      } else if (findings.list().size() == before) {
        findings.add(
            TestlogFinding.SHEET_NOT_USED,
            source.sheet().where(),
            "the sheet is none of those known by name, and no header row of it names a load column"
                + " and a gauge column");
      }
    }
    if (runs.isEmpty() && !findings.hasErrors()) {
      findings.add(
          TestlogFinding.NO_READINGS, tables.where(tables.runs()), "found no sheet with readings");
    }
    sources.stream()
        .map(ReadingsSource::file)
        .filter(name -> !name.isEmpty())
        .distinct()
        .filter(name -> used.stream().noneMatch(source -> source.file().equals(name)))
        .filter(name -> sources.stream().noneMatch(s -> s.file().equals(name) && s.expected()))
        .forEach(
            name ->
                findings.add(
                    TestlogFinding.NO_READINGS,
                    Where.file(name),
                    "no sheet of the file names a load column and a gauge column"));
    sources.stream()
        .filter(used::contains)
        .forEach(
            source ->
                unlessDamaged(() -> Optional.of(source.sheet().notes()))
                    .ifPresent(notes -> notes.report(source.sheet().where(), findings)));
    return runs;
  }

  /** The sheet that a run names. */
  private Optional<ReadingsSource> source(RunRows.RunRow run) {
    List<ReadingsSource> ofFile =
        sources.stream()
            .filter(source -> run.file().isEmpty() || source.file().equals(run.file()))
            .toList();
    List<ReadingsSource> fitting =
        ofFile.stream()
            .filter(
                source ->
                    run.sheet().isEmpty()
                        || HeaderText.key(source.sheet().name()).equals(HeaderText.key(run.sheet())))
            .toList();
    if (fitting.size() == 1) {
      return Optional.of(fitting.get(0));
    }
    if (fitting.isEmpty()) {
      boolean file = ofFile.isEmpty();
      String wanted = file ? run.file() : run.sheet();
      List<String> known =
          file
              ? sources.stream().map(ReadingsSource::file).distinct().toList()
              : ofFile.stream().map(source -> source.sheet().name()).toList();
      findings.add(
          TestlogFinding.MISSING_SHEET,
          run.where(),
          "found no "
              + (file ? "file" : "sheet")
              + " '"
              + wanted
              + "' for run '"
              + run.name()
              + "'"
              + NearestWord.question(wanted, known));
    } else {
      findings.add(
          TestlogFinding.MISSING_ENTRY,
          run.where(),
          "the file '"
              + run.file()
              + "' has the sheets "
              + fitting.stream()
                  .map(source -> "'" + source.sheet().name() + "'")
                  .collect(Collectors.joining(", "))
              + "; expected one of them for run '"
              + run.name()
              + "'");
    }
    return Optional.empty();
  }

  /** What is damaged or passes a limit is told beside what was found before, and the rest is read. */
  private <T> Optional<T> unlessDamaged(Supplier<Optional<T>> reading) {
    try {
      return reading.get();
    } catch (Refusal damaged) {
      findings.addAll(damaged.findings());
      return Optional.empty();
    }
  }

  private static Set<String> columns(
      List<Claim> claims, List<RunRows.RunRow> described, boolean ofLoads) {
    Set<String> columns =
        claims.stream()
            .filter(claim -> claim.isLoad() == ofLoads)
            .map(Claim::key)
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
}
