import { z } from "zod";
import type { FieldSpec } from "../field-spec";
import { coefficientUncertainty, fractionNumber } from "../quantity";
import { lineNumber, requiredText } from "../text-schemas";
import { itemCommonShape, newItemCommon, type NewItem } from "./item-common";

export const ShareBody = z
  .strictObject({
    ...itemCommonShape,
    method: z.literal("share"),
    fraction: fractionNumber,
    coefficientUncertainty,
    source: requiredText("Say where the fraction comes from.", 300),
    of: z.array(lineNumber).max(1000, "At most 1000 items.").default([]),
    ofGroup: lineNumber.nullable().default(null),
    includeSavings: z.boolean("Say yes or no.").default(false),
  })
  .superRefine((body, context) => {
    const named = body.of.length > 0;
    if (named === (body.ofGroup !== null)) {
      const message = named ? "Name items or a group, not both." : "Name the items, or a group, that it is a share of.";
      context.addIssue({ code: "custom", path: ["of"], message });
    }
    if (new Set(body.of).size !== body.of.length) {
      context.addIssue({ code: "custom", path: ["of"], message: "An item is named twice." });
    }
  });
export type ShareBody = z.output<typeof ShareBody>;

export const SHARE_FIELDS: readonly FieldSpec[] = [
  {
    key: "fraction",
    label: "Share",
    help: "Of the sum of the basic estimates of its members.",
    type: { type: "fraction" },
  },
  {
    key: "coefficientUncertainty",
    label: "Standard uncertainty of the share",
    help: "As a fraction: 0.01 is one per cent of the members.",
    type: { type: "number" },
    optional: true,
  },
  { key: "source", label: "Source", type: { type: "text", longest: 300 } },
  { key: "of", label: "Of items", type: { type: "references", to: "item" }, optional: true },
  {
    key: "ofGroup",
    label: "Of group",
    help: "With its subgroups.",
    type: { type: "reference", to: "group" },
    optional: true,
  },
  { key: "includeSavings", label: "Savings count along", type: { type: "yes-no" } },
];

export function newShare(item: NewItem) {
  return {
    ...newItemCommon(item),
    method: "share" as const,
    fraction: null,
    coefficientUncertainty: null,
    source: "",
    of: [],
    ofGroup: null,
    includeSavings: false,
  };
}
