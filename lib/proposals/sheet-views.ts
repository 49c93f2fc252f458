import type { TextRow } from "@/lib/budget/text-diff";
import type { PointEffect } from "@/lib/evaluation/budget/effects";
import type { LineKind } from "@/lib/vocabulary/lines";

/** Newtons on the base issue and on today's; null where it cannot be computed there. */
export interface SidesEffect {
  onBase: number | null;
  onToday: number | null;
}

/** `rows` is null where the two texts differ too much to be compared in time. */
export interface ComparedText {
  was: string;
  toBe: string;
  rows: TextRow[] | null;
}

/** Together with the other proposed ones, on today's issue. */
export interface JointView {
  points: PointEffect[];
  others: { key: string; label: string; title: string; counts: boolean; conflicts: string[] }[];
  /** Why this proposal itself could not follow those ahead of it. */
  conflicts: string[];
}

/** What moved on a change sheet since its reader last looked. */
export interface MovedView {
  /** When they last looked. */
  since: string;
  /** The round that they saw then; 0 of a working copy. */
  round: number;
  /** Fields that say something else than then, each with what it said; null where it did not stand there. */
  fields: { kind: LineKind; number: string; field: string; saw: string | null }[];
  /** All else that moved, a sentence each. */
  sentences: string[];
  reason: ComparedText | null;
  /** The text to be signed, line by line. */
  signingText: ComparedText | null;
}
