// The figures of a channel as a page of their own, computed from the text as it stands in the
// editor, saved or not, by the command line that the server's jar holds too.
import { execFile } from "node:child_process";
import * as path from "node:path";
import * as vscode from "vscode";
import { channelAt } from "./sheet";

const SCHEME = "settlewell-figures";
const MOST_OUTPUT = 16 * 1024 * 1024;

export class FiguresPages implements vscode.TextDocumentContentProvider {
  private readonly changed = new vscode.EventEmitter<vscode.Uri>();
  readonly onDidChange = this.changed.event;

  /** @param command the program and the arguments before those of a command of the tool */
  constructor(private readonly command: () => string[]) {}

  register(): vscode.Disposable {
    return vscode.Disposable.from(
      this.changed,
      vscode.workspace.registerTextDocumentContentProvider(SCHEME, this),
      vscode.commands.registerCommand("settlewell.showFigures", (uri?: string, channel?: string) =>
        this.show(uri, channel),
      ),
      vscode.workspace.onDidChangeTextDocument((event) => this.refresh(event.document.uri)),
    );
  }

  private async show(uri?: string, channel?: string): Promise<void> {
    const editor = vscode.window.activeTextEditor;
    const sheet = typeof uri === "string" ? vscode.Uri.parse(uri) : editor?.document.uri;
    if (!sheet) {
      return;
    }
    const document = await vscode.workspace.openTextDocument(sheet);
    const name = channel ?? (editor && channelAt(linesOf(document), editor.selection.active.line));
    if (!name) {
      void vscode.window.showInformationMessage("Put the cursor into a channel first.");
      return;
    }
    const page = await vscode.workspace.openTextDocument(pageOf(sheet, name));
    await vscode.window.showTextDocument(page, {
      viewColumn: vscode.ViewColumn.Beside,
      preserveFocus: true,
      preview: true,
    });
  }

  async provideTextDocumentContent(page: vscode.Uri): Promise<string> {
    const { sheet, channel } = JSON.parse(page.query) as { sheet: string; channel: string };
    const document = await vscode.workspace.openTextDocument(vscode.Uri.parse(sheet));
    return this.compute(document, channel);
  }

  private compute(document: vscode.TextDocument, channel: string): Promise<string> {
    const [program, ...before] = this.command();
    const file = document.uri.fsPath;
    const args = [...before, "figures", "--derivations", "--channel", channel, "--stdin-name", file, "-"];
    return new Promise((resolve) => {
      const child = execFile(
        program,
        args,
        { cwd: path.dirname(file), maxBuffer: MOST_OUTPUT },
        (failure, output, errors) => resolve(output || errors || String(failure)),
      );
      child.stdin?.on("error", () => {});
      child.stdin?.end(document.getText());
    });
  }

  private refresh(sheet: vscode.Uri): void {
    for (const document of vscode.workspace.textDocuments) {
      if (document.uri.scheme === SCHEME && JSON.parse(document.uri.query).sheet === sheet.toString()) {
        this.changed.fire(document.uri);
      }
    }
  }
}

function pageOf(sheet: vscode.Uri, channel: string): vscode.Uri {
  return vscode.Uri.from({
    scheme: SCHEME,
    path: `/${channel} of ${path.posix.basename(sheet.path)}.txt`,
    query: JSON.stringify({ sheet: sheet.toString(), channel }),
  });
}

export function linesOf(document: vscode.TextDocument): string[] {
  return document.getText().split(/\r?\n/);
}
