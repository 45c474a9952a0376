// The colours of a line, by the engine that the editor itself uses.
import assert from "node:assert/strict";
import * as fs from "node:fs";
import { before, test } from "node:test";
import * as oniguruma from "vscode-oniguruma";
import * as textmate from "vscode-textmate";

let grammar: textmate.IGrammar;

before(async () => {
  const wasm = fs.readFileSync("node_modules/vscode-oniguruma/release/onig.wasm");
  await oniguruma.loadWASM(wasm);
  const registry = new textmate.Registry({
    onigLib: Promise.resolve({
      createOnigScanner: (sources) => new oniguruma.OnigScanner(sources),
      createOnigString: (text) => new oniguruma.OnigString(text),
    }),
    loadGrammar: async (scope) => {
      const file = "syntaxes/channel-sheet.tmLanguage.json";
      return scope === "source.channel-sheet"
        ? textmate.parseRawGrammar(fs.readFileSync(file, "utf8"), file)
        : null;
    },
  });
  grammar = (await registry.loadGrammar("source.channel-sheet"))!;
});

/** Each coloured stretch with the first two words of its scope. */
function colours(line: string): string[] {
  return grammar
    .tokenizeLine(line, textmate.INITIAL)
    .tokens.filter((token) => token.scopes.length > 1)
    .map((token) => {
      const scope = token.scopes[token.scopes.length - 1].split(".").slice(0, 2).join(".");
      return `${line.slice(token.startIndex, token.endIndex)}=${scope}`;
    })
    .filter((text) => !text.includes("=punctuation"));
}

test("a toleranced value with its drift", () => {
  assert.deepEqual(colours("  - resistor: 4.7 kΩ ±1 % ±100 ppm/K"), [
    "resistor=entity.name",
    "4.7=constant.numeric",
    "kΩ=keyword.other",
    "±=keyword.operator",
    "1=constant.numeric",
    "%=keyword.other",
    "±=keyword.operator",
    "100=constant.numeric",
    "ppm/K=keyword.other",
  ]);
});

test("a range, the letter-digit code, a name and a comment in flow style", () => {
  assert.deepEqual(colours("    pull-up: {resistor: 4k7, to: ref}   # 5 V"), [
    "pull-up=entity.name",
    "resistor=entity.name",
    "4k7=constant.numeric",
    "to=entity.name",
    "ref=string.unquoted",
    "# 5 V=comment.line",
  ]);
  assert.deepEqual(colours("ambient: -10 °C to 50 °C"), [
    "ambient=entity.name",
    "-10=constant.numeric",
    "°C=keyword.other",
    "to=keyword.operator",
    "50=constant.numeric",
    "°C=keyword.other",
  ]);
  assert.deepEqual(colours("    order: [level, water-temperature]"), [
    "order=entity.name",
    "level=string.unquoted",
    "water-temperature=string.unquoted",
  ]);
});

test("unequal tolerances, a basis, a coverage factor, a date", () => {
  assert.deepEqual(colours("capacitor: 4.7 µF +80/-20 %").slice(3), [
    "+=keyword.operator",
    "80=constant.numeric",
    "/-=keyword.operator",
    "20=constant.numeric",
    "%=keyword.other",
  ]);
  assert.deepEqual(colours("accuracy: ±0.1 % of reading (k=2)").slice(4), [
    "of reading=keyword.other",
    "k=variable.parameter",
    "==keyword.operator",
    "2=constant.numeric",
  ]);
  assert.deepEqual(colours("until: 2027-06-30")[1], "2027-06-30=constant.other");
});

test("prose is prose: no quantities, commas and all", () => {
  const [key, text] = colours("    about: 20 mA through this shunt, and more");
  assert.equal(key, "about=entity.name");
  assert.equal(text, "20 mA through this shunt, and more=string.unquoted");
});
