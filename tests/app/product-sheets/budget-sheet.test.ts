import { describe, expect, it } from "vitest";
import {
  type BudgetSheet,
  type ItemRow,
  budgetSheet,
  pointOf,
} from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import {
  SheetQuery,
  chosenRows,
  isOver,
  sheetAddress,
} from "@/app/(workspace)/products/[productCode]/_sheet/sheet-filter";
import { staveInput } from "@/app/(workspace)/products/[productCode]/_sheet/stave-input";
import { budgetState, line } from "@/tests/support/budget-state";
import { SIGN_PANEL, sideFairing, signPanel } from "@/tests/support/demo-budgets";
import { frozenBudget } from "./frozen-budget";

function sheetOf(state: ReturnType<typeof signPanel>): BudgetSheet {
  const budget = frozenBudget(state);
  const point = pointOf(budget, undefined);
  if (!point) throw new Error("a budget has an operating point");
  return budgetSheet(budget, point);
}

const numbersOf = (rows: readonly { number: string }[]) => rows.map(({ number }) => number);

describe("the rows of the budget sheet", () => {
  it("print what the demo's table prints for basic, predicted and allocation", () => {
    const rows = sheetOf(signPanel()).rows.filter((row): row is ItemRow => row.kind === "item");

    expect(rows.map(({ number, allocationHundredths }) => [number, allocationHundredths])).toEqual(
      SIGN_PANEL.map(({ number, allocation }) => [number, Math.round(allocation * 100)]),
    );
    for (const { number, predicted } of SIGN_PANEL) {
      expect(rows.find((row) => row.number === number)?.predicted).toBeCloseTo(predicted, 1);
    }
  });

  it("call over exactly what the demo's table calls over", () => {
    const over = sheetOf(signPanel()).rows.filter(isOver);

    expect(numbersOf(over)).toEqual(["020", "060", "090", "100", "110"]);
  });

  it("sum a group over its subgroups and leave it without a margin where it has no allocation", () => {
    const state = sideFairing();
    const grouped = {
      ...state,
      lines: [
        line("group", "G10", { name: "Panels", order: 0 }),
        line("group", "G11", { name: "Outer", order: 0, parent: "G10" }),
        ...state.lines.map((each) =>
          each.kind === "item" && Number(each.number) <= 20
            ? { ...each, body: { ...each.body, group: each.number === "010" ? "G10" : "G11" } }
            : each,
        ),
      ],
    };
    const rows = sheetOf(grouped).rows;
    const [outer, whole] = [rows.find(({ number }) => number === "G11"), rows.find(({ number }) => number === "G10")];
    const item = (number: string) => rows.find((row) => row.kind === "item" && row.number === number)?.predicted ?? NaN;

    expect(whole).toMatchObject({ kind: "group", members: ["010", "020"], marginHundredths: null, depth: 0 });
    expect(whole?.predicted).toBeCloseTo(item("010") + item("020"), 9);
    expect(outer?.predicted).toBeCloseTo(item("020"), 9);
  });

  it("show no margin for an item that is refused", () => {
    const state = budgetState({
      code: "T",
      name: "T",
      kind: "other_body",
      point: { fluid: "custom", density: { value: 1 }, dynamicViscosity: { value: 1 }, speed: { value: 1 } },
      limitHundredths: 1000,
      reserveHundredths: 0,
      items: {
        "010": {
          ...{ name: "Plate", ownerId: 1, order: 10, grade: "estimated", method: "flat-plate-friction" },
          ...{ methodVersion: 1, length: { value: 1 }, breadth: { value: 1 }, faces: 1, roughness: { value: 0 } },
        },
      },
      allocations: [{ kind: "item", number: "010", hundredths: 100 }],
    });
    const [row] = sheetOf(state).rows;

    expect(row).toMatchObject({ kind: "item", allocationHundredths: 100, marginHundredths: null });
    expect(staveInput(sheetOf(state)).items).toEqual([]);
  });
});

describe("the stave of a sheet", () => {
  it("ends its solid part at the sum that is frozen", () => {
    const { items, basic } = staveInput(sheetOf(signPanel()));

    expect(items.reduce((sum, item) => sum + item.basic, 0)).toBeCloseTo(basic, 9);
  });
});

describe("what the address asks of the sheet", () => {
  const sheet = sheetOf(signPanel());
  const ask = (query: object) => numbersOf(chosenRows(sheet, SheetQuery.parse(query), 1));

  it("finds by words in number, name or owner, whatever their case", () => {
    expect(ask({ find: "FACE" })).toEqual(["010", "020"]);
    expect(ask({ find: "rear face" })).toEqual(["020"]);
    expect(ask({ find: "brackenholt" })).toHaveLength(SIGN_PANEL.length);
    expect(ask({ find: "nothing like it" })).toEqual([]);
  });

  it("shows only what is over, or only what the reader owns", () => {
    expect(ask({ only: "over" })).toEqual(["020", "060", "090", "100", "110"]);
    expect(numbersOf(chosenRows(sheet, SheetQuery.parse({ only: "mine" }), 2))).toEqual([]);
  });

  it("sorts by a column, up and down", () => {
    expect(ask({ sort: "predicted", down: "1" }).slice(0, 2)).toEqual(["060", "040"]);
    expect(ask({ sort: "margin" })[0]).toBe("060");
  });

  it("reads what it does not know as if it were not there, and writes only what matters", () => {
    const query = SheetQuery.parse({ issue: "x", point: "<script>", sort: "sideways", only: "all", on: "yesterday" });

    expect(query).toEqual({ find: "", only: "all", sort: "sheet" });
    expect(sheetAddress("/b", query, { point: "OP-2", find: "a b" })).toBe("/b?point=OP-2&find=a+b");
    expect(sheetAddress("/b", query, {})).toBe("/b");
  });
});
