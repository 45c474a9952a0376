package dev.settlewell.finding;

import dev.settlewell.channel.Analysis;
import java.util.List;

/**
 * The findings of a sheet: every check of the catalogue run on its own, covered ones left out,
 * severities and acceptances of the sheet applied, in the order of the text.
 */
public final class Findings {
  private Findings() {}

  /**
   * @return the findings, accepted ones among them (marked); those with severity {@code OFF} left
   *     out. A check that fails gives one finding named {@code internal-fault}, and the others go on.
   */
  public static List<Finding> of(Analysis analysis) {
    throw new UnsupportedOperationException();
  }
}
