import { describe, expect, it } from "vitest";
import { budgetSheet } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { figureWorking } from "@/app/(workspace)/products/[productCode]/_workings/figure-working";
import { FIGURES, type Working } from "@/app/(workspace)/products/[productCode]/_workings/working";
import type { LineRevisionView } from "@/lib/budget/views";
import { formatNewtonsNumber } from "@/lib/units/format-newtons";
import { sideFairing, supplyDuct } from "@/tests/support/demo-budgets";
import { frozenBudget } from "./frozen-budget";

function sheetOf(state: ReturnType<typeof sideFairing>, at = "OP-1") {
  const budget = frozenBudget(state);
  const point = budget.results.points.find(({ operatingPoint }) => operatingPoint === at);
  if (!point) throw new Error(`no ${at}`);
  return budgetSheet(budget, point);
}

const cold = {
  "OP-2": {
    name: "cold",
    fluid: "air",
    staticTemperature: { value: 258.15 },
    staticPressure: { value: 101325 },
    speed: { value: 25 },
  },
};

describe("the working of a number", () => {
  const sheet = sheetOf(sideFairing({ otherPoints: cold }));

  it("ends at the number that the sheet prints, for every item of both demo products", () => {
    for (const each of [sheet, sheetOf(supplyDuct())]) {
      for (const row of each.rows) {
        const working = figureWorking(each, { figure: "basic", of: "item", number: row.number }, []);
        expect(working?.steps.at(-1)?.value, row.number).toBe(formatNewtonsNumber(row.basic));
      }
    }
  });

  it("writes the sum of the sheet out, item by item, and its total last", () => {
    const working = figureWorking(sheet, { figure: "predicted", of: "total", number: null }, []);

    expect(working?.terms).toHaveLength(sheet.rows.length + 1);
    expect(working?.terms.at(-1)).toEqual({ label: "ΣP", value: formatNewtonsNumber(sheet.point.totals.predicted) });
  });

  it("gives growth as the fraction of the maturity grade", () => {
    const [step] = figureWorking(sheet, { figure: "growth", of: "item", number: "010" }, [])?.steps ?? [];

    expect(step?.withValues).toBe("|6.14| · 0.1");
    expect(step?.source).toContain("preliminary");
  });

  it("scales a reserve that the terms do not state with the limit", () => {
    const elsewhere = sheetOf(sideFairing({ otherPoints: cold }), "OP-2");
    const stated = figureWorking(sheet, { figure: "reserve", of: "total", number: null }, []);
    const scaled = figureWorking(elsewhere, { figure: "reserve", of: "total", number: null }, []);

    expect(stated?.steps).toEqual([]);
    expect(scaled?.steps[0]?.withValues).toBe("3.00 · 66.00 / 66.00");
  });

  it("names the act that last moved an allocation, newest revision first", () => {
    const moved = revision("C", 7, "rows.item-010", "6.50", "7.00");
    const before = revision("B", 4, "rows.item-010", null, "6.50");
    const other = revision("D", 9, "rows.item-020", "9.00", "9.50");
    const working = figureWorking(sheet, { figure: "allocation", of: "item", number: "010" }, [other, moved, before]);

    expect(working?.sentences[0]).toBe("Set from 6.50 to 7.00 N in issue 7, revision C of the allocations sheet.");
    expect(working?.links).toEqual([{ path: "proposals/7", label: "TF-2-CP-07 Move" }]);
  });

  it("answers nothing for a number that is not on the sheet, and something for every figure that is", () => {
    expect(figureWorking(sheet, { figure: "basic", of: "item", number: "999" }, [])).toBeNull();
    expect(figureWorking(sheet, { figure: "limit", of: "item", number: "010" }, [])).toBeNull();

    const answered = FIGURES.filter((figure) => figure !== "allocation").map((figure): Working | null =>
      figureWorking(sheet, { figure, of: "total", number: null }, []),
    );
    expect(answered.every((working) => working !== null && working.answer !== null)).toBe(true);
  });
});

function revision(letter: string, number: number, field: string, was: string | null, now: string): LineRevisionView {
  const proposal = { number, label: `TF-2-CP-0${number}`, title: "Move", proposer: { id: 1, name: "Tansy" } };
  const issue = { number, at: "2026-05-01T08:00:00.000Z", contentHash: "0", proposal, signatures: [], baselines: [] };
  return { letter, retired: false, issue, fields: [{ field, label: "Allocation", was, now, unit: "N" }] };
}
