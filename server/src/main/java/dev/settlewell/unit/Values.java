package dev.settlewell.unit;

/**
 * Reads one value of a sheet by the grammar of {@code schema/grammar.md}: never guesses, and answers
 * what it refuses with the spelling to use.
 */
public final class Values {
  private Values() {}

  public static Reading<Toleranced> quantity(String raw, Expected expected) {
    throw new UnsupportedOperationException();
  }

  public static Reading<Toleranced> component(String raw, Expected expected) {
    throw new UnsupportedOperationException();
  }

  public static Reading<Deviation> deviation(String raw, Expected expected) {
    throw new UnsupportedOperationException();
  }

  public static Reading<Need> need(String raw, Expected expected) {
    throw new UnsupportedOperationException();
  }

  public static Reading<Range> range(String raw, Expected expected) {
    throw new UnsupportedOperationException();
  }

  public static Reading<Range> outputRange(String raw, Expected expected) {
    throw new UnsupportedOperationException();
  }

  /** {@link Form#COUNT}, {@link Form#PLAIN}, {@link Form#FRACTION}, {@link Form#RATIO}. */
  public static Reading<Double> number(Form form, String raw) {
    throw new UnsupportedOperationException();
  }
}
