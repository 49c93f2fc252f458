import { z } from "zod";
import type { FieldSpec } from "./field-spec";
import { roughnessQuantity } from "./quantity";
import { requiredText } from "./text-schemas";

export const FinishBody = z.strictObject({
  name: requiredText("Give the finish a name.", 120),
  roughness: roughnessQuantity,
  source: requiredText("Say where the roughness comes from.", 300),
});
export type FinishBody = z.output<typeof FinishBody>;

export const FINISH_FIELDS: readonly FieldSpec[] = [
  { key: "name", label: "Name", type: { type: "text", longest: 120 } },
  {
    key: "roughness",
    label: "Roughness",
    symbol: "k_s",
    help: "Equivalent sand-grain roughness: not the Ra of a surface tester.",
    type: { type: "quantity", dimension: "roughness" },
  },
  { key: "source", label: "Source", type: { type: "text", longest: 300 } },
];

export function newFinish() {
  return { name: "", roughness: null, source: "" };
}
