import { describe, expect, it } from "vitest";
import { withMethod } from "@/app/_components/line-fields/new-edit";
import {
  newItemEdit,
  revisedItemEdit,
  type TargetItem,
  type TrialTargets,
} from "@/app/(workspace)/trial/_trial/proposal-edit";
import { exampleTrial } from "@/app/(workspace)/trial/_trial/setting";
import { parseBody } from "@/lib/evaluation/lines/parse-body";
import { DraftEdit } from "@/lib/proposals/schema";

const SETTING = exampleTrial().b;

const ITEM: TargetItem = {
  number: "020",
  name: "Roof",
  letter: "B",
  body: {
    ...SETTING.item,
    name: "Roof",
    ownerId: 7,
    group: "G10",
    order: 20,
    grade: "layout",
    basis: "Shell alone",
    evidence: [{ document: "D-1", revision: "A", date: "2026-01-02" }],
    length: { value: 8, entered: "8 m" },
    liesBehind: "010",
    runUpFollows: true,
    finish: "F30",
  },
};

const TARGETS: TrialTargets = {
  userId: 7,
  items: [ITEM],
  taken: ["010", "020"],
  nextOrder: 30,
  versions: { "flat-plate-friction": 1, "drag-area": 1, "bluff-body": 1 },
  finishes: [
    { number: "F30", roughness: 6e-6 },
    { number: "F80", roughness: 150e-6 },
  ],
};

describe("a trial as a proposal", () => {
  it("becomes a new item of its proposer that the editor takes as complete", () => {
    const edit = DraftEdit.parse(newItemEdit(SETTING, { number: "030", name: "Side panel" }, TARGETS));

    expect(edit).toMatchObject({ operation: "add", kind: "item", number: "030", baseLetter: null });
    expect(parseBody("item", edit.body)).toMatchObject({
      ok: true,
      content: { body: { name: "Side panel", ownerId: 7, order: 30, grade: "estimated", length: { value: 4 } } },
    });
  });

  it("revises an item in what was tried and leaves the rest as it stands", () => {
    const edit = DraftEdit.parse(revisedItemEdit(SETTING, ITEM, TARGETS));

    expect(edit).toMatchObject({ operation: "revise", number: "020", baseLetter: "B" });
    expect(edit.body).toEqual({ ...ITEM.body, length: SETTING.item.length, finish: "F80", runUpFollows: false });
    expect(parseBody("item", edit.body).ok).toBe(true);
  });

  it("takes another method with its own fields, and none of the old one's", () => {
    const setting = { ...SETTING, item: { ...withMethod(SETTING.item, "drag-area", null), dragArea: { value: 0.1 } } };
    const { body } = revisedItemEdit(setting, ITEM, TARGETS);

    expect(body).toMatchObject({
      method: "drag-area",
      name: "Roof",
      ownerId: 7,
      grade: "layout",
      dragArea: { value: 0.1 },
    });
    expect(body).not.toHaveProperty("length");
    expect(body).not.toHaveProperty("finish");
  });

  it("keeps the version of the item's method, which only a proposal that says so moves", () => {
    const adopted = { ...ITEM, body: { ...ITEM.body, methodVersion: 2 } };
    expect(revisedItemEdit(SETTING, adopted, TARGETS).body?.methodVersion).toBe(2);
    const budget = { ...TARGETS, versions: { "flat-plate-friction": 2 } };
    expect(newItemEdit(SETTING, { number: "030", name: "Side panel" }, budget).body?.methodVersion).toBe(2);
  });

  it("keeps the source of an item, unless the trial chose a catalogued shape", () => {
    const bluff = withMethod(SETTING.item, "bluff-body", null);
    const item = { ...ITEM, body: { ...bluff, source: "Tunnel test 4" } };

    const own = revisedItemEdit({ ...SETTING, item: { ...bluff, dragCoefficient: 1 } }, item, TARGETS);
    expect(own.body?.source).toBe("Tunnel test 4");
    const catalogued = revisedItemEdit({ ...SETTING, item: { ...bluff, source: "Catalogue" } }, item, TARGETS);
    expect(catalogued.body?.source).toBe("Catalogue");
  });

  it("types the roughness where the product has another finish under that number, or none", () => {
    for (const finishes of [[], [{ number: "F80", roughness: 1e-4 }]]) {
      const { body } = newItemEdit(SETTING, { number: "030", name: "Panel" }, { ...TARGETS, finishes });

      expect(body).toMatchObject({ finish: null, roughness: { value: 150 * 1e-6 } });
      expect(parseBody("item", body).ok).toBe(true);
    }
  });
});
