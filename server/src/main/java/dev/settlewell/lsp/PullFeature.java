package dev.settlewell.lsp;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import org.eclipse.lsp4j.Diagnostic;
import org.eclipse.lsp4j.DiagnosticRegistrationOptions;
import org.eclipse.lsp4j.DocumentDiagnosticParams;
import org.eclipse.lsp4j.DocumentDiagnosticReport;
import org.eclipse.lsp4j.PreviousResultId;
import org.eclipse.lsp4j.RelatedFullDocumentDiagnosticReport;
import org.eclipse.lsp4j.RelatedUnchangedDocumentDiagnosticReport;
import org.eclipse.lsp4j.ServerCapabilities;
import org.eclipse.lsp4j.WorkspaceDiagnosticParams;
import org.eclipse.lsp4j.WorkspaceDiagnosticReport;
import org.eclipse.lsp4j.WorkspaceDocumentDiagnosticReport;
import org.eclipse.lsp4j.WorkspaceFullDocumentDiagnosticReport;
import org.eclipse.lsp4j.WorkspaceUnchangedDocumentDiagnosticReport;
import org.eclipse.lsp4j.jsonrpc.CancelChecker;

/** Findings for clients that ask for them. What they have already is not sent again. */
final class PullFeature implements Feature {
  /** The last list of a sheet and the name it went out under. */
  private record Report(String id, List<Diagnostic> diagnostics) {}

  private final Session session;
  private final Map<String, Report> reports = new HashMap<>();
  private int lastId;

  PullFeature(Session session) {
    this.session = session;
  }

  @Override
  public void register(Methods methods) {
    methods.request("textDocument/diagnostic", DocumentDiagnosticParams.class, this::document);
    methods.request("workspace/diagnostic", WorkspaceDiagnosticParams.class, this::workspace);
  }

  @Override
  public void announce(ServerCapabilities server, Abilities client) {
    if (client.pulls()) {
      DiagnosticRegistrationOptions options = new DiagnosticRegistrationOptions(true, true);
      options.setIdentifier(DiagnosticMapper.SOURCE);
      server.setDiagnosticProvider(options);
    }
  }

  private DocumentDiagnosticReport document(
      DocumentDiagnosticParams params, View view, CancelChecker cancel) {
    Report report = report(Uris.name(params.getTextDocument().getUri()), view);
    if (report.id().equals(params.getPreviousResultId())) {
      return new DocumentDiagnosticReport(
          new RelatedUnchangedDocumentDiagnosticReport(report.id()));
    }
    RelatedFullDocumentDiagnosticReport full =
        new RelatedFullDocumentDiagnosticReport(report.diagnostics());
    full.setResultId(report.id());
    return new DocumentDiagnosticReport(full);
  }

  /** Computed on the worker alone, so the map needs no lock. */
  private Report report(String name, View view) {
    List<Diagnostic> diagnostics = Diagnosis.of(name, view, session.faults());
    Report known = reports.get(name);
    if (known == null || !known.diagnostics().equals(diagnostics)) {
      known = new Report(Integer.toString(++lastId), diagnostics);
      reports.put(name, known);
    }
    return known;
  }

  private WorkspaceDiagnosticReport workspace(
      WorkspaceDiagnosticParams params, View view, CancelChecker cancel) {
    Map<String, String> previous = new HashMap<>();
    if (params.getPreviousResultIds() != null) {
      for (PreviousResultId id : params.getPreviousResultIds()) {
        previous.put(Uris.name(id.getUri()), id.getValue());
      }
    }
    List<WorkspaceDocumentDiagnosticReport> items = new ArrayList<>();
    for (String name : view.sheets()) {
      cancel.checkCanceled();
      items.add(item(name, previous.get(name), view));
    }
    return new WorkspaceDiagnosticReport(items);
  }

  private WorkspaceDocumentDiagnosticReport item(String name, String previous, View view) {
    Report report = report(name, view);
    String uri = view.uri(name);
    Integer version = view.version(name);
    if (Objects.equals(report.id(), previous)) {
      return new WorkspaceDocumentDiagnosticReport(
          new WorkspaceUnchangedDocumentDiagnosticReport(report.id(), uri, version));
    }
    WorkspaceFullDocumentDiagnosticReport full =
        new WorkspaceFullDocumentDiagnosticReport(report.diagnostics(), uri, version);
    full.setResultId(report.id());
    return new WorkspaceDocumentDiagnosticReport(full);
  }
}
