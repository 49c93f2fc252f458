import { DIMENSIONS, type DimensionName } from "@/lib/units/dimensions";
import { formatExact } from "@/lib/units/format-number";
import { formatHundredths } from "@/lib/units/format-newtons";
import { formatQuantity, formatQuantityNumber, formatUsQuantity } from "@/lib/units/format-quantity";
import type { FieldType } from "./field-spec";
import type { NameBook } from "./name-book";

export interface FieldText {
  text: string;
  unit?: string;
  /** As it was typed, where that differs from what is printed. */
  entered?: string;
  /** The same in US customary units, for a reader who wants them: "27 ft". */
  us?: string;
}

/** What stands where nothing is chosen or typed. */
const NOTHING = "none";

/** A field's value in the unit an engineer reads it in, names in place of ids; unfinished drafts print too. */
export function fieldText(type: FieldType, value: unknown, names: NameBook): FieldText {
  if (value === null || value === undefined || value === "") return { text: NOTHING };

  switch (type.type) {
    case "quantity":
      return quantityText(type.dimension, value);
    case "newtons":
      return typeof value === "number"
        ? { text: formatHundredths(value), unit: "N", us: formatUsQuantity(value / 100, "force") }
        : asTyped(value);
    case "fraction":
      return typeof value === "number" ? { text: formatExact(value * 100), unit: "%" } : asTyped(value);
    case "number":
      return typeof value === "number" ? { text: formatExact(value), ...unitOf(type.unit) } : asTyped(value);
    case "yes-no":
      return { text: value === true ? "yes" : "no" };
    case "choice":
    case "number-choice":
      return { text: choiceLabel(type.choices, value) };
    case "person":
      return { text: typeof value === "number" ? (names.person(value) ?? `person ${value}`) : String(value) };
    case "reference":
      return { text: named(String(value), names.line(type.to, String(value))) };
    case "file":
      return { text: fileText(value) };
    case "references":
      return { text: referencesText(value, (number) => named(number, names.line(type.to, number))) };
    default:
      return asTyped(value);
  }
}

function quantityText(dimension: DimensionName, value: unknown): FieldText {
  if (typeof value !== "object" || value === null || !("value" in value) || typeof value.value !== "number") {
    return asTyped(value);
  }
  const spread = "standardUncertainty" in value ? value.standardUncertainty : undefined;
  const plain = formatQuantityNumber(value.value, dimension);
  const text = typeof spread === "number" ? `${plain} ± ${spreadText(spread, dimension)}` : plain;
  const entered = "entered" in value && typeof value.entered === "string" ? value.entered : "";
  const printed = formatQuantity(value.value, dimension);
  const differs = entered !== "" && comparable(entered) !== comparable(printed) && comparable(entered) !== plain;
  const us = formatUsQuantity(value.value, dimension);
  return { text, unit: DIMENSIONS[dimension].display, us, ...(differs ? { entered } : {}) };
}

/** A spread of temperatures is a difference: it is not shifted to Celsius. */
function spreadText(spread: number, dimension: DimensionName): string {
  return formatExact(spread * DIMENSIONS[dimension].perSi);
}

function comparable(text: string): string {
  return text.replace(/\s+/g, " ").replace(/\u03bc/g, "µ");
}

function unitOf(unit: string | undefined): { unit?: string } {
  return unit === undefined ? {} : { unit };
}

function choiceLabel(choices: readonly { value: string | number; label: string }[], value: unknown): string {
  return choices.find((choice) => choice.value === value)?.label ?? String(value);
}

function named(number: string, name: string | null): string {
  return name === null ? number : `${number} ${name}`;
}

function referencesText(value: unknown, print: (number: string) => string): string {
  if (!Array.isArray(value) || value.length === 0) return NOTHING;
  return value.map((number) => print(String(number))).join(", ");
}

/** The beginning of the hash tells two files of one name apart. */
function fileText(value: unknown): string {
  if (typeof value !== "object" || value === null || !("name" in value) || !("sha256" in value)) return NOTHING;
  return `file ${String(value.name)} (SHA-256 ${String(value.sha256).slice(0, 12)}…)`;
}

function asTyped(value: unknown): FieldText {
  return { text: typeof value === "string" ? value : JSON.stringify(value) };
}
