import type { z } from "zod";

import { newTerms } from "@/lib/evaluation/lines/terms-body";
import type { EstablishProductInput } from "@/lib/products/schema";
import type { DimensionName } from "@/lib/units/dimensions";
import { parseQuantity } from "@/lib/units/parse-quantity";
import { toHundredths } from "@/lib/units/rounding";
import { MATURITY_GRADES, type MaturityGrade } from "@/lib/vocabulary/grades";

import type { EstablishField, EstablishValues } from "./establish-values";

export type EstablishFaults = Partial<Record<EstablishField, string>>;

/** What the parts of the form need: the typed texts, how to change one, what is wrong with one. */
export interface EstablishFieldsProps {
  values: EstablishValues;
  change: (field: EstablishField, text: string) => void;
  faults: EstablishFaults;
}

export interface ReadEstablishment {
  /** Everything but the password, which is typed when it is signed. */
  input: Omit<z.input<typeof EstablishProductInput>, "password">;
  /** What of the typed text could not be read. */
  faults: EstablishFaults;
}

/** Turns what was typed into the input of the act; what lies outside a rule is told by the act itself. */
export function readEstablishment(
  values: EstablishValues,
  product: { code: string; timeZone: string },
): ReadEstablishment {
  const reader = newReader(values);
  const limit = reader.hundredths("limit");
  const reserve = reader.hundredths("reserve");
  const isCustom = values.fluid === "custom";
  const number = values.number.trim();

  const operatingPoint = {
    number,
    body: {
      name: values.name.trim(),
      fluid: values.fluid,
      fluidVersion: 1,
      staticTemperature: isCustom ? null : reader.quantity("staticTemperature", "temperature"),
      staticPressure: values.fluid === "air" ? reader.quantity("staticPressure", "pressure") : null,
      pressureAltitude: null,
      density: isCustom ? reader.quantity("density", "density") : null,
      dynamicViscosity: isCustom ? reader.quantity("dynamicViscosity", "viscosity") : null,
      speed: reader.quantity("speed", "speed"),
      hoursPerYear: reader.number("hoursPerYear"),
      limitHundredths: limit,
    },
  };
  const terms = {
    ...plainTerms(newTerms({ referenceOperatingPoint: number, reserveHundredths: reserve ?? 0 })),
    growthTable: Object.fromEntries(MATURITY_GRADES.map((grade) => [grade, reader.fraction(grade)])),
    countSize: Number(values.countSize),
    referenceArea: reader.quantity("referenceArea", "area"),
    flowArea: reader.quantity("flowArea", "area"),
    timeZone: product.timeZone,
  };
  return { input: { productCode: product.code, operatingPoint, terms }, faults: reader.faults };
}

/** Where the act's own faults stand on this form. */
export function fieldOfFault(path: string): EstablishField | null {
  const grade = MATURITY_GRADES.find((candidate) => path === `terms.growthTable.${candidate}`);
  if (grade) return `growth.${grade}`;
  if (path.startsWith("terms.reserves")) return "reserve";
  const field = path.split(".").at(-1) ?? "";
  return FIELDS_BY_KEY.get(field) ?? null;
}

const FIELDS_BY_KEY: ReadonlyMap<string, EstablishField> = new Map<string, EstablishField>([
  ["limitHundredths", "limit"],
  ...(
    [
      "number",
      "name",
      "fluid",
      "staticTemperature",
      "staticPressure",
      "density",
      "dynamicViscosity",
      "speed",
      "hoursPerYear",
      "countSize",
      "referenceArea",
      "flowArea",
    ] as const
  ).map((key) => [key, key] as const),
]);

type QuantityField =
  "staticTemperature" | "staticPressure" | "density" | "dynamicViscosity" | "speed" | "referenceArea" | "flowArea";

function newReader(values: EstablishValues) {
  const faults: EstablishFaults = {};

  function quantity(field: QuantityField, dimension: DimensionName) {
    if (values[field].trim() === "") return null;
    const parsed = parseQuantity(values[field], dimension);
    if (parsed.ok) return { ...parsed.quantity };
    faults[field] = parsed.sentence;
    return null;
  }

  /** Limit and reserve are kept in whole hundredths of a newton, so that sums are exact. */
  function hundredths(field: "limit" | "reserve"): number | null {
    if (values[field].trim() === "") {
      faults[field] = field === "limit" ? "Give the limit, for example 310 N." : "Give the reserve; it may be 0 N.";
      return null;
    }
    const parsed = parseQuantity(values[field], "force");
    if (!parsed.ok) {
      faults[field] = parsed.sentence;
      return null;
    }
    const whole = toHundredths(parsed.quantity.value);
    if (Math.abs(whole / 100 - parsed.quantity.value) > 1e-9 * Math.max(1, whole)) {
      faults[field] = "Give it to 0.01 N: allocations are kept in whole hundredths of a newton.";
    }
    return whole;
  }

  function number(field: "hoursPerYear"): number | null {
    const typed = values[field].trim();
    if (typed === "") return null;
    if (/^\d+(\.\d+)?$/.test(typed)) return Number(typed);
    faults[field] = "Give a number of hours, for example 1800.";
    return null;
  }

  function fraction(grade: MaturityGrade): number {
    const typed = values.growth[grade].trim();
    if (/^\d+(\.\d+)?$/.test(typed)) return Number((Number(typed) / 100).toPrecision(12));
    faults[`growth.${grade}`] = "Give per cent of the basic estimate, for example 20.";
    return 0;
  }

  return { faults, quantity, hundredths, number, fraction };
}

/** Terms as JSON: what the input of the act is made of. */
function plainTerms(terms: ReturnType<typeof newTerms>) {
  const { referenceOperatingPoint, reserves, plannedProfile, evidenceAgeDays, rollUpVersion, uncertaintyVersion } =
    terms;
  const { reviewers, programManagerOn } = terms.reviewRules;
  return {
    referenceOperatingPoint,
    reserves: reserves.map((row) => ({ ...row })),
    plannedProfile: plannedProfile.map((row) => ({ ...row })),
    evidenceAgeDays,
    rollUpVersion,
    uncertaintyVersion,
    reviewRules: { reviewers, programManagerOn: { ...programManagerOn } },
  };
}
