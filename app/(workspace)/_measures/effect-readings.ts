import type { EffectBasis } from "@/lib/evaluation/measures/effect-bases";
import type { MeasureBasis } from "@/lib/evaluation/measures/measure-basis";
import { isKept, NEWTONS, type Reading, readChange, readChangeNumber } from "@/lib/evaluation/measures/reading";

import { type ChosenMeasure, readingFor } from "./chosen-measure";

/** How the newtons of an operating point are printed on the two sides of a change. */
export interface EffectReading {
  was: Reading;
  now: Reading;
}

export interface EffectReadings {
  byPoint: Readonly<Record<string, EffectReading>>;
  /** The unit of all of them, for the head of a column; null where they differ and every figure says its own. */
  unit: string | null;
  isKept: boolean;
}

/** In newtons, as everything is kept. */
export const EFFECT_IN_NEWTONS: EffectReadings = { byPoint: {}, unit: NEWTONS.unit, isKept: true };

export function effectReadings(
  chosen: Pick<ChosenMeasure, "measure" | "units">,
  bases: readonly EffectBasis[],
): EffectReadings {
  const pairs = bases.flatMap(({ operatingPoint, was, now }) => {
    const [known = null] = [now ?? was];
    if (known === null) return [];
    const read = (basis: MeasureBasis | null) => readingFor(chosen, basis ?? known);
    return [[operatingPoint, { was: read(was), now: read(now) }] as const];
  });
  const readings = pairs.flatMap(([, { was, now }]) => [was, now]);
  const units = new Set(readings.map(({ unit }) => unit));
  const [unit = NEWTONS.unit] = units;
  return {
    byPoint: Object.fromEntries(pairs),
    unit: units.size > 1 ? null : unit,
    isKept: readings.every(isKept),
  };
}

export function readingAt({ byPoint }: EffectReadings, operatingPoint: string): EffectReading {
  return byPoint[operatingPoint] ?? { was: NEWTONS, now: NEWTONS };
}

/** Does the change move what forces are referred to there, so that its steps don't add up in this measure? */
export function movesBasis({ was, now }: EffectReading): boolean {
  return was.unit !== now.unit || Math.abs(was.perNewton / now.perNewton - 1) > STORED_ROUNDING;
}

/** What an issue keeps is rounded to 12 significant digits, what a change computes is not. */
const STORED_ROUNDING = 1e-9;

interface MovedFigure {
  was: number | null;
  now: number | null;
  /** Newtons; 0 at an operating point that comes or goes. */
  delta: number;
}

/** What a change does to one figure: each side by its own stream and terms, and printed as the side after it. */
export function effectText(reading: EffectReading, figure: MovedFigure, withUnit: boolean): string {
  const print = withUnit ? readChange : readChangeNumber;
  return print(reading.now, asAfter(reading, figure));
}

/** The newtons that after the change make up the difference of the two readings. */
function asAfter(reading: EffectReading, { was, now, delta }: MovedFigure): number {
  const { was: before, now: after } = reading;
  if (was === null || now === null || before.unit !== after.unit || !movesBasis(reading)) return delta;
  return now - (was * before.perNewton) / after.perNewton;
}
