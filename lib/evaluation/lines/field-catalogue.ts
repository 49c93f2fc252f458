import type { LineKind } from "@/lib/vocabulary/lines";
import { METHOD_NAMES, type MethodName } from "../methods/method-name";
import { ALLOCATIONS_FIELDS } from "./allocations-body";
import type { FieldSpec } from "./field-spec";
import { FINISH_FIELDS } from "./finish-body";
import { GROUP_FIELDS } from "./group-body";
import { ITEM_METHODS } from "./item-methods";
import { ITEM_CLOSING_FIELDS, ITEM_LEADING_FIELDS } from "./items/item-common";
import { OPERATING_POINT_FIELDS } from "./operating-point-body";
import { TERMS_FIELDS } from "./terms-fields";

const METHOD_FIELD: FieldSpec = {
  key: "method",
  label: "Method",
  type: {
    type: "choice",
    choices: METHOD_NAMES.map((value) => ({
      value,
      label: ITEM_METHODS[value].label,
      help: ITEM_METHODS[value].summary,
    })),
  },
};

const FIELDS_OF_KIND: Record<Exclude<LineKind, "item">, readonly FieldSpec[]> = {
  group: GROUP_FIELDS,
  operating_point: OPERATING_POINT_FIELDS,
  finish: FINISH_FIELDS,
  allocations: ALLOCATIONS_FIELDS,
  terms: TERMS_FIELDS,
};

/** The fields of a line in the order they are shown; an item's depend on its method. */
export function fieldsOf(kind: LineKind, method: MethodName | null): readonly FieldSpec[] {
  if (kind !== "item") return FIELDS_OF_KIND[kind];

  const own = method === null ? [] : ITEM_METHODS[method].fields;
  return [...ITEM_LEADING_FIELDS, METHOD_FIELD, ...own, ...ITEM_CLOSING_FIELDS];
}

/** The fields that a body of this kind has, read from the body itself: also where it is an unfinished draft. */
export function fieldsOfBody(kind: LineKind, body: object): readonly FieldSpec[] {
  return fieldsOf(kind, "method" in body ? methodNamed(body.method) : null);
}

function methodNamed(name: unknown): MethodName | null {
  return METHOD_NAMES.find((method) => method === name) ?? null;
}
