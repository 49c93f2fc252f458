/**
 * A budget as a book-keeper would hold it, in whole hundredths of a newton. Nothing here is the product's: the walk
 * compares the two.
 */
export interface ModelBudget {
  items: Record<string, ModelItem>;
  groups: Record<string, { parent: string | null; revision: number }>;
  limit: number;
  reserve: number;
  /** How often the operating point and the terms were revised. */
  revisions: { point: number; terms: number };
  /** Allocations by holder, "item 010" or "group G10". */
  rows: Record<string, number>;
  unallocated: number;
}

export interface ModelItem {
  owner: string;
  /** Fixed, the same at every operating point; negative on a saving. */
  force: number;
  group: string | null;
  saving: boolean;
  retired: boolean;
  revision: number;
}

export type ModelEdit =
  | { what: "force"; item: string; to: number; bodyOwner: string }
  | { what: "owner"; item: string; to: string; bodyOwner: string }
  | { what: "group"; item: string; to: string | null; bodyOwner: string }
  | { what: "add"; item: string; body: Omit<ModelItem, "retired" | "revision"> }
  | { what: "retire"; item: string }
  | { what: "reinstate"; item: string }
  | { what: "parent"; group: string; to: string | null }
  | { what: "limit"; to: number }
  | { what: "reserve"; to: number };

export interface ModelHolder {
  kind: "item" | "group" | "unallocated";
  number: string | null;
}

export interface ModelTransfer {
  giver: ModelHolder;
  receiver: ModelHolder;
  hundredths: number;
}

export interface ModelContent {
  edits: ModelEdit[];
  transfers: ModelTransfer[];
}

/** The line that an edit changes. */
export function lineOf(edit: ModelEdit): string {
  if ("item" in edit) return `item ${edit.item}`;
  if ("group" in edit) return `group ${edit.group}`;
  return edit.what === "limit" ? "point" : "terms";
}

/** How often a line was revised; undefined where there is none. */
export function revisionOf(budget: ModelBudget, line: string): number | undefined {
  if (line === "point" || line === "terms") return budget.revisions[line];
  const [kind, number = ""] = line.split(" ");
  return (kind === "item" ? budget.items : budget.groups)[number]?.revision;
}

/** The value of the one field that an edit changes; undefined where there is no such line. */
export function fieldOf(budget: ModelBudget, edit: ModelEdit): number | string | null | undefined {
  switch (edit.what) {
    case "limit":
    case "reserve":
      return budget[edit.what];
    case "parent":
      return budget.groups[edit.group]?.parent;
    case "force":
    case "owner":
    case "group":
      return budget.items[edit.item]?.[edit.what];
    default:
      return undefined;
  }
}

/** The budget after a change; null where it cannot take it. */
export function applied(before: ModelBudget, { edits, transfers }: ModelContent): ModelBudget | null {
  if (edits.length + transfers.length === 0) return null;
  const after = structuredClone(before);
  for (const edit of edits) if (!edited(after, edit)) return null;
  if (!holdsTogether(after)) return null;
  if (!transfers.every((transfer) => isSound(before, after, transfer))) return null;

  after.unallocated = after.limit - after.reserve - topSum(after);
  for (const { giver, receiver, hundredths } of transfers) move(after, giver, receiver, hundredths);
  for (const [number, item] of Object.entries(after.items)) {
    const key = `item ${number}`;
    const held = after.rows[key];
    if (!item.retired || held === undefined) continue;
    move(after, { kind: "item", number }, { kind: "unallocated", number: null }, held);
    delete after.rows[key];
  }
  return isConserved(after) && isCovered(after) ? after : null;
}

function edited(budget: ModelBudget, edit: ModelEdit): boolean {
  if (edit.what === "add") {
    if (budget.items[edit.item]) return false;
    budget.items[edit.item] = { ...edit.body, retired: false, revision: 0 };
    return true;
  }
  if (edit.what === "limit" || edit.what === "reserve") {
    if (budget[edit.what] === edit.to) return false;
    budget[edit.what] = edit.to;
    budget.revisions[edit.what === "limit" ? "point" : "terms"] += 1;
    return true;
  }
  if (edit.what === "parent") {
    const group = budget.groups[edit.group];
    if (!group || group.parent === edit.to) return false;
    budget.groups[edit.group] = { parent: edit.to, revision: group.revision + 1 };
    return true;
  }
  const item = budget.items[edit.item];
  if (!item || item.retired !== (edit.what === "reinstate")) return false;
  item.revision += 1;
  if (edit.what === "retire" || edit.what === "reinstate") {
    item.retired = edit.what === "retire";
    return true;
  }
  if (item[edit.what] === edit.to) return false;
  Object.assign(item, { [edit.what]: edit.to });
  return true;
}

