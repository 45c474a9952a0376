package dev.settlewell.vocabulary;

import dev.settlewell.unit.Dimension;
import java.util.List;
import java.util.Optional;

/**
 * One key of the format, as the schema describes it.
 *
 * @param name as a sheet writes it; of the items of a list or map, the list's own
 * @param takes what a value of the key must be
 * @param words of a choice all there are; of a quantity those that may stand in its place
 * @param refersTo what the name that stands here must be the name of; empty: nothing
 * @param kind of a {@link Shape#PART} the kind of its mapping
 * @param kinds of a {@link Shape#ONE_KIND} those its key may name
 * @param item of a list or map, what its items are
 * @param names of a map, what its keys are
 * @param entries two keys of the item's kind: where a list may also be written as a mapping, its
 *     keys give the first and its values the second
 * @param partOf the key whose long form this one is a piece of ({@code tolerance} of {@code value})
 * @param errorsFrom the key of {@code defaults} whose errors hold where the value states none
 * @param required a sheet without it is wrong; what else is missing only keeps figures from being
 *     computed
 * @param computed false for a key that is read and not computed with yet
 * @param standard what holds where the key is missing, as a sheet would write it
 * @param units those that data sheets use here, the likeliest first
 * @param doc Markdown: what it is, its unit, what data sheets call it
 */
public record Key(
    String name,
    Shape shape,
    Takes takes,
    List<String> words,
    Optional<NameKind> refersTo,
    Optional<String> kind,
    List<String> kinds,
    Optional<Key> item,
    Optional<MapNames> names,
    List<String> entries,
    Optional<String> partOf,
    Optional<String> errorsFrom,
    boolean required,
    boolean computed,
    Optional<String> standard,
    List<String> units,
    String doc,
    List<String> examples) {

  /** What the keys of a map are. */
  public enum MapNames {
    SUPPLY,
    CONVERTER,
    SCAN,
    INTERFERER,
    CHANNEL,
    /** Numbers of harmonics. */
    NUMBER,
    /** Names of findings. */
    FINDING;

    /** The user's own names, or empty where the keys are none. */
    public Optional<NameKind> nameKind() {
      return this == NUMBER || this == FINDING
          ? Optional.empty()
          : Optional.of(NameKind.valueOf(name()));
    }
  }

  /** Where the channel's own unit stands among the dimensions of a key. */
  public enum Measured {
    NO,
    YES,
    PER_SECOND
  }

  /**
   * The bounds of a value.
   *
   * @param dimensions those it may have, the likeliest first, beside the measured unit
   * @param measured whether it may have the channel's measured unit
   * @param positive above zero
   * @param least the least it may be, in the coherent unit or as a plain number
   * @param most the greatest
   * @param difference a temperature here is a difference
   * @param shuntSized milliohms are usual here
   * @param increasing of a list: each item above the one before
   * @param notEmpty of a list
   * @param size of a list: exactly so many items
   */
  public record Takes(
      List<Dimension> dimensions,
      Measured measured,
      boolean positive,
      Optional<Double> least,
      Optional<Double> most,
      boolean difference,
      boolean shuntSized,
      boolean increasing,
      boolean notEmpty,
      Optional<Integer> size) {
    public Takes {
      dimensions = List.copyOf(dimensions);
    }
  }

  public Key {
    words = List.copyOf(words);
    kinds = List.copyOf(kinds);
    entries = List.copyOf(entries);
    units = List.copyOf(units);
    examples = List.copyOf(examples);
  }

  /** True for a quantity in whose place a word or a name may stand. */
  public boolean takesWordOrQuantity() {
    return shape == Shape.QUANTITY && (!words.isEmpty() || refersTo.isPresent());
  }
}
