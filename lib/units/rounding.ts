/** Digits that results keep before they are stored and hashed. */
export const STORED_DIGITS = 12;

/** Rounds to 12 significant digits, so that a stored number doesn't depend on the last bits of a machine. */
export function roundStored(value: number): number {
  return withoutNegativeZero(Number(value.toPrecision(STORED_DIGITS)));
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
