import Qty from "js-quantities";

/**
 * Units that the unit package doesn't know or keeps to fewer digits than their definition has. Exact by
 * NIST SP 811 (2008), appendix B.8, or products of its exact factors (pound 0.45359237 kg, foot 0.3048 m,
 * standard gravity 9.80665 m/s²).
 */
const POUND_FORCE = 0.45359237 * 9.80665;
/** Conventional density of mercury times standard gravity, Pa per metre of column. */
const MERCURY = 13595.1 * 9.80665;
const EXACT_UNITS: ReadonlyMap<string, { factor: number; si: string }> = new Map([
  ["kt", { factor: 1852 / 3600, si: "m/s" }],
  ["kn", { factor: 1852 / 3600, si: "m/s" }],
  ["knot", { factor: 1852 / 3600, si: "m/s" }],
  ["knots", { factor: 1852 / 3600, si: "m/s" }],
  ["kts", { factor: 1852 / 3600, si: "m/s" }],
  ["kph", { factor: 1 / 3.6, si: "m/s" }],
  ["lbf", { factor: POUND_FORCE, si: "N" }],
  ["kgf", { factor: 9.80665, si: "N" }],
  ["psi", { factor: POUND_FORCE / 0.0254 ** 2, si: "Pa" }],
  ["psf", { factor: POUND_FORCE / 0.3048 ** 2, si: "Pa" }],
  ["lbf/in2", { factor: POUND_FORCE / 0.0254 ** 2, si: "Pa" }],
  ["lbf/ft2", { factor: POUND_FORCE / 0.3048 ** 2, si: "Pa" }],
  ["lb/ft3", { factor: 0.45359237 / 0.3048 ** 3, si: "kg/m3" }],
  ["lbm/ft3", { factor: 0.45359237 / 0.3048 ** 3, si: "kg/m3" }],
  ["slug/ft3", { factor: POUND_FORCE / 0.3048 ** 4, si: "kg/m3" }],
  // The package forgets the foot in its square foot.
  ["sqft", { factor: 0.3048 ** 2, si: "m2" }],
  ["kg/m/s", { factor: 1, si: "Pa*s" }],
  ["kg/(m*s)", { factor: 1, si: "Pa*s" }],
  ["inHg", { factor: MERCURY * 0.0254, si: "Pa" }],
  ["mmHg", { factor: MERCURY * 0.001, si: "Pa" }],
  ["kg/(m s)", { factor: 1, si: "Pa*s" }],
  ["thou", { factor: 2.54e-5, si: "m" }],
  ["mil", { factor: 2.54e-5, si: "m" }],
  ["lb/ft/s", { factor: 0.45359237 / 0.3048, si: "Pa*s" }],
  ["lb/(ft*s)", { factor: 0.45359237 / 0.3048, si: "Pa*s" }],
  // Of 550 foot pounds-force a second.
  ["hp", { factor: 550 * 0.3048 * POUND_FORCE, si: "W" }],
]);

const TEMPERATURES: ReadonlyMap<string, string> = new Map([
  ["°C", "tempC"],
  ["C", "tempC"],
  ["degC", "tempC"],
  ["K", "tempK"],
  ["degK", "tempK"],
  ["°F", "tempF"],
  ["F", "tempF"],
  ["degF", "tempF"],
]);

/** Old and celestial lengths that the package keeps to four digits or so: not admitted rather than wrong. */
const INEXACT_LENGTHS =
  /(league|furlong|fathom|pica|point|redshift|datamile|parsec)s?$|^(rd|rods?|pt|z|AU|ls|lmin|ly|pc|DM)$/;

const FACTOR = "[A-Za-z]+(?:-?[1-9])?";
const UNIT_PATTERN = new RegExp(`^${FACTOR}(?:[*/ ]${FACTOR})*$`);

/** Typographic signs as the unit package writes them: µ and μ to u, ² to 2, · to *. */
export function normalizeUnit(text: string): string {
  return text
    .trim()
    .replace(/[\u00b5\u03bc]/g, "u")
    .replace(/²/g, "2")
    .replace(/³/g, "3")
    .replace(/⁻/g, "-")
    .replace(/¹/g, "1")
    .replace(/[·⋅]/g, "*")
    .replace(/\^/g, "")
    .replace(/\s*([*/])\s*/g, "$1")
    .replace(/\s+/g, " ");
}

export type UnitConversion =
  { outcome: "converted"; value: number } | { outcome: "other_kind"; kind: string } | { outcome: "unknown" };

/** A number in some unit, turned into the SI unit that is asked for. */
export function convertUnit(value: number, unit: string, si: string): UnitConversion {
  if (si === "K") return convertTemperature(value, unit);

  const exact = EXACT_UNITS.get(unit);
  const known = quantityIn(exact?.si ?? unit);
  if (known === null) return { outcome: "unknown" };
  const target = normalizeUnit(si);
  if (!known.isCompatible(target)) return { outcome: "other_kind", kind: kindOf(known) };
  return { outcome: "converted", value: tidy(value * (exact?.factor ?? known.to(target).scalar)) };
}

function convertTemperature(value: number, unit: string): UnitConversion {
  const scale = TEMPERATURES.get(unit);
  if (scale !== undefined) return { outcome: "converted", value: tidy(kelvin(value, scale)) };

  const known = quantityIn(unit);
  return known === null ? { outcome: "unknown" } : { outcome: "other_kind", kind: kindOf(known) };
}

/** By NIST SP 811, B.8: the package refuses what lies below absolute zero, which the field's own rule says better. */
function kelvin(value: number, scale: string): number {
  if (scale === "tempC") return value + 273.15;
  return scale === "tempF" ? (value + 459.67) / 1.8 : value;
}

/** The package calls both viscosities by one name, and many kinds (s², say) by none, whatever its types promise. */
function kindOf(quantity: Qty): string {
  if (quantity.isCompatible("m2/s")) return "kinematic_viscosity";
  const kind: string | undefined = quantity.kind();
  return kind ?? "";
}

function quantityIn(unit: string): Qty | null {
  // A word such as "constructor" is found on every object, and so in the package's own table.
  const words = unit.split(/[^A-Za-z]+/);
  if (!UNIT_PATTERN.test(unit) || words.some((word) => word in Object.prototype)) return null;
  if (INEXACT_LENGTHS.test(unit)) return null;
  try {
    return Qty(1, unit);
  } catch (fault) {
    if (fault instanceof Qty.Error) return null;
    throw fault;
  }
}

/** 15 digits are what a double carries for certain: 59 °F is 288.15 K, not 288.15000000000003. */
function tidy(value: number): number {
  return Number(value.toPrecision(15));
}
