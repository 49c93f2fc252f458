import { z } from "zod";

import type { BudgetRow, BudgetSheet, GroupRow, ItemRow } from "./budget-sheet";

export const SORT_KEYS = ["sheet", "number", "name", "basic", "growth", "predicted", "allocation", "margin"] as const;
export type SortKey = (typeof SORT_KEYS)[number];

const ShortText = z.string().trim().max(120);

/** What the address of the budget sheet may say; anything else in it is read as if it were not there. */
export const SheetQuery = z.object({
  issue: z.coerce.number().int().positive().optional().catch(undefined),
  on: z.iso.date().optional().catch(undefined),
  point: z
    .string()
    .regex(/^[A-Z0-9][A-Z0-9-]{0,11}$/)
    .optional()
    .catch(undefined),
  measure: ShortText.optional().catch(undefined),
  find: ShortText.catch(""),
  only: z.enum(["all", "over", "cautions", "mine"]).catch("all"),
  sort: z.enum(SORT_KEYS).catch("sheet"),
  down: z.enum(["1"]).optional().catch(undefined),
});
export type SheetQuery = z.output<typeof SheetQuery>;

/** The same address with some of it changed; what is as it would be anyway is left out. */
export function sheetAddress(path: string, query: SheetQuery, change: Partial<SheetQuery>): string {
  const next = { ...query, ...change };
  const parts = new URLSearchParams();
  if (next.issue !== undefined) parts.set("issue", String(next.issue));
  if (next.on !== undefined) parts.set("on", next.on);
  if (next.point !== undefined) parts.set("point", next.point);
  if (next.measure !== undefined) parts.set("measure", next.measure);
  if (next.find !== "") parts.set("find", next.find);
  if (next.only !== "all") parts.set("only", next.only);
  if (next.sort !== "sheet") parts.set("sort", next.sort);
  if (next.down !== undefined) parts.set("down", next.down);
  const text = parts.toString();
  return text === "" ? path : `${path}?${text}`;
}

/** The rows that the query asks for: as on the sheet with the groups of what is found, or sorted without groups. */
export function chosenRows({ rows, isReference }: BudgetSheet, query: SheetQuery, userId: number): BudgetRow[] {
  const found = rows.filter(
    (row): row is ItemRow =>
      row.kind === "item" && isFound(row, query.find) && isAsked(row, query, isReference, userId),
  );
  if (query.sort !== "sheet") return sorted(found, query.sort, query.down !== undefined);
  if (query.find === "" && query.only === "all") return rows;

  const numbers = new Set(found.map(({ number }) => number));
  return rows.filter((row) => (row.kind === "item" ? numbers.has(row.number) : holdsAny(row, numbers)));
}

function holdsAny(group: GroupRow, numbers: ReadonlySet<string>): boolean {
  return group.members.some((member) => numbers.has(member));
}

function isFound({ number, name, owner }: ItemRow, find: string): boolean {
  const words = find.toLowerCase().split(/\s+/).filter(Boolean);
  const text = `${number} ${name} ${owner}`.toLowerCase();
  return words.every((word) => text.includes(word));
}

function isAsked(row: ItemRow, { only }: SheetQuery, isReference: boolean, userId: number): boolean {
  switch (only) {
    case "all":
      return true;
    case "over":
      return isReference && isOver(row);
    case "cautions":
      return row.result.notes.some(({ severity }) => severity !== "information");
    case "mine":
      return row.body.ownerId === userId;
  }
}

/** Predicted above the allocation by 0.01 N or more. */
export function isOver({ marginHundredths }: Pick<BudgetRow, "marginHundredths">): boolean {
  return marginHundredths !== null && marginHundredths < 0;
}

function sorted(rows: readonly ItemRow[], key: Exclude<SortKey, "sheet">, down: boolean): ItemRow[] {
  const ordered = rows.toSorted((one, other) => compare(one, other, key));
  return down ? ordered.reverse() : ordered;
}

function compare(one: ItemRow, other: ItemRow, key: Exclude<SortKey, "sheet">): number {
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
