package dev.settlewell.lsp;

import java.util.List;
import org.eclipse.lsp4j.Diagnostic;
import org.eclipse.lsp4j.DiagnosticSeverity;
import org.eclipse.lsp4j.Position;
import org.eclipse.lsp4j.Range;

/** The findings of one sheet as a client is told of them, whatever happens on the way. */
final class Diagnosis {
  private Diagnosis() {}

  static List<Diagnostic> of(String name, View view, Faults faults) {
    try {
      return view.named(name)
          .map(checked -> new DiagnosticMapper(view, checked).all())
          .orElse(List.of());
    } catch (RuntimeException | StackOverflowError fault) {
      faults.report("checking " + name, fault);
      return List.of(internalFault(fault));
    }
  }

  /** So that an editor without a log still tells why a sheet has no findings. */
  private static Diagnostic internalFault(Throwable fault) {
    Position start = new Position(0, 0);
    String message =
        "Settlewell made a mistake and could not check this sheet. Please report this text together"
            + " with the sheet: "
            + Faults.describe(fault);
    return new Diagnostic(
        new Range(start, start),
        message,
        DiagnosticSeverity.Error,
        DiagnosticMapper.SOURCE,
        "internal-fault");
  }
}
