import type { IndexedState } from "./indexed-state";

/** One row of the sheet: an item, or a group ahead of what it holds. */
export interface SheetRow {
  kind: "item" | "group";
  number: string;
  /** How many groups it stands in. */
  depth: number;
}

type Tree = Pick<IndexedState, "items" | "groups">;

/** Items and groups as the sheet prints them: level by level in the order that the lines state, then by number. */
export function sheetOrder(tree: Tree): SheetRow[] {
  const children = new Map<string | null, (Entry & { parent: string | null })[]>();
  for (const entry of entriesOf(tree)) {
    const siblings = children.get(entry.parent);
    if (siblings) siblings.push(entry);
    else children.set(entry.parent, [entry]);
  }
  return rowsBelow(null, 0, children);
}

/** The numbers of the items alone. */
export function itemsInSheetOrder(tree: Tree): string[] {
  return sheetOrder(tree).flatMap((row) => (row.kind === "item" ? [row.number] : []));
}

interface Entry {
  kind: "item" | "group";
  number: string;
  order: number;
}

type Children = ReadonlyMap<string | null, readonly (Entry & { parent: string | null })[]>;

function entriesOf({ items, groups }: Tree): (Entry & { parent: string | null })[] {
  return [
    ...[...groups].map(([number, { order, parent }]) => ({ kind: "group" as const, number, order, parent })),
    ...[...items].map(([number, { order, group }]) => ({ kind: "item" as const, number, order, parent: group })),
  ];
}

function rowsBelow(parent: string | null, depth: number, children: Children): SheetRow[] {
  const entries = [...(children.get(parent) ?? [])].sort(byOrder);
  return entries.flatMap(({ kind, number }) => [
    { kind, number, depth },
    ...(kind === "group" ? rowsBelow(number, depth + 1, children) : []),
  ]);
}

function byOrder(one: Entry, other: Entry): number {
  return one.order - other.order || compareNumbers(one.number, other.number) || compareNumbers(one.kind, other.kind);
}

/** Line numbers by their code units, so that every machine sorts alike. */
export function compareNumbers(one: string, other: string): number {
  return one < other ? -1 : one > other ? 1 : 0;
}
