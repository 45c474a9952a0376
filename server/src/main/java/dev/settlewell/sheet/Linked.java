package dev.settlewell.sheet;

import dev.settlewell.firmware.Source;
import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import dev.settlewell.unit.Toleranced;
import java.time.LocalDate;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * A sheet together with all it uses: what its names mean, wherever they are defined, and the
 * sources of the firmware that it is held against.
 *
 * @param used every sheet reached by {@code use}, nearest first, without this one
 * @param supplies of this sheet and of the used ones
 * @param problems those that only show once sheets are put together: a name that nothing defines, a
 *     name defined twice, a circle
 * @param sources the source files that {@code firmware} names, by the path as the sheet writes it
 * @param date the day the acceptances are judged on
 */
public record Linked(
    Sheet sheet,
    List<Sheet> used,
    Map<String, Named<Toleranced>> supplies,
    Map<String, Named<Part>> converters,
    Map<String, Named<Part>> interferers,
    List<Problem> problems,
    Map<String, Source> sources,
    LocalDate date) {

  /** A sheet whose firmware is not looked at. */
  public Linked(
      Sheet sheet,
      List<Sheet> used,
      Map<String, Named<Toleranced>> supplies,
      Map<String, Named<Part>> converters,
      Map<String, Named<Part>> interferers,
      List<Problem> problems,
      LocalDate date) {
    this(sheet, used, supplies, converters, interferers, problems, Map.of(), date);
  }

  /** The text of that name that a place may stand in: a sheet's or a source's. */
  public Optional<SourceText> text(String name) {
    return Stream.concat(
            Stream.concat(Stream.of(sheet), used.stream()).map(Sheet::text),
            sources.values().stream().flatMap(source -> source.text().stream()))
        .filter(text -> text.name().equals(name))
        .findFirst();
  }

  public Linked with(Map<String, Source> other) {
    return new Linked(
        sheet, used, supplies, converters, interferers, problems, Map.copyOf(other), date);
  }
}
