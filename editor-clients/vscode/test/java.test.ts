import assert from "node:assert/strict";
import * as fs from "node:fs";
import * as os from "node:os";
import * as path from "node:path";
import { after, test } from "node:test";
import { findJava, majorVersion } from "../src/java";

const work = fs.mkdtempSync(path.join(os.tmpdir(), "java-"));
after(() => fs.rmSync(work, { recursive: true }));

function home(name: string, version: string): string {
  const folder = path.join(work, name);
  fs.mkdirSync(path.join(folder, "bin"), { recursive: true });
  fs.writeFileSync(path.join(folder, "bin", "java"), "");
  fs.writeFileSync(path.join(folder, "release"), `IMPLEMENTOR="x"\nJAVA_VERSION="${version}"\n`);
  return folder;
}

const old = home("old", "1.8.0_402");
const eleven = home("eleven", "11.0.22");
const good = home("good", "17.0.15");
const newer = home("newer", "25");

test("the version of a release file, in the forms that JDKs write", () => {
  assert.equal(majorVersion('JAVA_VERSION="17.0.15"'), 17);
  assert.equal(majorVersion('A="1"\nJAVA_VERSION="1.8.0_402"\n'), 8);
  assert.equal(majorVersion("JAVA_VERSION=25"), 25);
  assert.equal(majorVersion('JAVA_VERSION_DATE="2024-01-16"'), 0);
});

test("the setting goes before JAVA_HOME and PATH, and is not replaced where it is wrong", () => {
  const rest = { javaHome: newer, path: path.join(newer, "bin"), windows: false };
  assert.deepEqual(findJava({ setting: good, ...rest }), {
    executable: path.join(good, "bin", "java"),
    version: 17,
  });
  const wrong = findJava({ setting: eleven, ...rest });
  assert.ok("problem" in wrong && wrong.problem.includes("names Java 11"), JSON.stringify(wrong));
  const missing = findJava({ setting: path.join(work, "nowhere"), ...rest });
  assert.ok("problem" in missing && missing.problem.includes("no folder"), JSON.stringify(missing));
});

test("a JAVA_HOME that is too old gives way to the PATH, through links", () => {
  const bin = path.join(work, "bin");
  fs.mkdirSync(bin);
  fs.symlinkSync(path.join(good, "bin", "java"), path.join(bin, "java"));
  const found = findJava({ setting: "", javaHome: old, path: `/nowhere:${bin}`, windows: false });
  assert.deepEqual(found, {
    executable: fs.realpathSync(path.join(good, "bin", "java")),
    version: 17,
  });
});

test("where there is none, the sentence says what was found and what to do", () => {
  const tooOld = findJava({ setting: "", javaHome: old, path: path.join(eleven, "bin"), windows: false });
  assert.ok("problem" in tooOld && tooOld.problem.includes("only Java 8"), JSON.stringify(tooOld));
  const none = findJava({ setting: "", path: "", windows: false });
  assert.ok("problem" in none && none.problem.includes("none was found"), JSON.stringify(none));
  assert.ok("problem" in none && none.problem.includes("settlewell.java.home"));
});
