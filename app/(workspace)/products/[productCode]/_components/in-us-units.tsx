import { formatUsQuantity } from "@/lib/units/format-quantity";
import type { UnitSystem, UsDimension } from "@/lib/units/us-customary";

interface InUsUnitsProps {
  value: number;
  dimension: UsDimension;
  units: UnitSystem;
}

/** Under the SI value of the column, for a reader of US customary units. */
export function InUsUnits({ value, dimension, units }: InUsUnitsProps) {
  return units === "si" ? null : <span className="block text-xs text-ink-2">{formatUsQuantity(value, dimension)}</span>;
}
