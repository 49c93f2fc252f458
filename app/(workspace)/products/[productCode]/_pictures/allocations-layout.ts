import type { AllocationLine } from "@/lib/evaluation/budget/allocations-view";

import { type Scale, rulerTicks } from "./scale";
import type { Span } from "./stave-layout";

export interface AllocationRow {
  label: string;
  /** Newtons; a saving's lie left of zero. */
  solid: Span;
  growth: Span;
  /** What goes beyond the allocation. */
  over: Span | null;
  allocation: number | null;
  margin: number | null;
}

export interface AllocationsLayout {
  rows: AllocationRow[];
  scale: Scale;
  ticks: number[];
}

export interface AllocatedItem extends Pick<AllocationLine, "number" | "name" | "allocationHundredths"> {
  basic: number;
  predicted: number;
  marginHundredths: number | null;
}

/** Every item on one ruler, with round values of the measure in which a newton is `perNewton`: basic solid, growth hatched behind it, its allocation as a post. */
export function allocationsLayout(items: readonly AllocatedItem[], perNewton = 1): AllocationsLayout {
  const rows = items.map(({ number, name, basic, predicted, allocationHundredths, marginHundredths }) => {
    const allocation = allocationHundredths === null ? null : allocationHundredths / 100;
    const isOver = marginHundredths !== null && marginHundredths < 0;
    return {
      label: `${number} ${name}`,
      // Growth makes a saving smaller: what is left of it is solid.
      solid: basic < 0 ? { from: Math.min(predicted, 0), to: 0 } : { from: 0, to: basic },
      growth: { from: Math.min(basic, predicted), to: Math.max(basic, predicted) },
      over: isOver && allocation !== null ? { from: allocation, to: predicted } : null,
      allocation,
      margin: marginHundredths === null ? null : marginHundredths / 100,
    };
  });
  const ends = rows.flatMap(({ solid, growth, allocation }) => [solid.from, growth.from, growth.to, allocation ?? 0]);
  const scale = { min: Math.min(0, ...ends), max: Math.max(0, ...ends) * 1.04 || 1 };
  return { rows, scale, ticks: rulerTicks(scale, 6, perNewton) };
}
