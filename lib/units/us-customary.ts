import type { DimensionName } from "./dimensions";
import { convertUnit, normalizeUnit } from "./unit-text";

export type UnitSystem = "si" | "us";

/** The unit of a measured thing in US customary units: as the converter reads it, and as it is printed. */
export interface UsUnit {
  si: string;
  unit: string;
  printed: string;
}

const US_UNIT_TABLE = {
  length: { si: "m", unit: "ft", printed: "ft" },
  roughness: { si: "m", unit: "thou", printed: "mil" },
  altitude: { si: "m", unit: "ft", printed: "ft" },
  area: { si: "m2", unit: "ft2", printed: "ft²" },
  speed: { si: "m/s", unit: "mph", printed: "mph" },
  ductSpeed: { si: "m/s", unit: "ft/s", printed: "ft/s" },
  temperature: { si: "K", unit: "°F", printed: "°F" },
  pressure: { si: "Pa", unit: "psf", printed: "lbf/ft²" },
  density: { si: "kg/m3", unit: "lb/ft3", printed: "lb/ft³" },
  viscosity: { si: "Pa*s", unit: "lb/ft/s", printed: "lb/(ft·s)" },
  kinematicViscosity: { si: "m2/s", unit: "ft2/s", printed: "ft²/s" },
  force: { si: "N", unit: "lbf", printed: "lbf" },
  thickness: { si: "m", unit: "in", printed: "in" },
  power: { si: "W", unit: "hp", printed: "hp" },
} as const satisfies Record<DimensionName | "ductSpeed" | "kinematicViscosity" | "thickness" | "power", UsUnit>;

export type UsDimension = keyof typeof US_UNIT_TABLE;
export const US_UNITS: Record<UsDimension, UsUnit> = US_UNIT_TABLE;

/** How many of the US unit one of the SI unit is; temperatures are shifted besides and go through `inUsUnits`. */
export function usPerSi(dimension: Exclude<UsDimension, "temperature">): number {
  const { si, unit } = US_UNITS[dimension];
  return 1 / siOf(1, unit, si);
}

/** An SI value in its US customary unit. By NIST SP 811, B.8: t/°F = T/K × 1.8 − 459.67. */
export function inUsUnits(value: number, dimension: UsDimension): number {
  return dimension === "temperature" ? value * 1.8 - 459.67 : value * usPerSi(dimension);
}

function siOf(value: number, unit: string, si: string): number {
  const converted = convertUnit(value, normalizeUnit(unit), si);
  if (converted.outcome !== "converted") throw new RangeError(`${unit} is no unit of what is measured in ${si}`);
  return converted.value;
}
