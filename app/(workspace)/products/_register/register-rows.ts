import { z } from "zod";

import type { RegisterSheetEntry } from "@/lib/products/register-sheet";
import { STANDING_ORDER } from "@/lib/vocabulary/standing";

const SORT_KEYS = ["code", "name", "standing", "margin", "share", "pending"] as const;
export type RegisterSort = (typeof SORT_KEYS)[number];

const ShortText = z.string().trim().max(120);

/** What the address of the register may say; anything else in it is read as if it were not there. */
export const RegisterQuery = z.object({
  measure: ShortText.optional().catch(undefined),
  find: ShortText.catch(""),
  only: z.enum(["all", "waiting", "open", "into_the_reserve", "over", "not_established"]).catch("all"),
  sort: z.enum(SORT_KEYS).catch("code"),
  down: z.enum(["1"]).optional().catch(undefined),
});
export type RegisterQuery = z.output<typeof RegisterQuery>;

/** The same address with some of it changed; what is as it would be anyway is left out. */
export function registerAddress(query: RegisterQuery, change: Partial<RegisterQuery>): string {
  const next = { ...query, ...change };
  const parts = new URLSearchParams();
  if (next.measure !== undefined) parts.set("measure", next.measure);
  if (next.find !== "") parts.set("find", next.find);
  if (next.only !== "all") parts.set("only", next.only);
  if (next.sort !== "code") parts.set("sort", next.sort);
  if (next.down !== undefined) parts.set("down", next.down);
  const text = parts.toString();
  return text === "" ? "/products" : `/products?${text}`;
}

/** A product on the register, with how many of its open proposals wait for the reader. */
export interface RegisterRow extends RegisterSheetEntry {
  waiting: number;
}

/** The rows that are asked for, in the order that is asked for; what has no figure stands last. */
export function chosenProducts(rows: readonly RegisterRow[], query: RegisterQuery): RegisterRow[] {
  const found = rows.filter((row) => isFound(row, query.find) && isAsked(row, query.only));
  const ordered = found.toSorted((one, other) => compare(one, other, query.sort) || byText(one, other, "code"));
  return query.down === undefined ? ordered : ordered.reverse();
}

function isFound({ product: { code, name } }: RegisterRow, find: string): boolean {
  const text = `${code} ${name}`.toLowerCase();
  return find
    .toLowerCase()
    .split(/\s+/)
    .every((word) => text.includes(word));
}

function isAsked({ worst, product, openProposals, waiting }: RegisterRow, only: RegisterQuery["only"]): boolean {
  switch (only) {
    case "all":
      return true;
    case "waiting":
      return waiting > 0;
    case "open":
      return openProposals > 0;
    case "not_established":
      return product.newestIssue === null;
    case "into_the_reserve":
    case "over":
      return worst?.standing === only;
  }
}

function compare(one: RegisterRow, other: RegisterRow, sort: RegisterSort): number {
  switch (sort) {
    case "code":
    case "name":
      return byText(one, other, sort);
    case "standing":
      return standingOf(one) - standingOf(other);
    case "margin":
      return figure(one.worst?.margin) - figure(other.worst?.margin);
    case "share":
      return figure(shareOfLimit(one)) - figure(shareOfLimit(other));
    case "pending":
      return other.waiting - one.waiting || other.openProposals - one.openProposals;
  }
}

/** The margin as a fraction of the limit. */
export function shareOfLimit({ worst }: Pick<RegisterRow, "worst">): number | undefined {
  return worst === null ? undefined : worst.margin / worst.limit;
}

function byText(one: RegisterRow, other: RegisterRow, key: "code" | "name"): number {
  return one.product[key] < other.product[key] ? -1 : one.product[key] > other.product[key] ? 1 : 0;
}

/** The worst first. */
function standingOf({ worst }: RegisterRow): number {
  return worst === null ? STANDING_ORDER.length : -STANDING_ORDER.indexOf(worst.standing);
}

function figure(value: number | undefined): number {
  return value ?? Number.MAX_VALUE;
}
