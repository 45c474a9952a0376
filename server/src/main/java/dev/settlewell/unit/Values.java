package dev.settlewell.unit;

/**
 * Reads one value of a sheet by the grammar of {@code schema/grammar.md}: never guesses, and
 * answers what it refuses with the spelling to use.
 *
 * <p>A reading has a value beside flaws only where every flaw is a slip of spelling whose meaning
 * is certain ({@link Flaw#safe()}), or a doubt.
 */
public final class Values {
  private Values() {}

  public static Reading<Toleranced> quantity(String raw, Expected expected) {
    return Cursor.read(raw, cursor -> new Grammar(cursor, expected).quantity());
  }

  public static Reading<Toleranced> component(String raw, Expected expected) {
    return Cursor.read(raw, cursor -> new Grammar(cursor, expected).component());
  }

  public static Reading<Deviation> deviation(String raw, Expected expected) {
    return Cursor.read(raw, cursor -> new Grammar(cursor, expected).deviation());
  }

  public static Reading<Need> need(String raw, Expected expected) {
    return Cursor.read(raw, cursor -> new Grammar(cursor, expected).need());
  }

  public static Reading<Range> range(String raw, Expected expected) {
    return Cursor.read(raw, cursor -> new Grammar(cursor, expected).range(false));
  }

  public static Reading<Range> outputRange(String raw, Expected expected) {
    return Cursor.read(raw, cursor -> new Grammar(cursor, expected).range(true));
  }

  /**
   * {@link Form#COUNT}, {@link Form#PLAIN}, {@link Form#FRACTION}, {@link Form#RATIO}; decibels of
   * a ratio become a ratio of amplitudes.
   */
  public static Reading<Double> number(Form form, String raw) {
    return Cursor.read(
        raw,
        cursor -> {
          PlainNumbers numbers = new PlainNumbers(cursor);
          return switch (form) {
            case COUNT -> numbers.count();
            case PLAIN -> numbers.plain();
            case FRACTION -> numbers.fraction();
            case RATIO -> numbers.ratio();
            default -> throw new IllegalArgumentException(form + " carries a unit");
          };
        });
  }
}
