// Finds a Java that can run the server. The version is read from the `release` file of a JDK, for
// asking `java -version` costs a start of the virtual machine.
import * as fs from "node:fs";
import * as path from "node:path";

export const LEAST_JAVA = 17;

export interface Java {
  executable: string;
  version: number;
}

/** Why there is none, in one sentence that says what to do. */
export interface NoJava {
  problem: string;
}

export interface Places {
  /** The setting; "" where it is not set. */
  setting: string;
  javaHome?: string;
  path?: string;
  windows: boolean;
}

export function findJava(places: Places): Java | NoJava {
  if (places.setting) {
    const chosen = inHome(places.setting, places.windows);
    return usable(chosen) ? chosen : { problem: notUsable(places.setting, chosen) };
  }
  const candidates = [places.javaHome, ...homesOnPath(places)];
  let tooOld: Java | undefined;
  for (const home of candidates) {
    const java = home ? inHome(home, places.windows) : undefined;
    if (usable(java)) {
      return java;
    }
    tooOld ??= java;
  }
  const found = tooOld ? `only Java ${tooOld.version} was found (${tooOld.executable})` : "none was found";
  return {
    problem:
      `Settlewell needs Java ${LEAST_JAVA} or newer, and ${found}. ` +
      "Install one, or set settlewell.java.home to the folder that holds its bin.",
  };
}

function notUsable(home: string, java: Java | undefined): string {
  const what = java
    ? `names Java ${java.version}, and Settlewell needs ${LEAST_JAVA} or newer`
    : "names no folder that holds a Java (bin and release)";
  return `The setting settlewell.java.home, ${home}, ${what}.`;
}

function usable(java: Java | undefined): java is Java {
  return java !== undefined && java.version >= LEAST_JAVA;
}

function inHome(home: string, windows: boolean): Java | undefined {
  const executable = path.join(home, "bin", windows ? "java.exe" : "java");
  try {
    if (!fs.statSync(executable).isFile()) {
      return undefined;
    }
    return { executable, version: majorVersion(fs.readFileSync(path.join(home, "release"), "utf8")) };
  } catch {
    return undefined;
  }
}

/** Of the text of a `release` file: 17 of "17.0.15", 8 of "1.8.0_402"; 0 where there is none. */
export function majorVersion(release: string): number {
  const found = /^JAVA_VERSION="?(?:1\.)?(\d+)/m.exec(release);
  return found ? Number(found[1]) : 0;
}

/** Where each `java` on the PATH really stands, its folder bin left out. */
function homesOnPath(places: Places): string[] {
  const folders = (places.path ?? "").split(places.windows ? ";" : ":").filter((folder) => folder);
  const homes: string[] = [];
  for (const folder of folders) {
    try {
      const real = fs.realpathSync(path.join(folder, places.windows ? "java.exe" : "java"));
      homes.push(path.dirname(path.dirname(real)));
    } catch {
      // No java here.
    }
  }
  return homes;
}
