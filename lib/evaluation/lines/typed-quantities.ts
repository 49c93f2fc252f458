import type { LineKind } from "@/lib/vocabulary/lines";
import type { FieldFault } from "@/lib/vocabulary/refusal";
import type { DimensionName } from "@/lib/units/dimensions";
import { parseQuantity } from "@/lib/units/parse-quantity";
import { fieldsOfBody } from "./field-catalogue";
import { valuesOf } from "./field-rows";

/** Printing keeps twelve digits: a text within these of its value is that value. */
const TOLERANCE = 1e-9;

/** Typed texts that say something else than the value beside them: a reader would be told two things. */
export function typedTextFaults(kind: LineKind, body: object): FieldFault[] {
  return quantityFields(kind, body).flatMap(({ key, dimension }) => {
    const quantity = valuesOf(valuesOf(body).get(key));
    const [value, entered] = [quantity.get("value"), quantity.get("entered")];
    if (typeof value !== "number" || typeof entered !== "string" || entered === "") return [];

    const read = parseQuantity(entered, dimension);
    if (!read.ok) return [{ path: key, sentence: read.sentence }];
    const isSame = Math.abs(read.quantity.value - value) <= TOLERANCE * Math.abs(value);
    return isSame ? [] : [{ path: key, sentence: `"${entered}" is not the value beside it: type it again.` }];
  });
}

/** What is wrong with the text of a quantity that has no value; null where there is no text to read. */
export function unreadTextSentence(kind: LineKind, body: unknown, key: string): string | null {
  if (typeof body !== "object" || body === null) return null;
  const field = quantityFields(kind, body).find((each) => each.key === key);
  const entered = valuesOf(valuesOf(body).get(key)).get("entered");
  if (!field || typeof entered !== "string") return null;
  const read = parseQuantity(entered, field.dimension);
  return read.ok ? null : read.sentence;
}

function quantityFields(kind: LineKind, body: object): { key: string; dimension: DimensionName }[] {
  return fieldsOfBody(kind, body).flatMap(({ key, type }) =>
    type.type === "quantity" ? [{ key, dimension: type.dimension }] : [],
  );
}
