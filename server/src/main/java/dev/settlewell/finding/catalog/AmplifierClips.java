package dev.settlewell.finding.catalog;

import dev.settlewell.channel.OutputRange;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import java.util.function.Consumer;

/** An amplifier of the path is asked for more than its output can reach. */
final class AmplifierClips extends ChannelCheck {
  @Override
  public String name() {
    return "amplifier-clips";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "an amplifier's output cannot follow the measured range";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    for (OutputRange output : channel.figures().outputs()) {
      boolean nominal =
          output.nominalHigh() > output.swingHigh() || output.nominalLow() < output.swingLow();
      boolean worst =
          output.worstHigh() > output.swingHigh() || output.worstLow() < output.swingLow();
      if (nominal) {
        report.accept(finding(channel, output, output.nominalLow(), output.nominalHigh(), true));
      } else if (worst) {
        report.accept(finding(channel, output, output.worstLow(), output.worstHigh(), false));
      }
    }
  }

  private Finding finding(
      ChannelView channel, OutputRange output, double low, double high, boolean nominal) {
    String swing = Words.range(output.swingLow(), output.swingHigh(), "V");
    String reached = Words.range(low, high, "V");
    String message =
        "the output must go from %s%s and can go from %s; %s"
            .formatted(
                reached, nominal ? "" : " with all tolerances", swing, mend(output, low, high));
    return FindingBuilder.of(this, output.place(), channel.name())
        .severity(nominal ? Severity.ERROR : Severity.WARNING)
        .about(label(channel, output))
        .message(message)
        .need("within " + swing)
        .have(reached)
        .margin(Words.of(Math.min(output.swingHigh() - high, low - output.swingLow()), "V"))
        .related(output.swingPlace(), "what the output can reach")
        .related(channel.stated("measures"), "what is measured")
        .build();
  }

  private static String mend(OutputRange output, double low, double high) {
    double width = (output.swingHigh() - output.swingLow()) / (high - low);
    if (width < 1) {
      return "at most " + Words.share(width) + " of the gain fit";
    }
    double shift = high > output.swingHigh() ? output.swingHigh() - high : output.swingLow() - low;
    return "a level "
        + Words.of(Math.abs(shift), "V")
        + (shift < 0 ? " lower" : " higher")
        + " fits";
  }

  private static String label(ChannelView channel, OutputRange output) {
    return channel.stages().stream()
        .filter(stage -> stage.part().keyPlace().equals(output.place()))
        .map(ChannelView.Stage::label)
        .findFirst()
        .orElse("");
  }
}
