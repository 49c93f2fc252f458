import type { ProductKind } from "@/lib/vocabulary/lines";
import type { BudgetState } from "../lines/line-state";
import { termsOf } from "./indexed-state";
import type { PointResult } from "./results";

/** A force read in the other measures of the trade; null where the product has no use for one. */
export interface Measures {
  /** C_D·A, m². */
  dragArea: number;
  /** On the reference area of the terms. */
  coefficient: number | null;
  counts: number | null;
  /** What one count is: always printed beside them. */
  countSize: number;
  /** D·U of things that move, W. */
  power: number | null;
  /** kWh a year, by the hours of the operating point. */
  energyPerYear: number | null;
  /** Of a duct, Pa on its flow area. */
  pressureLoss: number | null;
}

/** Ducts and sign panels stand still: nobody pays for power there by their speed. */
const MOVING_KINDS: readonly ProductKind[] = ["vehicle_fairing", "other_body"];
const WATTS_PER_KILOWATT = 1000;

/** One force at one operating point in every measure that the product admits. */
export function measuresOf(
  newtons: number,
  point: Pick<PointResult, "operatingPoint" | "stream">,
  state: BudgetState,
): Measures {
  const { referenceArea, flowArea, countSize } = termsOf(state);
  const { dynamicPressure, speed } = point.stream;
  const dragArea = newtons / dynamicPressure;
  const coefficient = referenceArea === null ? null : dragArea / referenceArea.value;
  const power = MOVING_KINDS.includes(state.product.kind) ? newtons * speed : null;
  const hours = hoursOf(point.operatingPoint, state);
  return {
    dragArea,
    coefficient,
    counts: coefficient === null ? null : coefficient / countSize,
    countSize,
    power,
    energyPerYear: power === null || hours === null ? null : (power / WATTS_PER_KILOWATT) * hours,
    pressureLoss: state.product.kind === "duct" && flowArea !== null ? newtons / flowArea.value : null,
  };
}

function hoursOf(operatingPoint: string, state: BudgetState): number | null {
  const line = state.lines.find(({ kind, number }) => kind === "operating_point" && number === operatingPoint);
  return line?.kind === "operating_point" ? line.body.hoursPerYear : null;
}
