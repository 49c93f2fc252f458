import { z } from "zod";
import type { FieldSpec } from "../field-spec";
import { nonNegativeQuantity, positiveNumber, positiveQuantity } from "../quantity";
import { lineNumber } from "../text-schemas";
import { demandOneRoughness, FRICTION_FIELDS, frictionShape, newFriction } from "./friction-fields";
import { itemCommonShape, newItemCommon, type NewItem } from "./item-common";

export const FlatPlateBody = z
  .strictObject({
    ...itemCommonShape,
    method: z.literal("flat-plate-friction"),
    length: positiveQuantity,
    breadth: positiveQuantity,
    faces: z.int("Give a whole number of faces.").min(1, "At least one wetted face.").max(1_000_000, "Too many faces."),
    liesBehind: lineNumber.nullable().default(null),
    runUpFollows: z.boolean("Say yes or no.").default(false),
    runUp: nonNegativeQuantity.default({ value: 0 }),
    ...frictionShape,
    localSpeedRatio: positiveNumber.default(1),
    formFactor: positiveNumber.default(1),
  })
  .superRefine((body, context) => {
    demandOneRoughness(body, context);
    if (body.runUpFollows && body.liesBehind === null) {
      const message = "Say which item it lies behind, or type the run-up.";
      context.addIssue({ code: "custom", path: ["liesBehind"], message });
    }
  });
export type FlatPlateBody = z.output<typeof FlatPlateBody>;

export const FLAT_PLATE_FIELDS: readonly FieldSpec[] = [
  {
    key: "length",
    label: "Length along the flow",
    symbol: "L",
    type: { type: "quantity", dimension: "length" },
  },
  { key: "breadth", label: "Breadth", symbol: "b", type: { type: "quantity", dimension: "length" } },
  {
    key: "faces",
    label: "Wetted faces",
    symbol: "n",
    help: "Of all like plates together: four plates wetted on both sides have eight.",
    type: { type: "number", whole: true },
  },
  {
    key: "liesBehind",
    label: "Lies behind",
    help: "The item whose boundary layer runs on over this one.",
    type: { type: "reference", to: "item" },
    optional: true,
  },
  {
    key: "runUpFollows",
    label: "Run-up follows that item",
    help: "No: the run-up is typed; with 0 the plate starts a fresh layer.",
    type: { type: "yes-no" },
  },
  {
    key: "runUp",
    label: "Run-up",
    symbol: "x₀",
    help: "Wetted length ahead of this plate from the start of the layer.",
    type: { type: "quantity", dimension: "length" },
    shownWhen: { field: "runUpFollows", is: [false] },
  },
  ...FRICTION_FIELDS,
  {
    key: "localSpeedRatio",
    label: "Local speed ratio",
    help: "Speed along this surface over the speed of the operating point.",
    type: { type: "number" },
  },
  {
    key: "formFactor",
    label: "Form factor",
    help: "Multiplies the friction where the surface is not flat.",
    type: { type: "number" },
  },
];

export function newFlatPlate(item: NewItem) {
  return {
    ...newItemCommon(item),
    method: "flat-plate-friction" as const,
    length: null,
    breadth: null,
    faces: 1,
    liesBehind: null,
    runUpFollows: false,
    runUp: { value: 0 },
    ...newFriction,
    localSpeedRatio: 1,
    formFactor: 1,
  };
}
