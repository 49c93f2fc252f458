import { z } from "zod";

export const SORT_KEYS = ["sheet", "number", "name", "basic", "growth", "predicted", "allocation", "margin"] as const;
export type SortKey = (typeof SORT_KEYS)[number];

const LINE_NUMBER = /^[A-Z0-9][A-Z0-9-]{0,11}$/;
const ShortText = z.string().trim().max(120);

/** What the address of the budget sheet may say; anything else in it is read as if it were not there. */
export const SheetQuery = z.object({
  issue: z.coerce.number().int().positive().optional().catch(undefined),
  on: z.iso.date().optional().catch(undefined),
  point: z.string().regex(LINE_NUMBER).optional().catch(undefined),
  measure: ShortText.optional().catch(undefined),
  find: ShortText.catch(""),
  only: z.enum(["all", "over", "cautions", "mine"]).catch("all"),
  sort: z.enum(SORT_KEYS).catch("sheet"),
  down: z.enum(["1"]).optional().catch(undefined),
  /** Numbers of the groups whose rows are folded away. */
  closed: z
    .string()
    .transform((text) => text.split(",").filter((number) => LINE_NUMBER.test(number)))
    .catch([]),
});
export type SheetQuery = z.output<typeof SheetQuery>;
