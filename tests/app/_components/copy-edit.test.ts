import { describe, expect, it } from "vitest";
import { copyEdit } from "@/app/_components/line-fields/new-edit";
import { parseBody } from "@/lib/evaluation/lines/parse-body";
import { line } from "@/tests/support/budget-state";

const LAMP = {
  ...{ name: "Side lamp", ownerId: 7, group: "G10", order: 40, grade: "released", methodVersion: 1, saving: false },
  ...{ method: "bluff-body", dragCoefficient: 0.6, referenceArea: { value: 0.008 }, source: "House table 2" },
  evidence: [{ document: "Drawing 12", revision: "B", date: "2026-02-03" }],
  justifications: [{ code: "mach-above-limit", text: "Measured at that speed.", excess: 1.1 }],
};

describe("a copy of an item", () => {
  const copy = copyEdit(line("item", "040", LAMP), "item", "050", 9);

  it("is a new line of whoever copies it, with the same method and sizes", () => {
    expect(copy).toMatchObject({ operation: "add", kind: "item", number: "050", baseLetter: null });
    expect(copy.body).toMatchObject({ ownerId: 9, name: "Side lamp, copy", group: "G10", dragCoefficient: 0.6 });
    expect(copy.body?.referenceArea).toEqual({ value: 0.008 });
  });

  it("starts as an estimate: evidence, grade and justifications were the other item's", () => {
    expect(copy.body).toMatchObject({ grade: "estimated", evidence: [], justifications: [] });
  });

  it("is a body that can be proposed as it is", () => {
    expect(parseBody("item", copy.body)).toMatchObject({ ok: true });
  });
});
