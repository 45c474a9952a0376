package dev.settlewell.text;

import java.util.List;

/**
 * Something that keeps a stretch of text from being taken as written. Found by the readers (YAML,
 * quantities, the sheet); named as findings further up.
 *
 * @param message one sentence: what is wrong, and the spelling that mends it
 */
public record Problem(
    Kind kind, Place place, String message, List<Related> related, List<Fix> fixes) {

  /** What is wrong, in the terms of the catalogue of findings. */
  public enum Kind {
    SYNTAX,
    UNKNOWN_KEY,
    MISSING_KEY,
    WRONG_KIND,
    MISSING_UNIT,
    WRONG_UNIT,
    NOT_ONE_VALUE,
    VALUE_OUT_OF_RANGE,
    UNKNOWN_NAME,
    DUPLICATE_NAME,
    FORMAT_VERSION,
    USE_NOT_FOUND,
    USE_OUTSIDE_WORKSPACE,
    USE_CIRCLE,
    AMBIGUOUS_TEXT,
    ERROR_STATED_TWICE
  }

  public Problem {
    related = List.copyOf(related);
    fixes = List.copyOf(fixes);
  }

  public Problem(Kind kind, Place place, String message) {
    this(kind, place, message, List.of(), List.of());
  }

  public Problem(Kind kind, Place place, String message, Fix... fixes) {
    this(kind, place, message, List.of(), List.of(fixes));
  }
}
