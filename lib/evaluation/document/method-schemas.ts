import { z } from "zod";
import { FRICTION_LINE_CHOICES } from "@/lib/aero/friction/friction-line-name";
import {
  anyNumber,
  fraction,
  numberField,
  oneOfMessage,
  positive,
  textField,
  wholeFromOne,
  zeroOrGreater,
} from "./number-input";
import { StreamPointInput } from "./operating-point-schema";

/** Where a layer turns turbulent when nothing is said: the usual engineering value, common practice. */
export const DEFAULT_CRITICAL_REYNOLDS = 5e5;

export const TransitionInput = z.discriminatedUnion(
  "kind",
  [
    z.strictObject({
      kind: z.literal("natural"),
      criticalReynolds: numberField(positive).default(DEFAULT_CRITICAL_REYNOLDS),
    }),
    z.strictObject({ kind: z.literal("tripped"), at: numberField(zeroOrGreater).default(0) }),
    z.strictObject({ kind: z.literal("laminar") }),
  ],
  { error: oneOfMessage(["natural", "tripped", "laminar"]) },
);

const frictionLine = z
  .enum(FRICTION_LINE_CHOICES, {
    error: `must be one of ${FRICTION_LINE_CHOICES.join(", ")}`,
  })
  .default("automatic");

const surface = {
  roughness: numberField(zeroOrGreater).default(0),
  transition: TransitionInput.default({ kind: "natural", criticalReynolds: DEFAULT_CRITICAL_REYNOLDS }),
  frictionLine,
};
const localSpeedRatio = { localSpeedRatio: numberField(positive).default(1) };
const saving = { saving: z.boolean("must be true or false").default(false) };

export const FLAT_PLATE_FRICTION = {
  method: z.literal("flat-plate-friction"),
  length: numberField(positive),
  breadth: numberField(positive),
  faces: numberField(wholeFromOne),
  runUp: numberField(zeroOrGreater).default(0),
  ...surface,
  ...localSpeedRatio,
  formFactor: numberField(positive).default(1),
};

export const DUCT_ENTRY = {
  method: z.literal("duct-entry"),
  width: numberField(positive),
  height: numberField(positive),
  length: numberField(positive),
  ...surface,
};

export const LOSS_COEFFICIENT = {
  method: z.literal("loss-coefficient"),
  lossCoefficient: numberField(zeroOrGreater),
  flowArea: numberField(positive),
  ...localSpeedRatio,
};

export const BLUFF_BODY = {
  method: z.literal("bluff-body"),
  dragCoefficient: numberField(zeroOrGreater),
  referenceArea: numberField(positive),
  shelterFactor: numberField(zeroOrGreater).default(1),
  ...localSpeedRatio,
};

export const DRAG_AREA = {
  method: z.literal("drag-area"),
  dragArea: numberField(anyNumber),
  ...localSpeedRatio,
  ...saving,
};

export const MEASURED = {
  method: z.literal("measured"),
  force: numberField(anyNumber),
  testPoint: StreamPointInput,
  ...saving,
};

export const FIXED = { method: z.literal("fixed"), force: numberField(anyNumber), ...saving };

export const SHARE = {
  method: z.literal("share"),
  fraction: numberField(fraction),
  of: z.array(textField(), "must be a list of item ids").min(1, "must name at least one item").optional(),
  ofGroup: textField().optional(),
};
