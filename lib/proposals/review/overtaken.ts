import type { LineEdit } from "@/lib/evaluation/budget/edits";
import type { ItemBody } from "@/lib/evaluation/lines/item-body";
import type { BudgetState, LineOf, LineState } from "@/lib/evaluation/lines/line-state";
import { OPERATING_POINT_STATE_FIELDS } from "@/lib/evaluation/lines/operating-point-body";
import { parseBody } from "@/lib/evaluation/lines/parse-body";
import { LINE_KIND_NAMES, type LineKind } from "@/lib/vocabulary/lines";
import { sameValue } from "../records/same-value";

/**
 * Why a proposal can take no approving signature before it is carried forward: since its base issue a line it edits
 * has a new revision, or something that its items are computed from has changed. Empty when it is not overtaken.
 */
export function overtakenReasons(base: BudgetState, today: BudgetState, edits: readonly LineEdit[]): string[] {
  const items = edits.flatMap((edit) => itemBodyOf(edit) ?? []);
  return [
    ...new Set([
      ...edits.flatMap((edit) => movedLine(base, today, edit.kind, edit.number) ?? []),
      ...movedStates(base, today),
      ...movedGrowthTable(base, today),
      ...items.flatMap((body) => movedSources(base, today, body)),
    ]),
  ];
}

/** Only what the edit makes of an item is computed; a retired item uses nothing any more. */
function itemBodyOf({ kind, operation, body }: LineEdit): ItemBody | null {
  if (kind !== "item" || operation === "retire") return null;
  const parsed = parseBody("item", body);
  return parsed.ok && parsed.content.kind === "item" ? parsed.content.body : null;
}

function find(state: BudgetState, kind: LineKind, number: string): LineState | undefined {
  return state.lines.find((line) => line.kind === kind && line.number === number);
}

function movedLine(base: BudgetState, today: BudgetState, kind: LineKind, number: string): string | null {
  const now = find(today, kind, number);
  if (now === undefined || find(base, kind, number)?.letter === now.letter) return null;
  return `${LINE_KIND_NAMES[kind]} ${number} has a new revision, ${now.letter}, since issue ${now.issue}.`;
}

function linesOf<K extends LineKind>(state: BudgetState, kind: K): LineOf<K>[] {
  return state.lines.filter((line): line is LineOf<K> => line.kind === kind);
}

function movedStates(base: BudgetState, today: BudgetState): string[] {
  const earlier = new Map(linesOf(base, "operating_point").map((line) => [line.number, line.body]));
  return linesOf(today, "operating_point").flatMap(({ number, issue, body }) => {
    const before = earlier.get(number);
    if (!before || OPERATING_POINT_STATE_FIELDS.every((field) => sameValue(before[field], body[field]))) return [];
    return [`Operating point ${number} has another fluid, state or speed since issue ${issue}.`];
  });
}

function movedGrowthTable(base: BudgetState, today: BudgetState): string[] {
  const [before] = linesOf(base, "terms");
  const [now] = linesOf(today, "terms");
  if (!before || !now || sameValue(before.body.growthTable, now.body.growthTable)) return [];
  return [`The growth table changed in issue ${now.issue}.`];
}

function movedSources(base: BudgetState, today: BudgetState, body: ItemBody): string[] {
  const finish = "finish" in body && body.finish !== null ? [movedLine(base, today, "finish", body.finish)] : [];
  const behind =
    "liesBehind" in body && body.liesBehind !== null ? [movedLine(base, today, "item", body.liesBehind)] : [];
  const members = body.method === "share" ? movedMembers(base, today, body) : [];
  return [...finish, ...behind, ...members].filter((reason) => reason !== null);
}

type ShareBody = Extract<ItemBody, { method: "share" }>;

function movedMembers(base: BudgetState, today: BudgetState, share: ShareBody): (string | null)[] {
  if (share.ofGroup === null) return share.of.map((number) => movedLine(base, today, "item", number));
  const before = membersOf(base, share.ofGroup, share.includeSavings);
  const now = membersOf(today, share.ofGroup, share.includeSavings);
  const moved = now.map((number) => movedLine(base, today, "item", number));
  const joined = now.filter((number) => !before.includes(number) && find(base, "item", number));
  const left = before.filter((number) => !now.includes(number));
  return [
    ...moved,
    ...joined.map((number) => `Item ${number} joined group ${share.ofGroup}, of which an edited item is a share.`),
    ...left.map((number) => `Item ${number} left group ${share.ofGroup}, of which an edited item is a share.`),
  ];
}

/** Items of a group and of its subgroups as they stand, savings only if asked for. */
function membersOf(state: BudgetState, group: string, includeSavings: boolean): string[] {
  const groups = new Set([group]);
  const all = linesOf(state, "group").filter(({ retired }) => !retired);
  for (let grew = true; grew;) {
    const more = all.filter(
      ({ number, body }) => !groups.has(number) && body.parent !== null && groups.has(body.parent),
    );
    for (const { number } of more) groups.add(number);
    grew = more.length > 0;
  }
  return linesOf(state, "item")
    .filter(({ retired, body }) => !retired && body.group !== null && groups.has(body.group))
    .filter(({ body }) => includeSavings || !body.saving)
    .map(({ number }) => number);
}
