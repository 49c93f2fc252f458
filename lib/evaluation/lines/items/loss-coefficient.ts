import { z } from "zod";
import type { FieldSpec } from "../field-spec";
import { coefficientUncertainty, nonNegativeNumber, positiveNumber, positiveQuantity } from "../quantity";
import { requiredText } from "../text-schemas";
import { itemCommonShape, newItemCommon, type NewItem } from "./item-common";

export const LossCoefficientBody = z.strictObject({
  ...itemCommonShape,
  method: z.literal("loss-coefficient"),
  lossCoefficient: nonNegativeNumber,
  coefficientUncertainty,
  source: requiredText("Say where the loss coefficient comes from.", 300),
  /** null: the flow area of the product. */
  flowArea: positiveQuantity.nullable().default(null),
  localSpeedRatio: positiveNumber.default(1),
});
export type LossCoefficientBody = z.output<typeof LossCoefficientBody>;

export const LOSS_COEFFICIENT_FIELDS: readonly FieldSpec[] = [
  {
    key: "lossCoefficient",
    label: "Loss coefficient",
    symbol: "K",
    help: "Pressure loss over the dynamic pressure at the local speed.",
    type: { type: "number" },
  },
  {
    key: "coefficientUncertainty",
    label: "Standard uncertainty of K",
    symbol: "u(K)",
    type: { type: "number" },
    optional: true,
  },
  { key: "source", label: "Source", type: { type: "text", longest: 300 } },
  {
    key: "flowArea",
    label: "Flow area",
    symbol: "A",
    help: "Leave it empty to take the flow area of the product.",
    type: { type: "quantity", dimension: "area" },
    optional: true,
  },
  {
    key: "localSpeedRatio",
    label: "Local speed ratio",
    help: "Speed that K refers to over the speed of the operating point.",
    type: { type: "number" },
  },
];

export function newLossCoefficient(item: NewItem) {
  return {
    ...newItemCommon(item),
    method: "loss-coefficient" as const,
    lossCoefficient: null,
    coefficientUncertainty: null,
    source: "",
    flowArea: null,
    localSpeedRatio: 1,
  };
}
