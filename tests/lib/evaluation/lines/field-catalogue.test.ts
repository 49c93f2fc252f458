import { describe, expect, it } from "vitest";
import { AllocationsBody } from "@/lib/evaluation/lines/allocations-body";
import { fieldsOf } from "@/lib/evaluation/lines/field-catalogue";
import type { FieldSpec } from "@/lib/evaluation/lines/field-spec";
import { FinishBody, newFinish } from "@/lib/evaluation/lines/finish-body";
import { GroupBody, newGroup } from "@/lib/evaluation/lines/group-body";
import { ItemBody } from "@/lib/evaluation/lines/item-body";
import { ITEM_METHODS } from "@/lib/evaluation/lines/item-methods";
import { newOperatingPoint, OperatingPointBody } from "@/lib/evaluation/lines/operating-point-body";
import { parseBody } from "@/lib/evaluation/lines/parse-body";
import { newTerms, TermsBody } from "@/lib/evaluation/lines/terms-body";
import { METHOD_NAMES } from "@/lib/evaluation/methods/method-name";
import type { LineKind } from "@/lib/vocabulary/lines";

const KINDS: [Exclude<LineKind, "item">, { shape: object }][] = [
  ["group", GroupBody],
  ["operating_point", OperatingPointBody],
  ["finish", FinishBody],
  ["allocations", AllocationsBody],
  ["terms", TermsBody],
];

function keysOf(fields: readonly FieldSpec[]): string[] {
  return fields.map(({ key }) => key).sort();
}

function schemaOf(method: string) {
  const schema = ItemBody.options.find(({ shape }) => shape.method.value === method);
  if (!schema) throw new Error(`no schema for ${method}`);
  return schema;
}

describe("the catalogue of fields", () => {
  it.each(KINDS)("names every field of a body of kind %s and no other", (kind, { shape }) => {
    expect(keysOf(fieldsOf(kind, null))).toEqual(Object.keys(shape).sort());
  });

  it.each(METHOD_NAMES)("names every field of an item by %s and no other", (method) => {
    expect(keysOf(fieldsOf("item", method))).toEqual(Object.keys(schemaOf(method).shape).sort());
  });

  it.each(METHOD_NAMES)("shows a field of %s by another field that the body has", (method) => {
    const fields = fieldsOf("item", method);
    const deciding = fields.flatMap(({ shownWhen }) => (shownWhen ? [shownWhen.field] : []));
    expect(keysOf(fields)).toEqual(expect.arrayContaining(deciding));
  });
});

describe("what a new line starts from", () => {
  it.each(METHOD_NAMES)("an item by %s has every field, and lacks only what its author has to fill in", (method) => {
    const template = ITEM_METHODS[method].template({ ownerId: 3, order: 10, group: null });
    expect(Object.keys(template).sort()).toEqual(Object.keys(schemaOf(method).shape).sort());

    const parsed = parseBody("item", template);
    const faults = parsed.ok ? [] : parsed.faults;
    const left = Object.entries(template).filter(([, value]) => value === null || value === "" || isEmptyList(value));
    for (const { path, sentence } of faults) {
      expect(left.map(([key]) => key)).toContain(path);
      expect(sentence).toMatch(/^[A-Z].*\.$/);
    }
    expect(faults.map(({ path }) => path)).toContain("name");
  });

  it.each<[LineKind, object]>([
    ["group", newGroup(10)],
    ["finish", newFinish()],
    ["operating_point", newOperatingPoint()],
  ])("a line of kind %s asks for its name", (kind, template) => {
    const parsed = parseBody(kind, template);
    expect(parsed.ok ? [] : parsed.faults.map(({ path }) => path)).toContain("name");
  });

  it("the terms are complete as they are offered", () => {
    expect(parseBody("terms", newTerms({ referenceOperatingPoint: "OP-1", reserveHundredths: 300 })).ok).toBe(true);
  });
});

function isEmptyList(value: unknown): boolean {
  return Array.isArray(value) && value.length === 0;
}
