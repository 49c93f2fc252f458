import { z } from "zod";

import { asRecord, type Body } from "@/app/_components/line-fields/body";
import { fieldsOfBody } from "@/lib/evaluation/lines/field-catalogue";
import { isShown, valuesOf } from "@/lib/evaluation/lines/field-rows";
import type { FieldSpec } from "@/lib/evaluation/lines/field-spec";
import { ITEM_METHODS } from "@/lib/evaluation/lines/item-methods";
import { newOperatingPoint } from "@/lib/evaluation/lines/operating-point-body";

const TypedBody = z.record(z.string(), z.json());

/** A stream and an item in it, as typed: complete or not. */
export const TrialSetting = z.strictObject({
  point: TypedBody,
  item: TypedBody,
  /** ΣB of the members of a share, which a trial doesn't have: typed as a force. */
  membersSum: z.json(),
});
export type TrialSetting = z.infer<typeof TrialSetting>;

/** Two settings beside each other. */
export const Trial = z.strictObject({ a: TrialSetting, b: TrialSetting });
export type Trial = z.infer<typeof Trial>;
export type Side = keyof Trial;
export const SIDES: readonly Side[] = ["a", "b"];

/** What a trial starts from: a plate in a wind, twice, the second one rougher. */
export function exampleTrial(): Trial {
  const point = asRecord({ ...newOperatingPoint(), speed: { value: 25, entered: "90 km/h" } });
  const item = asRecord({
    ...ITEM_METHODS["flat-plate-friction"].template({ ownerId: 0, order: 0, group: null }),
    length: { value: 4, entered: "4 m" },
    breadth: { value: 2.5, entered: "2.5 m" },
    finish: "F30",
    roughness: null,
  });
  return { a: { point, item, membersSum: null }, b: { point, item: { ...item, finish: "F80" }, membersSum: null } };
}

/** Fields that matter only within a budget or for its people. */
const LEFT_TO_THE_PROPOSAL = [
  "grade",
  "order",
  "runUpFollows",
  "includeSavings",
  "coefficientUncertainty",
  "humidityUncertainty",
  "name",
  "hoursPerYear",
  "limitHundredths",
];

export function pointFields(point: Body): FieldSpec[] {
  return fieldsOfBody("operating_point", point).filter((spec) => isAsked(spec) && isShown(spec, valuesOf(point)));
}

/** The fields of an item that decide its drag, in the order of its form. */
export function itemFields(item: Body): FieldSpec[] {
  return askedItemFields(item).filter((spec) => isShown(spec, valuesOf(item)));
}

/** The same with those that another choice would show. */
export function askedItemFields(item: Body): FieldSpec[] {
  const maySave = item.method === "drag-area" || item.method === "measured" || item.method === "fixed";
  return fieldsOfBody("item", item).filter((spec) => isAsked(spec) && (spec.key !== "saving" || maySave));
}

function isAsked({ key, type, fixed }: FieldSpec): boolean {
  if (fixed || LEFT_TO_THE_PROPOSAL.includes(key)) return false;
  switch (type.type) {
    case "quantity":
    case "number":
    case "fraction":
    case "newtons":
    case "yes-no":
    case "choice":
    case "number-choice":
      return true;
    case "reference":
      return type.to === "finish";
    default:
      return false;
  }
}
