import { describe, expect, it } from "vitest";
import type { LineEdit } from "@/lib/evaluation/budget/edits";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { previewChange } from "@/lib/evaluation/budget/preview-change";
import type { LineKind } from "@/lib/vocabulary/lines";
import { itemNumber, ITEMS, largeBudget, POINTS } from "@/tests/support/large-budget";

const STATE = largeBudget();
const FROZEN = evaluateBudget(STATE);
const frozenResults = new Set(FROZEN.points.flatMap(({ items }) => items));

function revise(kind: LineKind, number: string, change: object): LineEdit {
  const line = STATE.lines.find((each) => each.kind === kind && each.number === number);
  if (!line) throw new Error(`there is no ${kind} ${number}`);
  return { operation: "revise", kind, number, baseLetter: line.letter, body: { ...line.body, ...change } };
}

/** Items that were computed anew, by operating point: every other result is the very one that was frozen. */
function computedAnew(...edits: LineEdit[]): Record<string, string[]> {
  const { after, faults } = previewChange(STATE, FROZEN, edits, []);
  expect(faults).toEqual([]);
  return Object.fromEntries(
    after.results.points.map(({ operatingPoint, items }) => [
      operatingPoint,
      items
        .filter((result) => !frozenResults.has(result))
        .map(({ item }) => item)
        .sort(),
    ]),
  );
}
function atEach(...indices: number[]): Record<string, string[]> {
  return Object.fromEntries(POINTS.map((point) => [point, indices.map(itemNumber)]));
}

// In each ten items: 0 to 7 plates, every second one behind the one before it; 8 a body. Items 49, 129 and 209 are the
// shares of the groups G00, G02 and G04, which hold the items up to them from 0, 90 and 170 on.
describe(`a preview on ${ITEMS} items computes anew`, () => {
  it("a body that is edited and the share of its group, two items of five hundred", () => {
    expect(computedAnew(revise("item", itemNumber(8), { dragCoefficient: 0.5 }))).toEqual(atEach(8, 49));
  });

  it("a fixed force and the share of its group", () => {
    expect(computedAnew(revise("item", itemNumber(19), { force: { value: 2 } }))).toEqual(atEach(19, 49));
  });

  it("a share alone where only its fraction is edited", () => {
    expect(computedAnew(revise("item", itemNumber(49), { fraction: 0.1 }))).toEqual(atEach(49));
  });

  it("a plate, the one that lies behind it and their share", () => {
    expect(computedAnew(revise("item", itemNumber(20), { length: { value: 2 } }))).toEqual(atEach(20, 21, 49));
  });

  it("the one plate with the finish that is edited, and its share", () => {
    const edit = revise("finish", "B2", { roughness: { value: 3e-4 } });
    expect(computedAnew(edit)).toEqual(atEach(100, 129));
  });

  it("a body that changes its group, and the shares of both", () => {
    expect(computedAnew(revise("item", itemNumber(8), { group: "G04" }))).toEqual(atEach(8, 49, 209));
  });

  it("all items at the operating point whose speed is edited, none at the others", () => {
    const anew = computedAnew(revise("operating_point", "OP-2", { speed: { value: 16 } }));
    expect(Object.values(anew).map(({ length }) => length)).toEqual([0, ITEMS, 0, 0, 0]);
  });

  it("nothing where a limit, a reserve or a group's name is edited", () => {
    const limit = revise("operating_point", "OP-1", { limitHundredths: 11_000_000 });
    const reserve = revise("terms", "TM", { reserves: [{ operatingPoint: "OP-1", hundredths: 200_000 }] });
    expect(computedAnew(limit, reserve, revise("group", "G03", { name: "Roof" }))).toEqual(atEach());
  });
});
