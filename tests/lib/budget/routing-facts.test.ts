import { describe, expect, it } from "vitest";
import { ownersOfEdits, routingFacts } from "@/lib/budget/routing-facts";
import type { LineEdit, TransferEdit } from "@/lib/evaluation/budget/edits";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { previewChange } from "@/lib/evaluation/budget/preview-change";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { newTerms } from "@/lib/evaluation/lines/terms-body";
import { firstIssueLines } from "@/lib/products/first-issue";
import { DEFAULT_REVIEW_RULES } from "@/lib/vocabulary/review-rules";
import { addItem, bluffItem, firstPoint, fixedItem, shareItem } from "@/tests/support/budget-on-file";

const EVIDENCE = [{ document: "7731", revision: "C", date: "2026-03-15" }];
const OWNER = 1;
const OTHER = 2;

/** 010 fixed at 10 N in the layout grade, 020 a tenth of it, 030 a plate near the top of the one-fifth law's range. */
function budget() {
  const lines = firstIssueLines("vehicle_fairing", {
    productCode: "TF-2",
    operatingPoint: { number: "OP-1", body: firstPoint(10000) },
    terms: newTerms({ referenceOperatingPoint: "OP-1", reserveHundredths: 1000 }),
    password: "not asked",
  });
  const empty: BudgetState = { product: { code: "TF-2", name: "Fairing", kind: "vehicle_fairing" }, lines };
  const evidence = [{ document: "7731", revision: "C", date: "2026-03-15" }];
  const edits = [
    addItem("010", fixedItem(OWNER, 10, { grade: "layout", evidence })),
    addItem("020", shareItem(OWNER, 0.1, ["010"], { order: 20 })),
    addItem("030", plate(5.8)),
  ];
  const { after, faults } = previewChange(empty, evaluateBudget(empty), edits, []);
  expect(faults).toEqual([]);
  return after;
}

function plate(length: number) {
  const { force, source, ...common } = fixedItem(OWNER, 0, { order: 30 });
  expect([force.value, source]).toEqual([0, "Test"]);
  return {
    ...common,
    method: "flat-plate-friction",
    length: { value: length },
    breadth: { value: 0.2 },
    faces: 2,
    finish: null,
    roughness: { value: 0 },
    frictionLine: "one-fifth-law",
    transition: "tripped",
  };
}

const revise = (number: string, body: object): LineEdit => ({
  operation: "revise",
  kind: "item",
  number,
  baseLetter: "–",
  body,
});

function factsOf(edits: readonly LineEdit[], transfers: readonly TransferEdit[] = []) {
  const before = budget();
  const { after, faults } = previewChange(before.state, before.results, edits, transfers);
  expect(faults).toEqual([]);
  const rules = DEFAULT_REVIEW_RULES;
  return routingFacts({ rules, edits, transfers: transfers.length, before, after, earlierMoves: [] });
}

describe("the facts of a change", () => {
  it("name the fields that differ, and the grades on both sides", () => {
    const evidence = [{ document: "7731", revision: "C", date: "2026-03-15" }];
    const { edits } = factsOf([revise("010", fixedItem(OTHER, 9, { grade: "released", evidence }))]);
    expect(edits).toMatchObject([{ number: "010", gradeBefore: "layout", gradeAfter: "released" }]);
    expect([...(edits[0]?.changedFields ?? [])].sort()).toEqual(["force", "grade", "ownerId"]);
  });

  it("hold the totals of every operating point before and after, in newtons", () => {
    const evidence = [{ document: "7731", revision: "C", date: "2026-03-15" }];
    const [point] = factsOf([revise("010", fixedItem(OWNER, 12, { grade: "layout", evidence }))]).points;
    // 2 N more at 15 % growth, and a tenth of 2 N at 20 % of the share that follows.
    expect((point?.predictedAfter ?? 0) - (point?.predictedBefore ?? 0)).toBeCloseTo(2 * 1.15 + 0.2 * 1.2, 9);
    expect(point).toMatchObject({ operatingPoint: "OP-1", limit: 100, standingBefore: "inside" });
  });

  it("count growth that a raised grade releases on what the item then weighs, and none for a lowered one", () => {
    const evidence = [{ document: "7731", revision: "C", date: "2026-03-15" }];
    const graded = (grade: string) => factsOf([revise("010", fixedItem(OWNER, 8, { grade, evidence }))]).releases;
    expect(graded("released")).toEqual([{ item: "010", operatingPoint: "OP-1", released: expect.closeTo(0.8, 9) }]);
    expect(graded("estimated")).toEqual([]);
    expect(graded("layout")).toEqual([]);
  });

  it("tell a range caution only where the base revision did not carry it", () => {
    // Re of 5.8 m is 9.9 million, of 6.4 m 11 million: beyond the 10 million to which the one-fifth law is stated.
    const beyond = factsOf([revise("030", plate(6.4))]).newRangeCautions;
    expect(beyond).toEqual([{ item: "030", operatingPoint: "OP-1" }]);
    expect(factsOf([revise("030", plate(5.7))]).newRangeCautions).toEqual([]);
  });

  it("say whether the allocations sheet moves", () => {
    const transfer: TransferEdit = {
      giver: { kind: "unallocated", number: null },
      receiver: { kind: "item", number: "010" },
      hundredths: 100,
    };
    expect(factsOf([], [transfer])).toMatchObject({ transfers: 1, movesAllocations: true });
    expect(factsOf([revise("030", plate(5.7))])).toMatchObject({ transfers: 0, movesAllocations: false });
  });

  it("count another tree as a move of the sheet, also where no number on it moves", () => {
    const group: LineEdit = {
      operation: "add",
      kind: "group",
      number: "G10",
      baseLetter: null,
      body: { name: "Cab", parent: null, order: 10 },
    };
    const regrouped = revise("010", fixedItem(OWNER, 10, { grade: "layout", evidence: EVIDENCE, group: "G10" }));
    expect(factsOf([group])).toMatchObject({ movesAllocations: false });
    expect(factsOf([group, regrouped])).toMatchObject({ movesAllocations: true });
  });
});

it("names the owners of edited items before and after the change, and no others", () => {
  const before = budget();
  const edits = [revise("010", fixedItem(OTHER, 10)), addItem("040", bluffItem(3, 1, 0.1, { order: 40 }))];
  const { after } = previewChange(before.state, before.results, edits, []);
  expect(ownersOfEdits(edits, before.state, after.state)).toEqual([
    { item: "010", ownerId: OWNER },
    { item: "010", ownerId: OTHER },
    { item: "040", ownerId: 3 },
  ]);
});
