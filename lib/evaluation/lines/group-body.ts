import { z } from "zod";
import type { FieldSpec } from "./field-spec";
import { nonNegativeNumber } from "./quantity";
import { lineNumber, requiredText } from "./text-schemas";

export const GroupBody = z.strictObject({
  name: requiredText("Give the group a name.", 120),
  parent: lineNumber.nullable().default(null),
  order: nonNegativeNumber,
});
export type GroupBody = z.output<typeof GroupBody>;

export const GROUP_FIELDS: readonly FieldSpec[] = [
  { key: "name", label: "Name", type: { type: "text", longest: 120 } },
  { key: "parent", label: "Belongs to", type: { type: "reference", to: "group" }, optional: true },
  { key: "order", label: "Order on the sheet", type: { type: "number" } },
];

export function newGroup(order: number) {
  return { name: "", parent: null, order };
}
