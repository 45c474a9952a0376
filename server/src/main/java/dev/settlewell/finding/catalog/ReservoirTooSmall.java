package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Place;
import dev.settlewell.unit.PreferredValues;
import dev.settlewell.unit.PreferredValues.Series;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;

/** No acquisition lets the hold capacitor settle, but a larger capacitor at the pin does. */
final class ReservoirTooSmall extends ChannelCheck {
  @Override
  public String name() {
    return "reservoir-too-small";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "the capacitor at the pin is too small to charge the hold capacitor from";
  }

  @Override
  public List<String> covers() {
    return List.of("acquisition-too-short");
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    SettlingJudgement settling = new SettlingJudgement(channel);
    if (!settling.exceeds() || settling.mend() != SettlingJudgement.Mend.LARGER_RESERVOIR) {
      return;
    }
    double smallest = channel.number("smallest-reservoir");
    String part = Words.part(PreferredValues.nextHigher(Series.E6, smallest), "F");
    String needed = Words.of(smallest, "F") + " (" + part + " of E6)";
    Optional<Slot<?>> reservoir = settling.reservoir();
    String present =
        reservoir
            .map(slot -> "the capacitor at the pin leaves ")
            .orElse("no capacitor at the pin: ");
    String message =
        ("%s%s unsettled after %s, and no acquisition that fits mends it; needs at least %s"
                + " at the pin")
            .formatted(present, Words.lsb(settling.error()), settling.have(), needed);
    Place place = reservoir.map(Slot::place).orElse(channel.keyPlace("path"));
    report.accept(
        settling
            .begin(this, place)
            .message(message)
            .need(needed)
            .related(channel.stated("acquisition"), "the acquisition")
            .candidate(reservoir.flatMap(slot -> larger(channel, slot, part)))
            .build());
  }

  private static Optional<Fix> larger(ChannelView channel, Slot<?> slot, String part) {
    return Rewriting.fix(channel.text(), slot, part, "Put " + part + " at the pin");
  }
}
