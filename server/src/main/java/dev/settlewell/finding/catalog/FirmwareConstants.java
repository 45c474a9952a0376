package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.firmware.Constant;
import dev.settlewell.firmware.Constants;
import dev.settlewell.firmware.Source;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.SourceText;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/** What a sheet's {@code firmware} says, and what the sources say. */
final class FirmwareConstants {
  private FirmwareConstants() {}

  /**
   * One constant that the sheet names.
   *
   * @param source as it was read; empty where nobody looked
   */
  record Claim(
      Slot<String> constant,
      Slot<String> in,
      Slot<String> equalTo,
      double times,
      Optional<Source> source) {

    String name() {
      return constant.stated().orElseThrow();
    }

    String figure() {
      return equalTo.stated().orElseThrow();
    }

    /** The channel, scan or converter that an acceptance would stand on. */
    String subject() {
      String[] steps = figure().split("\\.");
      return steps.length > 2 ? steps[1] : steps[0];
    }

    List<Constant> definitions() {
      Optional<SourceText> text = source.flatMap(Source::text);
      return text.map(t -> Constants.find(t, name())).orElse(List.of());
    }
  }

  /** Those that are whole; what is missing or wrong in the others has its own finding. */
  static List<Claim> of(Analysis analysis) {
    return analysis.linked().sheet().top().list("firmware", Part.class).stated().stream()
        .flatMap(List::stream)
        .flatMap(item -> item.stated().stream())
        .flatMap(part -> claim(analysis, part))
        .toList();
  }

  private static Stream<Claim> claim(Analysis analysis, Part part) {
    Slot<String> constant = part.text("constant");
    Slot<String> in = part.text("in");
    Slot<String> equalTo = part.text("equals");
    Slot<Double> times = part.number("times");
    boolean whole = constant.isStated() && in.isStated() && equalTo.isStated() && !times.isWrong();
    if (!whole) {
      return Stream.empty();
    }
    Optional<Source> source =
        Optional.ofNullable(analysis.linked().sources().get(in.stated().orElseThrow()));
    return Stream.of(new Claim(constant, in, equalTo, times.orElse(1.0), source));
  }
}
