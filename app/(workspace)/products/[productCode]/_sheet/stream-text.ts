import type { PointResult } from "@/lib/evaluation/budget/results";
import { formatSignificant } from "@/lib/units/format-number";

/** "OP-1 motorway, 25.0 m/s, ρ 1.225 kg/m³, q 382.8 Pa". */
export function streamText({ operatingPoint, name, stream }: PointResult): string {
  const speed = `${formatSignificant(stream.speed)} m/s`;
  const density = `ρ ${formatSignificant(stream.density, 4)} kg/m³`;
  return `${operatingPoint} ${name}, ${speed}, ${density}, q ${formatSignificant(stream.dynamicPressure, 4)} Pa`;
}
