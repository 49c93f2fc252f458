import { describe, expect, it } from "vitest";
import { budgetSheet, type BudgetSheet } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { causeRows } from "@/app/(workspace)/products/[productCode]/_uncertainty/cause-rows";
import { chanceText } from "@/app/(workspace)/products/[productCode]/_uncertainty/chance-text";
import { sheetUncertainty } from "@/app/(workspace)/products/[productCode]/_uncertainty/frozen-uncertainty";
import { figureWorking } from "@/app/(workspace)/products/[productCode]/_workings/figure-working";
import { RUN_FIGURES } from "@/app/(workspace)/products/[productCode]/uncertainty/_components/run-figures";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { body, budget, fixed, plate, spread } from "@/tests/lib/evaluation/uncertainty/uncertain-budget";
import { frozenBudget } from "./frozen-budget";

function sheetOf(state: BudgetState): BudgetSheet {
  const frozen = frozenBudget(state);
  const [point] = frozen.results.points;
  if (!point) throw new Error("no point");
  return budgetSheet(frozen, point);
}

function knownOf(sheet: BudgetSheet) {
  const uncertainty = sheetUncertainty(sheet);
  if (uncertainty.state !== "known") throw new Error(uncertainty.state);
  return uncertainty.frozen;
}

const CITED = { evidence: [{ document: "7731", revision: "C", date: "2026-03-02" }] };
const SHEET = sheetOf(
  budget({
    "010": plate(spread(3.1, 0.05), { value: 1.15 }, 2),
    "020": plate(spread(2.2, 0.4), { value: 0.9 }, 1, CITED),
    "030": body(1.2, 0.06, spread(0.034, 0.002)),
    "040": fixed(spread(0.9, 0.2)),
  }),
);

describe("the causes of a sheet", () => {
  const rows = causeRows(SHEET, knownOf(SHEET));
  const row = (key: string) => rows.find((each) => each.key === key);

  it("say what is uncertain and by how much, in the unit that the issue states", () => {
    expect(row("operating_point:OP-1:speed")).toMatchObject({
      what: "Speed",
      where: "OP-1 OP-1",
      value: "24\u2009m/s",
      standardUncertainty: "0.360\u2009m/s",
    });
    expect(row("item:030:dragCoefficient")).toMatchObject({ value: "1.2", standardUncertainty: "0.0600" });
    expect(row("method:one-fifth-law")).toMatchObject({ what: "Bias of the line", value: null });
  });

  it("tell a source from a judgement", () => {
    const basis = (key: string) => row(key)?.basis;
    expect(basis("item:030:dragCoefficient")).toEqual({ kind: "source", text: "Test" });
    expect(basis("item:030:referenceArea")?.kind).toBe("judgement");
    expect(basis("item:020:length")).toEqual({ kind: "source", text: "evidence of the item: 7731 rev. C" });
    expect(basis("item:010:length")?.kind).toBe("judgement");
    expect(basis("operating_point:OP-1:speed")?.kind).toBe("judgement");
    expect(basis("method:bluff-body")).toMatchObject({ kind: "judgement" });
    expect(basis("method:bluff-body")?.text).not.toMatch(/judgement/i);
  });

  it("stand in the order of their shares, which add up to all of the variance", () => {
    const shares = rows.map(({ share }) => share);
    expect(shares).toEqual(shares.toSorted((one, other) => other - one));
    const all = shares.reduce((sum, share) => sum + share, knownOf(SHEET).otherCauses.share);
    expect(all).toBeCloseTo(1, 9);
  });
});

describe("the working of an uncertainty", () => {
  it("answers every figure of the total, every cause and every item", () => {
    for (const figure of ["interval", "standardUncertainty", "basicExceedsLimit", "predictedExceedsLimit"] as const) {
      expect(figureWorking(SHEET, { figure, of: "total", number: null }, [])?.answer, figure).toBeTruthy();
    }
    for (const { key } of knownOf(SHEET).causes) {
      const working = figureWorking(SHEET, { figure: "standardUncertainty", of: "cause", number: key }, []);
      expect(working?.answer, key).toMatch(/of the variance of ΣB$/);
      expect(working?.steps[0]?.source, key).toMatch(/^(Source|Judgement): ./);
    }
    const own = figureWorking(SHEET, { figure: "standardUncertainty", of: "item", number: "040" }, []);
    // A fixed force has no other uncertainty than its own.
    expect(own?.steps[0]?.value).toBe("0.200");
    expect(figureWorking(SHEET, { figure: "standardUncertainty", of: "cause", number: "item:999:x" }, [])).toBeNull();
  });

  it("stands with an item's results as the issue froze it", () => {
    const row = SHEET.rows.find(({ number }) => number === "040");
    expect(row?.kind === "item" ? row.result.answer?.standardUncertainty : null).toBe(0.2);
  });
});

describe("a sheet without an interval", () => {
  it("says why: nothing kept, no items, everything exact, an item without a result", () => {
    const exact = sheetOf(budget({ "010": fixed({ value: 3 }) }));
    expect(sheetUncertainty(exact)).toEqual({ state: "exact" });
    expect(sheetUncertainty({ ...exact, uncertainty: null })).toEqual({ state: "not_kept" });
    expect(sheetUncertainty(sheetOf(budget({})))).toEqual({ state: "no_items" });
    const refused = { operatingPoint: "OP-1", refused: ["010"] };
    expect(sheetUncertainty({ ...exact, uncertainty: refused })).toEqual({ state: "refused", items: ["010"] });
    expect(figureWorking(exact, { figure: "interval", of: "total", number: null }, [])).toBeNull();
  });
});

describe("figures of a run beside first order", () => {
  it("differ in newtons, in per cent of the standard uncertainty, and in points of probability", () => {
    const texts = RUN_FIGURES.map(({ difference }) => difference(2.1, 2));
    expect(texts).toEqual(["+0.10", "+5.0\u2009%", "+0.10", "+0.10", "+10.0 points", "+10.0 points"]);
    expect(RUN_FIGURES.map(({ difference }) => difference(2, 2))).toEqual([
      "0.00",
      "0.0\u2009%",
      "0.00",
      "0.00",
      "0.0 points",
      "0.0 points",
    ]);
    expect(RUN_FIGURES[4]?.difference(0.05, 0.0713)).toBe("−2.1 points");
  });

  it("prints a probability without saying that something cannot be", () => {
    expect([0, 0.0001, 0.0713, 0.9999, 1].map(chanceText)).toEqual([
      "0.0\u2009%",
      "below 0.1\u2009%",
      "7.1\u2009%",
      "above 99.9\u2009%",
      "100.0\u2009%",
    ]);
  });
});
