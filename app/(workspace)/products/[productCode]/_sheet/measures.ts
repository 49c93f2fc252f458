import type { TermsBody } from "@/lib/evaluation/lines/terms-body";
import type { StreamState } from "@/lib/evaluation/methods/stream-state";
import { formatExact, formatSignificant } from "@/lib/units/format-number";
import type { ProductKind } from "@/lib/vocabulary/lines";

export interface Measure {
  name: string;
  /** On what it is referred to, where it is referred to something. */
  of: string | null;
  text: string;
  unit: string;
}

interface MeasureContext {
  kind: ProductKind;
  terms: Pick<TermsBody, "referenceArea" | "flowArea" | "countSize">;
  stream: Pick<StreamState, "dynamicPressure" | "speed">;
  hoursPerYear: number | null;
}

/** A drag in newtons, read in the measures that the product's terms allow. */
export function measuresOf(newtons: number, context: MeasureContext): Measure[] {
  const { kind, terms, stream, hoursPerYear } = context;
  const dragArea = newtons / stream.dynamicPressure;
  if (kind === "duct") return pressureMeasure(newtons, terms.flowArea?.value);

  return [
    { name: "Drag area", of: null, text: formatSignificant(dragArea), unit: "m²" },
    ...coefficientMeasures(dragArea, terms),
    ...(kind === "vehicle_fairing" ? movingMeasures(newtons * stream.speed, hoursPerYear) : []),
  ];
}

function pressureMeasure(newtons: number, flowArea: number | undefined): Measure[] {
  if (flowArea === undefined) return [];
  const of = `on the flow area ${formatExact(flowArea)} m²`;
  return [{ name: "Pressure loss", of, text: formatSignificant(newtons / flowArea), unit: "Pa" }];
}

function coefficientMeasures(dragArea: number, { referenceArea, countSize }: MeasureContext["terms"]): Measure[] {
  if (!referenceArea) return [];
  const coefficient = dragArea / referenceArea.value;
  const of = `on the reference area ${formatExact(referenceArea.value)} m²`;
  return [
    { name: "Drag coefficient", of, text: formatSignificant(coefficient), unit: "" },
    {
      name: "Counts",
      of: `1 count = ${formatExact(countSize)}`,
      text: formatSignificant(coefficient / countSize),
      unit: "",
    },
  ];
}

const JOULES_PER_KILOWATT_HOUR = 3.6e6;

function movingMeasures(watts: number, hoursPerYear: number | null): Measure[] {
  const power = { name: "Power", of: "drag times speed", text: formatSignificant(watts), unit: "W" };
  if (hoursPerYear === null) return [power];
  const energy = (watts * hoursPerYear * 3600) / JOULES_PER_KILOWATT_HOUR;
  const of = `${formatExact(hoursPerYear)} hours a year`;
  return [power, { name: "Energy a year", of, text: formatSignificant(energy), unit: "kWh" }];
}
