import { STORED_DIGITS } from "./rounding";

export const THIN_SPACE = "\u2009";
const MINUS = "\u2212";
const SUPERSCRIPTS = "⁰¹²³⁴⁵⁶⁷⁸⁹";
/** Beyond these powers of ten a number is read more easily as 1.4 × 10⁷. */
const PLAIN_EXPONENTS = { least: -3, greatest: 3 };

/** Significant digits for coefficients, Reynolds numbers, thicknesses and pascals: "0.00309", "4.11 × 10⁶". */
export function formatSignificant(value: number, digits = 3): string {
  if (value === 0) return "0";

  const [mantissa, exponent] = split(value.toExponential(digits - 1));
  if (exponent < PLAIN_EXPONENTS.least || exponent > PLAIN_EXPONENTS.greatest) {
    return `${trueMinus(mantissa)} × 10${superscript(exponent)}`;
  }
  return trueMinus(Number(value.toPrecision(digits)).toFixed(Math.max(0, digits - 1 - exponent)));
}

/** A fixed number of decimals; a zero carries no sign. */
export function formatFixed(value: number, decimals: number): string {
  const text = value.toFixed(decimals);
  return Number(text) === 0 ? text.replace("-", "") : trueMinus(text);
}

/** The number as it was given, without noise of conversion: "2.4", "101 325", "1.79 × 10⁻⁵". */
export function formatExact(value: number): string {
  const shortest = Number(value.toPrecision(STORED_DIGITS));
  const [, exponent] = split(shortest.toExponential());
  if (shortest !== 0 && (exponent < -4 || exponent >= STORED_DIGITS)) {
    const [mantissa] = split(shortest.toExponential());
    return `${trueMinus(mantissa)} × 10${superscript(exponent)}`;
  }
  return trueMinus(grouped(String(shortest)));
}

export function formatPercent(fraction: number, decimals?: number): string {
  const text = decimals === undefined ? formatExact(fraction * 100) : formatFixed(fraction * 100, decimals);
  return `${text}${THIN_SPACE}%`;
}

export function trueMinus(text: string): string {
  return text.replace("-", MINUS);
}

function split(exponential: string): [mantissa: string, exponent: number] {
  const [mantissa = "", exponent = "0"] = exponential.split("e");
  return [mantissa, Number(exponent)];
}

function superscript(exponent: number): string {
  const digits = String(Math.abs(exponent)).replace(/\d/g, (digit) => SUPERSCRIPTS.charAt(Number(digit)));
  return exponent < 0 ? `⁻${digits}` : digits;
}

/** Digits before the point in groups of three where there are five or more. */
function grouped(text: string): string {
  const [whole = "", decimals] = text.split(".");
  const digits = whole.replace("-", "");
  const spaced = digits.length < 5 ? whole : whole.replace(/\B(?=(\d{3})+$)/g, THIN_SPACE);
  return decimals === undefined ? spaced : `${spaced}.${decimals}`;
}
