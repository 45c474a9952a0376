package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.firmware.Constant;
import java.util.function.Consumer;

/** A constant of the firmware that is not what the sheet says. */
final class FirmwareConstantDiffers implements Check {
  /** Room for the last bits of a computed figure. */
  private static final double ROUNDING = 1e-9;

  @Override
  public String name() {
    return "firmware-constant-differs";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "a constant of the firmware differs from the sheet";
  }

  @Override
  public void run(Analysis analysis, Consumer<Finding> report) {
    for (FirmwareConstants.Claim claim : FirmwareConstants.of(analysis)) {
      NamedFigure.Found figure = NamedFigure.find(analysis, claim.figure());
      for (Constant constant : claim.definitions()) {
        if (constant.value().isPresent()) {
          for (double value : figure.values()) {
            compare(claim, constant, value * claim.times(), figure.unit(), report);
          }
        }
      }
    }
  }

  private void compare(
      FirmwareConstants.Claim claim,
      Constant constant,
      double wanted,
      String unit,
      Consumer<Finding> report) {
    double written = constant.value().getAsDouble();
    double room = constant.halfDigit() + ROUNDING * Math.abs(wanted);
    if (Math.abs(written - wanted) <= room) {
      return;
    }
    String figure =
        claim.figure() + (claim.times() == 1 ? "" : " times " + Words.count(claim.times()));
    String inUnit = unit.isEmpty() || unit.equals("1") ? "" : " " + unit;
    report.accept(
        FindingBuilder.of(this, claim.constant().place(), claim.subject())
            .about(claim.name())
            .message(
                claim.name()
                    + " is "
                    + Words.count(written)
                    + " in the code, and "
                    + figure
                    + " is "
                    + Words.count(wanted)
                    + inUnit
                    + ": change the one that is wrong")
            .have(Words.count(written))
            .need(Words.count(wanted))
            .related(constant.place(), claim.name() + " in the code")
            .related(claim.equalTo().place(), "the figure")
            .build());
  }
}
