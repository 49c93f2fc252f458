import type { UncertainNumber } from "../document/number-input";
import type { MethodAnswer, MethodOutcome } from "./method-answer";

const WIDE_STEP = 1e-3;
const NARROW_STEP = 1e-6;

/** What a quantity gives at one value of an input. */
export interface Reading {
  newtons: number;
  /** Within one regime the newtons are a smooth function of every input. */
  regime: string;
}

/** ∂drag/∂x at the given value, by differences. */
export function sensitivity(given: UncertainNumber, at: (value: number) => MethodOutcome): number {
  return slope(given, (value) => {
    const outcome = at(value);
    return outcome.outcome === "answer" ? { newtons: outcome.answer.drag, regime: regimeOf(outcome.answer) } : null;
  });
}

/**
 * The slope of a reading at the given value, by differences.
 *
 * Five points where the same formulas hold at all of them (relative error below 1e-10); narrower, then one-sided, where a
 * change of line or regime or a refusal is near. A value of 0 has no scale of its own and is stepped by its uncertainty.
 *
 * @param at null where there is no reading
 */
export function slope({ value, standardUncertainty }: UncertainNumber, at: (value: number) => Reading | null): number {
  const centre = at(value);
  if (!centre) return 0;
  if (value === 0) return oneSided(centre.newtons, at, value, standardUncertainty);

  const alike = (x: number): number | null => {
    const reading = at(x);
    return reading && reading.regime === centre.regime ? reading.newtons : null;
  };
  const h = WIDE_STEP * Math.abs(value);
  const [low2, low1, high1, high2] = [alike(value - 2 * h), alike(value - h), alike(value + h), alike(value + 2 * h)];
  if (low2 !== null && low1 !== null && high1 !== null && high2 !== null) {
    return (low2 - high2 + 8 * (high1 - low1)) / (12 * h);
  }
  const narrow = NARROW_STEP * Math.abs(value);
  const below = alike(value - narrow);
  const above = alike(value + narrow);
  if (below !== null && above !== null) return (above - below) / (2 * narrow);
  if (above !== null) return (above - centre.newtons) / narrow;
  return below === null ? 0 : (centre.newtons - below) / narrow;
}

function oneSided(centre: number, at: (value: number) => Reading | null, value: number, step: number): number {
  const above = at(value + step);
  if (above) return (above.newtons - centre) / step;
  const below = at(value - step);
  return below ? (centre - below.newtons) / step : 0;
}

function regimeOf({ frictionLineUsed, roughnessVerdict, transitionAt }: MethodAnswer): string {
  const start = transitionAt === undefined ? "unreached" : transitionAt === 0 ? "from start" : "reached";
  return [frictionLineUsed, roughnessVerdict, start].join("|");
}
