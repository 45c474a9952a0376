// Run by test-in-browser.sh. Every wait is for a state; the last picture shows where it failed.
import { execFileSync, spawn } from "node:child_process";
import { mkdirSync, readdirSync, writeFileSync } from "node:fs";
import { createRequire } from "node:module";
import { createServer } from "node:net";
import path from "node:path";

const { STAND, WORK, PICTURES, SHEET, SETTLEWELL_WAIT } = process.env;
const { chromium } = createRequire(path.join(STAND, "x.js"))("playwright-core");
const patience = Number(SETTLEWELL_WAIT) * 1000;
const extension = path.dirname(new URL(import.meta.url).pathname);

const port = await new Promise((resolve) => {
  const probe = createServer().listen(0, "127.0.0.1", () => {
    const { port } = probe.address();
    probe.close(() => resolve(port));
  });
});

function serve() {
  const data = path.join(WORK, "code-data");
  mkdirSync(path.join(data, "User"), { recursive: true });
  writeFileSync(
    path.join(data, "User", "settings.json"),
    JSON.stringify({
      "workbench.startupEditor": "none",
      "workbench.secondarySideBar.defaultVisibility": "hidden",
      "security.workspace.trust.enabled": false,
      "telemetry.telemetryLevel": "off",
      "chat.disableAIFeatures": true,
      "editor.fontFamily": "DejaVu Sans Mono",
      "editor.minimap.enabled": false,
      "files.autoSave": "off",
    }),
  );
  const program = path.join(STAND, "server/node_modules/.bin/code-server");
  const folders = ["--user-data-dir", data, "--extensions-dir", path.join(WORK, "extensions")];
  // Nothing is to be fetched while testing: a port of this machine on which nobody listens.
  const gallery = { serviceUrl: "http://127.0.0.1:9/", itemUrl: "http://127.0.0.1:9/" };
  const env = { ...process.env, EXTENSIONS_GALLERY: JSON.stringify(gallery) };
  const vsix = readdirSync(extension).find((name) => name.endsWith(".vsix"));
  execFileSync(program, [...folders, "--install-extension", path.join(extension, vsix)], { env });
  const quiet = ["--auth", "none", "--disable-telemetry", "--disable-update-check"];
  const server = spawn(program, [...folders, ...quiet, "--bind-addr", `127.0.0.1:${port}`], { env });
  return new Promise((resolve, reject) => {
    let said = "";
    const listen = (text) => {
      said += text;
      if (said.includes("HTTP server listening")) {
        resolve(server);
      }
    };
    server.stdout.on("data", listen);
    server.stderr.on("data", listen);
    server.on("exit", () => reject(new Error(`the workbench ended: ${said}`)));
  });
}

const server = await serve();
const browser = await chromium.launch({ executablePath: "/usr/bin/chromium", args: ["--no-sandbox"] });
const page = await browser.newPage({ viewport: { width: 1400, height: 900 } });
page.setDefaultTimeout(patience);

let pictures = 0;
async function picture(name) {
  pictures += 1;
  await page.screenshot({ path: path.join(PICTURES, `${pictures}-${name}.png`) });
}

const editor = page.locator(".editor-group-container").first();

/** Waits until a part of the workbench says what is expected. */
async function says(where, text) {
  // The editor draws spaces that do not break.
  const found = where.filter({ hasText: text instanceof RegExp ? text : new RegExp(text.replaceAll(" ", "\\s")) });
  await found.first().waitFor();
  return found.first();
}

async function go(line, column) {
  await page.keyboard.press("Control+G");
  await page.locator(".quick-input-widget input").waitFor();
  await page.keyboard.type(`${line}:${column}`);
  await page.keyboard.press("Enter");
  await page.locator(".quick-input-widget").waitFor({ state: "hidden" });
}

async function fix(line, column, title, name) {
  await go(line, column);
  const menu = page.locator(".action-widget .monaco-list-row", { hasText: title }).first();
  // The menu closes by itself when the text's findings come anew under it: then once more.
  for (const end = Date.now() + patience; !(await menu.isVisible()) && Date.now() < end; ) {
    await page.keyboard.press("Control+.");
    await menu.waitFor({ timeout: 3000 }).catch(() => page.keyboard.press("Escape"));
  }
  await picture(name);
  await menu.click();
}

async function drive() {
  await page.goto(`http://127.0.0.1:${port}/?folder=${encodeURIComponent(path.dirname(SHEET))}`);
  await page.locator(".monaco-workbench").waitFor();
  const file = page.locator(".explorer-folders-view .monaco-list-row", { hasText: path.basename(SHEET) });
  await file.dblclick();

  await editor.locator(".squiggly-error").first().waitFor();
  await editor.locator(".squiggly-warning").first().waitFor();
  await says(editor.locator(".view-line"), "needs 2\\.\\d+ µs");
  await says(editor.locator(".codelens-decoration"), "acquisition 1.98 µs");
  await picture("findings-hints-lenses");

  const value = editor.locator(".view-line", { hasText: /8\scycles/ }).locator("span span", { hasText: "8" }).first();
  await value.hover();
  await says(page.locator(".monaco-hover"), "acquisition");
  await page.waitForTimeout(300); // the fade, for the picture's sake alone
  await picture("hover");
  await page.keyboard.press("Escape");

  await go(33, 100);
  await page.keyboard.press("Enter");
  await page.keyboard.type("resol");
  await says(page.locator(".suggest-widget .monaco-list-row"), "resolution");
  await picture("completion");
  await page.keyboard.press("Enter");
  await says(editor.locator(".view-line"), "resolution: ");
  await picture("completed");
  while ((await editor.locator(".view-line", { hasText: "resol" }).count()) > 0) {
    await page.keyboard.press("Escape");
    await page.keyboard.press("Control+Z");
  }

  await (await says(editor.locator(".codelens-decoration a"), "acquisition 1.98 µs")).click();
  const figures = page.locator(".editor-group-container").nth(1);
  await says(figures.locator(".view-line"), "source-resistance");
  await picture("figures");
  await figures.locator(".tab").first().click({ button: "middle" });
  await figures.waitFor({ state: "detached" });

  await page.keyboard.press("Control+Shift+M");
  await says(page.locator(".markers-panel .monaco-list-row"), "did you mean");
  await picture("problems");
  await page.keyboard.press("Control+1"); // back into the text

  await fix(32, 20, "16 cycles", "quick-fix");
  await says(editor.locator(".view-line"), "acquisition: 16 cycles");
  await fix(41, 58, "ref", "quick-fix-of-a-name");
  await editor.locator(".squiggly-error, .squiggly-warning").first().waitFor({ state: "detached" });
  await page.keyboard.press("Control+S");
  await page.locator(".tab.dirty").waitFor({ state: "detached" });
  await picture("mended");
}

let code = 0;
try {
  await drive();
} catch (failure) {
  console.error(String(failure));
  await picture("failure");
  code = 1;
}
await browser.close();
server.removeAllListeners("exit");
server.kill();
process.exit(code);
