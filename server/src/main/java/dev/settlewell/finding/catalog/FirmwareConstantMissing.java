package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.firmware.Constant;
import dev.settlewell.firmware.Source;
import dev.settlewell.sheet.Slot;
import java.util.List;
import java.util.function.Consumer;

/** A constant of the firmware, or the figure it must agree with, that is not there. */
final class FirmwareConstantMissing implements Check {
  @Override
  public String name() {
    return "firmware-constant-missing";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "a constant that the sheet names is not in the firmware";
  }

  @Override
  public void run(Analysis analysis, Consumer<Finding> report) {
    for (FirmwareConstants.Claim claim : FirmwareConstants.of(analysis)) {
      if (!NamedFigure.find(analysis, claim.figure()).known()) {
        report.accept(
            finding(
                claim,
                claim.equalTo(),
                "nothing computed or stated is named "
                    + claim.figure()
                    + ": write CHANNEL.FIGURE, SCAN.CHANNEL.FIGURE or CONVERTER.KEY"));
      }
      claim.source().ifPresent(source -> look(claim, source, report));
    }
  }

  private void look(FirmwareConstants.Claim claim, Source source, Consumer<Finding> report) {
    String file = claim.in().stated().orElseThrow();
    if (source.text().isEmpty()) {
      report.accept(
          finding(
              claim,
              claim.in(),
              claim.name() + " cannot be compared: " + file + ": " + source.why()));
      return;
    }
    List<Constant> definitions = claim.definitions();
    if (definitions.isEmpty()) {
      report.accept(
          finding(
              claim,
              claim.constant(),
              claim.name()
                  + " is not defined in "
                  + file
                  + ": no #define, const, constexpr or enum of that name"));
    }
    for (Constant constant : definitions) {
      if (constant.value().isEmpty()) {
        report.accept(
            FindingBuilder.of(this, claim.constant().place(), claim.subject())
                .about(claim.name())
                .message(
                    claim.name()
                        + " in "
                        + file
                        + " is no expression of literals: "
                        + constant.why())
                .related(constant.place(), claim.name() + " in the code")
                .build());
      }
    }
  }

  private Finding finding(FirmwareConstants.Claim claim, Slot<String> at, String message) {
    return FindingBuilder.of(this, at.place(), claim.subject())
        .about(claim.name())
        .message(message)
        .build();
  }
}
