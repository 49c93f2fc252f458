import { DIMENSIONS, type DimensionName } from "./dimensions";
import { formatExact, formatSignificant, THIN_SPACE } from "./format-number";
import { inUsUnits, US_UNITS, type UnitSystem, type UsDimension } from "./us-customary";

const KELVIN_AT_ZERO_CELSIUS = 273.15;

/** An SI value as an engineer reads it, with nothing lost: "2.4 m", "15 °C", "6 µm"; "7.874 ft (2.4 m)" in US units. */
export function formatQuantity(value: number, dimension: DimensionName, system: UnitSystem = "si"): string {
  const si = `${formatQuantityNumber(value, dimension)}${THIN_SPACE}${DIMENSIONS[dimension].display}`;
  return system === "si" ? si : `${formatUsQuantity(value, dimension)} (${si})`;
}

/** Four digits: the SI value beside it is the exact one. */
const US_DIGITS = 4;

/** An SI value in its US customary unit alone: "7.874 ft", "59 °F". */
export function formatUsQuantity(value: number, dimension: UsDimension): string {
  const number = Number(inUsUnits(value, dimension).toPrecision(US_DIGITS));
  return `${formatExact(number)}${THIN_SPACE}${US_UNITS[dimension].printed}`;
}

/** The same without its unit, for a column that states it. */
export function formatQuantityNumber(value: number, dimension: DimensionName): string {
  return formatExact(displayValue(value, dimension));
}

/** A result to three significant digits with its unit: "1.11 Pa", "16.2 m/s". */
export function formatResult(value: number, unit: string, digits = 3): string {
  return `${formatSignificant(value, digits)}${THIN_SPACE}${unit}`;
}

/** A result as its reader's units have it, with SI beside US customary: "10.1 ft (3.08 m)". */
export function formatResultIn(system: UnitSystem, value: number, dimension: UsDimension, si: string): string {
  if (system === "si") return si;
  return `${formatResult(inUsUnits(value, dimension), US_UNITS[dimension].printed)} (${si})`;
}

/** Thickness of a layer, in millimetres to three significant digits: "24.6 mm". */
export function formatThickness(metres: number, system: UnitSystem = "si"): string {
  return formatResultIn(system, metres, "thickness", formatResult(metres * 1000, "mm"));
}

/** Height of a roughness, in micrometres to three significant digits: "58.4 µm". */
export function formatRoughness(metres: number, system: UnitSystem = "si"): string {
  return formatResultIn(system, metres, "roughness", formatResult(metres * 1e6, "µm"));
}

function displayValue(value: number, dimension: DimensionName): number {
  return dimension === "temperature" ? value - KELVIN_AT_ZERO_CELSIUS : value * DIMENSIONS[dimension].perSi;
}
