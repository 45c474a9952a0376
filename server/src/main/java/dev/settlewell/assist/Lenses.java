package dev.settlewell.assist;

import dev.settlewell.channel.ChannelFigures;
import dev.settlewell.channel.ScanFigures;
import dev.settlewell.text.Span;
import dev.settlewell.unit.Engineering;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/** One line over each channel and scan: how it stands. */
public final class Lenses {
  /** A line of text over the name it is about. */
  public record Lens(Span span, String text) {}

  private Lenses() {}

  public static List<Lens> of(Checked checked) {
    List<Lens> lenses = new ArrayList<>();
    for (ScanFigures scan : checked.analysis().scans().values()) {
      add(lenses, scan.scan().place().span(), scan(scan));
    }
    for (ChannelFigures channel : checked.analysis().channels()) {
      add(lenses, channel.channel().place().span(), channel(checked, channel));
    }
    return lenses;
  }

  private static void add(List<Lens> lenses, Span span, List<String> parts) {
    if (!parts.isEmpty()) {
      lenses.add(new Lens(span, String.join(" · ", parts)));
    }
  }

  private static List<String> scan(ScanFigures scan) {
    List<String> parts = new ArrayList<>();
    time(scan, "scan-time", "scan time ", parts);
    OptionalDouble use = scan.figures().value("scan-utilisation");
    use.ifPresent(share -> parts.add(Engineering.message(share, "1") + " of the period"));
    return parts;
  }

  private static void time(ScanFigures scan, String figure, String words, List<String> parts) {
    scan.figures()
        .value(figure)
        .ifPresent(value -> parts.add(words + Engineering.message(value, "s")));
  }

  private static List<String> channel(Checked checked, ChannelFigures channel) {
    List<String> parts = new ArrayList<>();
    channel.budget().ifPresent(budget -> parts.add(BudgetWords.total(budget)));
    OptionalDouble have = channel.figures().value("acquisition");
    OptionalDouble need = channel.figures().value("required-acquisition");
    if (have.isPresent() && need.isPresent()) {
      parts.add(
          "acquisition "
              + Engineering.message(have.getAsDouble(), "s")
              + ", needs "
              + Engineering.message(need.getAsDouble(), "s"));
    }
    long findings =
        checked.findings().stream()
            .filter(f -> f.subject().equals(channel.channel().name()) && !f.isAccepted())
            .count();
    if (findings > 0) {
      parts.add(findings == 1 ? "1 finding" : findings + " findings");
    }
    return parts;
  }
}
