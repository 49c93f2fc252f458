import { describe, expect, it } from "vitest";
import { allocationsView } from "@/lib/evaluation/budget/allocations-view";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { standingSentence } from "@/lib/evaluation/budget/standing-sentence";
import { roundHundredths } from "@/lib/units/rounding";
import {
  SIDE_FAIRING,
  SIGN_PANEL,
  sideFairing,
  signPanel,
  SUPPLY_DUCT,
  supplyDuct,
  WINTER,
} from "@/tests/support/demo-budgets";

// Expected values: the three tables of the demo products, computed apart from this product.
const DEMOS = [
  { name: "side fairing", state: sideFairing(), rows: SIDE_FAIRING, basic: 54.96, predicted: 61.59, unallocated: 70 },
  { name: "supply duct", state: supplyDuct(), rows: SUPPLY_DUCT, basic: 124.15, predicted: 138.51, unallocated: 1180 },
  { name: "sign panel", state: signPanel(), rows: SIGN_PANEL, basic: 275.23, predicted: 310.32, unallocated: 150 },
];

describe.each(DEMOS)("the demo table of the $name", ({ state, rows, basic, predicted, unallocated }) => {
  const results = evaluateBudget(state);
  const [point] = results.points;

  it.each(rows)("has item $number at basic $basic N and predicted $predicted N", (row) => {
    const result = point?.items.find(({ item }) => item === row.number);
    expect(result?.refused).toBeNull();
    expect(roundHundredths(result?.basic ?? NaN)).toBe(row.basic);
    expect(roundHundredths(result?.predicted ?? NaN)).toBe(row.predicted);
  });

  it("adds up to the totals of the table", () => {
    expect(roundHundredths(point?.totals.basic ?? NaN)).toBe(basic);
    expect(roundHundredths(point?.totals.predicted ?? NaN)).toBe(predicted);
  });

  it("keeps allocations, unallocated and reserve at the limit, and flags the items of the table", () => {
    const view = allocationsView(state, results);
    expect(view.unallocatedHundredths).toBe(unallocated);
    expect(view.isConserved).toBe(true);
    const over = rows.filter((row) => row.predicted > row.allocation).map(({ number }) => number);
    expect(view.lines.filter(({ isOver }) => isOver).map(({ number }) => number)).toEqual(over);
  });
});

describe("the standing of the demo products", () => {
  const sentence = (state: ReturnType<typeof sideFairing>, number = "OP-1") => {
    const point = evaluateBudget(state).points.find(({ operatingPoint }) => operatingPoint === number);
    return point ? standingSentence(point).replace(/\s/g, " ") : null;
  };

  it("is inside by 1.41 N for the side fairing, 29.49 N for the duct and over by 20.32 N for the sign", () => {
    expect(sentence(sideFairing())).toBe("Inside by 1.41 N");
    expect(sentence(supplyDuct())).toBe("Inside by 29.49 N");
    expect(sentence(signPanel())).toBe("Over the limit by 20.32 N");
  });

  it("puts the duct at 147.3 N from a cold start and at 174.5 N at 9 m/s, there into the reserve", () => {
    const { points, worstPoint } = evaluateBudget(supplyDuct());
    expect(points.map(({ operatingPoint }) => operatingPoint)).toEqual(["OP-1", "OP-2", "OP-3"]);
    expect(points[1]?.totals.predicted).toBeCloseTo(147.3, 1);
    expect(points[2]?.totals.predicted).toBeCloseTo(174.5, 1);
    expect(points[2]?.standing).toBe("into_the_reserve");
    expect(worstPoint).toBe("OP-3");
  });

  it("brings the side fairing to 67.4 N at −15 °C, over the limit, with items 050 and 060 outside their range", () => {
    const winter = evaluateBudget(sideFairing({ otherPoints: { "OP-2": WINTER } })).points[1];
    expect(winter?.totals.predicted).toBeCloseTo(67.4, 1);
    expect(winter?.standing).toBe("over");
    const cautioned = winter?.items.filter(({ notes }) => notes.some(({ severity }) => severity === "caution"));
    expect(cautioned?.map(({ item }) => item)).toEqual(expect.arrayContaining(["050", "060"]));
  });
});
