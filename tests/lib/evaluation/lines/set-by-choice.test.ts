import { describe, expect, it } from "vitest";
import { BLUFF_BODY_SHAPES } from "@/lib/aero/bluff-body-shapes";
import { setByChoice } from "@/lib/evaluation/lines/field-spec";
import { ITEM_METHODS } from "@/lib/evaluation/lines/item-methods";
import { parseBody } from "@/lib/evaluation/lines/parse-body";

const SHAPE = ITEM_METHODS["bluff-body"].fields.find(({ key }) => key === "shape");

describe("a shape that is chosen from the catalogue", () => {
  if (!SHAPE || SHAPE.type.type !== "choice") throw new Error("the shape is no choice");
  const template = ITEM_METHODS["bluff-body"].template({ ownerId: 1, order: 10, group: null });
  const base = { ...template, name: "Lamp", referenceArea: { value: 0.01 } };

  it.each(SHAPE.type.choices)("writes its coefficient and its source, which then stand: $value", ({ value }) => {
    const body = { ...base, shape: value, ...setByChoice(SHAPE, value) };
    const published = BLUFF_BODY_SHAPES.find(({ id }) => id === value);
    const source: unknown = expect.stringContaining("check the book");
    expect(body).toMatchObject({ dragCoefficient: published?.dragCoefficient, source });
    expect(parseBody("item", body).ok).toBe(true);
  });

  it("is offered once each, and never the value of a loading code", () => {
    const values = SHAPE.type.type === "choice" ? SHAPE.type.choices.map(({ value }) => value) : [];
    expect(new Set(values).size).toBe(values.length);
    expect(values.filter((value) => value.startsWith("signboard"))).toEqual([]);
  });

  it("sets nothing where no choice or another field is meant", () => {
    expect(setByChoice(SHAPE, null)).toEqual({});
    expect(setByChoice({ key: "name", label: "Name", type: { type: "text", longest: 9 } }, "x")).toEqual({});
  });
});
