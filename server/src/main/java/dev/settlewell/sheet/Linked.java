package dev.settlewell.sheet;

import dev.settlewell.text.Problem;
import dev.settlewell.unit.Toleranced;
import java.time.LocalDate;
import java.util.List;
import java.util.Map;

/**
 * A sheet together with all it uses: what its names mean, wherever they are defined.
 *
 * @param used every sheet reached by {@code use}, nearest first, without this one
 * @param supplies of this sheet and of the used ones
 * @param problems those that only show once sheets are put together: a name that nothing defines, a
 *     name defined twice, a circle
 * @param date the day the acceptances are judged on
 */
public record Linked(
    Sheet sheet,
    List<Sheet> used,
    Map<String, Named<Toleranced>> supplies,
    Map<String, Named<Part>> converters,
    Map<String, Named<Part>> interferers,
    List<Problem> problems,
    LocalDate date) {}
