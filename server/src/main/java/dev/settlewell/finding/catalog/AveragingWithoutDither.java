package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import java.util.function.Consumer;

/** Too little noise in front of the converter for a mean to be finer than a code. */
final class AveragingWithoutDither extends ChannelCheck {
  @Override
  public String name() {
    return "averaging-without-dither";
  }

  @Override
  public Severity severity() {
    return Severity.WARNING;
  }

  @Override
  public String summary() {
    return "averaging cannot fill in between the codes, for there is too little noise";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    boolean noiseIsKnown = channel.converter().map(part -> part.has("noise")).orElse(false);
    double bias = channel.magnitude("averaging-bias") / Math.sqrt(2);
    double rest = channel.number("averaging-rest");
    if (!noiseIsKnown || !(bias > rest)) {
      return;
    }
    report.accept(
        FindingBuilder.of(this, channel, "average")
            .message(
                ("with %s of noise the mean keeps a bias of %s rms, more than the %s that averaging"
                        + " leaves; about 0.5 LSB of noise in front of the converter would let it"
                        + " work")
                    .formatted(
                        Words.lsb(channel.number("noise-lsb")), Words.lsb(bias), Words.lsb(rest)))
            .need("at most " + Words.lsb(rest))
            .have(Words.lsb(bias))
            .related(
                channel.converter().map(part -> part.slot("noise").place()),
                "the converter's noise")
            .build());
  }
}
