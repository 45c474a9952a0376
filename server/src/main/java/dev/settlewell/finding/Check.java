package dev.settlewell.finding;

import dev.settlewell.channel.Analysis;
import java.util.List;
import java.util.function.Consumer;

/** One finding of the catalogue: when it fires, and what it says. One class a finding. */
public interface Check {

  /** Kebab-case, in the trade's terms. */
  String name();

  /** The gravest severity it reports with, unless a sheet says otherwise. */
  Severity severity();

  /** What it says in one line, for lists of findings. */
  String summary();

  /** Findings that say nothing new once this one fires for the same subject. */
  default List<String> covers() {
    return List.of();
  }

  void run(Analysis analysis, Consumer<Finding> report);
}
