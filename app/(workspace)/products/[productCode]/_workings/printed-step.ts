import type { WorkedStep } from "@/lib/evaluation/methods/worked-step";
import { formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatSignificant } from "@/lib/units/format-number";

import type { WorkingStep } from "./working";

/** A worked step as it is printed. */
export function printedStep({ value, source, range, ...texts }: WorkedStep): WorkingStep {
  const text = texts.unit === "N" ? formatNewtonsNumber(value) : formatSignificant(value, 4);
  const unit = texts.unit === "–" ? "" : texts.unit;
  return {
    ...texts,
    unit,
    value: text,
    source: source ?? null,
    range: range ?? null,
  };
}
