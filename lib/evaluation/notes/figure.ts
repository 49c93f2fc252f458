import { formatSignificant } from "@/lib/units/format-number";

/** A number in a note's sentence: three significant digits, powers of ten outside 0.001 to 99 999. */
export function figure(value: number | string | undefined): string {
  if (typeof value !== "number") return value ?? "?";
  if (value === 0) return "0";
  const size = Math.abs(value);
  if (size >= 1e5 || size < 1e-3) return formatSignificant(value);
  return size >= 1000 ? String(Math.round(value)) : String(Number(value.toPrecision(3)));
}

/** A fraction as a percentage. */
export function percent(value: number | string | undefined): string {
  return typeof value === "number" ? `${Number((value * 100).toPrecision(2))} %` : "? %";
}
