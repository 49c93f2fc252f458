import { DIMENSIONS, type DimensionName } from "./dimensions";
import { convertUnit, normalizeUnit } from "./unit-text";

export type ParsedQuantity =
  { ok: true; quantity: { value: number; entered: string } } | { ok: false; sentence: string };

const LONGEST = 40;
const LARGEST = 1e12;
/** Nothing built is rougher: a greater number is one in µm without its unit. */
const ROUGHEST = 0.1;

const SPACES = /[\u00a0\u2009\u202f\s]+/g;
const GROUPED = String.raw`\d{1,3}(?: \d{3})+(?!\d)`;
const NUMBER = String.raw`[+-]?(?:${GROUPED}|\d+)?(?:\.\d+|\.)?(?:[eE][+-]?\d+)?`;
const POWER = String.raw`(?: ?[×x*] ?10(?:\^([+-]?\d+)|([⁺⁻]?[⁰¹²³⁴⁵⁶⁷⁸⁹]+)))?`;
const TYPED = new RegExp(`^(${NUMBER})${POWER} ?(.*)$`);
const SUPERSCRIPTS = "⁰¹²³⁴⁵⁶⁷⁸⁹";

/**
 * Reads a number with its unit as an engineer types it ("27 ft", "90 km/h", "15 °C", "150 µm") and keeps the text
 * beside the SI value. A number without a unit is in the SI unit of the field.
 */
export function parseQuantity(typed: string, dimension: DimensionName): ParsedQuantity {
  const entered = typed.trim();
  const { noun, example, si } = DIMENSIONS[dimension];
  if (entered === "") return refused(`Give ${noun}, for example ${example}.`);
  if (entered.length > LONGEST) return refused(`At most ${LONGEST} characters, for example ${example}.`);
  if (/\d,\d|,\d|\d,/.test(entered)) return refused(commaSentence(example));

  const read = readNumber(entered);
  if (read === null) return refused(`This is no number with a unit; ${noun} is needed, for example ${example}.`);
  if (!Number.isFinite(read.value)) return refused("Too large: beyond 10¹².");
  if (read.unit === "") return checked(read.value, entered, dimension);

  const converted = convertUnit(read.value, normalizeUnit(read.unit), si);
  if (converted.outcome === "converted") return checked(converted.value, entered, dimension);
  if (converted.outcome === "unknown") {
    return refused(`"${read.unit}" is no unit known here; ${noun} is needed, for example ${example}.`);
  }
  return refused(`${read.unit} is ${withArticle(converted.kind)}; ${noun} is needed, for example ${example}.`);
}

/** Reads a plain number without unit, as typed for a ratio or a coefficient. */
export function parseNumber(typed: string): { ok: true; value: number } | { ok: false; sentence: string } {
  const entered = typed.trim();
  if (entered === "") return refused("Give a number.");
  if (/,/.test(entered)) return refused(commaSentence("0.3"));
  const read = readNumber(entered);
  if (read === null) return refused("This is no number, for example 0.3.");
  if (read.unit !== "") return refused(`A plain number is needed here, without "${read.unit}".`);
  if (!(Math.abs(read.value) <= LARGEST)) return refused("Too large: beyond 10¹².");
  return { ok: true, value: read.value };
}

function readNumber(entered: string): { value: number; unit: string } | null {
  const plain = entered.replace(SPACES, " ").replace(/\u2212/g, "-");
  const [, digits = "", power, superscript, unit = ""] = TYPED.exec(plain) ?? [];
  if (!/\d/.test(digits)) return null;

  const exponent = power ?? (superscript === undefined ? "0" : plainDigits(superscript));
  const mantissa = digits.replace(/ /g, "");
  const value = /[eE]/.test(mantissa) ? Number(mantissa) * 10 ** Number(exponent) : Number(`${mantissa}e${exponent}`);
  return Number.isNaN(value) ? null : { value, unit: unit.trim() };
}

function plainDigits(superscript: string): string {
  return superscript
    .replace("⁻", "-")
    .replace("⁺", "")
    .replace(/[⁰¹²³⁴⁵⁶⁷⁸⁹]/g, (digit) => String(SUPERSCRIPTS.indexOf(digit)));
}

function checked(value: number, entered: string, dimension: DimensionName): ParsedQuantity {
  if (!(Math.abs(value) <= LARGEST)) return refused("Too large: beyond 10¹².");
  if (dimension === "roughness" && value > ROUGHEST) {
    return refused("Rougher than 0.1 m: name the unit, for example 150 µm.");
  }
  return { ok: true, quantity: { value: value === 0 ? 0 : value, entered } };
}

function commaSentence(example: string): string {
  return `A comma may be a decimal mark or part a thousand off: write a point, for example ${example}.`;
}

const KIND_NOUNS: ReadonlyMap<string, string> = new Map([
  ["unitless", "a number without dimension"],
  ["area", "an area"],
  ["energy", "an energy"],
  ["acceleration", "an acceleration"],
  ["angle", "an angle"],
  ["viscosity", "a dynamic viscosity"],
  ["power", "a power"],
]);

function withArticle(kind: string): string {
  const spoken = kind.replace(/_/g, " ");
  return KIND_NOUNS.get(kind) ?? (spoken === "" ? "something else" : `a ${spoken}`);
}

function refused(sentence: string): { ok: false; sentence: string } {
  return { ok: false, sentence };
}
