import { formatNewtonsChange } from "@/lib/units/format-newtons";
import { formatFixed, THIN_SPACE } from "@/lib/units/format-number";

import type { TrialReading } from "./read-setting";

export function dragOf({ result }: TrialReading): number | null {
  return result?.outcome.outcome === "answer" ? result.outcome.answer.drag : null;
}

/** "+0.40 N"; null where one side has no drag. */
export function newtonsFrom(a: number | null, b: number | null): string | null {
  return a === null || b === null ? null : formatNewtonsChange(b - a);
}

/** "+3.1 %" of A; null where one side has no drag or A is zero. */
export function percentFrom(a: number | null, b: number | null): string | null {
  if (a === null || b === null || a === 0) return null;
  const percent = ((b - a) / Math.abs(a)) * 100;
  return `${percent > 0 ? "+" : ""}${formatFixed(percent, 1)}${THIN_SPACE}%`;
}
