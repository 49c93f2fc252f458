import { z } from "zod";
import { checkDocumentRules } from "./document-rules";
import { checkItemRules } from "./item-rules";
import {
  BLUFF_BODY,
  DRAG_AREA,
  DUCT_ENTRY,
  FIXED,
  FLAT_PLATE_FRICTION,
  LOSS_COEFFICIENT,
  MEASURED,
  SHARE,
  TransitionInput,
} from "./method-schemas";
import { METHOD_NAMES } from "../methods/method-name";
import { type NumberInput, oneOfMessage, textField } from "./number-input";
import { OperatingPointInput, StreamPointInput } from "./operating-point-schema";

export { OperatingPointInput, StreamPointInput, TransitionInput };

const METHOD_MESSAGE = oneOfMessage(METHOD_NAMES);
const named = {
  id: textField(),
  group: textField().optional(),
};

/** The fields of one method alone, as a line of a budget keeps them. */
export const MethodInput = z
  .discriminatedUnion(
    "method",
    [
      z.strictObject(FLAT_PLATE_FRICTION),
      z.strictObject(DUCT_ENTRY),
      z.strictObject(LOSS_COEFFICIENT),
      z.strictObject(BLUFF_BODY),
      z.strictObject(DRAG_AREA),
      z.strictObject(MEASURED),
      z.strictObject(FIXED),
      z.strictObject(SHARE),
    ],
    { error: METHOD_MESSAGE },
  )
  .superRefine(checkItemRules, { when: () => true });

/** An item of an evaluation: a method's fields with the item's id and, if it has one, its group. */
export const ItemInput = z
  .discriminatedUnion(
    "method",
    [
      z.strictObject({ ...named, ...FLAT_PLATE_FRICTION }),
      z.strictObject({ ...named, ...DUCT_ENTRY }),
      z.strictObject({ ...named, ...LOSS_COEFFICIENT }),
      z.strictObject({ ...named, ...BLUFF_BODY }),
      z.strictObject({ ...named, ...DRAG_AREA }),
      z.strictObject({ ...named, ...MEASURED }),
      z.strictObject({ ...named, ...FIXED }),
      z.strictObject({ ...named, ...SHARE }),
    ],
    { error: METHOD_MESSAGE },
  )
  .superRefine(checkItemRules, { when: () => true });

/** What is evaluated: every item at every operating point. */
export const EvaluationDocument = z
  .strictObject(
    {
      operatingPoints: z.array(OperatingPointInput, "must be a list").min(1, "must have at least one operating point"),
      items: z.array(ItemInput, "must be a list").min(1, "must have at least one item"),
    },
    { error: (issue) => (issue.code === "invalid_type" ? "must be an object" : undefined) },
  )
  .superRefine(checkDocumentRules, { when: () => true });

export type { NumberInput };
export type FluidInput = z.infer<typeof StreamPointInput>;
export type StreamPointInput = FluidInput;
/** The same, where air may be humid: an operating point of a budget can say so, a document cannot. */
export type StreamInput =
  Exclude<FluidInput, { fluid: "air" }> | (Extract<FluidInput, { fluid: "air" }> & { relativeHumidity?: NumberInput });
export type OperatingPointInput = z.infer<typeof OperatingPointInput>;
export type TransitionInput = z.infer<typeof TransitionInput>;
export type MethodInput = z.infer<typeof MethodInput>;
export type ItemInput = z.infer<typeof ItemInput>;
export type EvaluationDocument = z.infer<typeof EvaluationDocument>;

/** The fields of one method, by its name. */
export type InputOf<M extends MethodInput["method"]> = Extract<MethodInput, { method: M }>;
