/** Digits that results keep before they are stored and hashed. */
export const STORED_DIGITS = 12;

/** Powers of ten that a double holds exactly. */
const EXACT_POWERS: readonly number[] = Array.from({ length: 23 }, (_, power) => Number(`1e${power}`));
/** Twelve digits and a power of ten are looked for within these sizes; others go by their decimal text. */
const QUICK = { least: 1e-10, greatest: 1e12 };
/** A product is off by less than this where it has twelve digits before the point. */
const NEAR_HALF = 1e-3;

/** Rounds to 12 significant digits, so that a stored number doesn't depend on the last bits of a machine. */
export function roundStored(value: number): number {
  return quicklyRounded(value) ?? withoutNegativeZero(Number(value.toPrecision(STORED_DIGITS)));
}

/**
 * The same number without going through text, where that is certain: not where the 13th digit is so near a half that the
 * rounding of the product could decide. The quotient of two exact numbers is the double nearest to the decimal one.
 */
function quicklyRounded(value: number): number | null {
  const size = Math.abs(value);
  if (!(size >= QUICK.least && size < QUICK.greatest)) return null;
  const power = EXACT_POWERS[STORED_DIGITS - 1 - Math.floor(Math.log10(size))];
  if (power === undefined) return null;
  const product = size * power;
  const whole = Math.floor(product);
  const rest = product - whole;
  // The logarithm of a number just below a power of ten may be rounded up to it.
  if (Math.abs(rest - 0.5) < NEAR_HALF || product < 1e11 || product >= 1e12) return null;
  const rounded = (rest < 0.5 ? whole : whole + 1) / power;
  return value < 0 ? -rounded : rounded;
}

/**
 * Newtons in whole hundredths, halves away from zero. Decided on the decimal text of 12 digits: 1.005 N is 101
 * hundredths though the nearest binary number lies below it.
 *
 * @throws RangeError if the value is not finite
 */
export function toHundredths(newtons: number): number {
  if (!Number.isFinite(newtons)) throw new RangeError(`newtons must be finite, got ${newtons}`);

  const [digits, exponent] = Math.abs(newtons)
    .toExponential(STORED_DIGITS - 1)
    .split("e");
  const hundredths = Math.round(Number(`${digits}e${Number(exponent) + 2}`));
  return withoutNegativeZero(newtons < 0 ? -hundredths : hundredths);
}

/** Newtons rounded to 0.01 N: what standings and thresholds are decided on. */
export function roundHundredths(newtons: number): number {
  return toHundredths(newtons) / 100;
}

function withoutNegativeZero(value: number): number {
  return value === 0 ? 0 : value;
}
