import type { LineKind } from "@/lib/vocabulary/lines";
import { mergeFields, mergedBody, type SettlementSide } from "../records/merge-fields";
import { sameValue } from "../records/same-value";
import { DraftContent, type DraftEdit } from "../schema";

export type DraftSide = "mine" | "theirs";

/** One value of a draft that two editors changed to different ones since they last had the same. */
export interface DraftConflict {
  /** "title", "transfers", "item 030 length", or "item 030" where one side changed a line that the other took out. */
  key: string;
  line: { kind: LineKind; number: string } | null;
  /** null where the whole line is meant. */
  field: string | null;
  mine: unknown;
  theirs: unknown;
}

export interface DraftMerge {
  content: DraftContent;
  conflicts: DraftConflict[];
}

type Choices = ReadonlyMap<string, DraftSide>;

type Fact = Exclude<keyof DraftContent, "edits">;

/**
 * What two editors of a draft made of the same saved state, put together: a field that one of them changed carries by
 * itself, one that both changed is a conflict and takes theirs until it is chosen.
 */
export function mergeDrafts(
  base: DraftContent,
  theirs: DraftContent,
  mine: DraftContent,
  choices: Choices,
): DraftMerge {
  const conflicts: DraftConflict[] = [];
  const meet = (conflict: DraftConflict): DraftSide => {
    conflicts.push(conflict);
    return choices.get(conflict.key) ?? "theirs";
  };
  const keep = (fact: Fact): DraftSide => {
    if (sameValue(base[fact], mine[fact])) return "theirs";
    if (sameValue(base[fact], theirs[fact]) || sameValue(mine[fact], theirs[fact])) return "mine";
    return meet({ key: fact, line: null, field: fact, mine: mine[fact], theirs: theirs[fact] });
  };
  const from = (side: DraftSide) => (side === "mine" ? mine : theirs);
  const facts = {
    title: from(keep("title")).title,
    reason: from(keep("reason")).reason,
    neededBy: from(keep("neededBy")).neededBy,
    transfers: from(keep("transfers")).transfers,
  };
  const edits = inOneOrder(theirs.edits, mine.edits).flatMap((key): DraftEdit[] => {
    const find = ({ edits: all }: DraftContent) => all.find((edit) => keyOf(edit) === key) ?? null;
    return mergeEdit({ base: find(base), theirs: find(theirs), mine: find(mine) }, choices, meet) ?? [];
  });
  return { content: { ...facts, edits }, conflicts };
}

/** A draft as the server keeps it: what was typed at the ends of a text is no change. */
export function asStored(content: DraftContent): DraftContent {
  const parsed = DraftContent.safeParse(content);
  return parsed.success ? parsed.data : content;
}

interface Sides {
  base: DraftEdit | null;
  theirs: DraftEdit | null;
  mine: DraftEdit | null;
}

function mergeEdit(
  { base, theirs, mine }: Sides,
  choices: Choices,
  meet: (conflict: DraftConflict) => DraftSide,
): DraftEdit[] | null {
  if (sameValue(base, mine) || sameValue(theirs, mine)) return theirs && [theirs];
  if (sameValue(base, theirs)) return mine && [mine];
  const some = mine ?? theirs;
  if (some === null) return null;
  const { kind, number } = some;
  const key = keyOf(some);
  if (!base?.body || !theirs?.body || !mine?.body || theirs.operation !== mine.operation) {
    const side = meet({ key, line: { kind, number }, field: null, mine, theirs });
    const kept = side === "mine" ? mine : theirs;
    return kept && [kept];
  }
  const merges = mergeFields(base.body, theirs.body, mine.body);
  const sides = new Map<string, SettlementSide>();
  for (const { field, side, theirs: their, yours } of merges) {
    if (side !== "conflict") continue;
    const chosen = meet({ key: `${key} ${field}`, line: { kind, number }, field, mine: yours, theirs: their });
    sides.set(field, chosen === "mine" ? "yours" : "theirs");
  }
  const body = DraftContent.shape.edits.element.shape.body.parse(mergedBody(theirs.body, merges, sides));
  return [{ ...theirs, body }];
}

function keyOf({ kind, number }: DraftEdit): string {
  return `${kind} ${number}`;
}

function inOneOrder(theirs: readonly DraftEdit[], mine: readonly DraftEdit[]): string[] {
  return [...new Set([...theirs, ...mine].map(keyOf))];
}
