package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Check;
import java.util.List;

/** Every finding there is, in the order of lists and reports: text, sheet, then the figures. */
public final class Catalog {
  public static final List<Check> CHECKS =
      List.of(
          new Syntax(),
          new FormatVersion(),
          new UnknownKey(),
          new MissingKey(),
          new WrongKind(),
          new MissingUnit(),
          new WrongUnit(),
          new NotOneValue(),
          new ValueOutOfRange(),
          new UnknownName(),
          new DuplicateName(),
          new UseNotFound(),
          new UseOutsideWorkspace(),
          new UseCircle(),
          new AmbiguousText(),
          new ErrorStatedTwice(),
          new UnusedName(),
          new NotComputed(),
          new TypicalOnly(),
          new NeverSettles(),
          new ReservoirTooSmall(),
          new AcquisitionTooShort(),
          new AcquisitionMarginal(),
          new AcquisitionNotOffered(),
          new SourceResistanceTooHigh(),
          new NotScanned(),
          new ScanOverrunsPeriod(),
          new ConverterOvercommitted(),
          new ClockOutsideLimits(),
          new SkewTooLarge(),
          new UnevenSampling(),
          new BandAboveHalfRate(),
          new InterfererReadsAsOffset(),
          new InterfererAliasesIntoBand(),
          new FilterDroop(),
          new NoAntiAliasFilter(),
          new OverRange(),
          new UnderRange(),
          new AmplifierClips(),
          new AmplifierLoadTooLow(),
          new RangePoorlyUsed(),
          new PinOverstressed(),
          new SensorFaultHidden(),
          new OutsideCurve(),
          new BudgetExceeded(),
          new WorstCaseExceeded(),
          new ResolutionTooCoarse(),
          new MissingCodes(),
          new AveragingWithoutDither(),
          new AccumulatorOverflows(),
          new FirmwareConstantDiffers(),
          new FirmwareConstantMissing(),
          new HazardousVoltage(),
          new AcceptanceExpired(),
          new AcceptanceUnused());

  /** What a sheet may accept or give a severity to. */
  public static final List<String> NAMES = CHECKS.stream().map(Check::name).toList();

  private Catalog() {}
}
