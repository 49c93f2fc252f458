import type { DimensionName } from "@/lib/units/dimensions";
import { formatQuantity } from "@/lib/units/format-quantity";
import { parseQuantity } from "@/lib/units/parse-quantity";

export type QuantityReading =
  { state: "empty" } | { state: "read"; value: number; text: string } | { state: "unread"; sentence: string };

/** What typed text means to the field: nothing yet, a value with its SI text, or why it cannot be read. */
export function quantityReading(typed: string, dimension: DimensionName): QuantityReading {
  if (typed.trim() === "") return { state: "empty" };

  const parsed = parseQuantity(typed, dimension);
  if (!parsed.ok) return { state: "unread", sentence: parsed.sentence };

  const { value } = parsed.quantity;
  return { state: "read", value, text: formatQuantity(value, dimension) };
}

/** The text that opens a field for a stored quantity: as it was typed, else as it is printed. */
export function quantityText(quantity: { value: number; entered?: string } | null, dimension: DimensionName): string {
  if (!quantity) return "";

  return quantity.entered ?? formatQuantity(quantity.value, dimension);
}
