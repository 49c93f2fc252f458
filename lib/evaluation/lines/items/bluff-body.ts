import { z } from "zod";
import { BLUFF_BODY_SHAPES, type BluffBodyShape } from "@/lib/aero/bluff-body-shapes";
import type { Choice, FieldSpec } from "../field-spec";
import { coefficientUncertainty, nonNegativeNumber, positiveNumber, positiveQuantity } from "../quantity";
import { optionalText, requiredText } from "../text-schemas";
import { itemCommonShape, newItemCommon, type NewItem } from "./item-common";

/** The value of a loading code is no measured drag: such a shape is not offered. */
const CATALOGUE = BLUFF_BODY_SHAPES.filter((shape) => !shape.isLoadingCodeValue);
const SHAPES = CATALOGUE.map(({ id }) => id);

export const BluffBodyBody = z
  .strictObject({
    ...itemCommonShape,
    method: z.literal("bluff-body"),
    shape: z.enum(SHAPES, "Choose a shape of the catalogue.").nullable().default(null),
    dragCoefficient: nonNegativeNumber,
    coefficientUncertainty,
    source: requiredText("Say where the drag coefficient comes from.", 300),
    referenceArea: positiveQuantity,
    shelterFactor: nonNegativeNumber.default(1),
    shelterReason: optionalText(300).default(""),
    localSpeedRatio: positiveNumber.default(1),
  })
  .superRefine((body, context) => {
    const published = CATALOGUE.find(({ id }) => id === body.shape)?.dragCoefficient;
    if (published !== undefined && body.dragCoefficient !== published) {
      const message = `The catalogue has ${published} for this shape: choose no shape for a coefficient of your own.`;
      context.addIssue({ code: "custom", path: ["dragCoefficient"], message });
    }
    if (body.shelterFactor !== 1 && body.shelterReason === "") {
      const message = "Say what shelters it: the factor is not 1.";
      context.addIssue({ code: "custom", path: ["shelterReason"], message });
    }
  });
export type BluffBodyBody = z.output<typeof BluffBodyBody>;

export const BLUFF_BODY_FIELDS: readonly FieldSpec[] = [
  {
    key: "shape",
    label: "Shape from the catalogue",
    help: "Fills in the published coefficient and its source; leave it empty for one of your own.",
    type: { type: "choice", choices: CATALOGUE.map(choiceOf) },
    optional: true,
  },
  {
    key: "dragCoefficient",
    label: "Drag coefficient",
    symbol: "C_D",
    help: "On the reference area given below.",
    type: { type: "number" },
  },
  {
    key: "coefficientUncertainty",
    label: "Standard uncertainty of C_D",
    symbol: "u(C_D)",
    type: { type: "number" },
    optional: true,
  },
  { key: "source", label: "Source", type: { type: "text", longest: 300 } },
  {
    key: "referenceArea",
    label: "Reference area",
    symbol: "A",
    help: "The area that the coefficient was published for, usually the frontal one.",
    type: { type: "quantity", dimension: "area" },
  },
  {
    key: "shelterFactor",
    label: "Shelter factor",
    help: "Below 1 where another body takes part of the stream off.",
    type: { type: "number" },
  },
  {
    key: "shelterReason",
    label: "Reason of the shelter factor",
    type: { type: "text", longest: 300 },
    optional: true,
  },
  {
    key: "localSpeedRatio",
    label: "Local speed ratio",
    help: "Speed at this body over the speed of the operating point.",
    type: { type: "number" },
  },
];

function choiceOf(shape: BluffBodyShape): Choice {
  const { id, name, dragCoefficient, referenceArea } = shape;
  const source = shape.isFromMemory ? `${shape.source}; quoted from memory, check the book` : shape.source;
  return {
    value: id,
    label: `${name}: ${dragCoefficient} (${bookOf(shape)})`,
    help: `On the ${referenceArea}. ${source}.`,
    sets: { dragCoefficient, source },
  };
}

/** The book alone: one shape may stand there twice, by two of them. */
function bookOf({ source }: BluffBodyShape): string {
  return source.split(",")[0] ?? source;
}

export function newBluffBody(item: NewItem) {
  return {
    ...newItemCommon(item),
    method: "bluff-body" as const,
    shape: null,
    dragCoefficient: null,
    coefficientUncertainty: null,
    source: "",
    referenceArea: null,
    shelterFactor: 1,
    shelterReason: "",
    localSpeedRatio: 1,
  };
}
