package dev.settlewell.finding;

/** How much a finding matters, the gravest first. */
public enum Severity {
  /** Readings are wrong. */
  ERROR,
  /** Readings are worse than {@code needs}. */
  WARNING,
  /** What a reviewer would want to know. */
  INFORMATION,
  HINT,
  /** Not reported. */
  OFF;

  public String label() {
    return name().toLowerCase(java.util.Locale.ROOT);
  }

  public boolean atLeast(Severity other) {
    return compareTo(other) <= 0;
  }
}
