import type { ItemDataRow, SheetDataRow } from "@/lib/budget/sheet-data";
import type { RowFigures } from "@/lib/evaluation/budget/sheet-rows";
import type { PersonName } from "@/lib/budget/views";

import type { SheetQuery, SortKey } from "./sheet-filter";

/** A row as it is shown: with the name of the person, which may change while an issue never does. */
export type ShownItem = ItemDataRow & { owner: string };
export type ShownRow = ShownItem | Extract<SheetDataRow, { kind: "group" }>;

export function shownRows(rows: readonly SheetDataRow[], people: readonly PersonName[]): ShownRow[] {
  const names = new Map(people.map(({ id, name }) => [id, name]));
  return rows.map((row) =>
    row.kind === "group" ? row : { ...row, owner: names.get(row.ownerId) ?? `person ${row.ownerId}` },
  );
}

export interface Reader {
  userId: number;
  /** Over is said only where allocations are set. */
  isReference: boolean;
}

type RowQuery = Pick<SheetQuery, "find" | "only" | "sort" | "down" | "closed">;

/** The rows that the query asks for: as on the sheet with the groups of what is found, or sorted without groups. */
export function chosenRows(rows: readonly ShownRow[], query: RowQuery, reader: Reader): ShownRow[] {
  const isChosen = (row: ShownRow): row is ShownItem =>
    row.kind === "item" && isFound(row, query.find) && isAsked(row, query.only, reader);
  if (query.sort !== "sheet") return sorted(rows.filter(isChosen), query.sort, query.down !== undefined);

  const isAll = query.find === "" && query.only === "all";
  return withoutClosed(isAll ? rows : withTheirGroups(rows, isChosen), query.closed);
}

/** Predicted above the allocation by 0.01 N or more. */
export function isOver({ marginHundredths }: Pick<RowFigures, "marginHundredths">): boolean {
  return marginHundredths !== null && marginHundredths < 0;
}

/** Found items and every group that holds one: from the end, a group comes after all that it holds. */
function withTheirGroups(rows: readonly ShownRow[], isChosen: (row: ShownRow) => boolean): ShownRow[] {
  let held: number[] = [];
  const kept = rows.toReversed().filter((row) => {
    const isKept = row.kind === "item" ? isChosen(row) : held.some((depth) => depth > row.depth);
    if (row.kind === "group") held = held.filter((depth) => depth <= row.depth);
    if (isKept) held.push(row.depth);
    return isKept;
  });
  return kept.reverse();
}

/** A closed group stands with its sums, what it holds does not. */
function withoutClosed(rows: readonly ShownRow[], closed: readonly string[]): ShownRow[] {
  let below: number | null = null;
  return rows.filter((row) => {
    if (below !== null && row.depth > below) return false;
    below = row.kind === "group" && closed.includes(row.number) ? row.depth : null;
    return true;
  });
}

function isFound({ number, name, owner }: ShownItem, find: string): boolean {
  const words = find.toLowerCase().split(/\s+/).filter(Boolean);
  const text = `${number} ${name} ${owner}`.toLowerCase();
  return words.every((word) => text.includes(word));
}

function isAsked(row: ShownItem, only: SheetQuery["only"], { isReference, userId }: Reader): boolean {
  switch (only) {
    case "all":
      return true;
    case "over":
      return isReference && isOver(row);
    case "cautions":
      return row.notes.some(({ severity }) => severity !== "information");
    case "mine":
      return row.ownerId === userId;
  }
}

function sorted(rows: readonly ShownItem[], key: Exclude<SortKey, "sheet">, down: boolean): ShownItem[] {
  const ordered = rows.toSorted((one, other) => compare(one, other, key));
  return down ? ordered.reverse() : ordered;
}

function compare(one: ShownItem, other: ShownItem, key: Exclude<SortKey, "sheet">): number {
  switch (key) {
    case "number":
    case "name":
      return one[key] < other[key] ? -1 : one[key] > other[key] ? 1 : 0;
    case "allocation":
      return orLast(one.allocationHundredths) - orLast(other.allocationHundredths);
    case "margin":
      return orLast(one.marginHundredths) - orLast(other.marginHundredths);
    default:
      return one[key] - other[key];
  }
}

/** What has no figure stands after all that have one; two of them are alike. */
function orLast(hundredths: number | null): number {
  return hundredths ?? Number.MAX_SAFE_INTEGER;
}
