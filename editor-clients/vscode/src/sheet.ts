// What the extension itself must know of a sheet's text: whose lines these are.

/** The channel that a line belongs to; undefined outside the section `channels`. */
export function channelAt(lines: readonly string[], line: number): string | undefined {
  const top = sectionAt(lines, line);
  if (top === undefined || !/^channels\s*:/.test(lines[top])) {
    return undefined;
  }
  const first = lines.slice(top + 1).find((text) => isContent(text));
  const indent = first === undefined ? 0 : indentOf(first);
  for (let at = line; at > top; at--) {
    if (isContent(lines[at]) && indentOf(lines[at]) === indent) {
      return /^\s+["']?([A-Za-z0-9_-]+)["']?\s*:/.exec(lines[at])?.[1];
    }
  }
  return undefined;
}

/** The line of the top-level key that a line stands under. */
function sectionAt(lines: readonly string[], line: number): number | undefined {
  for (let at = Math.min(line, lines.length - 1); at >= 0; at--) {
    if (/^[A-Za-z]/.test(lines[at])) {
      return at;
    }
  }
  return undefined;
}

function isContent(text: string): boolean {
  return /^\s*[^\s#]/.test(text);
}

function indentOf(text: string): number {
  return text.length - text.trimStart().length;
}
