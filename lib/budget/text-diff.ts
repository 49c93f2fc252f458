import { diffLines } from "diff";

/** One line of two texts laid side by side: in both, only in the old one, or only in the new one. */
export interface TextRow {
  side: "both" | "was" | "toBe";
  text: string;
}

/** Comparing blocks every request, so a text gets this long and no more. */
const TIME_LIMIT_MS = 100;

/** Two texts line by line, or null where they differ too much to be compared in time. */
export function textDiff(was: string, toBe: string, timeLimitMs = TIME_LIMIT_MS): TextRow[] | null {
  // Once the limit is spent nothing comes back at all; a limit of 0 would be taken for none.
  const parts = diffLines(ended(was), ended(toBe), { timeout: Math.max(1, timeLimitMs), stripTrailingCr: true });
  if (!parts) return null;
  return parts.flatMap(({ value, added, removed }) => {
    const side = added ? "toBe" : removed ? "was" : "both";
    return value
      .replace(/\n$/, "")
      .split("\n")
      .map((text) => ({ side, text }) as const);
  });
}

function ended(text: string): string {
  return text === "" || text.endsWith("\n") ? text : `${text}\n`;
}
