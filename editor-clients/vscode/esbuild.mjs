// Bundles the extension into dist/, or with --tests the tests into out/.
import { build } from "esbuild";
import { readdirSync } from "node:fs";

const common = { bundle: true, platform: "node", target: "node20", format: "cjs", logLevel: "warning" };

if (process.argv.includes("--tests")) {
  await build({
    ...common,
    entryPoints: readdirSync("test").map((name) => `test/${name}`),
    outdir: "out/test",
    outExtension: { ".js": ".cjs" },
    packages: "external",
  });
} else {
  await build({
    ...common,
    entryPoints: ["src/extension.ts"],
    outfile: "dist/extension.js",
    external: ["vscode"],
    minify: true,
  });
}
