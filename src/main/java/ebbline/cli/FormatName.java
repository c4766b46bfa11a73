package ebbline.cli;

import ebbline.report.OutputFormat;
import java.util.Locale;
import picocli.CommandLine.ITypeConverter;
import picocli.CommandLine.TypeConversionException;

/** Reads a format by its label. */
final class FormatName implements ITypeConverter<OutputFormat> {
  @Override
  public OutputFormat convert(String text) {
    for (OutputFormat format : OutputFormat.values()) {
      if (format.label().equals(text.toLowerCase(Locale.ROOT))) {
        return format;
      }
    }
    throw new TypeConversionException("found '" + text + "': expected table, csv or json");
  }
}
