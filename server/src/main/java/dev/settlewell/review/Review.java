package dev.settlewell.review;

import java.time.LocalDate;
import java.util.Comparator;
import java.util.List;

/**
 * Everything one report tells.
 *
 * @param sheets by path
 * @param failures files that could not be read, each with the reason
 * @param version of this program
 * @param date the day the acceptances were judged on
 */
public record Review(
    List<Reviewed> sheets, List<Failure> failures, String version, LocalDate date) {

  /** A file that could not be read. */
  public record Failure(String path, String message) {}

  public Review {
    sheets = sheets.stream().sorted(Comparator.comparing(Reviewed::path)).toList();
    failures = failures.stream().sorted(Comparator.comparing(Failure::path)).toList();
  }

  public String tool() {
    return "settlewell " + version;
  }

  Locations locations() {
    return new Locations(sheets);
  }
}
