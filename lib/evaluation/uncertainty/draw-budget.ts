import { streamStateOf } from "../methods/stream-state";
import type { BudgetModel, ModelItem } from "./budget-model";
import type { Cause } from "./cause";
import { normalCumulative } from "./normal-distribution";
import { normalQuantile } from "./normal-quantile";
import { fillSlots } from "./slot";
import type { UniformStream } from "./xoshiro";

/** The number before 1, which the sum of two parts may be rounded to. */
const GREATEST_PART = 1 - 2 ** -53;

/** ΣB and ΣB + ΣG of one draw; NaN where a method refuses what was drawn. */
export interface DrawnTotals {
  basic: number;
  predicted: number;
}

/** Draws a budget: every cause once, then every item from those very causes. Two runs from one stream are alike. */
export function budgetDrawer(model: BudgetModel): (stream: UniformStream) => DrawnTotals {
  const { causes, items, stream: point } = model;
  const drawCauses = causeDrawer(causes);
  const deviations = new Float64Array(causes.length);
  const basics = new Float64Array(items.length);
  return (uniform) => {
    drawCauses(uniform, deviations);
    fillSlots(point.slots, deviations);
    const state = streamStateOf(point.input);
    let basic = 0;
    let predicted = 0;
    for (let index = 0; index < items.length; index += 1) {
      const item = items[index];
      if (!item) continue;
      let newtons = item.kind === "share" ? sharedNewtons(item, basics, deviations) : formulaNewtons(item);
      for (const place of item.biases) newtons *= 1 + (deviations[place] ?? 0);
      basics[index] = newtons;
      basic += newtons;
      predicted += newtons + Math.abs(newtons) * item.growthFraction;
    }
    return { basic, predicted };

    function formulaNewtons(item: Extract<ModelItem, { kind: "formula" }>): number {
      fillSlots(item.slots, deviations);
      return item.force.newtons(state);
    }
  };
}

function sharedNewtons(
  { fraction, fractionPlace, members }: Extract<ModelItem, { kind: "share" }>,
  basics: Float64Array,
  deviations: Float64Array,
): number {
  let sum = 0;
  for (const member of members) sum += basics[member] ?? 0;
  return sum * (fractionPlace === null ? fraction : fraction + (deviations[fractionPlace] ?? 0));
}

/**
 * Writes the deviation of every cause from its value: normal (JCGM 101:2008, 6.4.7), cut off where the quantity cannot be.
 * Cut off means drawn from what is left of the distribution, which only shows where the uncertainty is a great part of the
 * value. All causes in one loop: a function of each would box every number that it gives.
 */
function causeDrawer(causes: readonly Cause[]): (uniform: UniformStream, deviations: Float64Array) => void {
  const spread = Float64Array.from(causes, ({ standardUncertainty }) => standardUncertainty);
  const below = Float64Array.from(causes, (cause) => partBelow(cause, cause.lowest));
  const within = Float64Array.from(causes, (cause) => partBelow(cause, cause.highest) - partBelow(cause, cause.lowest));
  return (uniform, deviations) => {
    for (let place = 0; place < spread.length; place += 1) {
      const part = Math.min((below[place] ?? 0) + (within[place] ?? 0) * uniform.nextUniform(), GREATEST_PART);
      deviations[place] = (spread[place] ?? 0) * normalQuantile(part);
    }
  };
}

function partBelow({ value, standardUncertainty }: Cause, limit: number): number {
  return normalCumulative((limit - value) / standardUncertainty);
}
