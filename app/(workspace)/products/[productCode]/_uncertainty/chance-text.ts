import { formatPercent } from "@/lib/units/format-number";

/** A probability as it is printed: "7.1 %", "below 0.1 %". */
export function chanceText(probability: number): string {
  if (probability > 0 && probability < 0.0005) return `below ${formatPercent(0.001, 1)}`;
  if (probability < 1 && probability > 0.9995) return `above ${formatPercent(0.999, 1)}`;
  return formatPercent(probability, 1);
}
