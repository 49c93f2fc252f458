import { FILE_HEADERS_ONLY, formatPatch, structuredPatch, type StructuredPatch } from "diff";

/** Canonical text of one line before and after; empty where it does not stand on that side. */
export interface LineTexts {
  /** "item 030" */
  name: string;
  letterBefore: string | null;
  letterAfter: string | null;
  before: string;
  after: string;
}

/** Comparing blocks every request, so one line gets this long and no more. */
const TIME_LIMIT_MS = 200;

/** The change of one line as hunks, or null where the texts differ too much to be compared in time. */
export function lineDiff({ name, letterBefore, letterAfter, before, after }: LineTexts): StructuredPatch | null {
  const patch = structuredPatch(
    letterBefore === null ? "none" : name,
    letterAfter === null ? "none" : name,
    ended(before),
    ended(after),
    letterBefore === null ? undefined : `revision ${letterBefore}`,
    letterAfter === null ? undefined : `revision ${letterAfter}`,
    { context: 3, timeout: TIME_LIMIT_MS, stripTrailingCr: true },
  );
  return patch ?? null;
}

/** The unified patch of a whole change, line after line; what could not be compared stands there as both texts. */
export function changePatch(lines: readonly LineTexts[]): string {
  return lines
    .filter(({ before, after }) => before !== after)
    .map((line) => {
      const patch = lineDiff(line);
      return patch ? formatPatch(patch, FILE_HEADERS_ONLY) : bothTexts(line);
    })
    .join("");
}

/** A patch that replaces everything is true as well, and takes no comparing. */
function bothTexts({ name, before, after }: LineTexts): string {
  const old = rows(before);
  const now = rows(after);
  const head = [`--- ${name}`, `+++ ${name}`, `@@ -${range(old)} +${range(now)} @@`];
  return [...head, ...old.map((row) => `-${row}`), ...now.map((row) => `+${row}`), ""].join("\n");
}

function range(lines: readonly string[]): string {
  return lines.length === 0 ? "0,0" : `1,${lines.length}`;
}

function rows(text: string): string[] {
  return text === "" ? [] : ended(text).slice(0, -1).split("\n");
}

function ended(text: string): string {
  return text === "" || text.endsWith("\n") ? text : `${text}\n`;
}
