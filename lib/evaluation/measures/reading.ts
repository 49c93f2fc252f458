import { formatExact, formatFixed, formatSignificant, THIN_SPACE, trueMinus } from "@/lib/units/format-number";
import { formatUsQuantity } from "@/lib/units/format-quantity";
import { formatNewtonsNumber } from "@/lib/units/format-newtons";
import { toHundredths } from "@/lib/units/rounding";
import { type UnitSystem, US_UNITS, type UsDimension, usPerSi } from "@/lib/units/us-customary";
import type { Measure } from "@/lib/vocabulary/measures";
import { type MeasureBasis, perNewton } from "./measure-basis";

/** How newtons are printed in one measure: one factor, one unit and one way of rounding for a whole sheet. */
export interface Reading {
  measure: Measure;
  /** Shown value = newtons × this. */
  perNewton: number;
  /** "" for a plain number. */
  unit: string;
  /** Decimals of every figure; null for three significant digits. */
  decimals: number | null;
  /** On what it is referred to, to be printed with it: "1 count = 0.001 on 10.00 m²". */
  basis: string | null;
}

/** Newtons to 0.01 N, as they are kept. */
export const NEWTONS: Reading = { measure: "newtons", perNewton: 1, unit: "N", decimals: 2, basis: null };

/** The reading of a measure; null where the product doesn't have it. */
export function readingOf(measure: Measure, basis: MeasureBasis, system: UnitSystem): Reading | null {
  const siFactor = perNewton(measure, basis);
  if (siFactor === null) return null;
  if (measure === "newtons" && system === "si") return NEWTONS;

  const us = system === "us" ? US_DIMENSIONS[measure] : undefined;
  const factor = us === undefined ? siFactor : siFactor * usPerSi(us);
  return {
    measure,
    perNewton: factor,
    unit: us === undefined ? SI_UNITS[measure] : US_UNITS[us].printed,
    decimals: THREE_DIGITS.has(measure) ? null : decimalsFor(factor),
    basis: basisText(measure, basis, system),
  };
}

/** A value without its unit: "0.16090". */
export function readNumber(reading: Reading, newtons: number): string {
  if (isKept(reading)) return formatNewtonsNumber(newtons);
  // What is 0.00 N for every decision is nothing in any measure, and carries no sign.
  if (toHundredths(newtons) === 0) return reading.decimals === null ? "0" : formatFixed(0, reading.decimals);
  const value = newtons * reading.perNewton;
  return reading.decimals === null ? formatSignificant(value) : grouped(formatFixed(value, reading.decimals));
}

/** A value with its unit: "0.16090 m²", "16.089 counts". */
export function readText(reading: Reading, newtons: number): string {
  const number = readNumber(reading, newtons);
  // A word stands apart from its number, a unit's sign close to it; neither is torn off at the end of a line.
  const space = reading.measure === "counts" ? "\u00a0" : THIN_SPACE;
  return reading.unit === "" ? number : `${number}${space}${reading.unit}`;
}

/** The value as a number for other programs, rounded as it is printed. */
export function readValue({ perNewton: factor, decimals }: Reading, newtons: number): number {
  if (toHundredths(newtons) === 0) return 0;
  const value = newtons * factor;
  return decimals === null ? Number(value.toPrecision(PRINTED_DIGITS)) : Number(value.toFixed(decimals));
}

/** Of coefficients and pascals. */
const PRINTED_DIGITS = 3;

/** A change without its unit, its sign always before it: "+0.00104"; what is 0.00 N has none. */
export function readChangeNumber(reading: Reading, newtons: number): string {
  return `${toHundredths(newtons) > 0 ? "+" : ""}${readNumber(reading, newtons)}`;
}

/** A change with its sign and unit: "−10.19 counts". */
export function readChange(reading: Reading, newtons: number): string {
  return `${toHundredths(newtons) > 0 ? "+" : ""}${readText(reading, newtons)}`;
}

/** A round value of a ruler, given in newtons: 4 lbf there and back is 4 again, not 3.99999999999. */
export function readTick(reading: Reading, newtons: number): string {
  return formatExact(Number((newtons * reading.perNewton).toPrecision(TICK_DIGITS)));
}

const TICK_DIGITS = 6;

/** Is it read in what is kept, so that nothing needs to stand beside it? */
export function isKept({ measure, perNewton: factor }: Reading): boolean {
  return measure === "newtons" && factor === 1;
}

const SI_UNITS: Record<Measure, string> = {
  newtons: "N",
  "drag-area": "m²",
  coefficient: "",
  counts: "counts",
  power: "W",
  energy: "kWh/year",
  pascals: "Pa",
};

/** Energy stays in kilowatt hours, which are bought in them too. */
const US_DIMENSIONS: Partial<Record<Measure, Exclude<UsDimension, "temperature">>> = {
  newtons: "force",
  "drag-area": "area",
  power: "power",
  pascals: "pressure",
};

const THREE_DIGITS: ReadonlySet<Measure> = new Set<Measure>(["coefficient", "pascals"]);

/** So many that the last one is worth 0.01 N at most: nothing that the newtons tell is hidden. */
function decimalsFor(factor: number): number {
  return Math.min(12, Math.max(0, Math.ceil(-Math.log10(0.01 * factor) - 1e-9)));
}

function basisText(measure: Measure, basis: MeasureBasis, system: UnitSystem): string | null {
  const { countSize, referenceArea, flowArea, dynamicPressure, speed, hoursPerYear } = basis;
  const at = system === "us" ? formatUsQuantity(speed, "speed") : `${formatSignificant(speed)}${THIN_SPACE}m/s`;
  switch (measure) {
    case "newtons":
      return `1 lbf = ${formatSignificant(1 / usPerSi("force"), 7)}${THIN_SPACE}N`;
    case "drag-area":
      return `drag over q = ${formatSignificant(dynamicPressure, 4)}${THIN_SPACE}Pa`;
    case "coefficient":
      return referenceArea === null ? null : `on the reference area ${areaText(referenceArea, system)}`;
    case "counts":
      return referenceArea === null
        ? null
        : `1 count = ${formatExact(countSize)} on ${areaText(referenceArea, system)}`;
    case "power":
      return `drag times speed, at ${at}`;
    case "energy":
      return `drag times speed, at ${at}, ${formatExact(hoursPerYear ?? 0)} hours a year`;
    case "pascals":
      return flowArea === null ? null : `on the flow area ${areaText(flowArea, system)}`;
  }
}

/** At least two decimals, and all that were given: "10.00 m²", "0.125 m²"; SI beside US customary. */
function areaText(area: number, system: UnitSystem): string {
  const given = formatExact(area);
  const decimals = given.split(".")[1]?.length ?? 0;
  const si = `${decimals < 2 && !given.includes("×") ? formatFixed(area, 2) : given}${THIN_SPACE}m²`;
  return system === "si" ? si : `${formatUsQuantity(area, "area")} (${si})`;
}

/** Thousands apart where there are five digits or more, as everywhere. */
function grouped(text: string): string {
  const [whole = "", decimals] = text.split(".");
  const digits = whole.replace(trueMinus("-"), "");
  const spaced = digits.length < 5 ? whole : whole.replace(/\B(?=(\d{3})+$)/g, THIN_SPACE);
  return decimals === undefined ? spaced : `${spaced}.${decimals}`;
}
