package dev.settlewell.sheet;

import dev.settlewell.syntax.SyntaxTree;
import dev.settlewell.text.Place;
import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import dev.settlewell.unit.Toleranced;
import java.util.List;
import java.util.Map;

/**
 * One channel sheet, bound to the schema. Whatever the text, there is a sheet: what could not be
 * read is {@link Slot.Wrong} in its slot and stands in {@code problems}.
 *
 * <p>{@code defaults} are already filled in: a resistor or capacitor of a path that states no
 * tolerance (or no drift) has the default's.
 *
 * @param top the keys of the top level
 * @param uncomputed keys that the format has and that nothing is computed from yet
 */
public record Sheet(
    SourceText text,
    SyntaxTree tree,
    Part top,
    Map<String, Named<Toleranced>> supplies,
    Map<String, Named<Part>> converters,
    Map<String, Named<Part>> scans,
    Map<String, Named<Part>> interferers,
    Map<String, Named<Part>> channels,
    List<Problem> problems,
    List<Place> uncomputed) {

  public String path() {
    return text.name();
  }
}
