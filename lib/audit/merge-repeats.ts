import type { HistoryRow } from "./queries";

export interface ShownRow extends HistoryRow {
  /** How many like it follow one another; more than one only for refusals. */
  times: number;
}

/** Refusals that repeat one after another are shown as one row; in the history each stands by itself. */
export function mergeRepeats(rows: readonly HistoryRow[]): ShownRow[] {
  const shown: ShownRow[] = [];
  for (const row of rows) {
    const last = shown.at(-1);
    if (last && isRepeat(last, row)) last.times += 1;
    else shown.push({ ...row, times: 1 });
  }
  return shown;
}

function isRepeat(one: HistoryRow, other: HistoryRow): boolean {
  return one.outcome === "refused" && repeatKey(one) === repeatKey(other);
}

function repeatKey(row: HistoryRow): string {
  const { chain, personId, act, subjectType, subjectId, outcome, reason } = row;
  return JSON.stringify([chain, personId, act, subjectType, subjectId, outcome, reason]);
}
