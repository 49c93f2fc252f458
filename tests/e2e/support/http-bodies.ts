import type { DraftContent, DraftEdit, DraftTransfer } from "@/lib/proposals/schema";

/** Newtons in hundredths: what the reserve leaves of the limit is unallocated. */
export const LIMIT = 20_000;
export const RESERVE = 1_000;

/** Air at 15 °C and 25 m/s. */
export function point(more: object = {}) {
  return {
    name: "Cruise",
    fluid: "air",
    fluidVersion: 1,
    staticTemperature: { value: 288.15, entered: "15 °C" },
    staticPressure: { value: 101325, entered: "1013.25 hPa" },
    speed: { value: 25, entered: "25 m/s" },
    limitHundredths: LIMIT,
    ...more,
  };
}

export function bluff(ownerId: number, dragCoefficient: number) {
  const own = { method: "bluff-body", dragCoefficient, referenceArea: { value: 0.1, entered: "0.1 m²" } };
  return { ...common(ownerId), name: "Mirror", source: "Test", ...own };
}

export function plate(ownerId: number, length: { value?: number; entered?: string }) {
  const own = { method: "flat-plate-friction", length, breadth: { value: 1 }, faces: 1, roughness: { value: 0 } };
  return { ...common(ownerId), name: "Plate", ...own };
}

export function share(ownerId: number, of: readonly string[]) {
  return { ...common(ownerId), name: "Gaps", method: "share", fraction: 0.05, of: [...of], source: "Test" };
}

function common(ownerId: number) {
  return { ownerId, group: null, order: 10, grade: "estimated", saving: false, methodVersion: 1 };
}

type Body = NonNullable<DraftEdit["body"]>;

export function adding(number: string, body: Body): DraftEdit {
  return { operation: "add", kind: "item", number, baseLetter: null, body };
}

export function revising(number: string, body: Body, baseLetter = "–"): DraftEdit {
  return { operation: "revise", kind: "item", number, baseLetter, body };
}

export function content(edits: DraftEdit[], transfers: DraftTransfer[] = []): DraftContent {
  return { title: "A change", reason: "Because it was measured.", neededBy: null, edits, transfers };
}