/** No group holds itself, however far up. */
function holdsTogether({ groups }: ModelBudget): boolean {
  return Object.keys(groups).every((start) => {
    const seen = new Set<string>();
    for (let group: string | null = start; group !== null; group = groups[group]?.parent ?? null) {
      if (seen.has(group)) return false;
      seen.add(group);
    }
    return true;
  });
}

function isSound(before: ModelBudget, after: ModelBudget, { giver, receiver, hundredths }: ModelTransfer): boolean {
  const exists = ({ kind, number }: ModelHolder) =>
    kind === "unallocated" || (number !== null && (kind === "item" ? after.items : after.groups)[number] !== undefined);
  const isRetired = (budget: ModelBudget, { kind, number }: ModelHolder) =>
    kind === "item" && budget.items[number ?? ""]?.retired === true;
  if (hundredths < 1 || (giver.kind === receiver.kind && giver.number === receiver.number)) return false;
  if (!exists(giver) || !exists(receiver) || isRetired(after, receiver)) return false;
  // What this very change retires may still give.
  return !(isRetired(after, giver) && isRetired(before, giver));
}

/** The groups above a holder, nearest first. */
function above({ items, groups }: ModelBudget, key: string): string[] {
  const [kind, number = ""] = key.split(" ");
  const chain: string[] = [];
  let group = (kind === "item" ? items[number]?.group : groups[number]?.parent) ?? null;
  for (; group !== null; group = groups[group]?.parent ?? null) chain.push(`group ${group}`);
  return chain;
}

/** What counts directly inside a holder: with null, inside none. */
function inside(budget: ModelBudget, ceiling: string | null): number {
  let sum = 0;
  for (const [key, held] of Object.entries(budget.rows)) {
    const nearest = above(budget, key).find((group) => group === ceiling || group in budget.rows) ?? null;
    if (nearest === ceiling) sum += held;
  }
  return sum;
}

function topSum(budget: ModelBudget): number {
  return inside(budget, null);
}

function move(budget: ModelBudget, giver: ModelHolder, receiver: ModelHolder, hundredths: number): void {
  const ends = [giver, receiver].map(({ kind, number }) => (kind === "unallocated" ? null : `${kind} ${number}`));
  for (const key of ends) if (key?.startsWith("group") && !(key in budget.rows)) budget.rows[key] = inside(budget, key);
  for (const key of ends) if (key?.startsWith("item")) budget.rows[key] ??= 0;
  const [takes, gives] = ends.map((key) => {
    if (key === null) return [];
    return [key, ...above(budget, key).filter((group) => group in budget.rows)];
  });
  for (const key of takes ?? []) if (!gives?.includes(key)) budget.rows[key] = (budget.rows[key] ?? 0) - hundredths;
  for (const key of gives ?? []) if (!takes?.includes(key)) budget.rows[key] = (budget.rows[key] ?? 0) + hundredths;
  if (giver.kind === "unallocated") budget.unallocated -= hundredths;
  if (receiver.kind === "unallocated") budget.unallocated += hundredths;
}

export function isConserved(budget: ModelBudget): boolean {
  return topSum(budget) + budget.unallocated + budget.reserve === budget.limit;
}

/** Nobody holds less than nothing, no group less than its members, no saving more than nothing. */
function isCovered(budget: ModelBudget): boolean {
  if (budget.unallocated < 0) return false;
  return Object.entries(budget.rows).every(([key, held]) => {
    const [kind, number = ""] = key.split(" ");
    if (kind === "group") return held >= inside(budget, key);
    return budget.items[number]?.saving ? held <= 0 : held >= 0;
  });
}

/** Grade estimated: a fifth of its size on top, so that a saving shrinks. Forces are multiples of five hundredths. */
export function predictedOf({ force, retired }: ModelItem): number {
  return retired ? 0 : force + Math.abs(force) / 5;
}

export function predicted(budget: ModelBudget): number {
  return Object.values(budget.items).reduce((sum, item) => sum + predictedOf(item), 0);
}
