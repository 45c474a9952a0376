import assert from "node:assert/strict";
import { test } from "node:test";
import { channelAt } from "../src/sheet";

const sheet = `channel-sheet: 1
scans:
  slow:
    rate: 1 Hz

channels:
  # the first
  air:
    measures: 0 V to 1 V
    path:
      - resistor: 1 kΩ

  soil:   # the second
    measures: 0 V to 1 V
findings:
  filter-droop: off`.split("\n");

test("each line of a channel belongs to it, and no other line to any", () => {
  const owners = sheet.map((_, line) => channelAt(sheet, line) ?? "-").join(" ");
  assert.equal(owners, "- - - - - - - air air air air air soil soil - -");
});

test("a section with no channel yet has none", () => {
  assert.equal(channelAt(["channels:", ""], 1), undefined);
  assert.equal(channelAt([""], 0), undefined);
});
