package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Alias;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Consumer;
import java.util.function.Predicate;

/** The lines of a channel's interferers that are worth a finding, the worst of each interferer. */
final class Interference {
  private final ChannelView channel;

  Interference(ChannelView channel) {
    this.channel = channel;
  }

  /** Reports each interferer that has such a line once, by its largest one. */
  void report(Check check, Predicate<Alias> concerns, String tells, Consumer<Finding> report) {
    Map<String, List<Alias>> byInterferer = new LinkedHashMap<>();
    for (Alias alias : channel.figures().aliases()) {
      if (concerns.test(alias) && alias.amplitudeMeasured() > channel.noticeable()) {
        byInterferer.computeIfAbsent(alias.interferer(), name -> new ArrayList<>()).add(alias);
      }
    }
    byInterferer.values().forEach(lines -> report.accept(finding(check, lines, tells)));
  }

  private Finding finding(Check check, List<Alias> lines, String tells) {
    Alias worst =
        lines.stream().max(Comparator.comparingDouble(Alias::amplitudeMeasured)).orElseThrow();
    String amplitude =
        Words.of(worst.amplitudeMeasured(), channel.unit())
            + " ("
            + Words.lsb(worst.amplitudeLsb())
            + ")";
    InterferenceRemedies remedies = new InterferenceRemedies(channel, worst);
    String message =
        "%s at %s %s with an amplitude of %s; %s would be small enough: %s"
            .formatted(
                line(worst),
                Words.of(worst.frequency(), "Hz"),
                tells.formatted(landing(worst)),
                amplitude,
                Words.of(channel.noticeable(), channel.unit()),
                remedies.told());
    FindingBuilder finding =
        FindingBuilder.of(check, worst.place(), channel.name())
            .about(worst.interferer())
            .message(message)
            .need("at most " + Words.of(channel.noticeable(), channel.unit()))
            .have(amplitude)
            .fact("gain", Words.share(worst.gain()));
    for (Alias line : lines) {
      if (line != worst) {
        finding.fact(
            line(line), landing(line) + ", " + Words.of(line.amplitudeMeasured(), channel.unit()));
      }
    }
    remedies.fixes().forEach(fix -> finding.candidate(Optional.of(fix)));
    return finding
        .related(channel.scan().map(scan -> scan.slot("rate").place()), "the scan's rate")
        .related(channel.stated("average"), "the average")
        .build();
  }

  private static String line(Alias alias) {
    return alias.harmonic() == 1
        ? alias.interferer()
        : "harmonic " + alias.harmonic() + " of " + alias.interferer();
  }

  private static String landing(Alias alias) {
    return alias.landsLow() == alias.landsHigh()
        ? Words.of(alias.landsLow(), "Hz")
        : Words.range(alias.landsLow(), alias.landsHigh(), "Hz");
  }
}
