import { z } from "zod";
import type { FieldSpec } from "../field-spec";
import { signedQuantity } from "../quantity";
import { requiredText } from "../text-schemas";
import { itemCommonShape, newItemCommon, type NewItem } from "./item-common";
import { demandSign } from "./saving-sign";

export const FixedBody = z
  .strictObject({
    ...itemCommonShape,
    method: z.literal("fixed"),
    force: signedQuantity,
    source: requiredText("Say where the force comes from.", 300),
  })
  .superRefine((body, context) => demandSign(body.saving, body.force, "force", context));
export type FixedBody = z.output<typeof FixedBody>;

export const FIXED_FIELDS: readonly FieldSpec[] = [
  {
    key: "force",
    label: "Force",
    symbol: "F",
    help: "The same at every operating point. Negative only on a saving.",
    type: { type: "quantity", dimension: "force" },
  },
  { key: "source", label: "Source", type: { type: "text", longest: 300 } },
];

export function newFixed(item: NewItem) {
  return { ...newItemCommon(item), method: "fixed" as const, force: null, source: "" };
}
