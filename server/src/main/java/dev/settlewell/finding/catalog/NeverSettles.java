package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Figure;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Part;
import dev.settlewell.text.Fix;
import dev.settlewell.unit.PreferredValues;
import dev.settlewell.unit.PreferredValues.Series;
import dev.settlewell.unit.Toleranced;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;

/** Neither a longer acquisition nor a larger capacitor at the pin lets the readings settle. */
final class NeverSettles extends ChannelCheck {
  @Override
  public String name() {
    return "never-settles";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "neither a longer acquisition nor a larger capacitor at the pin lets readings settle";
  }

  @Override
  public List<String> covers() {
    return List.of("reservoir-too-small");
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    SettlingJudgement settling = new SettlingJudgement(channel);
    if (!settling.exceeds() || settling.mend() != SettlingJudgement.Mend.NEITHER) {
      return;
    }
    Optional<String> largest = settling.sourceResistance();
    String would =
        largest
            .map(ohms -> "the source resistance would have to be at most " + ohms)
            .orElse("only a lower rate, or an amplifier in front of the pin, would");
    String message =
        ("%s stay unsettled after %s, and neither a longer acquisition nor a larger"
                + " capacitor at the pin mends it; %s")
            .formatted(Words.lsb(settling.error()), settling.have(), would);
    report.accept(
        settling
            .begin(this, channel.place("acquisition"))
            .severity(Severity.ERROR)
            .message(message)
            .need(largest.map(ohms -> "at most " + ohms).orElse("another source"))
            .fact("acquisition", why(channel, "required-acquisition"))
            .fact("reservoir", why(channel, "smallest-reservoir"))
            .candidate(lowerResistor(channel, settling))
            .build());
  }

  private static String why(ChannelView channel, String figure) {
    return channel
        .figure(figure)
        .map(Figure::state)
        .filter(Figure.State.None.class::isInstance)
        .map(state -> ((Figure.State.None) state).why())
        .orElse("none that fits the scan");
  }

  private static Optional<Fix> lowerResistor(ChannelView channel, SettlingJudgement settling) {
    Optional<Part> resistor = settling.onlyResistor();
    double tooMuch =
        channel.number("source-resistance") - channel.number("largest-source-resistance");
    double value =
        resistor
            .flatMap(part -> part.quantity("value").stated())
            .map(Toleranced::value)
            .orElse(Double.NaN);
    if (!(value - tooMuch > 0)) {
      return Optional.empty();
    }
    String lower = Words.part(PreferredValues.nextLower(Series.E24, value - tooMuch), "Ω");
    return Rewriting.fix(
        channel.text(), resistor.get().slot("value"), lower, "Lower the resistor to " + lower);
  }
}
