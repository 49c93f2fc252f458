import { formatExact, formatSignificant } from "@/lib/units/format-number";

import { fractionOf, rulerTicks, type Scale } from "../products/[productCode]/_pictures/scale";

export interface AxisTick {
  /** Fraction of the axis. */
  at: number;
  /** null: a rule without a number. */
  label: string | null;
}

export interface Axis {
  /** Fraction of the axis at which a value stands: 0 at its start, 1 at its end. */
  fraction: (value: number) => number;
  ticks: AxisTick[];
}

/** An axis from 0, or from below where a value is negative, to just above the greatest value. */
export function straightAxis(values: readonly number[], most = 5): Axis {
  const scale: Scale = { min: Math.min(0, ...values), max: Math.max(0, ...values) };
  // An axis on which everything is 0 still needs a length.
  if (scale.max === scale.min) scale.max = 1;
  return {
    fraction: (value) => fractionOf(scale, value),
    ticks: rulerTicks(scale, most).map((value) => ({ at: fractionOf(scale, value), label: formatExact(value) })),
  };
}

/** Whole powers of ten as numbers, the values between as rules. */
export function decadeAxis(fromPower: number, toPower: number): Axis {
  const fraction = logarithmic(10 ** fromPower, 10 ** toPower);
  const powers = Array.from({ length: toPower - fromPower + 1 }, (_, index) => fromPower + index);
  return { fraction, ticks: powers.map((power) => ({ at: fraction(10 ** power), label: powerOfTen(power) })) };
}

const STEPS = [1, 2, 5];

/** A logarithmic axis that ends on steps of 1, 2 or 5 times a power of ten around what it has to hold. */
export function stepAxis(least: number, greatest: number): Axis {
  const min = stepValues(least / 10, least).at(-1) ?? least;
  const max = stepValues(greatest, greatest * 10).at(0) ?? greatest;
  const fraction = logarithmic(min, max);
  const ticks = stepValues(min, max).map((value) => ({ at: fraction(value), label: formatSignificant(value, 1) }));
  return { fraction, ticks };
}

function stepValues(from: number, to: number): number[] {
  const first = Math.floor(Math.log10(from));
  const last = Math.ceil(Math.log10(to));
  return Array.from({ length: last - first + 1 }, (_, index) => first + index)
    .flatMap((power) => STEPS.map((step) => Number((step * 10 ** power).toPrecision(3))))
    .filter((value) => value >= from * (1 - 1e-9) && value <= to * (1 + 1e-9));
}

function logarithmic(min: number, max: number): (value: number) => number {
  return (value) => Math.log(value / min) / Math.log(max / min);
}

const SUPERSCRIPTS = "⁰¹²³⁴⁵⁶⁷⁸⁹";

/** "10⁷"; power 0 or greater. */
export function powerOfTen(power: number): string {
  return `10${String(power).replace(/\d/g, (digit) => SUPERSCRIPTS.charAt(Number(digit)))}`;
}
