import type { AllocationRow, AllocationsBody } from "../lines/allocations-body";
import type { LineState } from "../lines/line-state";
import type { Holder } from "./edits";
import { oncePer } from "./once-per";
import { compareNumbers } from "./sheet-order";

/** Hundredths of a newton by holder, while acts are worked into the sheet. */
export interface AllocationSheet {
  rows: Map<string, AllocationRow>;
  unallocated: number;
}

/** The group that holds a line, by kind and number; lines that a change retires are still among them. */
export type HolderTree = ReadonlyMap<string, string | null>;

export function keyOf(kind: "item" | "group", number: string): string {
  return `${kind} ${number}`;
}

export const holderTree = oncePer((lines: readonly LineState[]): HolderTree => {
  const tree = new Map<string, string | null>();
  for (const line of lines) {
    if (line.kind === "item") tree.set(keyOf("item", line.number), line.body.group);
    if (line.kind === "group") tree.set(keyOf("group", line.number), line.body.parent);
  }
  return tree;
});

export function openSheet({ rows, unallocatedHundredths }: AllocationsBody): AllocationSheet {
  const byKey = new Map(rows.map((row) => [keyOf(row.kind, row.number), { ...row }]));
  return { rows: byKey, unallocated: unallocatedHundredths };
}

export function closeSheet({ rows, unallocated }: AllocationSheet): AllocationsBody {
  const sorted = [...rows.values()].sort(
    (one, other) => compareNumbers(one.kind, other.kind) || compareNumbers(one.number, other.number),
  );
  return { rows: sorted, unallocatedHundredths: unallocated };
}

/** Σ of what has no allocated group above it: a group's allocation stands for its members'. */
export function allocatedSum(sheet: AllocationSheet, tree: HolderTree): number {
  return sumOf(sheet, ({ kind, number }) => allocatedAbove(keyOf(kind, number), sheet, tree).length === 0);
}

/** Σ of what a group's members hold: what counts directly under its ceiling. */
export function heldInside(group: string, sheet: AllocationSheet, tree: HolderTree): number {
  const key = keyOf("group", group);
  return sumOf(sheet, (row) => {
    const above = groupsAbove(keyOf(row.kind, row.number), tree);
    const nearest = above.find((holder) => sheet.rows.has(holder) || holder === key);
    return nearest === key;
  });
}

/**
 * Moves hundredths between two ends, and with them the ceiling of every allocated group that holds one end and not the
 * other. A group gives of what its members don't hold and so counts as holding its own end.
 */
export function moveAllocation(
  sheet: AllocationSheet,
  tree: HolderTree,
  { giver, receiver, hundredths }: { giver: Holder; receiver: Holder; hundredths: number },
): void {
  for (const end of [giver, receiver]) openCeiling(end, sheet, tree);
  const givers = ceilingsOf(giver, sheet, tree);
  const receivers = ceilingsOf(receiver, sheet, tree);
  addTo(giver, -hundredths, sheet);
  addTo(receiver, hundredths, sheet);
  for (const key of givers) if (!receivers.includes(key)) addToRow(key, -hundredths, sheet);
  for (const key of receivers) if (!givers.includes(key)) addToRow(key, hundredths, sheet);
}

/** A group without a row gets one for what its members already hold, so that nothing counts twice. */
function openCeiling({ kind, number }: Holder, sheet: AllocationSheet, tree: HolderTree): void {
  if (kind !== "group" || number === null || sheet.rows.has(keyOf("group", number))) return;
  sheet.rows.set(keyOf("group", number), { kind, number, hundredths: heldInside(number, sheet, tree) });
}

function ceilingsOf({ kind, number }: Holder, sheet: AllocationSheet, tree: HolderTree): string[] {
  if (kind === "unallocated" || number === null) return [];
  const key = keyOf(kind, number);
  const above = allocatedAbove(key, sheet, tree);
  return kind === "group" ? [key, ...above] : above;
}

/** A group's own row moves as the ceiling that holds its end. */
function addTo({ kind, number }: Holder, hundredths: number, sheet: AllocationSheet): void {
  if (kind === "unallocated") sheet.unallocated += hundredths;
  if (kind !== "item" || number === null) return;
  const key = keyOf("item", number);
  if (!sheet.rows.has(key)) sheet.rows.set(key, { kind, number, hundredths: 0 });
  addToRow(key, hundredths, sheet);
}

function addToRow(key: string, hundredths: number, sheet: AllocationSheet): void {
  const row = sheet.rows.get(key);
  if (row) row.hundredths += hundredths;
}

function allocatedAbove(key: string, sheet: AllocationSheet, tree: HolderTree): string[] {
  return groupsAbove(key, tree).filter((group) => sheet.rows.has(group));
}

function groupsAbove(key: string, tree: HolderTree): string[] {
  const above: string[] = [];
  let group = tree.get(key) ?? null;
  while (group !== null && !above.includes(keyOf("group", group))) {
    above.push(keyOf("group", group));
    group = tree.get(keyOf("group", group)) ?? null;
  }
  return above;
}

function sumOf({ rows }: AllocationSheet, counts: (row: AllocationRow) => boolean): number {
  return [...rows.values()].reduce((sum, row) => (counts(row) ? sum + row.hundredths : sum), 0);
}
