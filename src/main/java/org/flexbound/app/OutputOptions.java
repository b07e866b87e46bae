package org.flexbound.app;

import java.nio.file.Path;
import org.flexbound.report.UnitSystem;
import picocli.CommandLine.ITypeConverter;
import picocli.CommandLine.Option;
import picocli.CommandLine.TypeConversionException;

/** Where and in which units a command writes. */
final class OutputOptions {
  @Option(
      names = "--out",
      paramLabel = "DIR",
      defaultValue = "flexbound-out",
      description = "Folder to write to; made if it is not there (default: ${DEFAULT-VALUE}).")
  Path folder = Path.of("flexbound-out");

  @Option(
      names = "--units",
      paramLabel = "UNITS",
      defaultValue = "mm-kn",
      converter = Converter.class,
      description =
          "Units of the summary and the report: si, mm-kn or in-lbf (default: ${DEFAULT-VALUE}). "
              + "results.json is always in SI.")
  UnitSystem units = UnitSystem.MM_KN;

  /** Reads the name of a set of units. */
  static final class Converter implements ITypeConverter<UnitSystem> {
    @Override
    public UnitSystem convert(String value) {
      try {
        return UnitSystem.parse(value);
      } catch (IllegalArgumentException unknown) {
        throw new TypeConversionException(unknown.getMessage());
      }
    }
  }
}
