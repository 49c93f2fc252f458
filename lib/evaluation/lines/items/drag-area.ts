import { z } from "zod";
import type { FieldSpec } from "../field-spec";
import { positiveNumber, signedQuantity } from "../quantity";
import { requiredText } from "../text-schemas";
import { itemCommonShape, newItemCommon, type NewItem } from "./item-common";
import { demandSign } from "./saving-sign";

export const DragAreaBody = z
  .strictObject({
    ...itemCommonShape,
    method: z.literal("drag-area"),
    dragArea: signedQuantity,
    source: requiredText("Say where the drag area comes from.", 300),
    localSpeedRatio: positiveNumber.default(1),
  })
  .superRefine((body, context) => demandSign(body.saving, body.dragArea, "dragArea", context));
export type DragAreaBody = z.output<typeof DragAreaBody>;

export const DRAG_AREA_FIELDS: readonly FieldSpec[] = [
  {
    key: "dragArea",
    label: "Drag area",
    symbol: "C_D·A",
    help: "Negative only on a saving.",
    type: { type: "quantity", dimension: "area" },
  },
  { key: "source", label: "Source", type: { type: "text", longest: 300 } },
  {
    key: "localSpeedRatio",
    label: "Local speed ratio",
    help: "Speed at this body over the speed of the operating point.",
    type: { type: "number" },
  },
];

export function newDragArea(item: NewItem) {
  return {
    ...newItemCommon(item),
    method: "drag-area" as const,
    dragArea: null,
    source: "",
    localSpeedRatio: 1,
  };
}
