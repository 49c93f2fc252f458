import { THIN_SPACE, trueMinus } from "./format-number";
import { toHundredths } from "./rounding";

/** Whole hundredths as newtons, for columns that add up by eye: "61.59". */
export function formatHundredths(hundredths: number): string {
  const digits = String(Math.abs(hundredths)).padStart(3, "0");
  const text = `${digits.slice(0, -2)}.${digits.slice(-2)}`;
  return hundredths < 0 ? trueMinus(`-${text}`) : text;
}

/** Newtons to 0.01 N without the unit. */
export function formatNewtonsNumber(newtons: number): string {
  return formatHundredths(toHundredths(newtons));
}

/** Newtons to 0.01 N: "61.59 N". */
export function formatNewtons(newtons: number): string {
  return `${formatNewtonsNumber(newtons)}${THIN_SPACE}N`;
}

/** A change without the unit, with its sign always: "+0.40", "−3.90"; "0.00" has none. */
export function formatNewtonsChangeNumber(newtons: number): string {
  const hundredths = toHundredths(newtons);
  return `${hundredths > 0 ? "+" : ""}${formatHundredths(hundredths)}`;
}

/** A change with its sign and unit: "−3.90 N". */
export function formatNewtonsChange(newtons: number): string {
  return `${formatNewtonsChangeNumber(newtons)}${THIN_SPACE}N`;
}
