import { z } from "zod";
import type { FieldSpec } from "./field-spec";
import { hundredths, lineNumber } from "./text-schemas";

/** The number of the one allocations line of a product. */
export const ALLOCATIONS_NUMBER = "AL";

export const AllocationRow = z.strictObject({
  kind: z.enum(["item", "group"]),
  number: lineNumber,
  hundredths,
});
export type AllocationRow = z.output<typeof AllocationRow>;

export const AllocationsBody = z
  .strictObject({
    rows: z.array(AllocationRow).max(5000),
    /** Stored, so that conservation is a real check. */
    unallocatedHundredths: hundredths.min(0, "Unallocated may not go below zero."),
  })
  .superRefine((body, context) => {
    const keys = body.rows.map((row) => `${row.kind} ${row.number}`);
    if (new Set(keys).size !== keys.length) {
      context.addIssue({ code: "custom", path: ["rows"], message: "A line has two rows." });
    }
  });
export type AllocationsBody = z.output<typeof AllocationsBody>;

/** The sheet changes only by transfers and by acts that free allocation: nothing of it is typed. */
export const ALLOCATIONS_FIELDS: readonly FieldSpec[] = [
  {
    key: "rows",
    label: "Allocation",
    type: {
      type: "list",
      entry: "Allocation of",
      keyedBy: ["kind", "number"],
      of: [
        { key: "kind", label: "Kind", type: { type: "text", longest: 10 } },
        { key: "number", label: "Number", type: { type: "text", longest: 12 } },
        { key: "hundredths", label: "Allocation", type: { type: "newtons" } },
      ],
    },
    fixed: true,
  },
  { key: "unallocatedHundredths", label: "Unallocated", type: { type: "newtons" }, fixed: true },
];
