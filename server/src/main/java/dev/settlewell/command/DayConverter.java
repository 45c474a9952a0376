package dev.settlewell.command;

import java.time.LocalDate;
import java.time.format.DateTimeParseException;
import picocli.CommandLine;

/** Reads a day as {@code 2027-06-30}. */
final class DayConverter implements CommandLine.ITypeConverter<LocalDate> {
  @Override
  public LocalDate convert(String word) {
    try {
      return LocalDate.parse(word);
    } catch (DateTimeParseException e) {
      throw new CommandLine.TypeConversionException(
          "'" + word + "' is no day; write it as 2027-06-30");
    }
  }
}
