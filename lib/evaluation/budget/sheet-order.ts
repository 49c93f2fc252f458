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
  const children: Children = new Map();
  for (const [number, { order, parent }] of tree.groups) addChild(parent, { kind: "group", number, order }, children);
  for (const [number, { order, group }] of tree.items) addChild(group, { kind: "item", number, order }, children);
  const rows: SheetRow[] = [];
  addRowsBelow(null, 0, children, rows);
  return rows;
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

type Children = Map<string | null, Entry[]>;

function addChild(parent: string | null, entry: Entry, children: Children): void {
  const siblings = children.get(parent);
  if (siblings) siblings.push(entry);
  else children.set(parent, [entry]);
}

function addRowsBelow(parent: string | null, depth: number, children: Children, rows: SheetRow[]): void {
  for (const { kind, number } of children.get(parent)?.sort(byOrder) ?? []) {
    rows.push({ kind, number, depth });
    if (kind === "group") addRowsBelow(number, depth + 1, children, rows);
  }
}

function byOrder(one: Entry, other: Entry): number {
  return one.order - other.order || compareNumbers(one.number, other.number) || compareNumbers(one.kind, other.kind);
}

/** Line numbers by their code units, so that every machine sorts alike. */
export function compareNumbers(one: string, other: string): number {
  return one < other ? -1 : one > other ? 1 : 0;
}
