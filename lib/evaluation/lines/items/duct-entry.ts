import { z } from "zod";
import type { FieldSpec } from "../field-spec";
import { positiveQuantity } from "../quantity";
import { demandOneRoughness, FRICTION_FIELDS, frictionShape, newFriction } from "./friction-fields";
import { itemCommonShape, newItemCommon, type NewItem } from "./item-common";

export const DuctEntryBody = z
  .strictObject({
    ...itemCommonShape,
    method: z.literal("duct-entry"),
    width: positiveQuantity,
    height: positiveQuantity,
    length: positiveQuantity,
    ...frictionShape,
  })
  .superRefine(demandOneRoughness);
export type DuctEntryBody = z.output<typeof DuctEntryBody>;

export const DUCT_ENTRY_FIELDS: readonly FieldSpec[] = [
  { key: "width", label: "Width inside", symbol: "W", type: { type: "quantity", dimension: "length" } },
  { key: "height", label: "Height inside", symbol: "H", type: { type: "quantity", dimension: "length" } },
  {
    key: "length",
    label: "Length from the entry",
    symbol: "L",
    type: { type: "quantity", dimension: "length" },
  },
  ...FRICTION_FIELDS,
];

export function newDuctEntry(item: NewItem) {
  return {
    ...newItemCommon(item),
    method: "duct-entry" as const,
    width: null,
    height: null,
    length: null,
    ...newFriction,
  };
}
