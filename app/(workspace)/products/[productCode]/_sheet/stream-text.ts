import type { PointTotals } from "@/lib/evaluation/budget/results";
import { formatSignificant } from "@/lib/units/format-number";
import { formatResultIn } from "@/lib/units/format-quantity";
import type { UnitSystem } from "@/lib/units/us-customary";

/** "OP-1 motorway, 25.0 m/s, ρ 1.225 kg/m³, q 382.8 Pa"; in US customary units with these beside. */
export function streamText({ operatingPoint, name, stream }: PointTotals, units: UnitSystem = "si"): string {
  const { speed, density, dynamicPressure } = stream;
  const parts = [
    formatResultIn(units, speed, "speed", `${formatSignificant(speed)} m/s`),
    `ρ ${formatResultIn(units, density, "density", `${formatSignificant(density, 4)} kg/m³`)}`,
    `q ${formatResultIn(units, dynamicPressure, "pressure", `${formatSignificant(dynamicPressure, 4)} Pa`)}`,
  ];
  return `${operatingPoint} ${name}, ${parts.join(", ")}`;
}
