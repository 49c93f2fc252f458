import type { MethodName } from "@/lib/evaluation/lines/item-body";
import { ITEM_METHODS } from "@/lib/evaluation/lines/item-methods";
import type { MaturityGrade } from "@/lib/vocabulary/grades";
import type { DemoPerson } from "./people";

/** An item as a table of the demo states it; the owner is named, not numbered. */
export interface ItemDraft {
  number: string;
  name: string;
  owner: DemoPerson;
  group: string;
  grade: MaturityGrade;
  method: MethodName;
  fields: Record<string, unknown>;
  /** Newtons; entered by a transfer, never by the item. */
  allocation: number;
  /** Document and revision behind a grade above estimated. */
  evidence?: readonly [document: string, revision: string];
  basis?: string;
  /** Why a note of that code may stand. */
  justify?: Readonly<Record<string, string>>;
}

export const metres = (value: number, places = 2) => ({ value, entered: `${value.toFixed(places)} m` });
export const squareMetres = (value: number) => ({ value, entered: `${value} m²` });
export const micrometres = (value: number) => ({ value: value * 1e-6, entered: `${value} µm` });
export const degreesCelsius = (value: number) => ({ value: value + 273.15, entered: `${value} °C` });
export const metresPerSecond = (value: number) => ({ value, entered: `${value} m/s` });
export const pascals = (value: number) => ({ value, entered: `${value} Pa` });

/** The body that a form would send for this item. */
export function itemBody(draft: ItemDraft, ownerId: number, evidenceDate: string): Record<string, unknown> {
  const { number, name, group, grade, method, fields, evidence, basis = "", justify = {} } = draft;
  const citations = evidence ? [{ document: evidence[0], revision: evidence[1], date: evidenceDate }] : [];
  // How far each reaches is written in when the item is proposed.
  const justifications = Object.entries(justify).map(([code, text]) => ({ code, text, excess: 0 }));
  const template = ITEM_METHODS[method].template({ ownerId, order: Number(number), group });
  return { ...template, name, grade, basis, evidence: citations, justifications, ...fields };
}

interface Plate {
  length: number;
  breadth: number;
  faces: number;
  /** Number of a finish of the catalogue, or micrometres typed. */
  surface: string | number;
}

/** A plate whose layer is turbulent from its edge, by the one-fifth law unless `more` says otherwise. */
export function plate({ length, breadth, faces, surface }: Plate, more: Record<string, unknown> = {}) {
  const finish = typeof surface === "string" ? surface : null;
  const roughness = typeof surface === "string" ? null : micrometres(surface);
  return {
    method: "flat-plate-friction" as const,
    fields: {
      length: metres(length),
      breadth: metres(breadth),
      faces,
      finish,
      roughness,
      transition: "tripped",
      frictionLine: "one-fifth-law",
      ...more,
    },
  };
}

/** A form coefficient on a small area. */
export function form(
  dragCoefficient: number,
  area: number,
  source: string,
  shelter?: [factor: number, reason: string],
) {
  return {
    method: "bluff-body" as const,
    fields: {
      dragCoefficient,
      referenceArea: squareMetres(area),
      source,
      ...(shelter ? { shelterFactor: shelter[0], shelterReason: shelter[1] } : {}),
    },
  };
}

/** A loss coefficient on the flow area of the product. */
export function loss(lossCoefficient: number, source: string) {
  return { method: "loss-coefficient" as const, fields: { lossCoefficient, source } };
}

/** An entered drag area. */
export function entered(dragArea: number, source: string) {
  return { method: "drag-area" as const, fields: { dragArea: squareMetres(dragArea), source } };
}
