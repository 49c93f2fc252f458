import { MATURITY_GRADES, type MaturityGrade } from "@/lib/vocabulary/grades";
import { DEFAULT_GROWTH_TABLE } from "@/lib/evaluation/lines/terms-body";
import { formatExact } from "@/lib/units/format-number";

/** The form of establishing as it is typed: every field a text. */
export interface EstablishValues {
  number: string;
  name: string;
  fluid: string;
  staticTemperature: string;
  staticPressure: string;
  density: string;
  dynamicViscosity: string;
  speed: string;
  hoursPerYear: string;
  limit: string;
  reserve: string;
  growth: Record<MaturityGrade, string>;
  countSize: string;
  referenceArea: string;
  flowArea: string;
}

export type EstablishField = Exclude<keyof EstablishValues, "growth"> | `growth.${MaturityGrade}`;

export function newEstablishValues(): EstablishValues {
  return {
    number: "OP-1",
    name: "",
    fluid: "air",
    staticTemperature: "15 °C",
    staticPressure: "101325 Pa",
    density: "",
    dynamicViscosity: "",
    speed: "",
    hoursPerYear: "",
    limit: "",
    reserve: "",
    growth: {
      estimated: percentText("estimated"),
      layout: percentText("layout"),
      preliminary: percentText("preliminary"),
      released: percentText("released"),
      measured_like_part: percentText("measured_like_part"),
      measured_actual: percentText("measured_actual"),
    },
    countSize: "0.001",
    referenceArea: "",
    flowArea: "",
  };
}

export const GROWTH_FIELDS = MATURITY_GRADES.map((grade) => ({ grade, field: `growth.${grade}` as const }));

function percentText(grade: MaturityGrade): string {
  return formatExact(DEFAULT_GROWTH_TABLE[grade] * 100);
}
