import { DIMENSIONS, type DimensionName } from "./dimensions";
import { formatExact, formatSignificant, THIN_SPACE } from "./format-number";

const KELVIN_AT_ZERO_CELSIUS = 273.15;

/** An SI value as an engineer reads it, with nothing lost: "2.4 m", "15 °C", "6 µm". */
export function formatQuantity(value: number, dimension: DimensionName): string {
  return `${formatQuantityNumber(value, dimension)}${THIN_SPACE}${DIMENSIONS[dimension].display}`;
}

/** The same without its unit, for a column that states it. */
export function formatQuantityNumber(value: number, dimension: DimensionName): string {
  return formatExact(displayValue(value, dimension));
}

/** A result to three significant digits with its unit: "1.11 Pa", "16.2 m/s". */
export function formatResult(value: number, unit: string, digits = 3): string {
  return `${formatSignificant(value, digits)}${THIN_SPACE}${unit}`;
}

/** Thickness of a layer, in millimetres to three significant digits: "24.6 mm". */
export function formatThickness(metres: number): string {
  return formatResult(metres * 1000, "mm");
}

/** Height of a roughness, in micrometres to three significant digits: "58.4 µm". */
export function formatRoughness(metres: number): string {
  return formatResult(metres * 1e6, "µm");
}

function displayValue(value: number, dimension: DimensionName): number {
  return dimension === "temperature" ? value - KELVIN_AT_ZERO_CELSIUS : value * DIMENSIONS[dimension].perSi;
}
