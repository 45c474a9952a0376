import * as vscode from "vscode";
import {
  LanguageClient,
  type LanguageClientOptions,
  type ServerOptions,
} from "vscode-languageclient/node";
import { FiguresPages, linesOf } from "./figures";
import { findJava, type Java, type NoJava } from "./java";
import { channelAt } from "./sheet";

let client: LanguageClient | undefined;

export async function activate(context: vscode.ExtensionContext): Promise<void> {
  const jar = context.asAbsolutePath("server/settlewell.jar");
  const pages = new FiguresPages(() => command(java(), jar));
  context.subscriptions.push(
    pages.register(),
    vscode.commands.registerCommand("settlewell.restart", () => restart(jar)),
    vscode.workspace.onDidChangeConfiguration((event) => {
      if (event.affectsConfiguration("settlewell.java.home")) {
        void restart(jar);
      }
    }),
  );
  await start(jar);
}

export async function deactivate(): Promise<void> {
  await client?.stop();
}

async function restart(jar: string): Promise<void> {
  const running = client;
  client = undefined;
  // One that never came up has nothing to stop.
  await running?.dispose().catch(() => {});
  await start(jar);
}

async function start(jar: string): Promise<void> {
  const found = java();
  if ("problem" in found) {
    void explain(found);
    return;
  }
  const [program, ...args] = command(found, jar);
  const server: ServerOptions = { command: program, args: [...args, "serve"] };
  client = new LanguageClient("settlewell", "Settlewell", server, options());
  try {
    await client.start();
  } catch (failure) {
    client.outputChannel.appendLine(String(failure));
    void vscode.window.showErrorMessage(
      "Settlewell's server could not be started; the output channel Settlewell says why.",
    );
  }
}

function java(): Java | NoJava {
  return findJava({
    setting: vscode.workspace.getConfiguration("settlewell").get("java.home", ""),
    javaHome: process.env.JAVA_HOME,
    path: process.env.PATH,
    windows: process.platform === "win32",
  });
}

function command(found: Java | NoJava, jar: string): string[] {
  const executable = "executable" in found ? found.executable : "java";
  return [executable, "-XX:+UseSerialGC", "-Xshare:auto", "-jar", jar];
}

async function explain(none: NoJava): Promise<void> {
  const settings = "Open Settings";
  const again = "Try Again";
  const chosen = await vscode.window.showErrorMessage(none.problem, settings, again);
  if (chosen === settings) {
    await vscode.commands.executeCommand("workbench.action.openSettings", "settlewell.java.home");
  } else if (chosen === again) {
    await vscode.commands.executeCommand("settlewell.restart");
  }
}

function options(): LanguageClientOptions {
  return {
    documentSelector: [{ scheme: "file", pattern: "**/*.channels.yaml" }],
    synchronize: { configurationSection: "settlewell" },
    middleware: { provideCodeLenses: withFigures },
  };
}

/** The server's lenses are lines to read; over a channel a click shows its figures. */
async function withFigures(
  document: vscode.TextDocument,
  token: vscode.CancellationToken,
  next: (
    document: vscode.TextDocument,
    token: vscode.CancellationToken,
  ) => vscode.ProviderResult<vscode.CodeLens[]>,
): Promise<vscode.CodeLens[]> {
  const lenses = (await next(document, token)) ?? [];
  const lines = linesOf(document);
  for (const lens of lenses) {
    const channel = channelAt(lines, lens.range.start.line);
    if (channel && lens.command) {
      lens.command = {
        title: lens.command.title,
        tooltip: `Show the figures of ${channel}`,
        command: "settlewell.showFigures",
        arguments: [document.uri.toString(), channel],
      };
    }
  }
  return lenses;
}
