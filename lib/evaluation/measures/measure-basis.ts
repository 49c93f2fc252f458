import type { ProductKind } from "@/lib/vocabulary/lines";
import { MEASURES, type Measure } from "@/lib/vocabulary/measures";

/** What a force is referred to at one operating point of one issue, to be read in another measure. */
export interface MeasureBasis {
  kind: ProductKind;
  /** What one count is of the coefficient. */
  countSize: number;
  /** m²; null where the terms state none. */
  referenceArea: number | null;
  /** m², of a duct; null where the terms state none. */
  flowArea: number | null;
  /** q, Pa. */
  dynamicPressure: number;
  /** U, m/s. */
  speed: number;
  hoursPerYear: number | null;
}

interface BasisTerms {
  countSize: number;
  referenceArea: { value: number } | null;
  flowArea: { value: number } | null;
}

export function measureBasis(
  kind: ProductKind,
  { countSize, referenceArea, flowArea }: BasisTerms,
  { dynamicPressure, speed }: { dynamicPressure: number; speed: number },
  hoursPerYear: number | null,
): MeasureBasis {
  const areas = { referenceArea: referenceArea?.value ?? null, flowArea: flowArea?.value ?? null };
  return { kind, countSize, ...areas, dynamicPressure, speed, hoursPerYear };
}

/**
 * Shown value in SI = newtons × this; null where the product doesn't have the measure.
 *
 *   C_D·A = D/q,  C_D = C_D·A/A,  counts = C_D/c,  power = D·U,  energy = D·U·h/1000 (kWh),  Δp = D/A_flow
 */
export function perNewton(measure: Measure, basis: MeasureBasis): number | null {
  const { countSize, referenceArea, flowArea, dynamicPressure, speed, hoursPerYear } = basis;
  switch (measure) {
    case "newtons":
      return 1;
    case "drag-area":
      return 1 / dynamicPressure;
    case "coefficient":
      return referenceArea === null ? null : 1 / (dynamicPressure * referenceArea);
    case "counts":
      return referenceArea === null ? null : 1 / (dynamicPressure * referenceArea * countSize);
    case "power":
      return moves(basis) ? speed : null;
    case "energy":
      return moves(basis) && hoursPerYear !== null ? (speed * hoursPerYear) / 1000 : null;
    case "pascals":
      return basis.kind === "duct" && flowArea !== null ? 1 / flowArea : null;
  }
}

/** The measures that this product has at this operating point, newtons first. */
export function measuresOffered(basis: MeasureBasis): Measure[] {
  return MEASURES.filter((measure) => perNewton(measure, basis) !== null);
}

/** Why a measure is not offered. */
export function missingMeasureSentence(measure: Measure, basis: MeasureBasis): string {
  switch (measure) {
    case "coefficient":
    case "counts":
      return "The terms of this product state no reference area, so that it has no coefficient and no counts.";
    case "power":
      return "This product does not move by itself, so that its drag takes no power.";
    case "energy":
      return moves(basis)
        ? "This operating point states no hours a year, so that it has no energy a year."
        : "This product does not move by itself, so that its drag takes no energy.";
    case "pascals":
      return basis.kind === "duct"
        ? "The terms of this duct state no flow area, so that it has no pressure loss."
        : "Only a duct has a pressure loss.";
    case "newtons":
    case "drag-area":
      return "";
  }
}

function moves({ kind }: MeasureBasis): boolean {
  return kind === "vehicle_fairing";
}
